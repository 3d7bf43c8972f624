import * as z from 'zod'
import type { Db } from '../database.ts'
import { editionInForce } from '../editions/editions.queries.ts'
import { findDemoPerson } from '../people/people.queries.ts'
import { Role } from '../people/roles.contract.ts'
import { tokenHash } from '../token.ts'
import demoSheets from './demo-sheets.json' with { type: 'json' }
import { NewEntries, SheetHead } from './sheet-requests.contract.ts'
import { endDemoLinks, keepLink, listEntries } from './sheets.queries.ts'
import { sheetWriting } from './write-sheet.ts'

const dayMs = 24 * 60 * 60 * 1000
const minuteMs = 60 * 1000
const Findings = z.record(z.string(), z.record(z.string(), z.union([z.number(), z.string()])))

/** As the Diagnosis page keeps a finding; a check keeps nothing beside the value. */
const keptAs = (kind: string, value: number | string) =>
  kind === 'triage'
    ? null
    : typeof value === 'number'
      ? { kind: 'reading', text: String(value) }
      : { kind: 'observation', value, by: 'owner' }

/** The id of an entry: the sheet's last digits and the entry's place. */
const entryId = (sheet: string, place: number) =>
  `de300000-0000-4000-8${sheet.slice(-3)}-${String(place).padStart(12, '0')}`

/**
 * Makes the sheets of the demo people, each once, through what every sheet is written with: their results are computed
 * like any other's. What somebody has added to one since stays.
 */
export async function seedDemoSheets(db: Db): Promise<void> {
  const inForce = await editionInForce(db)
  if (inForce === undefined) return
  const writing = sheetWriting(db)
  for (const { id, by, kind, title, context, daysAgo, link, findings } of demoSheets) {
    const person = await findDemoPerson(db, Role.parse(by))
    if (person === undefined || (await listEntries(db, id)).length > 0) continue
    const begun = Date.now() - daysAgo * dayMs
    const at = (minutes: number) => new Date(begun + minutes * minuteMs).toISOString()
    const head = SheetHead.parse({
      kind,
      title,
      context,
      edition: inForce.hash,
      madeAt: at(0),
      changedAt: at(0),
    })
    const owner = { ownerId: person.id, keyHash: null }
    const isOwn = (sheet: { ownerId: string | null }) => sheet.ownerId === person.id
    await writing.putHead(id, head, { isOwn, owner, count: () => Promise.resolve() })
    const all = Object.entries(Findings.parse(findings)).flatMap(([mode, here]) =>
      Object.entries(here).map(([finding, value]) => ({ mode, finding, value })),
    )
    const { entries } = NewEntries.parse({
      entries: all.map((one, place) => ({
        ...one,
        id: entryId(id, place),
        kept: keptAs(kind, one.value),
        after: [],
        deviceAt: at(place + 1),
      })),
    })
    await writing.add({ id, edition: inForce.hash, ownerId: person.id }, entries, person)
    if (link !== undefined) await db.transaction().execute((tx) => keepLink(tx, id, tokenHash(link)))
  }
}

/** Where others reach the server, links whose tokens everyone knows open nothing. */
export const shutDemoLinks = (db: Db): Promise<void> =>
  endDemoLinks(
    db,
    demoSheets.flatMap(({ link }) => (link === undefined ? [] : [tokenHash(link)])),
  )
