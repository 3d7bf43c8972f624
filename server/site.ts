import { existsSync } from 'node:fs'
import { join } from 'node:path'
import compression from 'compression'
import express, { Router } from 'express'
import type { RequestHandler } from 'express'
import { Problem } from './problem.ts'

// By their endings, since the ids in page addresses hold dots too.
const isFile = /\/\.|\.(css|html|ico|js|json|map|mjs|png|jpg|svg|txt|webmanifest|webp|woff2?|xml)$/i

/** A file that is not there: asking for it again as a page would send HTML where a script was expected. */
const noSuchFile: RequestHandler = () => {
  throw new Problem('not-found')
}

/**
 * The built pages. Files under /assets carry their hash in their name and are kept for ever; every other address that
 * asks for a page gets index.html, which finds its own way.
 * @param folder where the build lies
 */
export function site(folder: string): Router {
  const page = join(folder, 'index.html')
  return Router()
    .use(compression())
    .use(
      '/assets',
      express.static(join(folder, 'assets'), { index: false, immutable: true, maxAge: '1y' }),
      noSuchFile,
    )
    .use(
      express.static(folder, {
        index: false,
        redirect: false,
        setHeaders: (res) => res.setHeader('Cache-Control', 'no-cache'),
      }),
    )
    .get('/{*path}', (req, res, next) => {
      if (req.accepts(['html', 'json']) !== 'html' || isFile.test(req.path)) return next()
      if (!existsSync(page)) throw new Problem('unavailable', 'The pages are not built yet.')
      res.set('Cache-Control', 'no-cache').sendFile(page)
    })
    .use(noSuchFile)
}
