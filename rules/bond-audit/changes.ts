/** Everything an audit may ask to change, for a plan to choose from. */
import type { Audited } from './audit.ts'
import { behindTransformer } from './changes/behind-transformer.ts'
import type { Change } from './changes/change.ts'
import { ownChanges } from './changes/part-changes.ts'
import { relayChanges } from './changes/relay-changes.ts'
import { bondsMissing } from './changes/where-bonds-go.ts'
import { unplugged, wireChanges } from './changes/wire-changes.ts'
import { mostParts } from './system.ts'
import type { System } from './system.ts'

/** Everything that could be changed about parts that failing modes touch. A balanced output is never told to bond. */
export function changesFor(system: System, modes: readonly Audited[]): Change[] {
  const failing = modes.filter(({ passes }) => !passes)
  const balanced = failing.some(({ findings }) =>
    findings.some(({ kind }) => kind === 'balanced-into-panel' || kind === 'bond-on-balanced'),
  )
  const touched = new Set(
    failing.flatMap(({ circuit, findings }) => [
      ...circuit.reached,
      ...circuit.live.flatMap(({ id }) => circuit.wiring.group(id).map((one) => one.id)),
      ...findings.flatMap(({ parts }) => parts),
      ...circuit.bonds.map(({ part }) => part.id),
    ]),
  )
  const near = system.parts.filter(({ id }) => touched.has(id))
  const [first] = failing
  const all = [
    ...near.flatMap((part) => [
      ...ownChanges(part),
      ...wireChanges(part),
      ...unplugged(part, system),
      ...(system.parts.length < mostParts ? behindTransformer(part) : []),
    ]),
    ...bondsMissing(failing),
    ...(first === undefined ? [] : relayChanges(first)),
  ]
  return balanced ? all.filter(({ bonds }) => !bonds) : all
}
