import { articleFaults } from '../../rules/edition/article-faults.ts'
import type { Article } from '../../rules/edition/schema.ts'
import type { Db } from '../database.ts'
import type { ArticlesInForce, ChangeArticles } from '../editions/editions.queries.ts'
import { Problem, notFound } from '../problem.ts'
import { conflict, draftOf, mustBeAt, readState } from './draft-state.ts'
import { articleOf, hashOf, textOf } from './draft-text.ts'
import type { Draft } from './drafts.contract.ts'
import { keepDraft, keepRevision, lastInForce, lockArticle } from './drafts.queries.ts'
import type { Tx } from '../database.ts'

type Done = { edition: number; draft: Draft }

/** Everyone reads what an edition is called, so an article for qualified people is not named there. */
const noteOf = (what: string, before: Article | undefined, after: Article) =>
  before?.audience === 'qualified' || after.audience === 'qualified'
    ? `An article for qualified people ${what}`
    : `Article ${what}: ${after.title}`

/** @throws Problem 400 with a sentence for each field that keeps the article from being put in force */
function mustBeSound(article: Article, { articles, diagnosis }: ArticlesInForce): void {
  const faults = articleFaults(article, {
    causes: new Set(diagnosis.causes.map((cause) => cause.id)),
    tests: new Set(diagnosis.tests.map((test) => test.id)),
    articles: new Set([article.slug, ...articles.map((one) => one.slug)]),
  })
  if (Object.keys(faults).length > 0)
    throw new Problem('bad-request', 'The article can’t be put in force yet. Mend what is marked.', faults)
}

const exchanged = (articles: readonly Article[], next: Article): Article[] =>
  articles.some((one) => one.slug === next.slug)
    ? articles.map((one) => (one.slug === next.slug ? next : one))
    : [...articles, next]

/** What came with the program is a revision too, so that it can be looked at and brought back. */
async function keepFormer(tx: Tx, slug: string, former: Article, edition: number): Promise<void> {
  const last = await lastInForce(tx, slug)
  const text = textOf(former)
  if (last === undefined || hashOf(last.text) !== hashOf(text))
    await keepRevision(tx, { slug, text, author: null, reason: `As it was in edition ${edition}`, edition })
}

/**
 * Puts a draft in force as a new edition, in one transaction with what is remembered of it.
 * @throws Problem 409 when the draft or what is in force is another by now; 400 when it is not fit yet
 */
export function putArticleInForce(
  db: Db,
  changeArticles: ChangeArticles,
  slug: string,
  { version, reason }: { version: string; reason: string },
  personId: string,
): Promise<Done> {
  return db.transaction().execute(async (tx) => {
    await lockArticle(tx, slug)
    const state = await readState(tx, slug)
    mustBeAt(state, version)
    const { row } = state
    if (row?.pending !== true)
      throw new Problem('conflict', 'There is no draft: this text is in force already.')
    let former: { article: Article; edition: number } | undefined
    const { number } = await changeArticles(tx, (inForce) => {
      const before = inForce.articles.find((one) => one.slug === slug)
      if (row.base !== (before === undefined ? null : hashOf(textOf(before))))
        throw conflict(state, 'Another text of this article came into force meanwhile.')
      if (before !== undefined) former = { article: before, edition: inForce.number }
      const article = articleOf(slug, row.text, before)
      mustBeSound(article, inForce)
      const what = before === undefined ? 'added' : 'changed'
      return { articles: exchanged(inForce.articles, article), note: noteOf(what, before, article), reason }
    })
    if (former !== undefined) await keepFormer(tx, slug, former.article, former.edition)
    await keepRevision(tx, { slug, text: row.text, author: personId, reason, edition: number })
    await keepDraft(tx, {
      slug,
      pending: false,
      text: row.text,
      base: null,
      personId,
      sittingSince: new Date(),
    })
    return { edition: number, draft: draftOf(await readState(tx, slug)) }
  })
}

type Withdrawal = { withdrawn: boolean; reason: string; replacedBy?: string | undefined }

/**
 * Withdraws an article as a new edition, or takes that back. It stays readable by its link, with a mark; a draft of it
 * stays as it is.
 * @throws Problem 404 when no such article is in force
 */
export function withdrawArticle(
  db: Db,
  changeArticles: ChangeArticles,
  slug: string,
  { withdrawn, reason, replacedBy }: Withdrawal,
  personId: string,
  today: string,
): Promise<Done> {
  return db.transaction().execute(async (tx) => {
    await lockArticle(tx, slug)
    let text: Article | undefined
    const { number } = await changeArticles(tx, (inForce) => {
      const before = inForce.articles.find((one) => one.slug === slug)
      if (before === undefined) throw notFound('article')
      const { withdrawn: _since, replacedBy: _other, ...held } = before
      const other = inForce.articles.find((one) => one.slug === replacedBy)
      if (
        replacedBy !== undefined &&
        (other === undefined || other.withdrawn !== undefined || replacedBy === slug)
      )
        throw new Problem('bad-request', 'Mend what is marked.', {
          replacedBy: 'Choose another article that is in force.',
        })
      text = withdrawn
        ? { ...held, withdrawn: before.withdrawn ?? today, ...(replacedBy !== undefined && { replacedBy }) }
        : held
      if (!withdrawn) mustBeSound(held, inForce)
      const note = noteOf(withdrawn ? 'withdrawn' : 'in force again', before, held)
      return { articles: exchanged(inForce.articles, text), note, reason }
    })
    await keepRevision(tx, {
      slug,
      text: textOf(text!),
      author: personId,
      reason: `${withdrawn ? 'Withdrawn' : 'In force again'}: ${reason}`,
      edition: number,
    })
    return { edition: number, draft: draftOf(await readState(tx, slug)) }
  })
}
