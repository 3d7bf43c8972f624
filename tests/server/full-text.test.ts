import { afterAll, beforeAll, expect, test } from 'vitest'
import { withFullText } from '../../server/articles/full-text.queries.ts'
import type { Joined } from '../../server/articles/full-text.queries.ts'
import { articleRanker, readJudgedQueries, scoreSearch } from '../../server/commands/search-scoring.ts'
import { readStarter } from '../../server/editions/read-starter.ts'
import { testDatabase } from './database.ts'
import type { TestDatabase } from './database.ts'

const starter = await readStarter()
const articles = [...starter.articles.everyone.articles, ...starter.articles.qualified.articles]
const queries = await readJudgedQueries()

let database: TestDatabase
beforeAll(async () => {
  database = await testDatabase('empty')
})
afterAll(() => database.close())

test('full text finds an article by its title, however the words are joined', async () => {
  const [first] = articles
  await withFullText(database.db, articles, async (find) => {
    for (const joined of ['all', 'any'] as const)
      expect((await find(first!.title, joined))[0]).toBe(first!.slug)
    expect(await find('grommet', 'any')).toEqual([])
    // One word that no article has: all can't be there, any still can.
    expect(await find('grommet neutral', 'all')).toEqual([])
    expect(await find('grommet neutral', 'any')).not.toEqual([])
  })
})

test('it leaves no table behind', async () => {
  const run = () => withFullText(database.db, articles.slice(0, 2), (find) => find('neutral', 'any'))
  expect(await run()).toEqual(await run())
})

test.each<Joined>(['all', 'any'])(
  'our search is ahead of it with %s words on the judged queries',
  async (joined) => {
    const ours = await scoreSearch(queries, articleRanker(articles))
    const theirs = await withFullText(database.db, articles, (find) =>
      scoreSearch(queries, (query) => find(query, joined)),
    )
    // It does find things: a comparison with nothing would prove nothing.
    expect(theirs.hitRate).toBeGreaterThan(joined === 'all' ? 0.1 : 0.5)
    expect(ours.hitRate).toBeGreaterThan(theirs.hitRate)
    expect(ours.reciprocalRank).toBeGreaterThan(theirs.reciprocalRank)
  },
)
