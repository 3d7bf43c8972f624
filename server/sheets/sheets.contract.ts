/** What the server answers. What it is sent stands in `sheet-requests.contract.ts`: pages send it, and never parse it. */
import * as z from 'zod/mini'
import type { RawFinding } from '../../rules/findings/sheet.ts'
import { Hash, Id, Kind, Moment, Name } from './sheet-parts.contract.ts'

const Ohms = z.optional(z.number())
/**
 * A finding as it was taken in, which was checked strictly then. Strict objects and tuples would weigh on every first
 * page, so that the pair of an unsteady reading is read as a list of two.
 */
const Finding = z.union([
  z.number(),
  z.string(),
  z.object({ overLimit: z.literal(true), meterOhms: Ohms }),
  z.object({
    value: z.number(),
    meterOhms: Ohms,
    between: z.optional(z.array(z.number()).check(z.minLength(2), z.maxLength(2))),
  }),
]) as unknown as z.ZodMiniType<RawFinding>
const Context = z.object({
  source: Name,
  system: Name,
  wiring: Name,
  mode: z.optional(Name),
  meterOhms: Ohms,
})

/** What the server has: the ids of what was sent. */
export const Taken = z.object({ ids: z.array(Id) })

const Entry = z.object({
  id: Id,
  mode: Name,
  finding: Name,
  value: z.nullable(Finding),
  kept: z.unknown(),
  after: z.array(Id),
  deviceAt: Moment,
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
      /** Somebody holds a link to it. */
      link: z.boolean(),
    }),
  ),
  /** Names the next page; null on the last. */
  next: z.nullable(z.string()),
})

/** PUT, POST …/link and DELETE …/link echo the sheet they were about. */
export const SheetNamed = z.object({ id: Id })
export const SheetLinkMade = z.object({ id: Id, token: z.string() })

export type SheetEntry = z.infer<typeof Entry>
export type SheetResult = z.infer<typeof Result>
export type SheetOpened = z.infer<typeof SheetOpened>
export type SheetsPage = z.infer<typeof SheetsPage>
