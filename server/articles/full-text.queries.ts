import { sql } from 'kysely'
import type { Article } from '../../rules/edition/schema.ts'
import { plainText } from '../../rules/search/plain-text.ts'
import type { Db } from '../database.ts'

/** How a query's words are joined: all must be there, as PostgreSQL does by itself, or any. */
export type Joined = 'all' | 'any'

const asked = (query: string, joined: Joined) =>
  joined === 'all'
    ? sql`websearch_to_tsquery('english', ${query})`
    : sql`replace(plainto_tsquery('english', ${query})::text, ' & ', ' | ')::tsquery`

/**
 * PostgreSQL's own full text over the same articles, to hold our search against: title, words people search for and
 * body weighted A, B and C. It lasts as long as `work`, in a table of one transaction, and leaves nothing behind.
 * @param work is given what finds articles' slugs, the best first
 */
export function withFullText<T>(
  db: Db,
  articles: readonly Article[],
  work: (find: (query: string, joined: Joined) => Promise<string[]>) => Promise<T>,
): Promise<T> {
  return db.transaction().execute(async (tx) => {
    await sql`create temporary table compared_article (slug text, content tsvector) on commit drop`.execute(
      tx,
    )
    for (const { slug, title, words, body } of articles)
      await sql`insert into compared_article values (${slug},
        setweight(to_tsvector('english', ${title}), 'A') ||
        setweight(to_tsvector('english', ${words.join('; ')}), 'B') ||
        setweight(to_tsvector('english', ${plainText(body)}), 'C'))`.execute(tx)
    return work(async (query, joined) => {
      const { rows } = await sql<{ slug: string }>`
        select slug from compared_article, (select ${asked(query, joined)} as query) as asked
        where content @@ asked.query
        order by ts_rank_cd(content, asked.query) desc, slug`.execute(tx)
      return rows.map((row) => row.slug)
    })
  })
}
