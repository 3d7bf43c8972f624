import type { Article } from '../../rules/edition/schema.ts'
import type { Knowledge } from './knowledge.ts'

export type UsedIn = { kind: 'article' | 'cause' | 'test'; id: string; title: string; label: string }

const article = (one: Article): UsedIn => ({
  kind: 'article',
  id: one.slug,
  title: one.title,
  label: 'Article',
})

function cause(knowledge: Knowledge, id: string): UsedIn[] {
  const found = knowledge.edition.causes.get(id)
  return found === undefined ? [] : [{ kind: 'cause', id, title: found.label, label: 'Cause' }]
}
function test(knowledge: Knowledge, id: string): UsedIn[] {
  const found = knowledge.edition.tests.get(id)
  return found === undefined ? [] : [{ kind: 'test', id, title: found.label, label: 'Test' }]
}
const namesLink = (body: string, kind: 'articles' | 'causes' | 'tests', id: string) =>
  body.includes(`](/${kind}/${id})`)

const all = (knowledge: Knowledge) => [...knowledge.articles.values()]

/** What links to an article: its causes, its tests, and other articles. */
export function usesOfArticle(knowledge: Knowledge, slug: string): UsedIn[] {
  const own = knowledge.articles.get(slug)
  return [
    ...(own?.causes ?? []).flatMap((id) => cause(knowledge, id)),
    ...(own?.tests ?? []).flatMap((id) => test(knowledge, id)),
    ...all(knowledge)
      .filter((one) => one.slug !== slug && namesLink(one.body, 'articles', slug))
      .map(article),
  ]
}

/** Articles about a cause: those that name it in their head first, then those that link to it. */
export function articlesOnCause(knowledge: Knowledge, id: string): UsedIn[] {
  const about = all(knowledge).filter((one) => one.causes.includes(id))
  const linking = all(knowledge).filter((one) => !about.includes(one) && namesLink(one.body, 'causes', id))
  return [...about, ...linking].map(article)
}

/** Articles that use a test, in their head or their text. */
export const articlesOnTest = (knowledge: Knowledge, id: string): UsedIn[] =>
  all(knowledge)
    .filter((one) => one.tests.includes(id) || namesLink(one.body, 'tests', id))
    .map(article)

/** Causes whose look-alikes a test tells apart, or whose repair it proves. Known to qualified people's files alone. */
export const causesOfTest = (knowledge: Knowledge, id: string): UsedIn[] =>
  [...knowledge.causes.values()]
    .filter(
      (one) =>
        one.lookAlikes?.some((other) => other.test === id) === true ||
        one.proof?.some((proof) => proof.test === id) === true,
    )
    .flatMap((one) => cause(knowledge, one.cause))

/** Causes that count this one among their look-alikes. */
export const causesLike = (knowledge: Knowledge, id: string): UsedIn[] =>
  [...knowledge.causes.values()]
    .filter((one) => one.lookAlikes?.some((other) => other.cause === id) === true)
    .flatMap((one) => cause(knowledge, one.cause))
