/** What is yet to be sent, and how each sheet stands with the server. `outbox.ts` decides what must be. */
import type { NewEntry, SheetHead } from '../../server/sheets/sheet-requests.contract.ts'
import { database, strict } from './database.ts'
import { newSecret } from './new-id.ts'

/** How a sheet stands with the server. There is none for a sheet that stays on this device. */
export type Sending = {
  /** The sheet's id on this device. */
  sheet: string
  /** Its id on the server: the same, but for one that came by a link. */
  remote: string
  /** Opens the sheet to this device when nobody is signed in. */
  key: string
  /** The link it came by; its owner may take that back. */
  link?: string | undefined
  /** The link it came by was taken back: it goes on as a sheet of its own. */
  ended?: boolean
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

export const newSending = (sheet: string): Sending => ({
  sheet,
  remote: sheet,
  key: newSecret(),
  there: false,
  head: '',
  last: {},
})

/** How a sheet stands with the server; undefined when it stays on this device. */
export async function getSending(sheet: string): Promise<Sending | undefined> {
  return (await database()).get('sendings', sheet)
}

/** How all sheets that go to the server stand with it. */
export async function listSendings(): Promise<Sending[]> {
  return (await database()).getAll('sendings')
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
