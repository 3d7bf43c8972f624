/** A tech at work: what they carry, how their instruments err, how they write down. Not physics; common practice. */
import { overLimitOhms } from '../../../rules/findings/sheet.ts'
import type { Kit } from '../../../rules/circuit/wiring/take-readings.ts'
import type { Found } from '../../../rules/circuit/wiring/readings/measured.ts'
import { between, betweenLog, happens, pick } from '../../../rules/circuit/wiring/sample.ts'
import type { Chance } from '../../../rules/circuit/wiring/sample.ts'

export type Tech = {
  kit: Kit
  /** Writes down whole volts. */
  whole: boolean
  /** The meter's own gain. */
  gain: number
  /** An ohmmeter's leads, Ω, and where it shows over limit. */
  leadOhms: number
  topOhms: number
  /** Smallest step of the clamp, A. */
  clampStep: number
}

/** What a tech turns up with: mostly 10 MΩ, now and then a low-resistance meter; a resistive or a neon tester. */
export function techComes(chance: Chance): Tech {
  const ohms = pick<() => number>(chance, [
    { value: () => 10_000_000, weight: 75 },
    { value: () => 1_000_000, weight: 9 },
    { value: () => Math.round(betweenLog(chance, 3_000, 400_000)), weight: 16 },
  ])()
  const lamp = betweenLog(chance, 100_000, 200_000)
  const lamps = [lamp, lamp, lamp].map((o) => o * between(chance, 0.95, 1.05)) as [number, number, number]
  const strikeVolts = [0, 0, 0].map(() => between(chance, 60, 74)) as [number, number, number]
  return {
    kit: {
      meter: { ohms, farads: happens(chance, 0.25) ? 0 : betweenLog(chance, 20e-12, 120e-12) },
      tester: happens(chance, 0.3)
        ? { kind: 'neon', ohms: lamps, strikeVolts }
        : { kind: 'resistive', ohms: lamps },
      bulbWatts: pick(chance, [
        { value: 60, weight: 2 },
        { value: 40, weight: 1 },
      ]),
    },
    whole: happens(chance, 0.15),
    gain: between(chance, 0.99, 1.01),
    leadOhms: between(chance, 0, 0.15),
    topOhms: pick(
      chance,
      [2e7, 4e7, 6e7].map((value) => ({ value, weight: 1 })),
    ),
    clampStep: pick(chance, [
      { value: 0.01, weight: 2 },
      { value: 0.1, weight: 1 },
    ]),
  }
}

const tenth = (x: number) => Math.max(0, Math.round(x * 10) / 10)

/** One number as this tech writes it down. */
export function writtenDown(chance: Chance, tech: Tech, id: string, exact: number, wander: number): number {
  if (id.endsWith('.ohms')) {
    if (exact >= overLimitOhms || exact > tech.topOhms) return overLimitOhms
    const ohms = exact * between(chance, 0.98, 1.02) + tech.leadOhms + between(chance, -0.05, 0.05)
    return ohms < 1000 ? tenth(ohms) : Number(ohms.toPrecision(3))
  }
  if (id.endsWith('.amps')) {
    const amps = exact * between(chance, 0.97, 1.03) + between(chance, -0.01, 0.02)
    return Number((Math.round(Math.max(0, amps) / tech.clampStep) * tech.clampStep).toFixed(2))
  }
  if (id.endsWith('.milliamps')) return tenth(exact * between(chance, 0.95, 1.05))
  if (id === 'source.hz') return tenth(exact)
  const volts = exact * tech.gain * between(chance, 1 - wander, 1 + wander) + between(chance, -0.2, 0.2)
  return tech.whole ? Math.max(0, Math.round(volts)) : tenth(volts)
}

/** Tests as people do them: what belongs together is left out together, and how often it is. */
const doneTogether: readonly (readonly [chance: number, ...ids: string[]])[] = [
  [0.02, 'receptacle.hn.volts'],
  [0.03, 'receptacle.hg.volts'],
  [0.03, 'receptacle.ng.volts'],
  [0.08, 'receptacle.hn.volts.loaded', 'receptacle.ng.volts.loaded'],
  [0.2, 'receptacle.ge.volts'],
  [0.08, 'receptacle.ng.ohms', 'receptacle.hg.ohms'],
  [0.08, 'panel.hn.volts', 'panel.hg.volts', 'panel.ng.volts'],
  [0.08, 'panel.l1n.volts', 'panel.l2n.volts', 'panel.l1l2.volts'],
  [0.08, 'panel.ng.ohms'],
  [0.08, 'source.hn.volts', 'source.hg.volts', 'source.ng.volts'],
  [0.08, 'source.ng.ohms'],
  [0.25, 'feeder.egc.amps'],
  [0.08, 'bulb.ng', 'bulb.ng.volts'],
  [0.08, 'bulb.hg'],
  [0.02, 'tester.hn-lamp', 'tester.hg-lamp', 'tester.ng-lamp'],
  [0, 'gfci.own-test', 'gfci.plug-test', 'gfci.in-use'],
]
/** Taken only where everything is: the sample cases hold none of these. */
const seldom: readonly (readonly [chance: number, ...ids: string[]])[] = [
  [0.15, 'source.hn.volts.loaded'],
  [0.15, 'panel.hn.volts.loaded', 'panel.ng.volts.loaded'],
  [0.15, 'branch.egc.amps'],
  [0.15, 'rod.amps'],
  [0.15, 'panel.l1g.volts', 'panel.l2g.volts'],
  [0.15, 'branch.hot.amps', 'branch.neutral.amps'],
  [0.15, 'branch.leakage.milliamps'],
  [0.15, 'branch.egc.ohms'],
  [0.15, 'receptacle.loop.ohms'],
  [0.15, 'source.bulb.ng.volts', 'source.bulb.hg.volts', 'source.bulb.hn.volts'],
  [0.15, 'source.ng.volts.dc', 'source.hz'],
]

/**
 * The findings a tech writes down of what the wiring gives.
 * @param everything also what a call seldom takes
 * @param engine its volts wander more
 * @param reach whether the source's own terminals can be reached
 */
export function takenBy(
  chance: Chance,
  tech: Tech,
  exact: Found,
  { everything, engine, reach }: { everything: boolean; engine: boolean; reach: boolean },
): Found {
  const found: Found = {}
  for (const [leftOut, ...ids] of everything ? [...doneTogether, ...seldom] : doneTogether) {
    if (happens(chance, leftOut)) continue
    for (const id of ids) {
      const value = exact[id]
      if (value === undefined || (!reach && id.startsWith('source.'))) continue
      found[id] =
        typeof value === 'number'
          ? writtenDown(chance, tech, id, value, engine ? 0.012 : 0.005)
          : mishandled(chance, id, value)
    }
  }
  // Where the terminals can't be reached the feeder's ground wire mostly can't be told from others either.
  if (!reach) delete found['feeder.egc.amps']
  return found
}

/** A worn button, a load that tripped it by itself, a bulb that a GFCI took away. */
function mishandled(chance: Chance, id: string, value: string): string {
  if (id === 'gfci.own-test' && happens(chance, 0.03)) return value === 'trips' ? 'holds' : 'trips'
  if (id === 'gfci.in-use' && value === 'holds' && happens(chance, 0.05)) return 'trips-with-load'
  if (id === 'bulb.hg' && happens(chance, 0.02)) return 'dark'
  return value
}
