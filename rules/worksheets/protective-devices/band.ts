import { throughPoints } from '../curve.ts'
import type { Reference } from '../result.ts'
import type { Times } from '../written.ts'

/** When a protective device opens: two edges over the current as a multiple of its rating. */
export type Band = {
  /** "20 A breaker (UL 489)". */
  name: string
  ratedAmps: number
  /** Multiple of the rating up to which it must not open, and from which it must. */
  holdsTo: number
  opensFrom: number
  /** Soonest and latest opening: multiple, seconds. Past the last point level. */
  soonest: readonly (readonly [multiple: number, seconds: number])[]
  latest: readonly (readonly [multiple: number, seconds: number])[]
  /** Multiples between which the magnetic part picks up, where it has one. */
  magnetic: readonly [least: number, most: number] | undefined
  references: readonly Reference[]
  assumptions: readonly string[]
}

/** When it opens at this current: Infinity for "never". Between holding and opening it may do either. */
export function opensAfter(band: Band, amps: number): Times {
  const multiple = amps / band.ratedAmps
  if (multiple <= band.holdsTo * (1 + 1e-9)) return { fromSeconds: Infinity, toSeconds: Infinity }
  return {
    fromSeconds: throughPoints(band.soonest, multiple, 'logarithmic'),
    toSeconds:
      multiple < band.opensFrom * (1 - 1e-9) ? Infinity : throughPoints(band.latest, multiple, 'logarithmic'),
  }
}

/** Least current, A, at which it surely opens within this time; Infinity where the band promises none. */
export function ampsToOpenWithin(band: Band, seconds: number): number {
  const [first, last] = [band.opensFrom, 100]
  if (opensAfter(band, last * band.ratedAmps).toSeconds > seconds) return Infinity
  let [under, over] = [first * (1 - 1e-6), last]
  for (let step = 0; step < 60; step++) {
    const middle = Math.sqrt(under * over)
    if (opensAfter(band, middle * band.ratedAmps).toSeconds > seconds) under = middle
    else over = middle
  }
  return over * band.ratedAmps
}

/** The jump of a latest edge lies just under its multiple: at the multiple itself it has already opened. */
export const justUnder = (multiple: number): number => multiple * (1 - 1e-7)
