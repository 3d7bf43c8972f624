import { remembered, seen } from '../result.ts'
import type { Band } from './band.ts'
import { justUnder } from './band.ts'

/** Latest opening at 200 % of the rating: UL 489, up to 100 A seen, above from memory. Seconds. */
const at200 = [
  [30, 120],
  [50, 240],
  [100, 360],
  [150, 480],
  [225, 600],
  [400, 720],
] as const
/** Latest opening at 300 %: NEMA AB 4 field table for 250 V breakers, from memory. */
const at300 = [
  [30, 50],
  [50, 80],
  [400, 140],
] as const

const forRating = (table: readonly (readonly [number, number])[], amps: number): number =>
  (table.find(([upTo]) => amps <= upTo) ?? table.at(-1)!)[1]

/** The magnetic part of small breakers: from 5 to 10 times the rating is typical, no standard sets it. */
export const typicalMagnetic = { least: 5, most: 10 } as const
/** One half cycle to three cycles: what a magnetic release and its arc take (typical, from memory). */
const atOnce = { soonest: 0.008, latest: 0.05 } as const

/**
 * A North American molded-case breaker. UL 489 fixes three points: 100 % holds, 135 % opens within 1 h (2 h above
 * 50 A), 200 % within the table. NEMA AB 4 adds 300 %. Beyond it the heat I²t stays the same. The soonest edge and
 * the magnetic band are typical, not of the standard.
 * @param magnetic multiples of the rating between which the magnetic part picks up
 */
export function ul489(ratedAmps: number, magnetic: { least: number; most: number } = typicalMagnetic): Band {
  const twice = forRating(at200, ratedAmps)
  const thrice = forRating(at300, ratedAmps)
  const { least, most } = magnetic
  const heat = (multiple: number) => (thrice * 9) / multiple ** 2
  const early = (multiple: number) => 40 / multiple ** 2
  const latestThermal = [
    [1.35, ratedAmps <= 50 ? 3600 : 7200],
    [2, twice],
    [3, thrice],
  ] as const
  const soonestThermal = [
    [1, 3600],
    [1.35, 60],
    [2, early(2)],
  ] as const
  return {
    name: `${ratedAmps} A breaker (UL 489)`,
    ratedAmps,
    holdsTo: 1,
    opensFrom: 1.35,
    soonest: [...soonestThermal.filter(([m]) => m < least), [least, early(least)], [least, atOnce.soonest]],
    latest: [
      ...latestThermal.filter(([m]) => m < most),
      [justUnder(most), heat(most)],
      [most, atOnce.latest],
    ],
    magnetic: [least, most],
    references: [
      ratedAmps <= 100
        ? seen('UL 489: holds at 100 %, opens at 135 % and 200 % of its rating within set times')
        : remembered('UL 489: holds at 100 %, opens at 135 % and 200 % of its rating within set times'),
      remembered('NEMA AB 4: field check at 300 %'),
    ],
    assumptions: [
      `The magnetic part picks up between ${least} and ${most} times the rating: typical of small breakers, set by no standard. The breaker’s own time-current curve decides.`,
      'The band is of a cold breaker at 25 °C; its soonest edge is typical.',
    ],
  }
}
