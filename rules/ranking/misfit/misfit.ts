import { comparisons } from '../../edition/condition.ts'
import type { Condition } from '../../edition/condition.ts'
import type { Edition } from '../../edition/open.ts'
import type { Facts } from '../../findings/facts.ts'
import type { Sheet } from '../../findings/sheet.ts'
import type { Misfit, RankedCause } from '../diagnosis-types.ts'
import type { Check, Look } from './contradiction.ts'
import { bulbAgainstMeter, bulbOnTwoLegs, ohmsAgainstVolts, testerAgainstMeter } from './instrument-checks.ts'
import { alongTheRun, legs, panelAgainstLegs } from './place-checks.ts'
import { frequency, oneTriple, tooMany, underLoad } from './volts-checks.ts'

const checks: readonly Check[] = [
  tooMany,
  oneTriple,
  underLoad,
  alongTheRun,
  legs,
  panelAgainstLegs,
  testerAgainstMeter,
  bulbAgainstMeter,
  bulbOnTwoLegs,
  ohmsAgainstVolts,
  frequency,
]

function lookAt(edition: Edition, sheet: Sheet, facts: Facts): Look {
  const system = edition.systems.get(sheet.context.system)
  return {
    amount: (id) => {
      const value = facts.get(id)?.value
      return typeof value === 'number' ? value : undefined
    },
    observed: (id) => {
      const value = facts.get(id)?.value
      return typeof value === 'string' ? value : undefined
    },
    fact: (name) => {
      const value = facts.get(name)?.value
      return value === undefined ? undefined : String(value)
    },
    nominal: system?.nominalVolts ?? 120,
    hertz: system?.hertz ?? 60,
    legs: system?.legs ?? 1,
    wiring: sheet.context.wiring,
    facts,
  }
}

/**
 * Whether no single cause could give these findings, or they can't all be true; with the one to take again.
 * First the contradictions by name; then, where even the leading cause is ruled out by its own evidence.
 */
export function misfitOf(
  edition: Edition,
  sheet: Sheet,
  facts: ReadonlyMap<string, Facts>,
  ranking: readonly RankedCause[],
): Misfit | undefined {
  for (const [mode, own] of facts) {
    const look = lookAt(edition, sheet, own)
    for (const check of checks) {
      const found = check(look)
      if (found !== undefined) return { ...found, mode }
    }
  }
  const leader = ranking[0]
  if (leader === undefined || !leader.ruledOut) return undefined
  const worst = leader.evidence.find((e) => e.bits < 0)
  if (worst === undefined) return undefined
  const rule = edition.file.groups.flatMap((g) => g.rules).find((r) => r.id === worst.rule)
  const ids = facts.get(worst.mode)
  const again = rule && ids ? findingBehind(rule.when, ids) : undefined
  return {
    because:
      'Even the best cause leaves too much unexplained. Two faults at once, or a reading that slipped?',
    again: again ?? sheet.taken[0]?.id ?? '',
    mode: worst.mode,
  }
}

/** The first finding that a rule's condition rests on. */
function findingBehind(when: Condition, facts: Facts): string | undefined {
  return comparisons(when)
    .map(({ fact }) => facts.get(fact)?.from[0])
    .find((id) => id !== undefined)
}
