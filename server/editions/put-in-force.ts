import type { Db, Tx } from '../database.ts'
import type { EditionBytes } from './edition-bytes.ts'
import { editionInForce, keepEdition, lockEditions, numberOf, recordInForce } from './editions.queries.ts'
import type { EditionRow } from './editions.queries.ts'

export type PutInForce = {
  /** What the edition is called in lists, should it be new. */
  note: string
  /** Why it is put in force now. */
  reason: string
  /** Asked once nobody else can change the answer: true leaves the edition in force where it is. */
  unless?: (inForce: EditionRow) => boolean
}

/**
 * Puts an edition in force, keeping it first when it is new. The one in force already is left alone.
 * @returns the edition in force afterwards, and whether this call changed it
 */
export const putInForce = (db: Db, edition: EditionBytes, how: PutInForce): Promise<NowInForce> =>
  db.transaction().execute((tx) => putInForceWithin(tx, edition, how))

type NowInForce = { inForce: EditionRow; changed: boolean }

/** The same within a transaction that does something else too: both happen, or neither. */
export async function putInForceWithin(
  tx: Tx,
  edition: EditionBytes,
  { note, reason, unless = () => false }: PutInForce,
): Promise<NowInForce> {
  await lockEditions(tx)
  const before = await editionInForce(tx)
  if (before !== undefined && (before.hash === edition.hash || unless(before)))
    return { inForce: before, changed: false }
  const number = (await numberOf(tx, edition.hash)) ?? (await keepEdition(tx, edition, note))
  await recordInForce(tx, number, reason)
  const inForce = await editionInForce(tx)
  if (inForce === undefined) throw new Error(`edition ${number} was recorded but is not in force`)
  return { inForce, changed: true }
}
