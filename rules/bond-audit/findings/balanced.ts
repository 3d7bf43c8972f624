import type { Circuit } from '../circuit.ts'
import type { Finding } from '../findings.ts'
import { bondWords, listed } from '../phrases.ts'

/**
 * A balanced output: both wires stand at half voltage to ground. It is never told to bond.
 */
export function balancedFindings({ live, places, bonds }: Circuit): Finding[] {
  const found: Finding[] = []
  const names = listed(live.map(({ name }) => name))
  const ids = live.map(({ id }) => id)
  const panels = places.filter(({ kind }) => kind === 'panel')
  const mend = [
    `Replace ${names} with a source that has a neutral, or feed a listed isolation transformer with a bonded secondary from it.`,
    'Until then keep it off the panel: a breaker of one pole opens one live wire of two.',
  ]
  if (panels.length > 0)
    found.push({
      kind: 'balanced-into-panel',
      parts: [...ids, ...panels.map(({ id }) => id)],
      says: `${names} has a balanced output and feeds ${listed(panels.map(({ name }) => name))}. No bond can mend that.`,
      danger:
        'Both wires stand at half voltage to ground. A single-pole breaker or switch opens one and leaves the other live.',
      change: mend,
      sections: ['nec-250.26', 'nec-250.20', 'nec-250.30-1'],
    })
  if (bonds.length > 0)
    found.push({
      kind: 'bond-on-balanced',
      parts: bonds.map(({ part }) => part.id),
      says: `One wire of a balanced output is tied to ground, by ${listed(bonds.map(bondWords))}.`,
      danger: `It shorts half of the output through the source’s own ground: ${names} can be destroyed, or its case made live.`,
      change: [
        `Switch ${names} off and disconnect it from this wiring. Take no reading with it connected.`,
        ...mend,
      ],
      sections: ['nec-250.26', 'nec-250.30'],
    })
  return found
}
