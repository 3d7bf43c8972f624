import { sql } from 'kysely'
import type { Db } from '../database.ts'

type FeedbackColumns = {
  slug: string
  edition: number
  helped: boolean
  why: string
  personId: string | null
}

/** Keeps what a reader said. */
export async function keepFeedback(
  db: Db,
  { slug, edition, helped, why, personId }: FeedbackColumns,
): Promise<void> {
  await db
    .insertInto('article_feedback')
    .values({ slug, edition_number: edition, helped, why, person_id: personId })
    .execute()
}

/** How many an article helped, and how many not. */
export function countFeedback(db: Db, slug: string) {
  return db
    .selectFrom('article_feedback')
    .select([
      sql<number>`(count(*) filter (where helped))::int`.as('helped'),
      sql<number>`(count(*) filter (where not helped))::int`.as('not'),
    ])
    .where('slug', '=', slug)
    .executeTakeFirstOrThrow()
}

/** Why it did not help, the newest first. */
export function listWhys(db: Db, slug: string) {
  return db
    .selectFrom('article_feedback as f')
    .leftJoin('person as p', 'p.id', 'f.person_id')
    .select(['f.edition_number as edition', 'f.why', 'f.at', 'p.name as by'])
    .where('f.slug', '=', slug)
    .where('f.why', '<>', '')
    .orderBy('f.id', 'desc')
    .limit(50)
    .execute()
}
