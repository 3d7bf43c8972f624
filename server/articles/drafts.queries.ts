import { sql } from 'kysely'
import type { Db, Tx } from '../database.ts'
import { DraftText } from './drafts.contract.ts'

/** Waits until nobody else changes this article; holds until the transaction ends. */
export async function lockArticle(tx: Tx, slug: string): Promise<void> {
  await sql`select pg_advisory_xact_lock(hashtext('tracelamp article'), hashtext(${slug}))`.execute(tx)
}

const textOf = <Row extends { head: unknown; body: string }>({ head, body, ...row }: Row) => ({
  ...row,
  text: DraftText.parse({ head, body }),
})

/** The draft of an article, with who wrote it. Undefined when nobody has changed that article here. */
export async function findDraft(db: Db | Tx, slug: string) {
  const row = await db
    .selectFrom('article_draft as d')
    .innerJoin('person as p', 'p.id', 'd.edited_by')
    .select([
      'd.version',
      'd.pending',
      'd.head',
      'd.body',
      'd.base',
      'd.edited_by as editorId',
      'p.name as editor',
      'd.edited_at as editedAt',
      'd.sitting_since as sittingSince',
    ])
    .where('d.slug', '=', slug)
    .executeTakeFirst()
  return row && textOf(row)
}
export type DraftRow = NonNullable<Awaited<ReturnType<typeof findDraft>>>

/** Every draft with what its head says. */
export async function listDrafts(db: Db) {
  const rows = await db
    .selectFrom('article_draft as d')
    .innerJoin('person as p', 'p.id', 'd.edited_by')
    .select(['d.slug', 'd.pending', 'd.head', 'p.name as editor', 'd.edited_at as editedAt'])
    .orderBy('d.slug')
    .execute()
  return rows.map(({ head, ...row }) => ({ ...row, head: DraftText.shape.head.parse(head) }))
}

type DraftColumns = {
  slug: string
  pending: boolean
  text: DraftText
  base: string | null
  personId: string
  sittingSince: Date
}

/** Keeps a draft, with the next version's number. */
export async function keepDraft(tx: Tx, draft: DraftColumns): Promise<void> {
  const { slug, pending, text, base, personId, sittingSince } = draft
  const columns = {
    pending,
    head: JSON.stringify(text.head),
    body: text.body,
    base,
    edited_by: personId,
    edited_at: sql<Date>`now()` as never,
    sitting_since: sittingSince,
  }
  await tx
    .insertInto('article_draft')
    .values({ slug, version: 1, ...columns } as never)
    .onConflict((conflict) =>
      conflict
        .column('slug')
        .doUpdateSet((eb) => ({ ...columns, version: eb('article_draft.version', '+', 1) }) as never),
    )
    .execute()
}

type RevisionColumns = {
  slug: string
  text: DraftText
  author: string | null
  at?: Date
  reason: string
  edition: number | null
}

/** Keeps what an article said. Call it with the article locked: revisions are numbered. */
export async function keepRevision(tx: Tx, revision: RevisionColumns): Promise<void> {
  const { slug, text, author, at, reason, edition } = revision
  await tx
    .insertInto('article_revision')
    .values((eb) => ({
      slug,
      number: eb
        .selectFrom('article_revision')
        .where('slug', '=', slug)
        .select(sql<number>`coalesce(max(number), 0) + 1`.as('next')),
      head: JSON.stringify(text.head),
      body: text.body,
      author,
      at,
      reason,
      edition_number: edition,
    }))
    .execute()
}

/** Every revision of an article without its text, the newest first. */
export function listRevisions(db: Db, slug: string) {
  return db
    .selectFrom('article_revision as r')
    .leftJoin('person as p', 'p.id', 'r.author')
    .select(['r.number', 'p.name as author', 'r.at', 'r.reason', 'r.edition_number as edition'])
    .where('r.slug', '=', slug)
    .orderBy('r.number', 'desc')
    .execute()
}

/** One revision with its text. */
export async function findRevision(db: Db | Tx, slug: string, number: number) {
  const row = await db
    .selectFrom('article_revision')
    .select(['number', 'head', 'body'])
    .where('slug', '=', slug)
    .where('number', '=', number)
    .executeTakeFirst()
  return row && textOf(row)
}

/** The text that came into force last, as a revision. Undefined for one that came with the program. */
export async function lastInForce(tx: Tx, slug: string) {
  const row = await tx
    .selectFrom('article_revision')
    .select(['head', 'body'])
    .where('slug', '=', slug)
    .where('edition_number', 'is not', null)
    .orderBy('number', 'desc')
    .limit(1)
    .executeTakeFirst()
  return row && textOf(row)
}
