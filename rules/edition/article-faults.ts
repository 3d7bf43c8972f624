import { tooMuchMarkdown } from './markdown-limits.ts'
import { Article } from './schema.ts'

/** What an article may name and link to. */
export type Known = {
  causes: ReadonlySet<string>
  tests: ReadonlySet<string>
  articles: ReadonlySet<string>
}

const link = /\]\(\s*<?\/(causes|tests|articles)\/([^)\s>?#]*)/g
const warns = /^> \*\*(danger|warning|caution|notice):?\*\*/im
const promises = /\b(?:is|are|it’s|it's) safe\b/i

const lacking: Readonly<Record<string, string>> & { title: string; body: string } = {
  title: 'Give it a title.',
  sources: 'Name at least one source: where its facts come from.',
  reviewed: 'Say when it was reviewed.',
  body: 'Write the text.',
}

const unknownIn = (named: readonly string[], known: ReadonlySet<string>) =>
  named.filter((one) => !known.has(one)).join(', ')

function bodyFault(body: string, known: Known): string | undefined {
  if (body.trim() === '') return lacking.body
  const tooMuch = tooMuchMarkdown(body)
  if (tooMuch !== undefined) return tooMuch
  const dead = [...body.matchAll(link)].filter(
    ([, kind, id]) => !known[kind as keyof Known].has(id!.replace(/\/$/, '')),
  )
  if (dead.length > 0)
    return `Leads nowhere: ${dead.map(([, kind, id]) => `/${kind}/${id}`).join(', ')}. Pick the link anew.`
  if (!warns.test(body)) return 'Say what can hurt: begin a quote with > **Warning:** or **Caution:**.'
  const promise = promises.exec(body)?.[0]
  if (promise !== undefined) return `Say what was measured, not “${promise}”.`
  return undefined
}

/**
 * What keeps an article from being put in force: field → sentence; empty when nothing does. The page says it while one
 * writes, the server refuses with it.
 */
export function articleFaults(article: Article, known: Known): Record<string, string> {
  const faults: Record<string, string> = {}
  for (const { path } of Article.safeParse(article).error?.issues ?? []) {
    const field = String(path[0] ?? 'body')
    faults[field] ??= lacking[field] ?? 'Mend this.'
  }
  const { title, causes, tests, body, dueForReview, reviewed } = article
  if (title.trim() === '') faults['title'] = lacking.title
  const unknownCauses = unknownIn(causes, known.causes)
  if (unknownCauses !== '') faults['causes'] = `No such cause: ${unknownCauses}.`
  const unknownTests = unknownIn(tests, known.tests)
  if (unknownTests !== '') faults['tests'] = `No such test: ${unknownTests}.`
  if (dueForReview !== undefined && dueForReview <= reviewed)
    faults['dueForReview'] = 'The next review comes after the last one.'
  const inBody = bodyFault(body, known)
  if (inBody !== undefined) faults['body'] = inBody
  return faults
}
