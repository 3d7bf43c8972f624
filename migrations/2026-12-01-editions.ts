import { sql } from 'kysely'
import type { Kysely } from 'kysely'

/** Editions as files of bytes, and the record of which was in force when. Nothing here is ever changed or deleted. */
export async function up(db: Kysely<unknown>): Promise<void> {
  await db.schema
    .createTable('edition')
    .addColumn('number', 'integer', (c) => c.primaryKey().check(sql`number > 0`))
    .addColumn('hash', 'text', (c) =>
      c
        .notNull()
        .unique()
        .check(sql`hash ~ '^[0-9a-f]{64}$'`),
    )
    .addColumn('note', 'text', (c) => c.notNull().check(sql`note <> ''`))
    .addColumn('made_at', 'timestamptz', (c) => c.notNull().defaultTo(sql`now()`))
    .execute()

  await db.schema
    .createTable('edition_file')
    .addColumn('edition_number', 'integer', (c) => c.notNull().references('edition.number'))
    .addColumn('name', 'text', (c) => c.notNull().check(sql`name ~ '^[a-z]+(-[a-z]+)*$'`))
    .addColumn('audience', 'text', (c) => c.notNull().check(sql`audience in ('everyone', 'qualified')`))
    .addColumn('hash', 'text', (c) => c.notNull())
    .addColumn('bytes', 'bytea', (c) => c.notNull())
    .addPrimaryKeyConstraint('edition_file_pkey', ['edition_number', 'name'])
    .addCheckConstraint('edition_file_hash_is_of_its_bytes', sql`hash = encode(sha256(bytes), 'hex')`)
    .execute()
  await db.schema.createIndex('edition_file_hash').on('edition_file').column('hash').execute()

  await db.schema
    .createTable('edition_in_force')
    .addColumn('id', 'integer', (c) => c.primaryKey().generatedAlwaysAsIdentity())
    .addColumn('edition_number', 'integer', (c) => c.notNull().references('edition.number'))
    .addColumn('since', 'timestamptz', (c) => c.notNull().defaultTo(sql`clock_timestamp()`))
    .addColumn('reason', 'text', (c) => c.notNull().check(sql`reason <> ''`))
    .execute()

  await sql`
    create function refuse_change() returns trigger language plpgsql as $$
    begin
      raise exception '% is never changed or deleted', tg_table_name using errcode = 'restrict_violation';
    end $$
  `.execute(db)
  for (const table of ['edition', 'edition_file', 'edition_in_force'])
    await sql`
      create trigger ${sql.ref(`${table}_stays`)} before update or delete or truncate on ${sql.table(table)}
      for each statement execute function refuse_change()
    `.execute(db)

  // Looked at when a transaction ends: an edition's hash is that of its manifest, so no file can be missing,
  // and none can be added later.
  await sql`
    create function edition_is_whole() returns trigger language plpgsql as $$
    declare
      about integer := coalesce(to_jsonb(new)->>'number', to_jsonb(new)->>'edition_number')::integer;
      claimed text := (select hash from edition where number = about);
      found text := (
        select encode(sha256(convert_to(string_agg(line, e'\\n' order by line collate "C"), 'UTF8')), 'hex')
        from (select audience || ' ' || name || ' ' || hash as line
              from edition_file where edition_number = about) as manifest
      );
    begin
      if found is distinct from claimed then
        raise exception 'the files of edition % are not those of its hash', about using errcode = 'check_violation';
      end if;
      return null;
    end $$
  `.execute(db)
  await sql`
    create constraint trigger edition_is_whole after insert on edition
    deferrable initially deferred for each row execute function edition_is_whole()
  `.execute(db)
  await sql`
    create constraint trigger edition_file_is_listed after insert on edition_file
    deferrable initially deferred for each row execute function edition_is_whole()
  `.execute(db)
}
