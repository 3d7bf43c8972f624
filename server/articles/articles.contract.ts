import * as z from 'zod/mini'
import { Audience } from '../../rules/edition/audience.ts'

/** GET /api/articles?q=…: what is searched for. Empty lists nothing. */
export const ArticleQuery = z.object({
  q: z._default(
    z.string('must be one text').check(z.maxLength(200, 'must have 200 characters or fewer')),
    '',
  ),
})

/** A piece of text, and whether it is one of the words searched for. */
const Piece = z.object({ text: z.string(), marked: z.boolean() })

export const ArticlesFound = z.object({
  /** The edition that was searched. */
  edition: z.int(),
  /** How many there are; `hits` may hold fewer. */
  total: z.int(),
  hits: z.array(
    z.object({
      kind: z.enum(['article', 'cause', 'test']),
      id: z.string(),
      title: z.array(Piece),
      snippet: z.array(Piece),
      audience: Audience,
    }),
  ),
  /** How the query was read, when a slip in it was mended. */
  readAs: z.optional(z.string()),
})

export type ArticlesFound = z.infer<typeof ArticlesFound>
