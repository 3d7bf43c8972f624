import type { Audited } from '../audit.ts'
import { firstPanels } from '../paths.ts'
import { listed } from '../phrases.ts'
import type { Part, System } from '../system.ts'
import { change } from './change.ts'
import type { Change } from './change.ts'

/** Relays of sources in parallel, all at once; and for an inverter with a transfer inside, one that has such a relay. */
export function relayChanges({ circuit }: Audited): Change[] {
  const { wiring } = circuit
  const [panel] = firstPanels(circuit)
  const off = (ids: ReadonlySet<string>) => (system: System) => ({
    ...system,
    parts: system.parts.map((part): Part =>
      part.kind === 'source' && ids.has(part.id) ? { ...part, relay: [] } : part,
    ),
  })
  const together = wiring.groups.flatMap((group): Change[] => {
    const on = group.filter(({ output, relay }) => output === 'relay' && relay.length > 0)
    const [first, second] = on
    if (first === undefined || second === undefined) return []
    const others = listed(on.slice(1).map(({ name }) => name))
    const ids = new Set(on.map(({ id }) => id))
    const says = `turn its bond relay off, and that of ${others}, as their instructions allow`
    if (panel?.kind !== 'panel' || panel.bond)
      return [{ part: first.id, says: `${says}.`, work: 4, bonds: false, apply: off(ids) }]
    const bonded = { ...panel, bond: true }
    return [
      {
        part: first.id,
        says: `${says}; the one bond then goes into ${panel.name}, the first disconnect.`,
        work: 7,
        bonds: true,
        apply: (system) => change(panel, 0, '', bonded).apply(off(ids)(system)),
      },
    ]
  })
  const replaced = [...wiring.parts.values()].flatMap((part) =>
    part.kind === 'source' &&
    (part.output === 'floating' || part.output === 'bonded') &&
    wiring.builtIn(part.id)?.switch.neutral === 'switched'
      ? [
          change(
            part,
            8,
            'replace it with one whose bond relay closes on its own power alone.',
            { ...part, output: 'relay', relay: ['own-power'] },
            true,
          ),
        ]
      : [],
  )
  return [...together, ...replaced]
}
