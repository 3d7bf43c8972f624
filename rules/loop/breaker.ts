/** What a breaker of the usual kind likely does with a current that stays. */
import type { Breaker } from './loop-state.ts'

/** `stays`: carries it for ever. `late`: minutes to an hour. `soon`: seconds, or at once. `at-once`: likely at once. */
export type BreakerDoes = 'stays' | 'late' | 'soon' | 'at-once'

/**
 * Multiples of the rating. Household: UL 489 carries 100 %, trips at 135 % within the hour and at 200 % within two
 * minutes; where it trips at once is not in the standard, typically from 5 to 10 times (common practice, no source).
 * B: IEC 60898, 1.13 carried, magnetic from 3 to 5 times.
 */
const bands = {
  household: { carries: 1, late: 5, soon: 10 },
  b: { carries: 1.13, late: 3, soon: 5 },
} as const

export function breakerDoes({ amps, curve, sees }: Breaker): BreakerDoes {
  const { carries, late, soon } = bands[curve]
  const times = sees / amps
  if (times <= carries) return 'stays'
  if (times <= late) return 'late'
  return times < soon ? 'soon' : 'at-once'
}

/** The breaker of a small circuit: 15 A at 120 V, B 16 at 230 V. */
export const usualBreaker = (nominal: 120 | 230): Omit<Breaker, 'sees'> =>
  nominal === 230 ? { amps: 16, curve: 'b' } : { amps: 15, curve: 'household' }
