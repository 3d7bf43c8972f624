/** What can be done to a findings sheet, and how each is taken back. Pure: the page keeps what comes out. */
import type { Entries, Entry, Kept, Meter, ReadingEntry, SheetContent } from './sheet-content.ts'
import { entryOf, inView } from './sheet-content.ts'

type At = { mode: string; id: string }
/** What a reading's own strip changes. */
type Part = Partial<Pick<ReadingEntry, 'text' | 'upper' | 'meterOhms' | 'note' | 'unreachable'>>

export type Action =
  | ({ do: 'type'; text: string; which?: 'lower' | 'upper'; of: string } & At)
  | ({ do: 'set'; part: Part; of: string } & At)
  /** The same reading with another meter: the number before stays, paler, behind. */
  | ({ do: 'again'; meterOhms: number; of: string; was: number } & At)
  | ({ do: 'observe'; value: string; by: 'tech' | 'owner'; of: string } & At)
  | ({ do: 'remove'; of: string } & At)
  /** The field was left: the next key in it is another step. */
  | { do: 'settle' }
  | { do: 'look'; mode: string }
  | { do: 'add-mode'; mode: string; of: string }
  | { do: 'context'; source: string; system: string; wiring: string; meter: Meter; modes: readonly string[] }
  | { do: 'title'; title: string }
  | { do: 'what-if' }
  | { do: 'keep-what-if' }
  | { do: 'drop-what-if' }
  | { do: 'skip'; test: string; of: string }
  | { do: 'take-up'; test: string; of: string }
  | { do: 'undo' }

/** How far back Undo goes. */
const pastLimit = 40

const keptOf = ({ version: _, past: __, ...kept }: SheetContent): Kept => kept

/** Makes a change that Undo can take back; typing in one field adds to the step it began. */
function change(
  content: SheetContent,
  label: string,
  key: string,
  next: Partial<Kept>,
  typing = false,
): SheetContent {
  const last = content.past.at(-1)
  const goesOn = typing && last?.open === true && last.key === key
  const closed = content.past.map((step) => (step.open && !goesOn ? { ...step, open: false } : step))
  const past = goesOn
    ? content.past
    : [...closed, { label, key, open: typing, before: keptOf(content) }].slice(-pastLimit)
  return { ...content, ...next, past }
}

function withEntry(content: SheetContent, { mode, id }: At, entry: Entry | undefined): Partial<Kept> {
  const entries = inView(content)
  const { [id]: _, ...rest } = entries[mode] ?? {}
  const here = entry === undefined ? rest : { ...rest, [id]: entry }
  const next: Entries = { ...entries, [mode]: here }
  return content.whatIf === null ? { entries: next } : { whatIf: next }
}

const readingAt = (content: SheetContent, { mode, id }: At): ReadingEntry => {
  const entry = entryOf(content, mode, id)
  return entry?.kind === 'reading' ? entry : { kind: 'reading', text: '' }
}

/** Whether an entry says nothing any more, so that it needn't be kept. */
const isBlank = (entry: ReadingEntry): boolean =>
  entry.text === '' &&
  (entry.upper ?? '') === '' &&
  (entry.note ?? '') === '' &&
  entry.unreachable !== true &&
  entry.meterOhms === undefined

/** Drops the parts that say nothing. */
function tidy(entry: ReadingEntry): ReadingEntry {
  const { upper, note, unreachable, meterOhms, earlier, ...rest } = entry
  return {
    ...rest,
    ...(upper === undefined ? {} : { upper }),
    ...(note === undefined || note === '' ? {} : { note }),
    ...(unreachable === true ? { unreachable } : {}),
    ...(meterOhms === undefined ? {} : { meterOhms }),
    ...(earlier === undefined ? {} : { earlier }),
  }
}

