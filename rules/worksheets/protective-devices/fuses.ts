import { remembered } from '../result.ts'
import type { Band } from './band.ts'

/**
 * A North American fuse: UL 248 fixes only two points of small fuses, both from memory. From 200 % on the standard
 * says no more than what it says there; the fuse's own curve does.
 */
export function ul248(ratedAmps: number): Band {
  return {
    name: `${ratedAmps} A fuse (UL 248)`,
    ratedAmps,
    holdsTo: 1.1,
    opensFrom: 1.35,
    soonest: [
      [1.1, 300],
      [2, 4],
      [5, 0.2],
      [12, 0.008],
    ],
    latest: [
      [1.35, ratedAmps <= 60 ? 3600 : 7200],
      [2, ratedAmps <= 30 ? 240 : 360],
    ],
    magnetic: undefined,
    references: [remembered('UL 248: carries 110 %, opens at 135 % within 1 h, at 200 % within 4 or 6 min')],
    assumptions: [
      'UL 248 says nothing of a fuse’s time beyond 200 % of its rating, so the latest time stays as it is there. The fuse’s own time-current curve gives more; its soonest edge here is typical.',
    ],
  }
}

/** Gates of IEC 60269-1 table 3, gG, from memory: A that it stands 10 s, opens within 5 s, stands 0.1 s, opens within 0.1 s. */
const gates: Readonly<Record<string, readonly [number, number, number, number]>> = {
  '16': [33, 65, 85, 150],
  '20': [42, 85, 110, 200],
  '25': [52, 110, 150, 260],
  '32': [75, 150, 200, 350],
  '40': [95, 190, 260, 450],
  '50': [125, 250, 350, 610],
  '63': [160, 320, 450, 820],
}
export const gGRatings = ['16', '20', '25', '32', '40', '50', '63'] as const

/**
 * A gG fuse of IEC 60269 between its gates.
 * @throws RangeError for a rating that the table has no gates for
 */
export function gG(ratedAmps: number): Band {
  const row = gates[String(ratedAmps)]
  if (row === undefined) throw new RangeError(`no gates for a gG fuse of ${ratedAmps} A`)
  const [stands10, opens5, stands01, opens01] = row.map((amps) => amps / ratedAmps) as [
    number,
    number,
    number,
    number,
  ]
  return {
    name: `${ratedAmps} A fuse (gG)`,
    ratedAmps,
    holdsTo: 1.25,
    opensFrom: 1.6,
    soonest: [
      [1.25, 3600],
      [stands10, 10],
      [stands01, 0.1],
      [stands01 * 2, 0.008],
    ],
    latest: [
      [1.6, 3600],
      [opens5, 5],
      [opens01, 0.1],
    ],
    magnetic: undefined,
    references: [remembered('IEC 60269-1 tables 2 and 3: conventional currents and gates of gG fuses')],
    assumptions: ['Between the gates the edges run straight on log-log paper.'],
  }
}
