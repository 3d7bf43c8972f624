import { remembered, seen } from '../result.ts'
import type { Band } from './band.ts'
import { justUnder } from './band.ts'

export type Curve = 'B' | 'C' | 'D'
/** Multiples of the rating: at the lower it must not open within 0.1 s, at the upper it must. */
const magneticOf: Readonly<Record<Curve, readonly [number, number]>> = {
  B: [3, 5],
  C: [5, 10],
  D: [10, 20],
}
/** Latest opening at the lower multiple, s: up to 32 A, and above. From memory. */
const latestAtLower: Readonly<Record<Curve, readonly [number, number]>> = {
  B: [45, 90],
  C: [15, 30],
  D: [4, 8],
}

/** A breaker of IEC 60898-1: conventional currents, 2.55 times, and the magnetic band of its letter. */
export function iec60898(ratedAmps: number, curve: Curve): Band {
  const large = ratedAmps > 32 ? 1 : 0
  const [least, most] = magneticOf[curve]
  const hour = ratedAmps > 63 ? 7200 : 3600
  const lower = latestAtLower[curve][large]
  return {
    name: `${curve}${ratedAmps} breaker (IEC 60898)`,
    ratedAmps,
    holdsTo: 1.13,
    opensFrom: 1.45,
    soonest: [
      [1.13, hour],
      [2.55, 1],
      [least, 0.1],
      [least, 0.008],
    ],
    latest: [
      [1.45, hour],
      [2.55, large ? 120 : 60],
      [least, lower],
      [justUnder(most), lower],
      [most, 0.1],
    ],
    magnetic: [least, most],
    references: [
      seen(`IEC 60898-1 table 7: 1.13, 1.45 and 2.55 times the rating; magnetic band of type ${curve}`),
      remembered('IEC 60898-1 table 7: latest opening at the lower end of the magnetic band'),
    ],
    assumptions: ['The band is of a cold breaker at 30 °C.'],
  }
}
