import { sql } from 'kysely'
import type { Kysely } from 'kysely'

/** Articles as people write them: the draft of each, what it was before, and what readers said. */
export async function up(db: Kysely<unknown>): Promise<void> {
  await db.schema
    .createTable('article_draft')
    .addColumn('slug', 'text', (c) => c.primaryKey().check(sql`slug ~ '^[a-z0-9]+([.-][a-z0-9]+)*$'`))
    .addColumn('version', 'integer', (c) => c.notNull().check(sql`version > 0`))
    // False once it is in force: then the edition holds the text, and this row only counts versions on.
    .addColumn('pending', 'boolean', (c) => c.notNull())
    .addColumn('head', 'jsonb', (c) => c.notNull())
    .addColumn('body', 'text', (c) => c.notNull().check(sql`octet_length(body) <= 200000`))
    // Hash of the text in force that it was begun from; null for a new article.
    .addColumn('base', 'text')
    .addColumn('edited_by', 'uuid', (c) => c.notNull().references('person.id'))
    .addColumn('edited_at', 'timestamptz', (c) => c.notNull().defaultTo(sql`now()`))
    // Since when this person has been at it: what they save in one sitting is one revision.
    .addColumn('sitting_since', 'timestamptz', (c) => c.notNull().defaultTo(sql`now()`))
    .execute()

  await db.schema
    .createTable('article_revision')
    .addColumn('slug', 'text', (c) => c.notNull())
    .addColumn('number', 'integer', (c) => c.notNull().check(sql`number > 0`))
    .addColumn('head', 'jsonb', (c) => c.notNull())
    .addColumn('body', 'text', (c) => c.notNull())
    // Null for what came with the program.
    .addColumn('author', 'uuid', (c) => c.references('person.id'))
    .addColumn('at', 'timestamptz', (c) => c.notNull().defaultTo(sql`clock_timestamp()`))
    .addColumn('reason', 'text', (c) => c.notNull())
    // The edition it came into force with; null for a draft.
    .addColumn('edition_number', 'integer', (c) => c.references('edition.number'))
    .addPrimaryKeyConstraint('article_revision_pkey', ['slug', 'number'])
    .execute()
  await sql`
    create trigger article_revision_stays before update or delete or truncate on article_revision
    for each statement execute function refuse_change()
  `.execute(db)

  await db.schema
    .createTable('article_feedback')
    .addColumn('id', 'integer', (c) => c.primaryKey().generatedAlwaysAsIdentity())
    .addColumn('slug', 'text', (c) => c.notNull())
    .addColumn('edition_number', 'integer', (c) => c.notNull().references('edition.number'))
    .addColumn('helped', 'boolean', (c) => c.notNull())
    .addColumn('why', 'text', (c) => c.notNull().check(sql`length(why) <= 500`))
    .addColumn('at', 'timestamptz', (c) => c.notNull().defaultTo(sql`now()`))
    // Null for who isn't signed in.
    .addColumn('person_id', 'uuid', (c) => c.references('person.id'))
    .execute()
  await db.schema
    .createIndex('article_feedback_slug')
    .on('article_feedback')
    .columns(['slug', 'id'])
    .execute()
}
