import { sql } from 'kysely'
import type { Db, Tx } from '../database.ts'
import type { NewEntry, SheetHead } from './sheet-requests.contract.ts'
import type { SheetResult } from './sheets.contract.ts'

const columns = [
  's.id',
  's.owner_id as ownerId',
  's.key_hash as keyHash',
  's.kind',
  's.title',
  's.context',
  's.edition_hash as edition',
  's.made_at as madeAt',
  's.changed_at as changedAt',
] as const

/** One sheet. Undefined when there is none of that id. */
export function findSheet(db: Db | Tx, id: string) {
  return db.selectFrom('sheet as s').select(columns).where('s.id', '=', id).executeTakeFirst()
}

export type SheetRow = NonNullable<Awaited<ReturnType<typeof findSheet>>>

/** The same, held until the transaction ends, so that entries and result are written one after another. */
export function lockSheet(tx: Tx, id: string) {
  return tx.selectFrom('sheet as s').select(columns).where('s.id', '=', id).forUpdate().executeTakeFirst()
}

/** The sheet a link opens. Undefined when it was taken back, or never was. */
export function findByLink(db: Db | Tx, tokenHash: string) {
  return db
    .selectFrom('sheet_link as l')
    .innerJoin('sheet as s', 's.id', 'l.sheet_id')
    .select(columns)
    .where('l.token_hash', '=', tokenHash)
    .where('l.taken_back_at', 'is', null)
    .executeTakeFirst()
}

type Owner = { ownerId: string | null; keyHash: string | null }

/** Makes a sheet. False when there is one of that id already, whoever's it is. */
export async function addSheet(db: Db | Tx, id: string, head: SheetHead, owner: Owner): Promise<boolean> {
  const made = await db
    .insertInto('sheet')
    .values({
      id,
      owner_id: owner.ownerId,
      key_hash: owner.keyHash,
      kind: head.kind,
      title: head.title,
      context: JSON.stringify(head.context),
      edition_hash: head.edition,
      made_at: new Date(head.madeAt),
      changed_at: new Date(head.changedAt),
    })
    .onConflict((conflict) => conflict.column('id').doNothing())
    .returning('id')
    .executeTakeFirst()
  return made !== undefined
}

/** Names a sheet anew, unless what is there was changed later. */
export async function changeSheet(tx: Tx, id: string, head: SheetHead): Promise<void> {
  await tx
    .updateTable('sheet')
    .set({
      title: head.title,
      context: JSON.stringify(head.context),
      edition_hash: head.edition,
      changed_at: new Date(head.changedAt),
    })
    .where('id', '=', id)
    .where('changed_at', '<=', new Date(head.changedAt))
    .execute()
}

/** Gives a sheet that was begun without an account to whoever holds its key and has one now. */
export async function adoptSheet(tx: Tx, id: string, ownerId: string): Promise<void> {
  await tx
    .updateTable('sheet')
    .set({ owner_id: ownerId })
    .where('id', '=', id)
    .where('owner_id', 'is', null)
    .execute()
}

/** Whether an edition of that hash is kept here. */
export async function isEdition(db: Db | Tx, hash: string): Promise<boolean> {
  return (
    (await db.selectFrom('edition').select('number').where('hash', '=', hash).executeTakeFirst()) !==
    undefined
  )
}

/** The number of the edition with this hash. */
export async function editionNumber(db: Db | Tx, hash: string): Promise<number> {
  const { number } = await db
    .selectFrom('edition')
    .select('number')
    .where('hash', '=', hash)
    .executeTakeFirstOrThrow()
  return number
}

type Writer = { id: string | null; name: string | null }

/** Adds entries; those that are there already stay as they are. Returns how many were new. */
export async function addEntries(
  tx: Tx,
  sheetId: string,
  entries: readonly NewEntry[],
  by: Writer,
): Promise<number> {
  const added = await tx
    .insertInto('sheet_entry')
    .values(
      entries.map(({ id, mode, finding, value, kept, after, deviceAt }) => ({
        id,
        sheet_id: sheetId,
        mode,
        finding,
        value: value === null ? null : JSON.stringify(value),
        kept: kept === null ? null : JSON.stringify(kept),
        after,
        by_person: by.id,
        by_name: by.name,
        device_at: new Date(deviceAt),
      })),
    )
    .onConflict((conflict) => conflict.column('id').doNothing())
    .returning('id')
    .execute()
  return added.length
}

/** Which of these ids belong to another sheet's entries. */
export async function entriesElsewhere(tx: Tx, sheetId: string, ids: readonly string[]): Promise<string[]> {
  const found = await tx
    .selectFrom('sheet_entry')
    .select('id')
    .where('id', 'in', ids)
    .where('sheet_id', '<>', sheetId)
    .execute()
  return found.map((entry) => entry.id)
}

