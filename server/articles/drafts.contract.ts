import * as z from 'zod/mini'
import { bytesOf, mostBodyBytes, tooLong } from '../../rules/edition/markdown-limits.ts'
import { Audience } from '../../rules/edition/audience.ts'

const Moment = z.iso.datetime()
// zod's own would be the only use of it, and weigh on every page.
const isDay = (day: string) =>
  /^\d{4}-\d{2}-\d{2}$/.test(day) &&
  !Number.isNaN(Date.parse(day)) &&
  new Date(day).toISOString().startsWith(day)
const Day = z.string().check(z.refine(isDay, 'Write a date: year-month-day.'))
const NoneOrDay = z
  .string()
  .check(z.refine((day) => day === '' || isDay(day), 'Write a date: year-month-day.'))
const Id = z.string().check(z.maxLength(80), z.regex(/^[a-z0-9]+([.-][a-z0-9]+)*$/))
const Names = z.array(Id).check(z.maxLength(60, 'That is more than 60.'))
const lines = (most: number) =>
  z
    .array(
      z
        .string()
        .check(z.trim(), z.minLength(1), z.maxLength(most, `A line has ${most} characters or fewer.`)),
    )
    .check(z.maxLength(80, 'That is more than 80 lines.'))

/** An article's address. `new` is the page that begins one. */
export const Slug = Id.check(z.refine((slug) => slug !== 'new', 'An article can’t be called “new”.'))

/** What stands above an article's text. Unlike an article's own it may be unfinished. */
export const DraftHead = z.object({
  title: z.string().check(z.maxLength(200, 'A title has 200 characters or fewer.')),
  audience: Audience,
  causes: Names,
  tests: Names,
  words: lines(100),
  sources: lines(500),
  reviewed: NoneOrDay,
  dueForReview: NoneOrDay,
})
export const DraftText = z.object({
  head: DraftHead,
  body: z.string().check(
    z.refine((body) => bytesOf(body) <= mostBodyBytes, tooLong),
    // PostgreSQL keeps every character but this one.
    z.refine((body) => !body.includes('\u0000'), 'The text holds a character that can’t be kept.'),
  ),
})

/** What one began from: another one's save gives the text another. */
const Version = z.string().check(z.maxLength(60))
const Reason = z
  .string('Say why.')
  .check(z.trim(), z.minLength(1, 'Say why.'), z.maxLength(300, 'A reason has 300 characters or fewer.'))

/** PUT /api/article-drafts/:slug */
export const SaveDraft = z.extend(DraftText, {
  version: Version,
  /** What this replaces is to be kept as a revision, whatever sitting it is of. */
  apart: z.optional(z.boolean()),
  /** Number of the revision that this brings back. */
  restores: z.optional(z.int()),
  /** `inForce.hash` as the writer has seen it: the draft now takes what is in force there into account. */
  onto: z.optional(z.string()),
})
/** POST /api/article-drafts/:slug/let-go */
export const DropDraft = z.object({ version: Version })
/** PUT /api/article-drafts/:slug/in-force */
export const PutArticleInForce = z.object({ version: Version, reason: Reason })
/** PUT /api/article-drafts/:slug/withdrawn */
export const Withdraw = z.object({
  withdrawn: z.boolean('Say whether it is withdrawn.'),
  reason: Reason,
  /** The article to read instead. */
  replacedBy: z.optional(Slug),
})

/** GET /api/article-drafts/:slug, the answer to a save, and `theirs` of a refused one. */
export const Draft = z.object({
  slug: Slug,
  version: Version,
  /** Whether it says something else than what is in force. */
  pending: z.boolean(),
  /** Null for an article that does not exist yet. */
  text: z.nullable(DraftText),
  /** Null where nobody has changed it here. */
  edited: z.nullable(z.object({ by: z.string(), at: Moment })),
  inForce: z.nullable(
    z.object({ hash: z.string(), text: DraftText, withdrawn: z.nullable(Day), edition: z.int() }),
  ),
  /** What is in force was changed since this draft was begun from it. */
  overtaken: z.boolean(),
})

/** GET /api/article-drafts: every article, and what is to be done about it. */
export const DraftList = z.object({
  articles: z.array(
    z.object({
      slug: Slug,
      title: z.string(),
      audience: Audience,
      inForce: z.boolean(),
      pending: z.boolean(),
      withdrawn: z.nullable(Day),
      dueForReview: z.nullable(Day),
      edited: z.nullable(z.object({ by: z.string(), at: Moment })),
    }),
  ),
})

/** GET /api/article-drafts/:slug/revisions, the newest first. */
export const RevisionList = z.object({
  revisions: z.array(
    z.object({
      number: z.int(),
      /** Null: came with the program. */
      author: z.nullable(z.string()),
      at: Moment,
      reason: z.string(),
      /** The edition it came into force with. */
      edition: z.nullable(z.int()),
    }),
  ),
})
/** GET /api/article-drafts/:slug/revisions/:number */
export const Revision = z.extend(DraftText, { number: z.int() })

/** What was put in force. */
export const ArticleInForce = z.object({ edition: z.int(), draft: Draft })

export type DraftHead = z.infer<typeof DraftHead>
export type DraftText = z.infer<typeof DraftText>
export type Draft = z.infer<typeof Draft>
export type DraftList = z.infer<typeof DraftList>
export type RevisionList = z.infer<typeof RevisionList>
export type SaveDraft = z.infer<typeof SaveDraft>
