import type { Edition } from '../../../rules/edition/open.ts'
import { bitsOf } from './bits.ts'
import type { Bits } from './bits.ts'
import { withSecondOpinion } from './second-opinion.ts'
import { countModel } from './count.ts'
import { computedGroups } from './plan.ts'

/** What the bits are counted over: seeds that begin with `fit` are never reported on. */
export const fitSeed = 'fit 1'
export const fitEach = 1500

export type Fitted = {
  /** Rule id → bits by cause. */
  bits: ReadonlyMap<string, Bits>
  /** Test id → outcome id → how often it ends so. */
  weights: ReadonlyMap<string, ReadonlyMap<string, number>>
  /** Rules that the model shows too seldom to count. */
  tooRare: readonly string[]
}

/** The bits of every computed rule of this edition, from model cases alone. */
export function fittedBits(edition: Edition, seed = fitSeed, each = fitEach): Fitted {
  const { tallies, outcomes } = countModel(edition, computedGroups, seed, each)
  const rules = new Map(edition.file.groups.flatMap((g) => g.rules.map((r) => [r.id, r] as const)))
  const written = (id: string) => (cause: string) => rules.get(id)?.says[cause] ?? rules.get(id)?.others ?? 0
  const bits = new Map<string, Bits>()
  const tooRare: string[] = []
  for (const plan of computedGroups) {
    for (const tally of tallies.get(plan.group) ?? []) {
      if (plan.byHand?.includes(tally.rule)) continue
      const says = bitsOf(tally, plan, edition.causeIds, written(tally.rule))
      if (says === undefined) tooRare.push(tally.rule)
      else bits.set(tally.rule, withSecondOpinion(tally.rule, says, edition.causeIds))
    }
  }
  return { bits, weights: outcomes.weights(), tooRare }
}
