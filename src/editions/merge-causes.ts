import type { CauseProcedure } from '../../rules/edition/schema.ts'

/**
 * One procedure a cause from what is for everyone and what is for qualified people: parts that only one of them has
 * are taken over, repairs are listed one after the other.
 */
export function mergeCauses(parts: readonly CauseProcedure[]): ReadonlyMap<string, CauseProcedure> {
  const merged = new Map<string, CauseProcedure>()
  for (const part of parts) {
    const before = merged.get(part.cause)
    merged.set(
      part.cause,
      before === undefined ? part : { ...before, ...part, remedies: [...before.remedies, ...part.remedies] },
    )
  }
  return merged
}
