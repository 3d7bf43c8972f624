import { sql } from 'kysely'
import { ArticlesFile } from '../../rules/edition/schema.ts'
import type { Article, DiagnosisFile } from '../../rules/edition/schema.ts'
import type { Db, Tx } from '../database.ts'
import type { EditionBytes, EditionFile } from './edition-bytes.ts'
import { FileName } from './editions.contract.ts'

/** The edition in force. Undefined when none ever was. */
export function editionInForce(db: Db | Tx) {
  return db
    .selectFrom('edition_in_force as f')
    .innerJoin('edition as e', 'e.number', 'f.edition_number')
    .select(['e.number', 'e.hash', 'e.note', 'f.since'])
    .orderBy('f.id', 'desc')
    .limit(1)
    .executeTakeFirst()
}

/** The edition with this hash, with the last time it was in force. Undefined when it never was. */
export function editionOfHash(db: Db, hash: string) {
  return db
    .selectFrom('edition_in_force as f')
    .innerJoin('edition as e', 'e.number', 'f.edition_number')
    .select(['e.number', 'e.hash', 'e.note', 'f.since'])
    .where('e.hash', '=', hash)
    .orderBy('f.id', 'desc')
    .limit(1)
    .executeTakeFirst()
}

export type EditionRow = NonNullable<Awaited<ReturnType<typeof editionInForce>>>

/** Every edition with the last time it was in force, the newest first. */
export function listEditions(db: Db) {
  return db
    .with('period', (q) =>
      q
        .selectFrom('edition_in_force')
        .distinctOn('edition_number')
        .select([
          'edition_number',
          'since',
          sql<Date | null>`(select min(later.since) from edition_in_force as later
                            where later.id > edition_in_force.id)`.as('until'),
        ])
        .orderBy('edition_number')
        .orderBy('id', 'desc'),
    )
    .selectFrom('edition as e')
    .leftJoin('period as p', 'p.edition_number', 'e.number')
    .select(['e.number', 'e.hash', 'e.note', 'p.since', 'p.until'])
    .orderBy('e.number', 'desc')
    .execute()
}

/** An edition's files without their bytes, by name: those for everyone, and for the qualified where that is asked. */
export function listFiles(db: Db, editionNumber: number, forQualified: boolean) {
  return db
    .selectFrom('edition_file')
    .select(['name', 'audience', 'hash', sql<number>`octet_length(bytes)`.as('bytes')])
    .where('edition_number', '=', editionNumber)
    .where('audience', 'in', forQualified ? ['everyone', 'qualified'] : ['everyone'])
    .orderBy('name')
    .execute()
}

/** One file by its hash. Undefined when no edition has it. */
export function findFile(db: Db, hash: string) {
  return db
    .selectFrom('edition_file')
    .select(['name', 'audience', 'bytes'])
    .where('hash', '=', hash)
    .orderBy(sql`audience = 'everyone'`, 'desc')
    .limit(1)
    .executeTakeFirst()
}

/** A file of an edition as JSON. Throws where the edition lacks it: every edition has all its files. */
export async function openFile(db: Db | Tx, editionNumber: number, name: FileName): Promise<unknown> {
  const { bytes } = await db
    .selectFrom('edition_file')
    .select('bytes')
    .where('edition_number', '=', editionNumber)
    .where('name', '=', name)
    .executeTakeFirstOrThrow()
  return JSON.parse(bytes.toString('utf8')) as unknown
}

/** Every file of an edition, with its bytes. */
export async function readFiles(db: Db | Tx, editionNumber: number): Promise<EditionFile[]> {
  const rows = await db
    .selectFrom('edition_file')
    .select(['name', 'audience', 'hash', 'bytes'])
    .where('edition_number', '=', editionNumber)
    .execute()
  return rows.map((row) => ({ ...row, name: FileName.parse(row.name) }))
}

/** Waits until nobody else is putting an edition in force; holds until the transaction ends. */
export async function lockEditions(tx: Tx): Promise<void> {
  await sql`select pg_advisory_xact_lock(hashtext('tracelamp editions'))`.execute(tx)
}

/** The number of the edition with this hash. Undefined when it isn't kept yet. */
export async function numberOf(tx: Tx, hash: string): Promise<number | undefined> {
  const row = await tx.selectFrom('edition').select('number').where('hash', '=', hash).executeTakeFirst()
  return row?.number
}

/** Keeps an edition under the next number. */
export async function keepEdition(tx: Tx, edition: EditionBytes, note: string): Promise<number> {
  const { number } = await tx
    .insertInto('edition')
    .values((eb) => ({
      number: eb.selectFrom('edition').select(sql<number>`coalesce(max(number), 0) + 1`.as('next')),
      hash: edition.hash,
      note,
    }))
    .returning('number')
    .executeTakeFirstOrThrow()
  await tx
    .insertInto('edition_file')
    .values(edition.files.map((file) => ({ edition_number: number, ...file })))
    .execute()
  return number
}

/** Records that an edition is in force from now on, and tells every server process once the transaction ends. */
export async function recordInForce(tx: Tx, editionNumber: number, reason: string): Promise<void> {
  await tx.insertInto('edition_in_force').values({ edition_number: editionNumber, reason }).execute()
  await sql`select pg_notify('edition_in_force', ${String(editionNumber)})`.execute(tx)
}

/** What is in force while a transaction changes the articles. */
export type ArticlesInForce = { number: number; articles: readonly Article[]; diagnosis: DiagnosisFile }
/** Articles to put in force instead, what the edition is called, and why. */
export type ArticlesChange = { articles: readonly Article[]; note: string; reason: string }
/** Puts other articles in force within a transaction; handed to the articles by whoever builds the application. */
export type ChangeArticles = (
  tx: Tx,
  change: (inForce: ArticlesInForce) => ArticlesChange,
) => Promise<{ number: number }>

/** The articles of both audiences. */
export async function openShelf(db: Db | Tx, editionNumber: number): Promise<Article[]> {
  const files = await Promise.all([
    openFile(db, editionNumber, 'articles-everyone'),
    openFile(db, editionNumber, 'articles-qualified'),
  ])
  return files.flatMap((file) => ArticlesFile.parse(file).articles)
}

/** Whether there is an edition of this number. */
export async function editionExists(db: Db, number: number): Promise<boolean> {
  if (number < 1 || number > 2_147_483_647) return false
  return (
    (await db.selectFrom('edition').select('number').where('number', '=', number).executeTakeFirst()) !==
    undefined
  )
}
