/** A findings sheet as the Diagnosis page keeps it: what was typed, as it was typed. */
import * as z from 'zod/mini'

/** A reading as typed, with its instrument and whatever else was said of it. Text may be no number yet. */
export const ReadingEntry = z.object({
  kind: z.literal('reading'),
  text: z.string(),
  /** The other number of an unsteady reading, as typed. */
  upper: z.optional(z.string()),
  /** Taken with another meter than the sheet's: its input resistance, ohms. */
  meterOhms: z.optional(z.number()),
  note: z.optional(z.string()),
  /** Could not be reached, so that nobody asks for it again. */
  unreachable: z.optional(z.boolean()),
  /** What the meter before showed, when it was taken again with another. */
  earlier: z.optional(z.object({ text: z.string(), meterOhms: z.number() })),
})
export const ObservationEntry = z.object({
  kind: z.literal('observation'),
  value: z.string(),
  by: z.enum(['tech', 'owner']),
})
export const Entry = z.discriminatedUnion('kind', [ReadingEntry, ObservationEntry])
const Entries = z.record(z.string(), z.record(z.string(), Entry))

/** The meter's input resistance: two common kinds, or a low one as typed. */
export const Meter = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('10M') }),
  z.object({ kind: z.literal('1M') }),
  z.object({ kind: z.literal('low'), ohms: z.string() }),
])
const SheetContext = z.object({ source: z.string(), system: z.string(), wiring: z.string(), meter: Meter })

/** All of a sheet that Undo brings back. */
const Kept = z.object({
  title: z.string(),
  context: SheetContext,
  /** The mode in view. */
  mode: z.string(),
  /** Modes added to those of the source. */
  moreModes: z.array(z.string()),
  /** Mode → finding → entry. */
  entries: Entries,
  /** Entries as they would be, while something is tried; null when nothing is. */
  whatIf: z.nullable(Entries),
  /** Tests put aside: "test" or "test mode". */
  skipped: z.array(z.string()),
})
const Step = z.object({
  /** What Undo takes back, in words. */
  label: z.string(),
  /** Typing in one field is one step until the field is left. */
  key: z.string(),
  open: z.boolean(),
  before: Kept,
})
export const SheetContent = z.extend(Kept, { version: z.literal(1), past: z.array(Step) })

export type ReadingEntry = z.infer<typeof ReadingEntry>
export type ObservationEntry = z.infer<typeof ObservationEntry>
export type Entry = z.infer<typeof Entry>
export type Entries = z.infer<typeof Entries>
export type Meter = z.infer<typeof Meter>
export type SheetContext = z.infer<typeof SheetContext>
export type Kept = z.infer<typeof Kept>
export type SheetContent = z.infer<typeof SheetContent>

/** A new sheet: nothing taken. */
export const newSheet = (title: string, context: SheetContext, mode: string): SheetContent => ({
  version: 1,
  title,
  context,
  mode,
  moreModes: [],
  entries: {},
  whatIf: null,
  skipped: [],
  past: [],
})

/** The entries in view: those tried, while something is tried. */
export const inView = (content: SheetContent): Entries => content.whatIf ?? content.entries

/** One entry of the entries in view. */
export const entryOf = (content: SheetContent, mode: string, id: string): Entry | undefined =>
  inView(content)[mode]?.[id]

export const readingOf = (content: SheetContent, mode: string, id: string): ReadingEntry | undefined => {
  const entry = entryOf(content, mode, id)
  return entry?.kind === 'reading' ? entry : undefined
}

/** How many entries of a mode count as taken: what is typed or answered, not what can't be reached. */
export const isTaken = (entry: Entry): boolean =>
  entry.kind === 'observation' || (entry.text.trim() !== '' && entry.unreachable !== true)
