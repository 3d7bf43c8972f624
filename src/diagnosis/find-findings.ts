import { fitsContext } from '../../rules/edition/open.ts'
import type { Edition } from '../../rules/edition/open.ts'

export type Found = { id: string; label: string; help: string; kind: 'reading' | 'observation' }

const plain = (text: string) => text.toLowerCase().replace(/[–-]/g, ' ').replace(/’/g, "'")

/** Findings of this context whose name or help holds every word typed; names that begin with it first. */
export function findFindings(
  edition: Edition,
  context: { system: string; wiring: string },
  query: string,
): Found[] {
  const words = plain(query)
    .split(/\s+/)
    .filter((word) => word !== '')
  const observations = edition.file.observations.map(
    ({ id, label, help, values }): Found & { text: string } => ({
      id,
      label,
      help,
      kind: 'observation',
      text: plain(`${label} ${help} ${values.map((value) => value.label).join(' ')}`),
    }),
  )
  const readings = edition.file.readings
    .filter((reading) => fitsContext(reading, context))
    .map(({ id, label, help, unit, place }): Found & { text: string } => ({
      id,
      label,
      help,
      kind: 'reading',
      text: plain(`${label} ${help} ${unit} ${place}`),
    }))
  const first = (found: { label: string }) =>
    words.some((word) => plain(found.label).startsWith(word)) ? 0 : 1
  return [...observations, ...readings]
    .filter((found) => words.every((word) => found.text.includes(word)))
    .sort((a, b) => first(a) - first(b))
    .map(({ text: _, ...found }) => found)
}
