import { database, strict } from './database.ts'
import { askToLast } from './lasting.ts'

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
}

const channel = 'BroadcastChannel' in globalThis ? new BroadcastChannel('tracelamp-sheets') : undefined
const listeners = new Set<() => void>()
const announce = () => {
  for (const listener of listeners) listener()
}
channel?.addEventListener('message', announce)
function changed(): void {
  announce()
  channel?.postMessage('changed')
}

/** Calls back after any sheet was saved or removed, in this tab or another. Returns the way to stop it. */
export function onSheetsChanged(listener: () => void): () => void {
  listeners.add(listener)
  return () => listeners.delete(listener)
}

/**
 * Keeps a sheet. Resolves once it lies on the disk: wait for it before drawing what was typed.
 * @throws DOMException QuotaExceededError when the device is full, or another when it keeps nothing at all
 */
export async function saveSheet(doc: SheetDoc): Promise<void> {
  const tx = (await database()).transaction('sheets', 'readwrite', strict)
  const [known] = await Promise.all([tx.store.getKey(doc.id), tx.store.put(doc), tx.done])
  changed()
  // A check is never interrupted by a browser that asks the person back.
  if (doc.kind === 'diagnosis' && known === undefined) void askToLast().catch(() => undefined)
}

/** One sheet, or undefined when this device has none of that id. */
export async function loadSheet(id: string): Promise<SheetDoc | undefined> {
  return (await database()).get('sheets', id)
}

/** All sheets on this device, the last changed first. */
export async function listSheets(kind?: SheetDoc['kind']): Promise<SheetDoc[]> {
  const all = await (await database()).getAll('sheets')
  return all
    .filter((doc) => kind === undefined || doc.kind === kind)
    .sort((a, b) => (a.changedAt < b.changedAt ? 1 : a.changedAt > b.changedAt ? -1 : 0))
}

/** Takes a sheet off this device. Put the same document back with `saveSheet` to undo. */
export async function removeSheet(id: string): Promise<void> {
  const tx = (await database()).transaction('sheets', 'readwrite', strict)
  await Promise.all([tx.store.delete(id), tx.done])
  changed()
}
