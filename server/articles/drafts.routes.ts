import { Router } from 'express'
import type { Request, Response } from 'express'
import type { Db } from '../database.ts'
import { editionInForce, openShelf } from '../editions/editions.queries.ts'
import type { ChangeArticles } from '../editions/editions.queries.ts'
import { notFound } from '../problem.ts'
import { readBody } from '../read.ts'
import { allow, signedIn } from '../session.ts'
import { draftOf, readState } from './draft-state.ts'
import {
  ArticleInForce,
  Draft,
  DraftList,
  DropDraft,
  PutArticleInForce,
  Revision,
  RevisionList,
  SaveDraft,
  Slug,
  Withdraw,
} from './drafts.contract.ts'
import { findRevision, listDrafts, listRevisions } from './drafts.queries.ts'
import { putArticleInForce, withdrawArticle } from './put-article-in-force.ts'
import { dropDraft, saveDraft } from './save-draft.ts'

function slugOf(req: Request): string {
  const read = Slug.safeParse(req.params['slug'])
  if (!read.success) throw notFound('article')
  return read.data
}

async function everyArticle(db: Db): Promise<DraftList['articles']> {
  const inForce = await editionInForce(db)
  const shelf = inForce === undefined ? [] : await openShelf(db, inForce.number)
  const drafts = new Map((await listDrafts(db)).map((draft) => [draft.slug, draft]))
  const rows = shelf.map(({ slug, title, audience, withdrawn = null, dueForReview = null }) => {
    const draft = drafts.get(slug)
    drafts.delete(slug)
    const edited = draft === undefined ? null : { by: draft.editor, at: draft.editedAt.toISOString() }
    return {
      slug,
      title,
      audience,
      inForce: true,
      pending: draft?.pending === true,
      withdrawn,
      dueForReview,
      edited,
    }
  })
  const begun = [...drafts.values()]
    .filter((draft) => draft.pending)
    .map(({ slug, head, editor, editedAt }) => ({
      slug,
      title: head.title,
      audience: head.audience,
      inForce: false,
      pending: true,
      withdrawn: null,
      dueForReview: null,
      edited: { by: editor, at: editedAt.toISOString() },
    }))
  return [...rows, ...begun].sort((a, b) => (a.slug < b.slug ? -1 : 1))
}

/** Writing articles: for senior techs and admins. */
export function draftRoutes(db: Db, changeArticles: ChangeArticles): Router {
  const senior = allow('senior')
  const answer = (res: Response, body: unknown) => res.set('Cache-Control', 'no-store').json(body)
  return Router()
    .get('/article-drafts', senior, async (_req, res) => {
      answer(res, DraftList.parse({ articles: await everyArticle(db) }))
    })
    .get('/article-drafts/:slug', senior, async (req, res) => {
      answer(res, draftOf(await readState(db, slugOf(req))))
    })
    .put('/article-drafts/:slug', senior, async (req, res) => {
      const saved = await saveDraft(db, slugOf(req), readBody(req, SaveDraft), signedIn(req).id)
      answer(res, Draft.parse(saved))
    })
    .post('/article-drafts/:slug/let-go', senior, async (req, res) => {
      const { version } = readBody(req, DropDraft)
      answer(res, Draft.parse(await dropDraft(db, slugOf(req), version, signedIn(req).id)))
    })
    .get('/article-drafts/:slug/revisions', senior, async (req, res) => {
      const revisions = (await listRevisions(db, slugOf(req))).map((row) => ({
        ...row,
        at: row.at.toISOString(),
      }))
      answer(res, RevisionList.parse({ revisions }))
    })
    .get('/article-drafts/:slug/revisions/:number', senior, async (req, res) => {
      const { number } = req.params
      const found =
        typeof number === 'string' && /^\d{1,6}$/.test(number)
          ? await findRevision(db, slugOf(req), Number(number))
          : undefined
      if (found === undefined) throw notFound('revision')
      answer(res, Revision.parse({ number: found.number, ...found.text }))
    })
    .put('/article-drafts/:slug/in-force', senior, async (req, res) => {
      const wanted = readBody(req, PutArticleInForce)
      const done = await putArticleInForce(db, changeArticles, slugOf(req), wanted, signedIn(req).id)
      answer(res, ArticleInForce.parse(done))
    })
    .put('/article-drafts/:slug/withdrawn', senior, async (req, res) => {
      const wanted = readBody(req, Withdraw)
      const today = new Date().toISOString().slice(0, 10)
      const done = await withdrawArticle(db, changeArticles, slugOf(req), wanted, signedIn(req).id, today)
      answer(res, ArticleInForce.parse(done))
    })
}
