import { fileURLToPath } from 'node:url'
import express from 'express'
import type { Express } from 'express'
import { sql } from 'kysely'
import { articleRoutes } from './articles/articles.routes.ts'
import { draftRoutes } from './articles/drafts.routes.ts'
import { feedbackRoutes } from './articles/feedback.routes.ts'
import type { Config } from './config.ts'
import type { Db } from './database.ts'
import { changeArticles } from './editions/change-articles.ts'
import { editionEvents } from './editions/edition-events.ts'
import type { EditionFeed } from './editions/edition-feed.ts'
import { editionRoutes } from './editions/editions.routes.ts'
import type { Log } from './log.ts'
import { accountRoutes } from './people/account.routes.ts'
import { peopleRoutes } from './people/people.routes.ts'
import { openThrottle } from './people/throttle.ts'
import { noSuchRoute, problems } from './problem.ts'
import { requestLog } from './request-log.ts'
import { onlyJson, sameOrigin } from './same-origin.ts'
import { security } from './security.ts'
import { allow, sessions } from './session.ts'
import { sheetEvents } from './sheets/sheet-events.ts'
import type { SheetFeed } from './sheets/sheet-feed.ts'
import { sheetRoutes } from './sheets/sheets.routes.ts'
import { site } from './site.ts'
import { workerOff } from './worker-off.ts'

export type AppParts = {
  db: Db
  feed: EditionFeed
  sheetFeed: SheetFeed
  log: Log
  config: Pick<Config, 'trustProxy' | 'worker' | 'sessionSecret'>
  /** Where the built pages lie; the checkout's `dist` unless said. */
  pages?: string
}

const dist = fileURLToPath(new URL('../dist', import.meta.url))

/**
 * The application as a function of its parts: tests build it too. `close` ends the open event streams, which would
 * otherwise keep the server from stopping.
 */
export function createApp({ db, feed, sheetFeed, log, config, pages = dist }: AppParts): {
  app: Express
  close: () => void
} {
  const events = editionEvents(feed)
  const sheetStreams = sheetEvents(sheetFeed)
  const session = sessions({ db, log, secret: config.sessionSecret })
  const throttle = openThrottle(db, config.sessionSecret)
  const app = express()
  app.disable('x-powered-by')
  app.set('trust proxy', config.trustProxy)
  // Bodies here are small and change; only files have tags, and those are their hashes.
  app.set('etag', false)
  app.set('query parser', 'simple')
  app.use(requestLog(log), security())
  app.get('/api/health', async (_req, res) => {
    await sql`select 1`.execute(db)
    res.set('Cache-Control', 'no-store').json({ status: 'up' })
  })
  app.use('/api', sameOrigin, onlyJson, session.handlers)
  // An article may be long, and only who may write one may send it.
  app.use('/api/article-drafts', allow('senior'), express.json({ limit: '600kb' }))
  app.use('/api', express.json({ limit: '64kb' }))
  app.use(
    '/api',
    editionRoutes(db, events.route),
    articleRoutes(db),
    draftRoutes(db, changeArticles),
    feedbackRoutes(db, throttle.feedback),
    accountRoutes(db, throttle),
    peopleRoutes(db),
    sheetRoutes({ db, events: sheetStreams, count: { sheet: throttle.sheet, link: throttle.sheetLink } }),
    noSuchRoute,
  )
  if (!config.worker) app.use(workerOff)
  app.use(site(pages))
  app.use(problems(log))
  const close = () => {
    events.close()
    sheetStreams.close()
    session.close()
  }
  return { app, close }
}
