import { Router } from 'express'
import type { Db } from '../database.ts'
import { editionExists, openShelf } from '../editions/editions.queries.ts'
import { notFound } from '../problem.ts'
import { readBody } from '../read.ts'
import { allow, mayReadQualified, personOf } from '../session.ts'
import { Feedback, HelpedKept, SayHelped } from './feedback.contract.ts'
import { countFeedback, keepFeedback, listWhys } from './feedback.queries.ts'

/**
 * Readers say whether an article helped, signed in or not.
 * @param throttle refuses an address that says too much
 */
export function feedbackRoutes(db: Db, throttle: (address: string | undefined) => Promise<void>): Router {
  return Router()
    .post('/articles/:slug/feedback', async (req, res) => {
      const { slug } = req.params
      const said = readBody(req, SayHelped)
      await throttle(req.ip)
      const shelf = (await editionExists(db, said.edition)) ? await openShelf(db, said.edition) : []
      const article = shelf.find((one) => one.slug === slug)
      // What the asker can't have read is not even said to be there.
      if (article === undefined || (article.audience === 'qualified' && !mayReadQualified(req)))
        throw notFound('article')
      await keepFeedback(db, { ...said, slug, personId: personOf(req)?.id ?? null })
      res
        .status(201)
        .set('Cache-Control', 'no-store')
        .json(HelpedKept.parse({ kept: true }))
    })
    .get('/article-drafts/:slug/feedback', allow('senior'), async (req, res) => {
      const slug = String(req.params['slug'])
      const [counts, whys] = await Promise.all([countFeedback(db, slug), listWhys(db, slug)])
      const said = whys.map((row) => ({ ...row, at: row.at.toISOString() }))
      res.set('Cache-Control', 'no-store').json(Feedback.parse({ ...counts, said }))
    })
}
