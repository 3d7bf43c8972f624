import * as z from 'zod/mini'
import { Audience } from '../../rules/edition/audience.ts'

const Hash = z.string().check(z.regex(/^[0-9a-f]{64}$/))
/** A moment, as ISO 8601 in UTC. */
const Moment = z.iso.datetime()

/** The files an edition consists of. */
export const FileName = z.enum([
  'diagnosis',
  'procedures-everyone',
  'procedures-qualified',
  'articles-everyone',
  'articles-qualified',
])

/** GET /api/edition and GET /api/editions/:hash: the edition in force, or an earlier one, with the files to fetch. */
export const EditionInForce = z.object({
  number: z.int(),
  hash: Hash,
  /** When it was last put in force. */
  inForceSince: Moment,
  note: z.string(),
  counts: z.object({ causes: z.int(), tests: z.int(), rules: z.int(), articles: z.int() }),
  files: z.array(z.object({ name: FileName, audience: Audience, hash: Hash, bytes: z.int() })),
})

/** GET /api/editions: every edition, the newest first. */
export const EditionList = z.object({
  editions: z.array(
    z.object({
      number: z.int(),
      hash: Hash,
      note: z.string(),
      /** Of the last time it was in force; null when it never was. */
      since: z.nullable(Moment),
      /** Null while it is in force. */
      until: z.nullable(Moment),
      inForce: z.boolean(),
    }),
  ),
})

/** The data of each `edition` event on GET /api/edition/events. */
export const EditionAnnounced = z.object({ number: z.int(), hash: Hash })

export type FileName = z.infer<typeof FileName>
export type EditionInForce = z.infer<typeof EditionInForce>
export type EditionList = z.infer<typeof EditionList>
export type EditionAnnounced = z.infer<typeof EditionAnnounced>
