import type { Band } from '../protective-devices/band.ts'
import { opensAfter } from '../protective-devices/band.ts'
import type { Plot } from '../plot.ts'
import { between, inTimes, written } from '../written.ts'
import type { Clearing } from './clearing.ts'

const frame = { width: 420, height: 330 }
const field = { left: 58, top: 14, right: 408, bottom: 282 }
const seconds = [0.005, 10_000] as const

/** 1, 2, 5, 10, 20 … between two amps. */
function amperes(from: number, to: number): number[] {
  const all: number[] = []
  for (let ten = 10 ** Math.floor(Math.log10(from)); ten <= to; ten *= 10)
    for (const step of [1, 2, 5])
      if (step * ten >= from * 0.999 && step * ten <= to * 1.001) all.push(step * ten)
  return all
}

/** The band of the device over the current, with what flows in this fault and what ends it. Undefined without a current. */
export function bandPlot(band: Band, clearing: Clearing): Plot | undefined {
  const { least, most } = clearing.amps
  if (!(most > 0)) return undefined
  const from = Math.min(band.ratedAmps * 0.5, least * 0.7)
  const to = Math.max(band.ratedAmps * 25, most * 1.5)
  const x = (amps: number) =>
    field.left + (Math.log(amps / from) / Math.log(to / from)) * (field.right - field.left)
  const y = (time: number) => {
    const kept = Math.min(seconds[1], Math.max(seconds[0], time))
    return (
      field.bottom -
      (Math.log(kept / seconds[0]) / Math.log(seconds[1] / seconds[0])) * (field.bottom - field.top)
    )
  }
  const inside = (edge: Band['latest']) =>
    edge.filter(([m]) => m * band.ratedAmps <= to).map(([m, s]) => [x(m * band.ratedAmps), y(s)] as const)
  const level = (side: 'fromSeconds' | 'toSeconds') => [field.right, y(opensAfter(band, to)[side])] as const
  const up = [
    [x(band.holdsTo * band.ratedAmps), field.top] as const,
    ...inside(band.soonest),
    level('fromSeconds'),
  ]
  const down = [
    [x(band.opensFrom * band.ratedAmps), field.top] as const,
    ...inside(band.latest),
    level('toSeconds'),
  ]
  const { breaker, source } = clearing
  const ends = [source.fromSeconds, source.toSeconds].filter((time) => time < Infinity)
  return {
    ...frame,
    field,
    xTicks: thinned(amperes(from, to), x).map((amps) => ({ at: x(amps), text: written(amps) })),
    yTicks: [0.01, 0.1, 1, 10, 100, 1000, 10_000].map((time) => ({ at: y(time), text: written(time, 5) })),
    xLabel: 'amps',
    yLabel: 'seconds',
    band: [...up, ...down.reverse()],
    operating: {
      left: x(least),
      right: x(most),
      top: breaker.toSeconds === Infinity ? field.top : y(breaker.toSeconds),
      bottom: breaker.fromSeconds === Infinity ? field.top : y(breaker.fromSeconds),
      text: `${between(least, most)} A`,
    },
    ends: [...new Set(ends)].map((time) => ({ y: y(time), text: `source lets go, ${written(time, 2)} s` })),
    words: `${band.name}: from ${written(band.opensFrom * band.ratedAmps)} A it must open. At ${between(least, most)} A it opens: ${inTimes(breaker)}. The source lets go: ${inTimes(source)}.`,
  }
}

/** Ticks that stand at least 34 points apart. */
function thinned(all: readonly number[], x: (amps: number) => number): number[] {
  const kept: number[] = []
  for (const amps of all) if (kept.length === 0 || x(amps) - x(kept.at(-1)!) >= 34) kept.push(amps)
  return kept
}
