import { withFullText } from '../articles/full-text.queries.ts'
import { isDatabaseDown, openDatabase } from '../database.ts'
import { readStarter } from '../editions/read-starter.ts'
import { openLog } from '../log.ts'
import { runningDatabase } from '../setup/running-database.mjs'
import { articleRanker, readJudgedQueries, scoreSearch } from './search-scoring.ts'
import type { SearchScore } from './search-scoring.ts'

const row = (what: string, score: SearchScore) =>
  console.log(
    `${what.padEnd(58)}${score.hitRate.toFixed(3).padStart(12)}   ${score.reciprocalRank.toFixed(3)}`,
  )

/**
 * Search judged on written queries, and PostgreSQL's full text on the same ones where a database is there already:
 * none is started for it.
 */
export async function measureSearch(): Promise<void> {
  const { articles: shelves } = await readStarter()
  const articles = [...shelves.everyone.articles, ...shelves.qualified.articles]
  const queries = await readJudgedQueries()
  console.log(`\n${queries.length} judged queries over ${articles.length} articles\n`)
  console.log(`${'search'.padEnd(58)}${'in first 3'.padStart(12)}   mean reciprocal rank`)
  row('ours', await scoreSearch(queries, articleRanker(articles)))

  const url = runningDatabase()
  if (url === undefined) {
    console.log('PostgreSQL’s full text: to compare, set DATABASE_URL or leave `npm start` running.')
    return
  }
  const db = openDatabase(url, openLog('silent'))
  try {
    await withFullText(db, articles, async (find) => {
      row('PostgreSQL’s full text, all words', await scoreSearch(queries, (query) => find(query, 'all')))
      row('PostgreSQL’s full text, any word', await scoreSearch(queries, (query) => find(query, 'any')))
    })
  } catch (error) {
    if (!isDatabaseDown(error)) throw error
    console.log('PostgreSQL’s full text: not compared, since the database can’t be reached.')
  } finally {
    await db.destroy()
  }
}
