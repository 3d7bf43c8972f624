import type { IDBPTransaction } from 'idb'
import type { NewEntry } from '../../server/sheets/sheet-requests.contract.ts'
import { inWriting } from '../../rules/findings/standing.ts'
import { database, strict } from './database.ts'
import type { Stores } from './database.ts'
import { newId } from './new-id.ts'
import { noteWith } from './sheets.ts'
import type { SentFinding, SheetDoc } from './sheets.ts'
import { newSending } from './unsent.ts'
import type { Sending, Unsent } from './unsent.ts'

/** What somebody else wrote and this device has taken over. */
export type Received = {
  mode: string
  finding: string
  ids: string[]
  sent: Pick<SentFinding, 'value' | 'kept'>
}

export type Writing = IDBPTransaction<Stores, ('sheets' | 'outbox' | 'sendings' | 'settings')[], 'readwrite'>

export const keyOf = ({ mode, finding }: Pick<SentFinding, 'mode' | 'finding'>): string =>
  `${mode} ${finding}`
const saysOf = ({ value, kept }: Pick<SentFinding, 'value' | 'kept'>): string => inWriting([value, kept])
/** What a finding says that is not there. */
const nothing = saysOf({ value: null, kept: null })

type Fresh = Omit<Unsent, 'what' | 'head' | 'entry'>

/** Puts an entry in the outbox. One for the same finding that has not gone out yet is changed instead. */
async function putEntry(tx: Writing, sending: Sending, found: SentFinding, letter: Fresh) {
  const outbox = tx.objectStore('outbox')
  const { mode, finding, value, kept } = found
  const key = keyOf(found)
  const deviceAt = new Date().toISOString()
  const waiting = (await outbox.getAll()).find(
    (one) =>
      one.what === 'entry' &&
      one.sheet === sending.sheet &&
      one.by === letter.by &&
      !one.tried &&
      keyOf(one.entry) === key,
  )
  const before = sending.last[key]
  if (waiting?.what === 'entry') {
    // Others' entries that came meanwhile are known to its writer now.
    const after = [...new Set([...waiting.entry.after, ...(before?.ids ?? [])])].filter(
      (id) => id !== waiting.entry.id,
    )
    const entry = { ...waiting.entry, value, kept, deviceAt, after } as NewEntry
    await outbox.put({ ...waiting, entry })
    sending.last[key] = { ids: [entry.id], says: saysOf(found) }
    return
  }
  const entry = { id: newId(), mode, finding, value, kept, after: before?.ids ?? [], deviceAt } as NewEntry
  await outbox.add({ ...letter, what: 'entry', entry })
  sending.last[key] = { ids: [entry.id], says: saysOf(found) }
}

/** All of a sheet but its findings, in writing. */
export const headSays = ({ kind, title, edition, sends }: SheetDoc): string =>
  inWriting({ kind, title, context: sends?.context, edition })

async function putHead(tx: Writing, sending: Sending, doc: SheetDoc, letter: Fresh) {
  const { kind, title, edition, sends, changedAt } = doc
  const says = headSays(doc)
  if (edition === undefined || sends === undefined || says === sending.head) return
  const outbox = tx.objectStore('outbox')
  const before = (await outbox.getAll()).find(
    (one) => one.what === 'head' && one.sheet === doc.id && one.by === letter.by && !one.tried,
  )
  const madeAt = before?.what === 'head' ? before.head.madeAt : changedAt
  const head = { kind, title, context: sends.context, edition, madeAt, changedAt }
  if (before === undefined) await outbox.add({ ...letter, what: 'head', head })
  else await outbox.put({ ...before, what: 'head', head })
  sending.head = says
}

/**
 * Notes what the server must be told of a sheet, in the transaction that keeps the sheet. A person's sheet goes to the
 * server; one begun while nobody was signed in stays here until a link is asked for.
 * @param by who wrote it
 */
export async function putInOutbox(
  tx: Writing,
  doc: SheetDoc,
  by: string | null,
  received: readonly Received[],
): Promise<void> {
  const known = await tx.objectStore('sendings').get(doc.id)
  if (doc.sends === undefined || doc.edition === undefined) return
  if (known === undefined && (doc.of ?? null) === null) return
  const sending = structuredClone(known ?? newSending(doc.id))
  for (const one of received) sending.last[keyOf(one)] = { ids: one.ids, says: saysOf(one.sent) }
  const letter = { sheet: doc.id, by, tried: false, failures: 0 }
  if (sending.link === undefined) await putHead(tx, sending, doc, letter)
  const now = new Map(doc.sends.findings.map((found) => [keyOf(found), found]))
  for (const found of now.values())
    if (saysOf(found) !== (sending.last[keyOf(found)]?.says ?? nothing))
      await putEntry(tx, sending, found, letter)
  for (const [key, { says }] of Object.entries(sending.last))
    if (!now.has(key) && says !== nothing) {
      const [mode = '', ...finding] = key.split(' ')
      await putEntry(tx, sending, { mode, finding: finding.join(' '), value: null, kept: null }, letter)
    }
  await tx.objectStore('sendings').put(sending)
}

noteWith(putInOutbox)

/** Notes what was written before this part of the page had come. */
export async function noteLate(): Promise<void> {
  const tx = (await database()).transaction(['sheets', 'outbox', 'sendings', 'settings'], 'readwrite', strict)
  const sheets = tx.objectStore('sheets')
  for (const { unnoted, ...doc } of await sheets.getAll())
    if (unnoted !== undefined) {
      await putInOutbox(tx, doc, unnoted.by, [])
      await sheets.put(doc)
    }
  await tx.done
}
