import type { Edition } from '../edition/open.ts'
import { deriveFacts } from '../findings/facts.ts'
import type { Sheet } from '../findings/sheet.ts'
import { bondGate } from './bond-gate.ts'
import type { Diagnosis } from './diagnosis-types.ts'
import { fire } from './engine.ts'
import type { Fired } from './ledger.ts'
import { misfitOf } from './misfit/misfit.ts'
import { nextTests } from './next-test.ts'
import { rank } from './rank.ts'
import { rowsOf } from './rows.ts'
import { stopsOf } from './stop.ts'
import type { Priors } from './weigh.ts'

/**
 * The diagnosis of a findings sheet: facts, rules that fire on each mode's facts, shares, and all that is said
 * beside them. Pure and deterministic: the same edition and sheet give the same answer, to the digit, anywhere.
 */
export async function diagnose(
  edition: Edition,
  sheet: Sheet,
  options: { priors?: Priors } = {},
): Promise<Diagnosis> {
  const facts = deriveFacts(edition, sheet)
  const fired: Fired[] = []
  for (const [mode, own] of facts) for (const rule of await fire(edition, own)) fired.push({ rule, mode })
  const ranked = rank(edition, sheet, facts, fired, options.priors ?? 'field')
  return {
    ranking: ranked.ranking,
    rows: rowsOf(edition, ranked.ranking),
    stops: stopsOf(edition, sheet),
    misfit: misfitOf(edition, sheet, facts, ranked.ranking),
    bond: bondGate(edition, sheet),
    nextTests: nextTests(edition, sheet, ranked),
  }
}
