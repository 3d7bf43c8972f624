import type { Request, RequestHandler } from 'express'
import { Problem } from './problem.ts'

const readsOnly = new Set(['GET', 'HEAD', 'OPTIONS'])

/** Whether our own page sent this. Browsers say so themselves; where they don't, their `Origin` is compared. */
function isOurs(req: Request): boolean {
  const site = req.get('sec-fetch-site')
  if (site !== undefined) return site === 'same-origin'
  const origin = req.get('origin')
  return origin !== undefined && URL.canParse(origin) && new URL(origin).host === req.host.toLowerCase()
}

/** Another site's page can't change anything here with the cookie of whoever looks at it. */
export const sameOrigin: RequestHandler = (req, _res, next) => {
  if (readsOnly.has(req.method) || isOurs(req)) return next()
  throw new Problem('forbidden', 'Only this server’s own pages may ask for that.')
}

/** A form of another site can't send JSON without the browser asking us first. */
export const onlyJson: RequestHandler = (req, _res, next) => {
  if (readsOnly.has(req.method) || req.is('application/json') === 'application/json') return next()
  throw new Problem('not-json')
}
