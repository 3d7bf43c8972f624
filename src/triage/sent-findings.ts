import type { SentFinding, SheetDoc } from '../offline/sheets.ts'
import { dangersSaid } from './said-stops.ts'
import { toSheet } from './to-sheet.ts'
import type { Triage } from './triage-state.ts'

/** The mode a source works in while nobody has said otherwise. */
const ownModes: Readonly<Record<string, string>> = { generator: 'generator', utility: 'utility' }

/** The answers as they go to the server, once a link was asked for or somebody is signed in. */
export function sentFindings(triage: Triage): NonNullable<SheetDoc['sends']> {
  const { context, findings: said = {} } = toSheet(triage)
  const findings = { ...said }
  // A yes of which no part was named stops here as the worst of its question does. It must stop a tech's page too.
  for (const { id, parts } of dangersSaid(triage))
    if (triage.which[id] === undefined) Object.assign(findings, parts[0].findings)
  const mode = context.mode ?? ownModes[context.source] ?? 'battery'
  const sent = Object.entries(findings).map(([finding, value]): SentFinding => ({
    mode,
    finding,
    value,
    kept: null,
  }))
  return { context: { ...context, mode }, findings: sent }
}
