import { sql } from 'kysely'
import type { Kysely } from 'kysely'

/**
 * Findings sheets. A sheet's id, and each entry's, is made on the device that wrote it, so that what is sent twice is
 * there once. Entries are added and never changed: of two readings that contradict each other both stay.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
  await db.schema
    .createTable('sheet')
    .addColumn('id', 'uuid', (c) => c.primaryKey())
    // Null: begun by somebody without an account, whose device holds the key.
    .addColumn('owner_id', 'uuid', (c) => c.references('person.id'))
    .addColumn('key_hash', 'text', (c) => c.check(sql`key_hash ~ '^[0-9a-f]{64}$'`))
    .addColumn('kind', 'text', (c) => c.notNull().check(sql`kind in ('triage', 'diagnosis')`))
    .addColumn('title', 'text', (c) => c.notNull().check(sql`length(title) between 1 and 200`))
    .addColumn('context', 'jsonb', (c) => c.notNull().check(sql`jsonb_typeof(context) = 'object'`))
    .addColumn('edition_hash', 'text', (c) => c.notNull().references('edition.hash'))
    // By the device's clock.
    .addColumn('made_at', 'timestamptz', (c) => c.notNull())
    .addColumn('changed_at', 'timestamptz', (c) => c.notNull())
    .addColumn('server_at', 'timestamptz', (c) => c.notNull().defaultTo(sql`now()`))
    .addCheckConstraint('sheet_is_somebodys', sql`owner_id is not null or key_hash is not null`)
    .execute()
  await db.schema
    .createIndex('sheet_owner')
    .on('sheet')
    .columns(['owner_id', 'changed_at desc', 'id desc'])
    .execute()

  await db.schema
    .createTable('sheet_entry')
    .addColumn('id', 'uuid', (c) => c.primaryKey())
    .addColumn('seq', 'bigint', (c) => c.notNull().unique().generatedAlwaysAsIdentity())
    .addColumn('sheet_id', 'uuid', (c) => c.notNull().references('sheet.id'))
    .addColumn('mode', 'text', (c) => c.notNull().check(sql`mode <> ''`))
    .addColumn('finding', 'text', (c) => c.notNull().check(sql`finding <> ''`))
    // Null: nothing that counts as taken stands there any more.
    .addColumn('value', 'jsonb')
    // The same as the page keeps it, with notes; it is for that page alone.
    .addColumn('kept', 'jsonb')
    // The entries this one takes the place of, as its writer knew them.
    .addColumn('after', sql`uuid[]`, (c) => c.notNull())
    .addColumn('by_person', 'uuid', (c) => c.references('person.id'))
    // As it was then; null for somebody without an account.
    .addColumn('by_name', 'text')
    .addColumn('device_at', 'timestamptz', (c) => c.notNull())
    .addColumn('server_at', 'timestamptz', (c) => c.notNull().defaultTo(sql`now()`))
    .execute()
  await db.schema.createIndex('sheet_entry_sheet').on('sheet_entry').columns(['sheet_id', 'seq']).execute()
  await sql`
    create trigger sheet_entry_stays before update or delete or truncate on sheet_entry
    for each statement execute function refuse_change()
  `.execute(db)

  await db.schema
    .createTable('sheet_result')
    .addColumn('sheet_id', 'uuid', (c) => c.primaryKey().references('sheet.id'))
    .addColumn('edition_hash', 'text', (c) => c.notNull().references('edition.hash'))
    .addColumn('result', 'jsonb', (c) => c.notNull())
    .addColumn('made_at', 'timestamptz', (c) => c.notNull().defaultTo(sql`now()`))
    .execute()

  await db.schema
    .createTable('sheet_link')
    .addColumn('token_hash', 'text', (c) => c.primaryKey().check(sql`token_hash ~ '^[0-9a-f]{64}$'`))
    .addColumn('sheet_id', 'uuid', (c) => c.notNull().references('sheet.id'))
    .addColumn('made_at', 'timestamptz', (c) => c.notNull().defaultTo(sql`now()`))
    .addColumn('taken_back_at', 'timestamptz')
    .execute()
  // One link at a time.
  await db.schema
    .createIndex('sheet_link_holds')
    .unique()
    .on('sheet_link')
    .column('sheet_id')
    .where(sql.ref('taken_back_at'), 'is', null)
    .execute()
}
