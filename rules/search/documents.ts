import type { Audience } from '../edition/audience.ts'
import type { Article, Cause, ProceduresFile, Test } from '../edition/schema.ts'
import { plainText } from './plain-text.ts'

export type Kind = 'article' | 'cause' | 'test'

/** What is searched of one article, cause or test. */
export type SearchDocument = {
  /** Kind and id: an article and its cause often share an id. */
  key: string
  kind: Kind
  id: string
  title: string
  /** Title, label and each symptom by itself: a query that fits into one of them means this. */
  phrases: readonly string[]
  /** Symptoms and other words people search for. */
  words: string
  /** Symptoms of the article that bears a cause's name: the article itself goes before its cause. */
  borrowed: string
  label: string
  body: string
  audience: Audience
}

/** An article whose body this device may not show is still found by its title and words. */
export type SearchableArticle = Omit<Article, 'body'> & { body?: string }

const join = (parts: readonly (string | undefined)[]) =>
  parts.filter((part) => part !== undefined && part !== '').join(' ')

/**
 * Everything that can be found, in a fixed order: withdrawn articles can't. A cause is also found by the symptoms of
 * the article of its name.
 * @param shelf those this device may name
 * @param procedures files this device may read; none is fine
 */
export function documentsOf(
  shelf: readonly SearchableArticle[],
  causes: readonly Cause[],
  tests: readonly Test[],
  procedures: readonly ProceduresFile[] = [],
): SearchDocument[] {
  const articles = shelf.filter((article) => article.withdrawn === undefined)
  const bySlug = new Map(articles.map((article) => [article.slug, article]))
  const ofArticles = articles.map((article): SearchDocument => ({
    key: `article:${article.slug}`,
    kind: 'article',
    id: article.slug,
    title: article.title,
    phrases: [article.title, ...article.words],
    words: article.words.join('; '),
    borrowed: '',
    label: '',
    body: plainText(article.body ?? ''),
    audience: article.audience,
  }))
  const ofCauses = causes.map((cause): SearchDocument => {
    const said = procedures.flatMap((file) => file.causes).filter((one) => one.cause === cause.id)
    return {
      key: `cause:${cause.id}`,
      kind: 'cause',
      id: cause.id,
      title: cause.title,
      phrases: [cause.title, cause.label],
      words: '',
      borrowed: (bySlug.get(cause.id)?.words ?? []).join('; '),
      label: cause.label,
      body: join(said.flatMap((one) => [one.means, one.homeowner?.fits, one.danger?.text])),
      audience: 'everyone',
    }
  })
  const ofTests = tests.map((test): SearchDocument => {
    const said = procedures.flatMap((file) => file.tests).filter((one) => one.test === test.id)
    return {
      key: `test:${test.id}`,
      kind: 'test',
      id: test.id,
      title: test.title,
      phrases: [test.title, test.label],
      words: '',
      borrowed: '',
      label: test.label,
      body: join(said.flatMap((one) => [one.shows, one.cannotShow])),
      audience: test.who === 'anyone' ? 'everyone' : 'qualified',
    }
  })
  return [...ofArticles, ...ofCauses, ...ofTests]
}
