import { Router } from 'express'
import type { Request } from 'express'
import type { Db } from '../database.ts'
import { Problem, notFound } from '../problem.ts'
import { readBody, readId, readQuery } from '../read.ts'
import { allow, mayReadQualified, personOf, signedIn, stillSignedIn } from '../session.ts'
import { newToken, tokenHash } from '../token.ts'
import { openSheet } from './open-sheet.ts'
import type { SheetEvents } from './sheet-events.ts'
import { NewEntries, SheetHead, SheetsQuery } from './sheet-requests.contract.ts'
import { SheetLinkMade, SheetNamed, SheetsPage, Taken } from './sheets.contract.ts'
import { findByLink, findSheet, keepLink, listSheets, sayChanged, takeBackLink } from './sheets.queries.ts'
import { isOwn, keyHashOf } from './whose-sheet.ts'
import { sheetWriting } from './write-sheet.ts'

const perPage = 50

type Parts = {
  db: Db
  events: SheetEvents
  /** Counts a sheet begun, or a link made, without an account against the address it comes from. */
  count: Record<'sheet' | 'link', (address: string | undefined) => Promise<void>>
}

const writerOf = (req: Request) => {
  const person = personOf(req)
  return { id: person?.id ?? null, name: person?.name ?? null }
}

/** Findings sheets: one's own, and others' by the link they gave. Somebody else's sheet is not there. */
export function sheetRoutes({ db, events, count }: Parts): Router {
  const writing = sheetWriting(db)

  const ownSheet = async (req: Request) => {
    const sheet = await findSheet(db, readId(req, 'sheet'))
    if (sheet === undefined || !isOwn(req, sheet)) throw notFound('sheet')
    return sheet
  }
  const byLink = async (req: Request) => {
    const sheet = await findByLink(db, tokenHash(String(req.params['token'])))
    if (sheet === undefined) throw notFound('link any more')
    return sheet
  }

  return Router()
    .get('/sheets', allow('person'), async (req, res) => {
      const { q, kind, after } = readQuery(req, SheetsQuery)
      const [changedAt, id] = after?.split('_') ?? []
      const from =
        changedAt === undefined || id === undefined ? undefined : { changedAt: new Date(changedAt), id }
      const found = await listSheets(db, signedIn(req).id, { words: q, kind }, from, perPage + 1)
      const sheets = found
        .slice(0, perPage)
        .map((sheet) => ({ ...sheet, changedAt: sheet.changedAt.toISOString() }))
      const last = sheets.at(-1)
      const next = found.length > perPage && last ? `${last.changedAt}_${last.id}` : null
      res.set('Cache-Control', 'no-store').json(SheetsPage.parse({ sheets, next }))
    })
    .put('/sheets/:id', async (req, res) => {
      const id = readId(req, 'sheet')
      const head = readBody(req, SheetHead)
      const person = personOf(req)
      if (head.kind === 'diagnosis' && !mayReadQualified(req))
        throw new Problem(person === undefined ? 'unauthorized' : 'forbidden')
      const keyHash = keyHashOf(req)
      if (person === undefined && keyHash === undefined) throw new Problem('unauthorized')
      await writing.putHead(id, head, {
        isOwn: (sheet) => isOwn(req, sheet),
        owner: { ownerId: person?.id ?? null, keyHash: keyHash ?? null },
        count: () => (person === undefined ? count.sheet(req.ip) : Promise.resolve()),
      })
      res.set('Cache-Control', 'no-store').json(SheetNamed.parse({ id }))
    })
    .get('/sheets/:id', async (req, res) => {
      res.set('Cache-Control', 'no-store').json(await openSheet(db, await ownSheet(req), true))
    })
    .post('/sheets/:id/entries', async (req, res) => {
      const sheet = await ownSheet(req)
      const { entries } = readBody(req, NewEntries)
      await writing.add(sheet, entries, writerOf(req))
      res.set('Cache-Control', 'no-store').json(Taken.parse({ ids: entries.map((entry) => entry.id) }))
    })
    .get('/sheets/:id/events', async (req, res) => {
      const { id } = await ownSheet(req)
      events.follow(res, { sheet: id, person: personOf(req)?.id, mayRead: stillSignedIn(db, req) })
    })
    .post('/sheets/:id/link', async (req, res) => {
      const { id } = await ownSheet(req)
      if (personOf(req) === undefined) await count.link(req.ip)
      const token = newToken()
      await db.transaction().execute(async (tx) => {
        await takeBackLink(tx, id)
        await keepLink(tx, id, tokenHash(token))
        await sayChanged(tx, id)
      })
      res.status(201).set('Cache-Control', 'no-store').json(SheetLinkMade.parse({ id, token }))
    })
    .delete('/sheets/:id/link', async (req, res) => {
      const { id } = await ownSheet(req)
      await db.transaction().execute(async (tx) => {
        await takeBackLink(tx, id)
        await sayChanged(tx, id)
      })
      res.set('Cache-Control', 'no-store').json(SheetNamed.parse({ id }))
    })
    .get('/shared/:token', async (req, res) => {
      const sheet = await byLink(req)
      res.set('Cache-Control', 'no-store').json(await openSheet(db, sheet, isOwn(req, sheet)))
    })
    .post('/shared/:token/entries', allow('tech'), async (req, res) => {
      const sheet = await byLink(req)
      const { entries } = readBody(req, NewEntries)
      await writing.add(sheet, entries, writerOf(req))
      res.set('Cache-Control', 'no-store').json(Taken.parse({ ids: entries.map((entry) => entry.id) }))
    })
    .get('/shared/:token/events', async (req, res) => {
      const { id } = await byLink(req)
      const hash = tokenHash(req.params.token)
      const holds = async () => (await findByLink(db, hash)) !== undefined
      const still = stillSignedIn(db, req)
      const mayRead = async () => (await holds()) && (await still())
      events.follow(res, { sheet: id, person: personOf(req)?.id, mayRead })
    })
}
