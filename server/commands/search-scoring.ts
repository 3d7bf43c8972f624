/** How well a search answers written queries, each with the articles that ought to come. */
import { readFile } from 'node:fs/promises'
import * as z from 'zod'
import type { Article } from '../../rules/edition/schema.ts'
import { buildIndex, search } from '../../rules/search/search.ts'

/** A query as somebody would type it, and the articles of which one ought to be among the first three. */
const JudgedQuery = z.strictObject({ query: z.string().min(1), want: z.array(z.string()).min(1).max(4) })
export type JudgedQuery = z.infer<typeof JudgedQuery>

/** A query's articles by their slugs, the best first. */
export type Ranker = (query: string) => Promise<readonly string[]> | readonly string[]

/** What a search reached; `missed` are the queries whose first three hold nothing that was wanted. */
export type SearchScore = { hitRate: number; reciprocalRank: number; missed: readonly string[] }

const queriesFile = new URL('../../tests/cases/queries.jsonl', import.meta.url)

/** The judged queries. Throws where a line is none. */
export async function readJudgedQueries(): Promise<JudgedQuery[]> {
  const lines = (await readFile(queriesFile, 'utf8')).split('\n').filter((line) => line.trim() !== '')
  return lines.map((line) => JudgedQuery.parse(JSON.parse(line)))
}

/** Our search over articles alone, so that it stands beside one that knows nothing else. */
export function articleRanker(articles: readonly Article[]): Ranker {
  const index = buildIndex(articles, [], [])
  return (query) => search(index, query, articles.length).hits.map((hit) => hit.id)
}

/**
 * Share of the queries with a wanted article among the first three, and the mean of one over the place of the first
 * wanted one: nothing where it doesn't come at all.
 */
export async function scoreSearch(queries: readonly JudgedQuery[], ranker: Ranker): Promise<SearchScore> {
  let reciprocal = 0
  const missed: string[] = []
  for (const { query, want } of queries) {
    const place = (await ranker(query)).findIndex((slug) => want.includes(slug))
    if (place >= 0) reciprocal += 1 / (place + 1)
    if (place < 0 || place > 2) missed.push(query)
  }
  return {
    hitRate: 1 - missed.length / queries.length,
    reciprocalRank: reciprocal / queries.length,
    missed,
  }
}
