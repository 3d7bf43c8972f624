import type { Edition } from '../edition/open.ts'
import type { ReadyRule } from './engine.ts'

/** A rule that fired, and the mode whose findings made it fire. */
export type Fired = { rule: ReadyRule; mode: string }

/** What counts for one cause in one group: the strongest for, the strongest against. */
export type Entry = { for: Fired | undefined; against: Fired | undefined }

const bitsOf = (one: Fired | undefined, cause: number) => one?.rule.bits[cause] ?? 0

/** Net bits of an entry for a cause. */
const netOf = (entry: Entry, cause: number) => bitsOf(entry.for, cause) + bitsOf(entry.against, cause)

/** By cause index, then group. Per group and cause the strongest for and the strongest against count. */
export function ledgerOf(edition: Edition, fired: readonly Fired[]): ReadonlyMap<string, Entry>[] {
  const ledger = edition.causeIds.map(() => new Map<string, Entry>())
  for (const one of fired) {
    const { group, bits } = one.rule
    ledger.forEach((groups, cause) => {
      const b = bits[cause] ?? 0
      if (b === 0) return
      const entry = groups.get(group) ?? { for: undefined, against: undefined }
      if (b > 0 && b > bitsOf(entry.for, cause)) entry.for = one
      if (b < 0 && b < bitsOf(entry.against, cause)) entry.against = one
      groups.set(group, entry)
    })
  }
  return ledger
}

/**
 * Bits by cause index: what a ledger of these rules adds up to, without making one.
 * Next tests ask this for hundreds of hypothetical outcomes.
 */
export function totals(causes: number, rules: readonly ReadyRule[]): number[] {
  const byGroup = new Map<string, ReadyRule[]>()
  for (const rule of rules) {
    const group = byGroup.get(rule.group)
    if (group === undefined) byGroup.set(rule.group, [rule])
    else group.push(rule)
  }
  const sums = new Array<number>(causes).fill(0)
  for (const group of byGroup.values())
    for (let cause = 0; cause < causes; cause++) {
      let most = 0
      let least = 0
      for (const { bits } of group) {
        const b = bits[cause] ?? 0
        if (b > most) most = b
        else if (b < least) least = b
      }
      sums[cause] = (sums[cause] ?? 0) + most + least
    }
  return sums
}

/** Struck out on a screen: two or more groups against on balance, eight bits together. */
export function isRuledOut(groups: ReadonlyMap<string, Entry>, cause: number): boolean {
  const against = [...groups.values()].map((entry) => netOf(entry, cause)).filter((net) => net < 0)
  return against.length >= 2 && against.reduce((a, b) => a + b, 0) <= -8
}
