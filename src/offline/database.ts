import { openDB } from 'idb'
import type { DBSchema, IDBPDatabase } from 'idb'
import type { Unsent, Sending } from './unsent.ts'
import type { SheetDoc } from './sheets.ts'

export type Stores = DBSchema & {
  sheets: { key: string; value: SheetDoc }
  /** Without an audience: kept by an older build, and taken for what is for qualified people. */
  files: { key: string; value: { hash: string; bytes: Uint8Array; audience?: 'everyone' | 'qualified' } }
  /** What the server has yet to take, in the order it was written. */
  outbox: { key: number; value: Unsent }
  /** How each sheet that goes to the server stands with it. */
  sendings: { key: string; value: Sending }
  settings: { key: string; value: { key: string; value: unknown } }
}

let opened: Promise<IDBPDatabase<Stores>> | undefined

/** The device's own database, opened once. A version another tab still holds open is let go of when it asks. */
export function database(): Promise<IDBPDatabase<Stores>> {
  opened ??= openDB<Stores>('tracelamp', 2, {
    upgrade(db, from) {
      if (from < 1) {
        db.createObjectStore('sheets', { keyPath: 'id' })
        db.createObjectStore('files', { keyPath: 'hash' })
        db.createObjectStore('settings', { keyPath: 'key' })
      }
      if (from < 2) {
        db.createObjectStore('outbox', { keyPath: 'n', autoIncrement: true })
        db.createObjectStore('sendings', { keyPath: 'sheet' })
      }
    },
    blocking(_old, _new, event) {
      ;(event.target as IDBDatabase).close()
      opened = undefined
    },
    terminated() {
      opened = undefined
    },
  }).catch((problem: unknown) => {
    opened = undefined
    throw problem
  })
  return opened
}

/** Readings must outlive a dead battery, so a write counts only once it lies on the disk. */
export const strict = { durability: 'strict' } as const
