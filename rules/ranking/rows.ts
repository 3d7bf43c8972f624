import type { Edition } from '../edition/open.ts'
import type { CauseRow, RankedCause } from './diagnosis-types.ts'

/** Below this share a cause is nobody's rival. */
const worthNaming = 0.05

const sumOf = (cause: RankedCause) => cause.evidence.reduce((sum, e) => sum + e.bits, 0)

/**
 * Rows of the screen. Causes that the findings can't part (the same bits on balance, and each worth naming)
 * stand as one row, "either of these", the more dangerous first.
 */
export function rowsOf(edition: Edition, ranking: readonly RankedCause[]): CauseRow[] {
  const rows: RankedCause[][] = []
  for (const cause of ranking) {
    const level =
      cause.evidence.length > 0 && cause.share >= worthNaming
        ? rows.find((row) => row[0] && row[0].share >= worthNaming && sumOf(row[0]) === sumOf(cause))
        : undefined
    if (level === undefined) rows.push([cause])
    else level.push(cause)
  }
  const danger = (c: RankedCause) => edition.causes.get(c.cause)?.danger ?? 0
  return rows
    .map((causes) => ({
      causes: [...causes].sort((a, b) => danger(b) - danger(a) || b.share - a.share),
      share: causes.reduce((sum, c) => sum + c.share, 0),
    }))
    .sort((a, b) => b.share - a.share)
}
