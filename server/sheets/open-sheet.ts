import type { Db } from '../database.ts'
import { SheetOpened } from './sheets.contract.ts'
import { findResult, linkMadeAt, listEntries } from './sheets.queries.ts'
import type { SheetRow } from './sheets.queries.ts'

/** A sheet whole, as whoever may read it gets it. */
export async function openSheet(db: Db, sheet: SheetRow, own: boolean): Promise<SheetOpened> {
  const [entries, result, linkAt] = await Promise.all([
    listEntries(db, sheet.id),
    findResult(db, sheet.id),
    own ? linkMadeAt(db, sheet.id) : undefined,
  ])
  return SheetOpened.parse({
    ...sheet,
    madeAt: sheet.madeAt.toISOString(),
    changedAt: sheet.changedAt.toISOString(),
    own,
    entries: entries.map(({ byId, byName, deviceAt, serverAt, ...entry }) => ({
      ...entry,
      by: byId === null ? null : { id: byId, name: byName ?? '' },
      deviceAt: deviceAt.toISOString(),
      serverAt: serverAt.toISOString(),
    })),
    result: result ?? null,
    linkMadeAt: linkAt?.toISOString() ?? null,
  })
}
