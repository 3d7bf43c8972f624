import type { Circuit } from '../circuit.ts'
import type { Exception } from '../exceptions.ts'
import type { Finding } from '../findings.ts'
import { groundPathOf } from '../ground-path.ts'
import { listed } from '../phrases.ts'
import type { PowerPart } from '../system.ts'

const metric = ({ live }: Circuit) => live.some(({ volts }) => volts === '230')

/**
 * Metal whose faults find no wire back to the source: places that are fed, and the live source's own case. Where no
 * bond is in circuit nothing has a way back, and that is said once.
 */
export function groundPathFindings(circuit: Circuit, exceptions: readonly Exception[]): Finding[] {
  const { live, places, bonds } = circuit
  if (bonds.length === 0) return []
  const excused = new Set(
    exceptions
      .filter(({ kind }) => kind === 'no-ground-behind-gfci' || kind === 'rod-with-rcd')
      .flatMap(({ parts }) => parts),
  )
  // The utility's transformer is not on the site.
  const cases: PowerPart[] = live.filter((part) => part.kind !== 'source' || part.type !== 'utility')
  const looked = [...new Set([...places, ...cases])].filter(({ id }) => !excused.has(id))
  const by = (path: 'soil' | 'none') => looked.filter((part) => groundPathOf(circuit, part) === path)
  const found: Finding[] = []
  const lost = by('none')
  if (lost.length > 0)
    found.push({
      kind: 'ground-missing',
      parts: lost.map(({ id }) => id),
      says: `No wire takes a fault at ${listed(lost.map(({ name }) => name))} back to the source.`,
      danger: 'Metal there becomes live and stays live: no breaker trips.',
      change: [
        `Run a grounding conductor of the size the breaker asks for to ${listed(lost.map(({ name }) => name))}, with the power wires.`,
      ],
      sections: metric(circuit) ? ['iec-411.4'] : ['nec-250.4'],
    })
  const soil = by('soil')
  if (soil.length > 0)
    found.push({
      kind: 'rod-only',
      parts: soil.map(({ id }) => id),
      says: `From ${listed(soil.map(({ name }) => name))} a fault goes back through soil, from rod to rod, and by no wire.`,
      danger:
        'Rods of tens of ohms let a few amps pass: no breaker trips, and the metal stays live. All readings look right meanwhile.',
      change: [
        `Run a grounding conductor to ${listed(soil.map(({ name }) => name))}. The rods may stay; more of them mend nothing.`,
      ],
      sections: metric(circuit) ? ['iec-411.4', 'iec-411.5'] : ['nec-250.4'],
    })
  return found
}
