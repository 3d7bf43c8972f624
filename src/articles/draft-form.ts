import type { Article } from '../../rules/edition/schema.ts'
import type { DraftText } from '../../server/articles/drafts.contract.ts'

/** A draft as its fields hold it: lists as the lines that are typed. */
export type DraftForm = Omit<DraftText['head'], 'words' | 'sources'> & {
  words: string
  sources: string
  body: string
}

const linesOf = (text: string) =>
  text
    .split('\n')
    .map((line) => line.trim())
    .filter((line) => line !== '')

export const formOf = ({ head, body }: DraftText): DraftForm => ({
  ...head,
  words: head.words.join('\n'),
  sources: head.sources.join('\n'),
  body,
})

export const textOf = ({ body, words, sources, ...head }: DraftForm): DraftText => ({
  head: { ...head, words: linesOf(words), sources: linesOf(sources) },
  body,
})

/** Whether two texts are the same to the letter, whatever way they came. */
export const sameText = (one: DraftText, other: DraftText): boolean => wholeOf(one) === wholeOf(other)

/** The article that it would be in force. */
export function articleOf(slug: string, text: DraftText): Article {
  const { dueForReview, ...head } = text.head
  return { slug, ...head, ...(dueForReview !== '' && { dueForReview }), body: text.body.trim() }
}

/** All of it as one text, for differences. */
export function wholeOf({ head, body }: DraftText): string {
  const line = (name: string, value: string) => (value === '' ? '' : `${name}: ${value}\n`)
  return [
    line('Title', head.title),
    line('Written for', head.audience === 'everyone' ? 'everyone' : 'qualified people'),
    line('Causes', head.causes.join(', ')),
    line('Tests', head.tests.join(', ')),
    line('Words people search for', head.words.join('; ')),
    line('Sources', head.sources.join('; ')),
    line('Reviewed', head.reviewed),
    line('Next review', head.dueForReview),
    `\n${body}`,
  ].join('')
}
