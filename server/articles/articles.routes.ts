import { Router } from 'express'
import { search } from '../../rules/search/search.ts'
import type { Db } from '../database.ts'
import { Problem } from '../problem.ts'
import { readQuery } from '../read.ts'
import { mayReadQualified } from '../session.ts'
import { ArticleQuery, ArticlesFound } from './articles.contract.ts'
import { indexInForce } from './search-in-force.ts'

/** The same search as in the browser, for devices that have no edition yet. */
export function articleRoutes(db: Db): Router {
  const inForce = indexInForce(db)
  return Router().get('/articles', async (req, res) => {
    const { q } = readQuery(req, ArticleQuery)
    const opened = await inForce(mayReadQualified(req))
    if (opened === undefined) throw new Problem('unavailable', 'No edition is in force yet.')
    const { edition, index } = opened
    res.json(ArticlesFound.parse({ edition, ...search(index, q) }))
  })
}
