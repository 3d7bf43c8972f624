import type { Edition } from '../../rules/edition/open.ts'
import { readSheet } from '../../rules/findings/parse.ts'
import { stopsOf } from '../../rules/ranking/stop.ts'
import { byWorst, saidStops } from './said-stops.ts'
import type { Here } from './said-stops.ts'
import { toSheet } from './to-sheet.ts'
import type { Triage } from './triage-state.ts'

/**
 * Everything that stops, the worst first: the answers of step 1, whatever the system, and what the findings say
 * once an edition is at hand.
 */
export function stopsHere(triage: Triage, edition: Edition | undefined): readonly Here[] {
  const found = new Map(saidStops(triage).map((one) => [one.id, one]))
  const read = edition && readSheet(edition, toSheet(triage))
  const computed = edition && read?.ok ? stopsOf(edition, read.sheet) : []
  for (const { id, mayBeGhost } of computed) if (!found.has(id)) found.set(id, { id, mayBeGhost })
  return byWorst(found.values())
}