function edit(content: SheetContent, at: At, of: string, part: Part, typing: boolean): SheetContent {
  const before = readingAt(content, at)
  // A typed number is a reading that was reached after all.
  const reached = part.text !== undefined && part.text !== '' ? { unreachable: false } : {}
  const after = tidy({ ...before, ...reached, ...part })
  const entry = isBlank(after) && after.upper === undefined ? undefined : after
  return change(content, of, `${at.mode} ${at.id}`, withEntry(content, at, entry), typing)
}

function takeAgain(
  content: SheetContent,
  at: At & { meterOhms: number; was: number; of: string },
): SheetContent {
  const before = readingAt(content, at)
  const earlier =
    before.text.trim() === '' ? before.earlier : { text: before.text, meterOhms: before.meterOhms ?? at.was }
  const entry = tidy({ kind: 'reading', text: '', meterOhms: at.meterOhms, note: before.note, earlier })
  return change(content, `${at.of}, other meter`, `${at.mode} ${at.id}`, withEntry(content, at, entry))
}

function setContext(content: SheetContent, action: Action & { do: 'context' }): SheetContent {
  const { source, system, wiring, meter, modes } = action
  const next = { source, system, wiring, meter }
  if (JSON.stringify(next) === JSON.stringify(content.context)) return content
  const filled = Object.entries(content.entries).flatMap(([mode, here]) =>
    Object.keys(here).length > 0 ? [mode] : [],
  )
  // Modes with findings stay in sight when the source that had them was a mistake.
  const moreModes = [...new Set([...content.moreModes, ...filled])].filter((mode) => !modes.includes(mode))
  const known = [...modes, ...moreModes]
  const mode = known.includes(content.mode) ? content.mode : (known[0] ?? content.mode)
  return change(content, 'what feeds it', 'context', { context: next, mode, moreModes }, true)
}

/** The sheet after an action. */
export function reduce(content: SheetContent, action: Action): SheetContent {
  switch (action.do) {
    case 'type': {
      const part = action.which === 'upper' ? { upper: action.text } : { text: action.text }
      return edit(content, action, action.of, part, true)
    }
    case 'set':
      return edit(content, action, action.of, action.part, action.part.note !== undefined)
    case 'again':
      return takeAgain(content, action)
    case 'observe': {
      const entry: Entry = { kind: 'observation', value: action.value, by: action.by }
      return change(content, action.of, `${action.mode} ${action.id}`, withEntry(content, action, entry))
    }
    case 'remove':
      if (entryOf(content, action.mode, action.id) === undefined) return content
      return change(content, `${action.of} removed`, 'remove', withEntry(content, action, undefined))
    case 'settle': {
      if (content.past.at(-1)?.open !== true) return content
      return { ...content, past: content.past.map((step) => (step.open ? { ...step, open: false } : step)) }
    }
    case 'look':
      return { ...content, mode: action.mode }
    case 'add-mode':
      return change(content, action.of, 'mode', {
        moreModes: [...new Set([...content.moreModes, action.mode])],
        mode: action.mode,
      })
    case 'context':
      return setContext(content, action)
    case 'title':
      return change(content, 'title', 'title', { title: action.title }, true)
    case 'what-if':
      return content.whatIf === null
        ? change(content, 'what if', 'what-if', { whatIf: content.entries })
        : content
    case 'keep-what-if':
      if (content.whatIf === null) return content
      return change(content, 'what if, kept', 'what-if', { entries: content.whatIf, whatIf: null })
    case 'drop-what-if':
      return content.whatIf === null
        ? content
        : change(content, 'what if, dropped', 'what-if', { whatIf: null })
    case 'skip':
      return change(content, `${action.of} put aside`, 'skip', { skipped: [...content.skipped, action.test] })
    case 'take-up':
      return change(content, `${action.of} taken up`, 'skip', {
        skipped: content.skipped.filter((test) => test !== action.test),
      })
    case 'undo': {
      const last = content.past.at(-1)
      return last === undefined ? content : { ...content, ...last.before, past: content.past.slice(0, -1) }
    }
  }
}

/** What Undo would take back, in words; undefined when there is nothing. */
export const undoes = (content: SheetContent): string | undefined => content.past.at(-1)?.label
