/** Counts how often each rule of the computed groups fires with each cause, over model cases. */
import { comparisons } from '../../../rules/edition/condition.ts'
import type { Condition } from '../../../rules/edition/condition.ts'
import type { Edition } from '../../../rules/edition/open.ts'
import { deriveFacts } from '../../../rules/findings/facts.ts'
import type { Facts } from '../../../rules/findings/facts.ts'
import { readCase } from '../../../rules/findings/parse.ts'
import { compileCondition } from '../../../rules/ranking/compile-rule.ts'
import type { Holds } from '../../../rules/ranking/compile-rule.ts'
import { electricalCauses } from '../../../rules/circuit/wiring/context.ts'
import { modelCase } from '../model/cases.ts'
import { OutcomeTally } from './outcomes.ts'
import type { Computed } from './plan.ts'

export type Tally = {
  rule: string
  /** By electrical cause: cases in which the rule could speak, and in which it fired. */
  could: number[]
  fired: number[]
}
type Counted = { plan: Computed; rules: { holds: Holds; inPlace: Holds; tally: Tally }[] }

/** The part of a condition that asks where one stands, not what one finds: what the chance is conditional on. */
function placePart(when: Condition): Holds {
  const parts = 'all' in when ? when.all : [when]
  const places = parts.filter((part) => comparisons(part).every((c) => c.fact.startsWith('context.')))
  return places.length === 0 ? () => true : compileCondition({ all: places })
}

function emptyTable(edition: Edition, plan: Computed): Counted {
  const group = edition.file.groups.find((g) => g.id === plan.group)
  if (group === undefined) throw new RangeError(`no group ${plan.group} in the rules`)
  for (const id of plan.byHand ?? [])
    if (!group.rules.some((r) => r.id === id)) throw new RangeError(`no rule ${id} in ${plan.group}`)
  const none = () => electricalCauses.map(() => 0)
  return {
    plan,
    rules: group.rules.map((rule) => ({
      holds: compileCondition(rule.when),
      inPlace: placePart(rule.when),
      tally: { rule: rule.id, could: none(), fired: none() },
    })),
  }
}

/** A case of which the group says nothing (not taken) is no case of it. */
function addCase({ rules }: Counted, facts: Facts, cause: number): void {
  const fired = rules.map(({ holds }) => holds(facts))
  if (!fired.includes(true)) return
  rules.forEach(({ inPlace, tally }, i) => {
    if (!inPlace(facts)) return
    tally.could[cause] = (tally.could[cause] ?? 0) + 1
    if (fired[i] === true) tally.fired[cause] = (tally.fired[cause] ?? 0) + 1
  })
}

/**
 * Tallies by group, and how tests end, over `each` model cases of every electrical cause, all readings taken.
 * @param seed of the model cases; what is held back for reports uses others
 */
export function countModel(
  edition: Edition,
  plans: readonly Computed[],
  seed: string,
  each: number,
): { tallies: ReadonlyMap<string, readonly Tally[]>; outcomes: OutcomeTally } {
  const outcomes = new OutcomeTally(edition)
  const tables = plans.map((plan) => emptyTable(edition, plan))
  electricalCauses.forEach((cause, c) => {
    for (let n = 0; n < each; n++) {
      const raw = modelCase(seed, cause, n, true)
      outcomes.add(raw)
      const one = readCase(edition, raw)
      if (!one.ok) throw new Error(`model case ${one.id ?? ''}: ${JSON.stringify(one.errors)}`)
      const { sheet } = one
      const whole = factsOf(edition, sheet)
      for (const table of tables) {
        const { alone } = table.plan
        if (alone === undefined) addCase(table, whole, c)
        else {
          const taken = sheet.taken.filter((t) => t.id === alone)
          if (taken.length > 0) addCase(table, factsOf(edition, { ...sheet, taken }), c)
        }
      }
    }
  })
  return {
    tallies: new Map(tables.map(({ plan, rules }) => [plan.group, rules.map((r) => r.tally)])),
    outcomes,
  }
}

const factsOf = (...of: Parameters<typeof deriveFacts>): Facts => {
  const [facts] = deriveFacts(...of).values()
  if (facts === undefined) throw new Error('a sheet has facts in its own mode')
  return facts
}
