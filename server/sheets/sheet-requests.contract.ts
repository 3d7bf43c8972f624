import * as z from 'zod/mini'
import { Hash, Id, Kind, Moment, Name } from './sheet-parts.contract.ts'

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
/** The query of GET /api/sheets. */
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

export type SheetHead = z.infer<typeof SheetHead>
export type NewEntry = z.infer<typeof NewEntry>
