/** Between the sheet as this page keeps it and as it goes to the server. */
import { standing } from '../../rules/findings/standing.ts'
import type { RawSheet } from '../../rules/findings/sheet.ts'
import type { Edition } from '../../rules/edition/open.ts'
import type { SheetEntry, SheetOpened } from '../../server/sheets/sheets.contract.ts'
import type { Received } from '../offline/outbox.ts'
import type { SentFinding, SheetDoc } from '../offline/sheets.ts'
import { isOverLimit, meterOhmsOf, numberIn } from './raw-sheet.ts'
import { Entry, newSheet } from './sheet-content.ts'
import type { Meter, SheetContent } from './sheet-content.ts'

/** What an entry counts as; null while it is no number, or can't be reached. */
function valueOf(finding: string, entry: Entry): SentFinding['value'] {
  if (entry.kind === 'observation') return entry.value
  if (entry.unreachable === true) return null
  const own = entry.meterOhms === undefined ? {} : { meterOhms: entry.meterOhms }
  // Only resistance has a limit to be over.
  if (isOverLimit(entry.text) && finding.endsWith('ohms')) return { overLimit: true, ...own }
  const value = numberIn(entry.text)
  if (value === undefined) return null
  const upper = numberIn(entry.upper ?? '')
  if (upper !== undefined) return { value, between: [value, upper], ...own }
  return entry.meterOhms === undefined ? value : { value, ...own }
}

const sentOf = (finding: string, entry: Entry) => ({ value: valueOf(finding, entry), kept: entry })

/** The sheet as it goes to the server. What is only tried does not. */
export function sentSheet(content: SheetContent): NonNullable<SheetDoc['sends']> {
  const { source, system, wiring, meter } = content.context
  const ohms = meterOhmsOf(meter)
  const context: RawSheet['context'] = {
    source,
    system,
    wiring,
    mode: content.mode,
    ...(ohms > 0 && { meterOhms: ohms }),
  }
  const findings = Object.entries(content.entries).flatMap(([mode, here]) =>
    Object.entries(here).map(([finding, entry]): SentFinding => ({
      mode,
      finding,
      ...sentOf(finding, entry),
    })),
  )
  return { context, findings }
}

/** An entry of the server's as this page keeps one; undefined where nothing stands. */
export function entryFrom({ value, kept }: Pick<SheetEntry, 'value' | 'kept'>): Entry | undefined {
  const read = Entry.safeParse(kept)
  if (read.success) return read.data
  if (value === null) return undefined
  // Only a homeowner's check keeps nothing beside the value.
  if (typeof value === 'string') return { kind: 'observation', value, by: 'owner' }
  const note = 'Read by the homeowner'
  if (typeof value === 'number') return { kind: 'reading', text: String(value), note }
  const own = { note, ...(value.meterOhms !== undefined && { meterOhms: value.meterOhms }) }
  if ('overLimit' in value) return { kind: 'reading', text: 'OL', ...own }
  const [lower, upper] = value.between ?? []
  return lower === undefined || upper === undefined
    ? { kind: 'reading', text: String(value.value), ...own }
    : { kind: 'reading', text: String(lower), upper: String(upper), ...own }
}

export type Came = Received & { entry: Entry | undefined }

/** What stands on the server, finding by finding, as this page takes it over. */
export const whatStands = (entries: readonly SheetEntry[]): Came[] =>
  standing(entries).map(({ mode, finding, entry: head, against }) => {
    const entry = entryFrom(head)
    return {
      mode,
      finding,
      ids: [head.id, ...against.map((one) => one.id)],
      entry,
      sent: entry === undefined ? { value: null, kept: null } : sentOf(finding, entry),
    }
  })

const meterOf = (ohms: number | undefined): Meter =>
  ohms === undefined || ohms === 10_000_000
    ? { kind: '10M' }
    : ohms === 1_000_000
      ? { kind: '1M' }
      : { kind: 'low', ohms: String(ohms) }

/** A sheet from the server, opened here for the first time. */
export function contentFrom(edition: Edition, opened: SheetOpened, came: readonly Came[]): SheetContent {
  const { source, system, wiring, mode, meterOhms } = opened.context
  const own = edition.sources.get(source)?.modes ?? []
  const content = newSheet(
    opened.title,
    { source, system, wiring, meter: meterOf(meterOhms) },
    mode ?? own[0] ?? '',
  )
  for (const { mode: at, finding, entry } of came)
    if (entry !== undefined) content.entries[at] = { ...content.entries[at], [finding]: entry }
  const moreModes = Object.keys(content.entries).filter((at) => !own.includes(at))
  return { ...content, moreModes }
}
