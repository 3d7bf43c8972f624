import type { RawFinding, RawSheet } from '../../rules/findings/sheet.ts'
import { database, strict } from './database.ts'
import { askToLast } from './ask-to-last.ts'
import type { putInOutbox, Received } from './outbox.ts'
import { idOf, isSeenBy } from './whose.ts'

/** One finding as it goes to the server. */
export type SentFinding = {
  mode: string
  finding: string
  /** Null while what is typed counts as nothing. */
  value: RawFinding | null
  /** The same as its page keeps it; null when the value says all. */
  kept: unknown
}

/**
 * A findings sheet as it lies on this device. `content` belongs to the feature that wrote it, which checks it
 * again when it reads it: an older build may have written it.
 */
export type SheetDoc<Content = unknown> = {
  id: string
  kind: 'triage' | 'diagnosis'
  title: string
  /** Hash of the edition it was begun with; it stays on that edition. */
  edition: string | undefined
  /** Device time, ISO 8601. */
  changedAt: string
  content: Content
  /** The same for the server, which knows no page's content. Missing in what an older build wrote. */
  sends?: { context: RawSheet['context']; findings: readonly SentFinding[] }
  /** Whose it is: who began it. Null: nobody was signed in. */
  of?: string | null
  /** Written before the part of the page had come that notes what is to be sent, and by whom. */
  unnoted?: { by: string | null }
}

const channel = 'BroadcastChannel' in globalThis ? new BroadcastChannel('tracelamp-sheets') : undefined
const listeners = new Set<() => void>()
const announce = () => {
  for (const listener of listeners) listener()
}
channel?.addEventListener('message', announce)
/** Tells this tab and the others that sheets, or what is to be sent of them, are not what they were. */
export function sayChanged(): void {
  announce()
  channel?.postMessage('changed')
}

/** Calls back after any sheet was saved or removed, in this tab or another. Returns the way to stop it. */
export function onSheetsChanged(listener: () => void): () => void {
  listeners.add(listener)
  return () => listeners.delete(listener)
}

let note: typeof putInOutbox | undefined
/** Hands in how to note what must be sent. It comes late: an answer about danger waits for no network. */
export function noteWith(how: typeof putInOutbox): void {
  note = how
}

/**
 * Keeps a sheet, and in the same step notes what the server must be told of it. Resolves once it lies on the disk: wait
 * for it before drawing what was typed.
 * @param received what others wrote that this doc holds now, so that it isn't sent back as ours
 * @throws DOMException QuotaExceededError when the device is full, or another when it keeps nothing at all
 */
export async function saveSheet(doc: SheetDoc, received: readonly Received[] = []): Promise<void> {
  const tx = (await database()).transaction(['sheets', 'outbox', 'sendings', 'settings'], 'readwrite', strict)
  const sheets = tx.objectStore('sheets')
  const write = async () => {
    const [before, person] = await Promise.all([sheets.get(doc.id), tx.objectStore('settings').get('person')])
    const by = idOf(person?.value)
    const of = before === undefined ? (doc.of === undefined ? by : doc.of) : (before.of ?? null)
    const { unnoted: _, ...rest } = doc
    const kept = { ...rest, of }
    await Promise.all(
      note === undefined
        ? [sheets.put({ ...kept, unnoted: { by } })]
        : [sheets.put(kept), note(tx, kept, by, received)],
    )
    return before === undefined
  }
  const [isNew] = await Promise.all([write(), tx.done])
  sayChanged()
  // A check is never interrupted by a browser that asks the person back.
  if (doc.kind === 'diagnosis' && isNew) void askToLast().catch(() => undefined)
}

/** One sheet, or undefined when this device has none of that id, or somebody else's. */
export async function loadSheet(id: string): Promise<SheetDoc | undefined> {
  const tx = (await database()).transaction(['sheets', 'settings'])
  const [doc, person] = await Promise.all([
    tx.objectStore('sheets').get(id),
    tx.objectStore('settings').get('person'),
  ])
  return doc && isSeenBy(doc, idOf(person?.value)) ? doc : undefined
}

/** Takes a sheet off this device. Put the same document back with `saveSheet` to undo. */
export async function removeSheet(id: string): Promise<void> {
  const tx = (await database()).transaction('sheets', 'readwrite', strict)
  await Promise.all([tx.store.delete(id), tx.done])
  sayChanged()
}
