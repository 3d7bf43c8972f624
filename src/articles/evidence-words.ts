import type { Edition } from '../../rules/edition/open.ts'

const strengths = ['slight', 'some', 'good', 'strong', 'near certain'] as const

/** One to five bits, in the words of the evidence ledger. */
export const strengthOf = (bits: number): string => strengths[Math.min(5, Math.max(1, Math.abs(bits))) - 1]!

/** "Good, for". */
export function bitsInWords(bits: number): string {
  const words = strengthOf(bits)
  return `${words[0]!.toUpperCase()}${words.slice(1)}, ${bits > 0 ? 'for' : 'against'}`
}

export type Speaks = { rule: string; group: string; bits: number; because: string; source: string }

/** Every rule that says something of a cause, the strongest first; level ones in the edition's order. */
export function rulesOn(edition: Edition, cause: string): Speaks[] {
  const all = edition.file.groups.flatMap((group) =>
    group.rules.map((rule) => ({
      rule: rule.id,
      group: group.title,
      bits: rule.says[cause] ?? rule.others ?? 0,
      because: rule.because,
      source: rule.source,
    })),
  )
  return all.filter((one) => one.bits !== 0).sort((a, b) => Math.abs(b.bits) - Math.abs(a.bits))
}
