import { Router } from 'express'
import type { Request, RequestHandler } from 'express'
import type { Db } from '../database.ts'
import { Problem, notFound } from '../problem.ts'
import { mayReadQualified, personOf } from '../session.ts'
import { compressedFiles } from './compressed-files.ts'
import { editionCounts } from './count-edition.ts'
import { EditionInForce, EditionList } from './editions.contract.ts'
import { editionInForce, editionOfHash, listEditions, listFiles } from './editions.queries.ts'
import type { EditionRow } from './editions.queries.ts'
import { stillOpen } from './still-open.ts'

const year = 31_536_000
// The smallest first: browsers name gzip before br without meaning it.
const preferred = ['br', 'gzip'] as const

/**
 * What is in force, what was, and the files. A file's address holds its hash, so that it may be kept for ever; the
 * hash is no right to read what is for qualified people.
 */
export function editionRoutes(db: Db, events: RequestHandler): Router {
  const fileOf = compressedFiles(db)
  const countsOf = editionCounts(db)
  /** An edition with the files that the asker may have. */
  const asked = async (req: Request, { since, ...edition }: EditionRow) => {
    const qualified = mayReadQualified(req)
    const [files, { [qualified ? 'qualified' : 'everyone']: counts }] = await Promise.all([
      listFiles(db, edition.number, qualified),
      countsOf(edition.number),
    ])
    return EditionInForce.parse({ ...edition, inForceSince: since.toISOString(), counts, files })
  }
  const isStillOpen = stillOpen(db)
  return Router()
    .get('/edition', async (req, res) => {
      res.json(await asked(req, (await editionInForce(db)) ?? noneYet()))
    })
    .get('/editions/:hash', async (req, res) => {
      const { hash } = req.params
      const edition = /^[0-9a-f]{64}$/.test(hash) ? await editionOfHash(db, hash) : undefined
      if (edition === undefined) throw notFound('edition')
      res.json(await asked(req, edition))
    })
    .get('/edition/events', events)
    .get('/editions', async (_req, res) => {
      const [rows, inForce] = await Promise.all([listEditions(db), editionInForce(db)])
      const editions = rows.map(({ since, until, ...row }) => ({
        ...row,
        since: since?.toISOString() ?? null,
        until: until?.toISOString() ?? null,
        inForce: row.number === inForce?.number,
      }))
      res.set('Cache-Control', 'no-cache').json(EditionList.parse({ editions }))
    })
    .get('/edition-files/:hash', async (req, res) => {
      const { hash } = req.params
      const file = /^[0-9a-f]{64}$/.test(hash) ? await fileOf(hash) : undefined
      if (file === undefined) throw notFound('file')
      const forAnyone =
        file.forEveryone && (await isStillOpen({ name: file.name, hash, bytes: file.bytes.identity }))
      if (!forAnyone && !mayReadQualified(req))
        throw new Problem(personOf(req) === undefined ? 'unauthorized' : 'forbidden')
      const encoding = preferred.find((one) => req.acceptsEncodings(one) === one) ?? 'identity'
      res.set({
        // What is for qualified people must be gone when they sign out: no cache but the page's own keeps it. An
        // article may become theirs later, so what holds articles lies in no cache that serves others.
        'Cache-Control': !forAnyone
          ? 'private, no-store'
          : `${file.name === 'articles-everyone' ? 'private' : 'public'}, max-age=${year}, immutable`,
        'Content-Type': 'application/json; charset=utf-8',
        ETag: `"${hash}${encoding === 'identity' ? '' : `-${encoding}`}"`,
        Vary: forAnyone ? 'Accept-Encoding' : 'Accept-Encoding, Cookie',
        ...(encoding === 'identity' ? {} : { 'Content-Encoding': encoding }),
      })
      res.send(file.bytes[encoding])
    })
}

function noneYet(): never {
  throw new Problem('unavailable', 'No edition is in force yet.')
}