/** All entries of a sheet, in the order they came. */
export function listEntries(db: Db | Tx, sheetId: string) {
  return db
    .selectFrom('sheet_entry')
    .select([
      'id',
      'mode',
      'finding',
      'value',
      'kept',
      'after',
      'by_person as byId',
      'by_name as byName',
      'device_at as deviceAt',
      'server_at as serverAt',
    ])
    .where('sheet_id', '=', sheetId)
    .orderBy('seq')
    .execute()
}

/** Notes that a sheet was written on, unless it was later changed. */
export async function touchSheet(tx: Tx, id: string, at: Date): Promise<void> {
  await tx
    .updateTable('sheet')
    .set({ changed_at: at })
    .where('id', '=', id)
    .where('changed_at', '<', at)
    .execute()
}

/** Keeps what the edition said of the sheet as it is now. */
export async function keepResult(tx: Tx, sheetId: string, result: SheetResult): Promise<void> {
  const row = { edition_hash: result.edition, result: JSON.stringify(result) }
  await tx
    .insertInto('sheet_result')
    .values({ sheet_id: sheetId, ...row })
    .onConflict((conflict) => conflict.column('sheet_id').doUpdateSet({ ...row, made_at: sql<Date>`now()` }))
    .execute()
}

/** Forgets the result of a sheet that can't be computed any more. */
export async function dropResult(tx: Tx, sheetId: string): Promise<void> {
  await tx.deleteFrom('sheet_result').where('sheet_id', '=', sheetId).execute()
}

/** What the edition said. Undefined while what feeds the sheet can't be read. */
export async function findResult(db: Db | Tx, sheetId: string): Promise<unknown> {
  const row = await db
    .selectFrom('sheet_result')
    .select('result')
    .where('sheet_id', '=', sheetId)
    .executeTakeFirst()
  return row?.result
}

type Wanted = { words: string; kind: SheetHead['kind'] | undefined }
type After = { changedAt: Date; id: string }

/** A page of somebody's own sheets, the last changed first. */
export function listSheets(db: Db, ownerId: string, wanted: Wanted, after: After | undefined, most: number) {
  const { words, kind } = wanted
  const like = `%${words.replace(/[\\%_]/g, '\\$&')}%`
  return db
    .selectFrom('sheet as s')
    .leftJoin('sheet_result as r', 'r.sheet_id', 's.id')
    .select([
      's.id',
      's.kind',
      's.title',
      's.edition_hash as edition',
      's.changed_at as changedAt',
      sql<number>`(select count(distinct (e.mode, e.finding))::integer from sheet_entry as e
                   where e.sheet_id = s.id and e.value is not null
                     and not exists (select from sheet_entry as later
                                     where later.sheet_id = s.id and e.id = any (later.after)))`.as(
        'findings',
      ),
      sql<boolean>`coalesce(jsonb_array_length(r.result -> 'stops') > 0, false)`.as('stops'),
      sql<boolean>`exists (select from sheet_link as l where l.sheet_id = s.id and l.taken_back_at is null)`.as(
        'link',
      ),
    ])
    .where('s.owner_id', '=', ownerId)
    .where('s.title', 'ilike', like)
    .$if(kind !== undefined, (query) => query.where('s.kind', '=', kind!))
    .$if(after !== undefined, (query) =>
      query.where(sql<boolean>`(s.changed_at, s.id) < (${after?.changedAt}, ${after?.id}::uuid)`),
    )
    .orderBy('s.changed_at', 'desc')
    .orderBy('s.id', 'desc')
    .limit(most)
    .execute()
}

/** When the link that holds was made. Undefined when there is none. */
export async function linkMadeAt(db: Db | Tx, sheetId: string): Promise<Date | undefined> {
  const link = await db
    .selectFrom('sheet_link')
    .select('made_at')
    .where('sheet_id', '=', sheetId)
    .where('taken_back_at', 'is', null)
    .executeTakeFirst()
  return link?.made_at
}

/** Ends the link of a sheet, if there is one. */
export async function takeBackLink(tx: Tx, sheetId: string): Promise<void> {
  await tx
    .updateTable('sheet_link')
    .set({ taken_back_at: sql<Date>`now()` })
    .where('sheet_id', '=', sheetId)
    .where('taken_back_at', 'is', null)
    .execute()
}

/** Keeps the hash of a link's token. */
export async function keepLink(tx: Tx, sheetId: string, tokenHash: string): Promise<void> {
  await tx.insertInto('sheet_link').values({ sheet_id: sheetId, token_hash: tokenHash }).execute()
}

/** Ends the links with these hashes. */
export async function endDemoLinks(db: Db, hashes: readonly string[]): Promise<void> {
  await db
    .updateTable('sheet_link')
    .set({ taken_back_at: sql<Date>`now()` })
    .where('token_hash', 'in', hashes)
    .where('taken_back_at', 'is', null)
    .execute()
}

/** Tells every server process, once the transaction ends, that a sheet or its link is not what it was. */
export async function sayChanged(tx: Tx, sheetId: string): Promise<void> {
  await sql`select pg_notify('look_again', ${sheetId})`.execute(tx)
}
