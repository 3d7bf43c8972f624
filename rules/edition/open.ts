import * as z from 'zod/mini'
import { comparisons } from './condition.ts'
import { DiagnosisFile } from './schema.ts'
import type { Cause, Observation, Reading, Test } from './schema.ts'
import { factValues } from '../findings/fact-names.ts'

type Source = DiagnosisFile['sources'][number]
type System = DiagnosisFile['systems'][number]

/** An opened edition: the parsed file, with its vocabularies by id. Never changed after opening. */
export type Edition = {
  file: DiagnosisFile
  /** Cause ids in the catalogue's order, which breaks ties. */
  causeIds: readonly string[]
  causes: ReadonlyMap<string, Cause>
  readings: ReadonlyMap<string, Reading>
  observations: ReadonlyMap<string, Observation>
  tests: ReadonlyMap<string, Test>
  sources: ReadonlyMap<string, Source>
  systems: ReadonlyMap<string, System>
  wirings: ReadonlySet<string>
  modes: ReadonlySet<string>
  /** Named edges of derived facts, by id. */
  edges: Readonly<Record<string, number>>
}

const byId = <T extends { id: string }>(list: readonly T[]): ReadonlyMap<string, T> =>
  new Map(list.map((one) => [one.id, one]))

/** Every fault of an edition that its schema can't see: ids that lead nowhere, rules on unknown facts. */
function faultsOf(edition: Edition): string[] {
  const { file } = edition
  const faults: string[] = []
  const twice = (what: string, ids: readonly string[]) => {
    for (const id of ids)
      if (ids.indexOf(id) !== ids.lastIndexOf(id)) faults.push(`${what} ${id} stands twice`)
  }
  twice('cause', edition.causeIds)
  twice(
    'finding',
    [...file.readings, ...file.observations].map((f) => f.id),
  )
  twice(
    'test',
    file.tests.map((t) => t.id),
  )
  twice(
    'group',
    file.groups.map((g) => g.id),
  )
  twice(
    'rule',
    file.groups.flatMap((g) => g.rules.map((r) => r.id)),
  )
  const known = factValues(file)
  for (const rule of file.groups.flatMap((g) => g.rules)) {
    for (const cause of Object.keys(rule.says))
      if (!edition.causes.has(cause)) faults.push(`rule ${rule.id} names the unknown cause ${cause}`)
    for (const { fact, value } of comparisons(rule.when)) {
      const values = known.get(fact)
      if (values === undefined) faults.push(`rule ${rule.id} asks for the unknown fact ${fact}`)
      else if (values !== 'number')
        for (const one of Array.isArray(value) ? value : [value])
          if (!values.includes(String(one))) faults.push(`rule ${rule.id}: ${fact} is never ${String(one)}`)
    }
  }
  for (const test of file.tests) {
    const taken = [...test.findings, ...test.outcomes.flatMap((o) => Object.keys(o.findings))]
    for (const id of taken)
      if (!edition.readings.has(id) && !edition.observations.has(id))
        faults.push(`test ${test.id} takes the unknown finding ${id}`)
  }
  return [...new Set(faults)]
}

/**
 * Opens an edition's diagnosis file.
 * @throws Error naming every fault, when the file is not a sound edition
 */
export function openEdition(file: unknown): Edition {
  const read = DiagnosisFile.safeParse(file)
  if (!read.success) throw new Error(`not an edition:\n${z.prettifyError(read.error)}`)
  const parsed = read.data
  const edition: Edition = {
    file: parsed,
    causeIds: parsed.causes.map((c) => c.id),
    causes: byId(parsed.causes),
    readings: byId(parsed.readings),
    observations: byId(parsed.observations),
    tests: byId(parsed.tests),
    sources: byId(parsed.sources),
    systems: byId(parsed.systems),
    wirings: new Set(parsed.wirings.map((w) => w.id)),
    modes: new Set(parsed.modes.map((m) => m.id)),
    edges: Object.fromEntries(parsed.edges.map((e) => [e.id, e.value])),
  }
  const faults = faultsOf(edition)
  if (faults.length > 0) throw new Error(`not an edition:\n${faults.join('\n')}`)
  return edition
}

/** Whether a reading can be taken in this context (a panel reading needs a panel, a second leg 120/240). */
export function fitsContext(
  reading: { systems?: string[] | undefined; wirings?: string[] | undefined },
  context: { system: string; wiring: string },
): boolean {
  return (
    (reading.systems === undefined || reading.systems.includes(context.system)) &&
    (reading.wirings === undefined || reading.wirings.includes(context.wiring))
  )
}
