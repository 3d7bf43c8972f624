import { beforeAll, describe, expect, test } from 'vitest'
import { articleRanker, readJudgedQueries, scoreSearch } from '../../server/commands/search-scoring.ts'
import type { JudgedQuery, SearchScore } from '../../server/commands/search-scoring.ts'
import { readStarter } from '../../server/editions/read-starter.ts'

const starter = await readStarter()
const articles = [...starter.articles.everyone.articles, ...starter.articles.qualified.articles]
const queries = await readJudgedQueries()

describe('the judged queries', () => {
  test('are sixty different ones', () => {
    expect(queries).toHaveLength(60)
    expect(new Set(queries.map(({ query }) => query.toLowerCase())).size).toBe(60)
  })
  test('want articles that are there', () => {
    const slugs = articles.map((article) => article.slug)
    for (const { query, want } of queries)
      for (const slug of want) expect(slugs, `${query}: ${slug}`).toContain(slug)
  })
  test('hardly ever stand in an article word by word: that would answer them by heart', () => {
    const said = new Set(
      articles.flatMap(({ title, words }) => [title, ...words]).map((s) => s.toLowerCase()),
    )
    // Three came out alike by chance: the queries were written without sight of the articles’ words.
    const alike = queries.map(({ query }) => query).filter((query) => said.has(query.toLowerCase()))
    expect(alike.length, alike.join('\n')).toBeLessThanOrEqual(3)
  })
})

describe('our search on them', () => {
  let score: SearchScore
  beforeAll(async () => {
    score = await scoreSearch(queries, articleRanker(articles))
  })
  test('has a wanted article among the first three nine times in ten', () =>
    expect(score.hitRate, score.missed.join('\n')).toBeGreaterThanOrEqual(0.9))
  test('has it near the top: mean reciprocal rank of 0.75 or more', () =>
    expect(score.reciprocalRank).toBeGreaterThanOrEqual(0.75))
})

describe('the score', () => {
  const two: JudgedQuery[] = [
    { query: 'one', want: ['b', 'c'] },
    { query: 'other', want: ['z'] },
  ]
  test.each([
    ['first', ['b', 'a'], 0.5, 0.5],
    ['second, by the first of those wanted', ['a', 'c', 'b'], 0.5, 0.25],
    ['fourth: in the rank, not in the rate', ['a', 'x', 'y', 'b'], 0, 0.125],
    ['nowhere', ['a'], 0, 0],
    ['in an empty answer', [], 0, 0],
  ])('counts a wanted article that comes %s', async (_where, answer, hitRate, reciprocalRank) => {
    const score = await scoreSearch(two, (query) => (query === 'one' ? answer : []))
    expect(score).toMatchObject({ hitRate, reciprocalRank })
    expect(score.missed).toContain('other')
  })
})
