import type { Edition } from '../edition/open.ts'
import type { Facts } from '../findings/facts.ts'
import type { Sheet } from '../findings/sheet.ts'
import type { Evidence, RankedCause } from './diagnosis-types.ts'
import { isRuledOut, ledgerOf, totals } from './ledger.ts'
import type { Entry, Fired } from './ledger.ts'
import { numbersBehind } from './numbers.ts'
import { priorWeights, sharesOf } from './weigh.ts'
import type { Priors } from './weigh.ts'

export type Ranked = {
  ranking: RankedCause[]
  /** By cause index, in the catalogue's order. */
  shares: readonly number[]
  bits: readonly number[]
  weights: readonly number[]
}

/** Ranks every cause: by share descending, level ones in the catalogue's order, each with its evidence. */
export function rank(
  edition: Edition,
  sheet: Sheet,
  facts: ReadonlyMap<string, Facts>,
  fired: readonly Fired[],
  priors: Priors,
): Ranked {
  const ledger = ledgerOf(edition, fired)
  const weights = priorWeights(edition, sheet.context, priors)
  const bits = totals(
    weights.length,
    fired.map((f) => f.rule),
  )
  const shares = sharesOf(weights, bits)
  const before = sharesOf(
    weights,
    weights.map(() => 0),
  )

  const evidenceOf = (one: Fired | undefined, cause: number): Evidence[] => {
    if (one === undefined) return []
    const { rule, mode } = one
    const own = facts.get(mode)
    return [
      {
        group: rule.group,
        rule: rule.id,
        bits: rule.bits[cause] ?? 0,
        because: rule.because,
        source: rule.source,
        numbers: own === undefined ? '' : numbersBehind(edition, own, rule),
        mode,
      },
    ]
  }
  const entries = (groups: ReadonlyMap<string, Entry>, cause: number) =>
    [...groups.values()]
      .flatMap((e) => [...evidenceOf(e.for, cause), ...evidenceOf(e.against, cause)])
      .sort((a, b) => Math.abs(b.bits) - Math.abs(a.bits) || (a.rule < b.rule ? -1 : 1))

  const ranking = edition.causeIds
    .map((cause, i) => {
      const groups = ledger[i] ?? new Map<string, Entry>()
      return {
        cause,
        share: shares[i] ?? 0,
        before: before[i] ?? 0,
        evidence: entries(groups, i),
        ruledOut: isRuledOut(groups, i),
      }
    })
    .sort((a, b) => b.share - a.share) // stable: level ones keep the catalogue's order
  return { ranking, shares, bits, weights }
}
