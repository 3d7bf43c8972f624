import { sql } from 'kysely'
import type { Kysely } from 'kysely'

/** People, their sessions, the one-time links that let them set a password, and the tries that throttling counts. */
export async function up(db: Kysely<unknown>): Promise<void> {
  await db.schema
    .createTable('person')
    .addColumn('id', 'uuid', (c) => c.primaryKey().defaultTo(sql`gen_random_uuid()`))
    .addColumn('email', 'text', (c) =>
      c.notNull().check(sql`email ~ '^[^[:space:]@]+@[^[:space:]@]+$' and length(email) <= 254`),
    )
    .addColumn('name', 'text', (c) =>
      c.notNull().check(sql`name = btrim(name) and length(name) between 1 and 100`),
    )
    .addColumn('role', 'text', (c) => c.notNull().check(sql`role in ('helper', 'tech', 'senior', 'admin')`))
    // Null until a one-time link was used.
    .addColumn('password_hash', 'text', (c) => c.check(sql`password_hash like '$2_$__$%'`))
    // A session carries the number it was begun with; another number ends every session at once.
    .addColumn('session_epoch', 'integer', (c) => c.notNull().defaultTo(1))
    .addColumn('demo', 'boolean', (c) => c.notNull().defaultTo(false))
    .addColumn('made_at', 'timestamptz', (c) => c.notNull().defaultTo(sql`now()`))
    // Null for who signed up alone, and for the first admin.
    .addColumn('made_by', 'uuid', (c) => c.references('person.id'))
    .addColumn('left_at', 'timestamptz')
    .execute()
  await db.schema
    .createIndex('person_email')
    .unique()
    .on('person')
    .expression(sql`lower(email)`)
    .execute()

  // Columns as connect-pg-simple asks for them.
  await db.schema
    .createTable('session')
    .addColumn('sid', 'varchar', (c) => c.primaryKey())
    .addColumn('sess', 'json', (c) => c.notNull())
    .addColumn('expire', 'timestamptz', (c) => c.notNull())
    .execute()
  await db.schema.createIndex('session_expire').on('session').column('expire').execute()
  await db.schema
    .createIndex('session_person')
    .on('session')
    .expression(sql`(sess ->> 'person')`)
    .execute()

  await db.schema
    .createTable('one_time_link')
    .addColumn('token_hash', 'text', (c) => c.primaryKey().check(sql`token_hash ~ '^[0-9a-f]{64}$'`))
    .addColumn('kind', 'text', (c) => c.notNull().check(sql`kind in ('set-password')`))
    .addColumn('person_id', 'uuid', (c) => c.notNull().references('person.id'))
    .addColumn('made_at', 'timestamptz', (c) => c.notNull().defaultTo(sql`now()`))
    // Null where it came from the command line.
    .addColumn('made_by', 'uuid', (c) => c.references('person.id'))
    .addColumn('expires_at', 'timestamptz', (c) => c.notNull())
    .addColumn('used_at', 'timestamptz')
    .execute()
  await db.schema.createIndex('one_time_link_person').on('one_time_link').column('person_id').execute()

  // Columns as rate-limiter-flexible asks for them. Keys are hashes: neither e-mails nor addresses lie here.
  await db.schema
    .createTable('sign_in_try')
    .addColumn('key', 'varchar(255)', (c) => c.primaryKey())
    .addColumn('points', 'integer', (c) => c.notNull().defaultTo(0))
    .addColumn('expire', 'bigint')
    .execute()
  await db.schema.createIndex('sign_in_try_expire').on('sign_in_try').column('expire').execute()
}
