import { ghostOrFirm } from '../circuit/instruments/ghost-or-firm.ts'
import type { GhostOrFirm } from '../circuit/instruments/ghost-or-firm.ts'
import { meterOf } from '../circuit/instruments/meter.ts'
import type { Ghost } from './fact-names.ts'
import type { Findings, Say } from './facts.ts'

const sides = ['receptacle.hg.volts', 'receptacle.ng.volts'] as const

/** The capacitance that couples a ghost, in bands. A bound tells only what lies under the first edge. */
function bandOf(told: GhostOrFirm, edges: Findings['edges']): Ghost | undefined {
  if (told.kind === 'firm') return 'firm'
  if (told.kind === 'not-told') return undefined
  const nanofarads = told.farads * 1e9
  if (nanofarads < (edges['ghost-cable'] ?? 0)) return 'short'
  if (told.kind === 'ghost-at-most') return undefined
  if (nanofarads < (edges['ghost-filters'] ?? 0)) return 'cable'
  return nanofarads < (edges['ghost-held'] ?? 0) ? 'filters' : 'held'
}

/**
 * What ties ground at the receptacle, where a voltage to it was read with a light meter and again with a heavy one.
 * Both voltages to ground meet the same capacitance; where they tell different stories nothing is said.
 */
export function ghostFacts(f: Findings, say: Say): void {
  const told = sides.flatMap((id) => {
    const [volts, earlier] = [f.amount(id), f.earlier(id)]
    if (volts === undefined || earlier === undefined) return []
    const now = { volts, meter: meterOf(f.meterOhms(id)) }
    const before = { volts: earlier.value, meter: meterOf(earlier.meterOhms) }
    const band = bandOf(ghostOrFirm(now, before, f.hertz), f.edges)
    return band === undefined ? [] : [{ id, band }]
  })
  const [first] = told
  if (first && told.every(({ band }) => band === first.band))
    say(
      'receptacle.ghost',
      first.band,
      told.map(({ id }) => id),
    )
}
