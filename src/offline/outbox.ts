import type { IDBPTransaction } from 'idb'
import type { NewEntry, SheetHead } from '../../server/sheets/sheets.contract.ts'
import { inWriting } from '../../rules/findings/standing.ts'
import { database, strict } from './database.ts'
import type { Stores } from './database.ts'
import { newId, newSecret } from './new-id.ts'
import type { SentFinding, SheetDoc } from './sheets.ts'

/** How a sheet stands with the server. There is none for a sheet that stays on this device. */
export type Sending = {
  /** The sheet's id on this device. */
  sheet: string
  /** Its id on the server: the same, but for one that came by a link. */
  remote: string
  /** Opens the sheet to this device when nobody is signed in. */
  key: string
  /** The link it came by; its owner may take that back. */
  link?: string
  /** The link that was made here, to be shown again. */
  given?: string | undefined
  /** The server has the sheet. */
  there: boolean
  /** The head as last put in the outbox, in writing. */
  head: string
  /** Mode and finding → the entries that stand, as this device knows them, and what the finding said then. */
  last: Record<string, { ids: string[]; says: string }>
}

type Letter = { what: 'head'; head: SheetHead } | { what: 'entry'; entry: NewEntry }
/** Something for the server. It leaves only when the server has named its id. */
export type Unsent = Letter & {
  n?: number
  sheet: string
  /** Who wrote it: nobody else's session sends it. Null: nobody was signed in. */
  by: string | null
  /** It went out once, so that the server may have it: it is not changed any more. */
  tried: boolean
  /** How often the server failed at it. */
  failures: number
  /** Why it was refused. The rest of its sheet waits behind it. */
  refused?: string
}

/** What somebody else wrote and this device has taken over. */
export type Received = {
  mode: string
  finding: string
  ids: string[]
  sent: Pick<SentFinding, 'value' | 'kept'>
}

type Writing = IDBPTransaction<Stores, ('sheets' | 'outbox' | 'sendings' | 'settings')[], 'readwrite'>

export const keyOf = ({ mode, finding }: Pick<SentFinding, 'mode' | 'finding'>): string =>
  `${mode} ${finding}`
const saysOf = ({ value, kept }: Pick<SentFinding, 'value' | 'kept'>): string => inWriting([value, kept])
/** What a finding says that is not there. */
const nothing = saysOf({ value: null, kept: null })

const isPerson = (value: unknown): value is { id: string } =>
  typeof value === 'object' && value !== null && 'id' in value && typeof value.id === 'string'

async function writerIn(tx: Writing): Promise<string | null> {
  const kept = (await tx.objectStore('settings').get('person'))?.value
  return isPerson(kept) ? kept.id : null
}

export const newSending = (sheet: string): Sending => ({
  sheet,
  remote: sheet,
  key: newSecret(),
  there: false,
  head: '',
  last: {},
})

/** Puts an entry in the outbox. One for the same finding that has not gone out yet is changed instead. */
async function putEntry(tx: Writing, sending: Sending, found: SentFinding, letter: Omit<Unsent, 'what'>) {
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

/**
 * Notes what the server must be told of a sheet, in the transaction that keeps the sheet. A sheet that somebody writes
 * who is signed in goes to the server; anybody else's stays here until they ask for a link.
 */
export async function putInOutbox(tx: Writing, doc: SheetDoc, received: readonly Received[]): Promise<void> {
  const by = await writerIn(tx)
  const known = await tx.objectStore('sendings').get(doc.id)
  if (doc.sends === undefined || doc.edition === undefined || (known === undefined && by === null)) return
  const sending = structuredClone(known ?? newSending(doc.id))
  for (const one of received) sending.last[keyOf(one)] = { ids: one.ids, says: saysOf(one.sent) }
  const letter = { sheet: doc.id, by, tried: false, failures: 0 }

  if (sending.link === undefined) {
    const head = { kind: doc.kind, title: doc.title, context: doc.sends.context, edition: doc.edition }
    const says = inWriting(head)
    if (says !== sending.head) {
      const before = (await tx.objectStore('outbox').getAll()).find(
        (one) => one.what === 'head' && one.sheet === doc.id && one.by === by && !one.tried,
      )
      const madeAt = before?.what === 'head' ? before.head.madeAt : doc.changedAt
      const next = { ...head, madeAt, changedAt: doc.changedAt }
      if (before === undefined) await tx.objectStore('outbox').add({ ...letter, what: 'head', head: next })
      else await tx.objectStore('outbox').put({ ...before, what: 'head', head: next })
      sending.head = says
    }
  }
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

/** How a sheet stands with the server; undefined when it stays on this device. */
export async function getSending(sheet: string): Promise<Sending | undefined> {
  return (await database()).get('sendings', sheet)
}

/** The sheet that came by a link, if it did already. */
export async function findByLink(link: string): Promise<Sending | undefined> {
  return (await (await database()).getAll('sendings')).find((one) => one.link === link)
}

/** Changes how a sheet stands with the server. */
export async function alterSending(sheet: string, change: Partial<Sending>): Promise<void> {
  const tx = (await database()).transaction('sendings', 'readwrite', strict)
  const before = (await tx.store.get(sheet)) ?? newSending(sheet)
  await Promise.all([tx.store.put({ ...before, ...change, sheet }), tx.done])
}

/** Everything that is yet to be sent, the oldest first. */
export async function listUnsent(): Promise<Unsent[]> {
  return (await database()).getAll('outbox')
}

/** Changes what is yet to be sent; `undefined` takes it out. Whatever has left meanwhile stays gone. */
export async function alterUnsent(
  ns: readonly number[],
  change: (letter: Unsent) => Unsent | undefined,
): Promise<void> {
  const tx = (await database()).transaction('outbox', 'readwrite', strict)
  for (const n of ns) {
    const letter = await tx.store.get(n)
    const next = letter && change(letter)
    if (next !== undefined) await tx.store.put(next)
    else if (letter !== undefined) await tx.store.delete(n)
  }
  await tx.done
}
