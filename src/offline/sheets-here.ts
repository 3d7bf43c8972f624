import { database } from './database.ts'
import type { SheetDoc } from './sheets.ts'
import { idOf, isSeenBy } from './whose.ts'

/** Whether an id is taken on this device, be it by a sheet that somebody else alone may see. */
export async function isTakenHere(id: string): Promise<boolean> {
  return (await (await database()).getKey('sheets', id)) !== undefined
}

/** The sheets on this device that whoever is here may see, the last changed first. */
export async function listSheets(kind?: SheetDoc['kind']): Promise<SheetDoc[]> {
  const tx = (await database()).transaction(['sheets', 'settings'])
  const [all, person] = await Promise.all([
    tx.objectStore('sheets').getAll(),
    tx.objectStore('settings').get('person'),
  ])
  const who = idOf(person?.value)
  return all
    .filter((doc) => (kind === undefined || doc.kind === kind) && isSeenBy(doc, who))
    .sort((a, b) => (a.changedAt < b.changedAt ? 1 : a.changedAt > b.changedAt ? -1 : 0))
}
