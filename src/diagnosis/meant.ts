import type { Reading } from '../../rules/edition/schema.ts'
import { numberIn } from './raw-sheet.ts'

const tooMany = 2.5 // × nominal: no source of the system gives it, and a slipped point does

export type Meant = { says: string; text: string }

/**
 * Asks whether a point slipped, where a voltage is beyond 2.5 × the system's. What was typed stays until the answer
 * is taken.
 */
export function meantBy(text: string, reading: Reading, nominal: number): Meant | undefined {
  if (reading.unit !== 'V') return undefined
  const value = numberIn(text)
  const base = reading.pair === 'l1l2' ? 2 * nominal : nominal
  if (value === undefined || value <= tooMany * base) return undefined
  const slipped = [10, 100].map((by) => value / by).find((x) => x <= 1.3 * base)
  if (slipped === undefined) return undefined
  const says = `Over ${tooMany * base} V on a ${base} V system.`
  return { says, text: String(Number(slipped.toPrecision(6))) }
}
