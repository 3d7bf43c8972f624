/**
 * A second opinion beside the count. `earlier-bits.json` holds what an earlier circuit model of ours gave: other
 * ranges, other habits of people, its limits chosen with the case files in sight. Two models err in different places,
 * and real houses are like neither; the mean of both is further from neither than they are from each other.
 */
import earlier from './earlier-bits.json' with { type: 'json' }
import type { Bits } from './bits.ts'

type Row = { says: Bits; others?: number }
const rows: Readonly<Record<string, Row | undefined>> = earlier

/** The mean of what was counted and what the earlier model said, a half going to the count. */
export function withSecondOpinion(rule: string, counted: Bits, causeIds: readonly string[]): Bits {
  const row = rows[rule]
  if (row === undefined) return counted
  const mean: Bits = {}
  for (const cause of causeIds) {
    const [own, other] = [counted[cause] ?? 0, row.says[cause] ?? row.others ?? 0]
    const middle = (own + other) / 2
    const bits = own > other ? Math.ceil(middle) : Math.floor(middle)
    if (bits !== 0) mean[cause] = bits
  }
  return mean
}
