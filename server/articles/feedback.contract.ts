import * as z from 'zod/mini'

const Moment = z.iso.datetime()

/** POST /api/articles/:slug/feedback: whether an article helped whoever read it. */
export const SayHelped = z.object({
  /** Number of the edition that was read. */
  edition: z.int('Name the edition.'),
  helped: z.boolean('Say whether it helped.'),
  /** Why not. */
  why: z._default(
    z.string().check(
      z.trim(),
      z.maxLength(500, 'Write 500 characters or fewer.'),
      z.refine((why) => !why.includes('\u0000'), 'The text holds a character that can’t be kept.'),
    ),
    '',
  ),
})
export const HelpedKept = z.object({ kept: z.literal(true) })

/** GET /api/article-drafts/:slug/feedback: what readers said, the newest first. */
export const Feedback = z.object({
  helped: z.int(),
  not: z.int(),
  /** Those who wrote why not. */
  said: z.array(z.object({ edition: z.int(), why: z.string(), at: Moment, by: z.nullable(z.string()) })),
})

export type Feedback = z.infer<typeof Feedback>
