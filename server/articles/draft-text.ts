import { createHash } from 'node:crypto'
import type { Article } from '../../rules/edition/schema.ts'
import type { DraftText } from './drafts.contract.ts'

/** An article's text as its editor has it. */
export const textOf = ({
  title,
  audience,
  causes,
  tests,
  words,
  sources,
  reviewed,
  dueForReview = '',
  body,
}: Article): DraftText => ({
  head: { title, audience, causes, tests, words, sources, reviewed, dueForReview },
  body,
})

/** The article that a draft makes; whether it is withdrawn is no matter of its text. */
export function articleOf(slug: string, { head, body }: DraftText, before?: Article): Article {
  const { dueForReview, ...rest } = head
  return {
    slug,
    ...rest,
    ...(dueForReview !== '' && { dueForReview }),
    ...(before?.withdrawn !== undefined && { withdrawn: before.withdrawn }),
    ...(before?.replacedBy !== undefined && { replacedBy: before.replacedBy }),
    body: body.trim(),
  }
}

/** The same text has the same. */
export const hashOf = ({ head, body }: DraftText): string => {
  const { title, audience, causes, tests, words, sources, reviewed, dueForReview } = head
  const parts = [title, audience, causes, tests, words, sources, reviewed, dueForReview, body.trim()]
  return createHash('sha256').update(JSON.stringify(parts)).digest('hex').slice(0, 16)
}
