import { openEdition } from '../../rules/edition/open.ts'
import type { Edition } from '../../rules/edition/open.ts'
import { readWhatCanBe } from '../../rules/findings/read-what-can-be.ts'
import type { RawFinding, RawSheet } from '../../rules/findings/sheet.ts'
import { standing } from '../../rules/findings/standing.ts'
import type { Entered, Standing } from '../../rules/findings/standing.ts'
import { diagnose } from '../../rules/ranking/diagnose.ts'
import { stopsOf } from '../../rules/ranking/stop.ts'
import type { Db } from '../database.ts'
import { openFile } from '../editions/editions.queries.ts'
import type { SheetResult } from './sheets.contract.ts'
import { editionNumber } from './sheets.queries.ts'

const mostOpen = 4

/** Opens editions by their hash, and keeps the last few open: a sheet stays on the one it was begun with. */
export function openedEditions(db: Db): (hash: string) => Promise<Edition> {
  const open = new Map<string, Promise<Edition>>()
  return (hash) => {
    const known = open.get(hash)
    open.delete(hash)
    const edition =
      known ??
      editionNumber(db, hash)
        .then((number) => openFile(db, number, 'diagnosis'))
        .then(openEdition)
    open.set(hash, edition)
    edition.catch(() => open.delete(hash))
    for (const [oldest] of open) if (open.size > mostOpen) open.delete(oldest)
    return edition
  }
}

/** The sheet as the core reads it, from what stands. */
export function rawSheetOf(
  context: RawSheet['context'],
  ownMode: string,
  stand: readonly Standing<Entered>[],
): RawSheet {
  const mode = context.mode ?? ownMode
  const byMode = new Map<string, Record<string, RawFinding>>()
  for (const { mode: at, finding, entry } of stand)
    if (entry.value !== null) byMode.set(at, { ...byMode.get(at), [finding]: entry.value })
  const { [mode]: findings = {}, ...otherModes } = Object.fromEntries(byMode)
  return { context: { ...context, mode }, findings, otherModes }
}

/**
 * What an edition says of a sheet's entries. Two readings that contradict each other: the last entered is ranked, either
 * stops, and no bond is released. Undefined when what feeds the sheet can't be read.
 */
export async function resultOf(
  edition: Edition,
  hash: string,
  context: RawSheet['context'],
  entries: readonly Entered[],
): Promise<SheetResult | undefined> {
  const ownMode = edition.sources.get(context.source)?.modes[0] ?? ''
  const stand = standing(entries)
  const { sheet, errors } = readWhatCanBe(edition, rawSheetOf(context, ownMode, stand))
  if (sheet === undefined) return undefined
  const { ranking, stops, misfit, bond } = await diagnose(edition, sheet)
  const ids = new Set(stops.map((stop) => stop.id))
  for (const one of stand)
    for (const entry of one.against) {
      const other = stand.map((each) => (each === one ? { ...one, entry } : each))
      const read = readWhatCanBe(edition, rawSheetOf(context, ownMode, other)).sheet
      for (const stop of read === undefined ? [] : stopsOf(edition, read)) ids.add(stop.id)
    }
  const certain = Object.keys(errors).length === 0 && stand.every((one) => one.against.length === 0)
  return {
    edition: hash,
    ranking: ranking.map(({ cause, share }) => ({ cause, share })),
    stops: [...ids],
    misfit: misfit !== undefined,
    bond: certain ? bond.state : 'held-back',
  }
}
