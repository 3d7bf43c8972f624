/** What stands on a sheet that several people write on, each perhaps without a network. */
import type { RawFinding } from './sheet.ts'

/** One finding as somebody entered it. Entries are added, never changed. */
export type Entered = {
  id: string
  mode: string
  finding: string
  /** Null: it was removed. */
  value: RawFinding | null
  /** The entries it takes the place of, as its writer knew them. */
  after: readonly string[]
  /** By the device's clock, ISO 8601. */
  deviceAt: string
}

export type Standing<Entry extends Entered> = {
  mode: string
  finding: string
  /** The one that counts: of several, the last entered. */
  entry: Entry
  /** Others that say something else and that nobody has put aside, the last first. */
  against: readonly Entry[]
}

/** Keys of an object in any order say the same: the database reorders them. */
const inOrder = (_: string, value: unknown): unknown =>
  typeof value === 'object' && value !== null && !Array.isArray(value)
    ? Object.fromEntries(Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1)))
    : value

/** What a value says, as text: two that say the same give the same. */
export const inWriting = (value: unknown): string => JSON.stringify(value, inOrder)

const lastFirst = (a: Entered, b: Entered): number =>
  Date.parse(b.deviceAt) - Date.parse(a.deviceAt) || (a.id < b.id ? 1 : -1)

/**
 * What stands in each mode for each finding. An entry whose writer knew the one before takes its place; two whose
 * writers did not know of each other both stand, and say so.
 * @param entries in any order
 */
export function standing<Entry extends Entered>(entries: readonly Entry[]): Standing<Entry>[] {
  const replaced = new Set(entries.flatMap((entry) => entry.after))
  const heads = new Map<string, Entry[]>()
  for (const entry of entries)
    if (!replaced.has(entry.id)) {
      const key = `${entry.mode} ${entry.finding}`
      heads.set(key, [...(heads.get(key) ?? []), entry])
    }
  return [...heads.values()].map((some) => {
    const [entry, ...rest] = [...some].sort(lastFirst) as [Entry, ...Entry[]]
    const against = rest.filter((other) => inWriting(other.value) !== inWriting(entry.value))
    return { mode: entry.mode, finding: entry.finding, entry, against }
  })
}
