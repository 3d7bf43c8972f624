import * as z from 'zod/mini'

const Moment = z.iso.datetime()
/** Made on the device. */
const Id = z
  .string('Name an id.')
  .check(z.regex(/^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/, 'An id is a UUID.'))
const Hash = z.string().check(z.regex(/^[0-9a-f]{64}$/))
/** An id of the edition's. */
const Name = z.string().check(z.minLength(1), z.maxLength(80))
const Size = z.number().check(z.nonnegative())
const Ohms = z.optional(z.number().check(z.positive()))

/** A finding as the core reads it (`RawFinding`). */
const Finding = z.union([
  Size,
  Name,
  z.strictObject({ overLimit: z.literal(true), meterOhms: Ohms }),
  z.strictObject({ value: Size, meterOhms: Ohms, between: z.optional(z.tuple([Size, Size])) }),
])
const Context = z.strictObject({
  source: Name,
  system: Name,
  wiring: Name,
  mode: z.optional(Name),
  meterOhms: Ohms,
})
const Kind = z.enum(['triage', 'diagnosis'])

/** PUT /api/sheets/:id: all of a sheet but its findings. Of two that cross, the later by the device's clock holds. */
export const SheetHead = z.strictObject({
  kind: Kind,
  title: z
    .string('Name the sheet.')
    .check(
      z.trim(),
      z.minLength(1, 'Name the sheet.'),
      z.maxLength(200, 'A name has 200 characters or fewer.'),
    ),
  context: Context,
  edition: Hash,
  madeAt: Moment,
  changedAt: Moment,
})

const mostKept = 4000
const NewEntry = z.strictObject({
  id: Id,
  mode: Name,
  finding: Name,
  /** Null: nothing that counts as taken stands there any more. */
  value: z.nullable(Finding),
  /** The same as the page keeps it, with notes; read again by that page alone. */
  kept: z.nullable(
    z
      .json()
      .check(
        z.refine((kept) => JSON.stringify(kept).length <= mostKept, 'There is too much in one finding.'),
      ),
  ),
  /** The entries it takes the place of, as its writer knew them. */
  after: z.array(Id).check(z.maxLength(50)),
  deviceAt: Moment,
})
/** POST …/entries. */
export const NewEntries = z.strictObject({
  entries: z.array(NewEntry).check(z.minLength(1), z.maxLength(200)),
})
/** What the server has: the ids of what was sent. */
export const Taken = z.object({ ids: z.array(Id) })

const Entry = z.extend(NewEntry, {
  /** Null for somebody without an account. */
  by: z.nullable(z.object({ id: Id, name: z.string() })),
  serverAt: Moment,
})

/** What the sheet's edition says of its findings. */
const Result = z.object({
  edition: Hash,
  ranking: z.array(z.object({ cause: z.string(), share: z.number() })),
  /** Any of two readings that contradict each other stops. */
  stops: z.array(z.string()),
  misfit: z.boolean(),
  bond: z.enum(['released', 'held-back']),
})

/** GET /api/sheets/:id and GET /api/shared/:token. */
export const SheetOpened = z.object({
  id: Id,
  kind: Kind,
  title: z.string(),
  context: Context,
  edition: Hash,
  madeAt: Moment,
  changedAt: Moment,
  /** Whether the asker may name it anew and hand out its link. */
  own: z.boolean(),
  /** In the order they came. */
  entries: z.array(Entry),
  /** Null while what feeds it can't be read. */
  result: z.nullable(Result),
  /** When the link that holds was made; null when there is none, or for whoever came by it. */
  linkMadeAt: z.nullable(Moment),
})

/** GET /api/sheets */
export const SheetsQuery = z.object({
  q: z._default(z.string().check(z.maxLength(200, 'must have 200 characters or fewer')), ''),
  kind: z.optional(Kind),
  /** `next` of the page before. */
  after: z.optional(
    z
      .string()
      .check(
        z.regex(
          /^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d\.\d{3}Z_[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/,
          'must be what a page before named',
        ),
      ),
  ),
})
export const SheetsPage = z.object({
  sheets: z.array(
    z.object({
      id: Id,
      kind: Kind,
      title: z.string(),
      edition: Hash,
      changedAt: Moment,
      findings: z.int(),
      stops: z.boolean(),
    }),
  ),
  /** Names the next page; null on the last. */
  next: z.nullable(z.string()),
})

/** PUT, POST …/link and DELETE …/link echo the sheet they were about. */
export const SheetNamed = z.object({ id: Id })
export const SheetLinkMade = z.object({ id: Id, token: z.string() })

export type SheetHead = z.infer<typeof SheetHead>
export type NewEntry = z.infer<typeof NewEntry>
export type SheetEntry = z.infer<typeof Entry>
export type SheetResult = z.infer<typeof Result>
export type SheetOpened = z.infer<typeof SheetOpened>
export type SheetsPage = z.infer<typeof SheetsPage>
