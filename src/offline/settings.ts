import { database, strict } from './database.ts'

/** Small things this device remembers, by name. */
export type Settings = {
  /** Side of the number pad that holds Clear, Unsteady and Done. */
  padSide: 'left' | 'right'
  /** Whether single letters act as keys on the Diagnosis page. */
  letterKeys: boolean
  /** What the server last said is in force, so that the page opens with no network. Parse it again. */
  editionInForce: unknown
  /** The sheet each page had open. */
  openTriage: string
  openDiagnosis: string
  /** The system last audited for its bonds, as its address writes it. */
  bondAudit: string
  /** Feet and AWG, or meters and mm²: for the worksheets. Parse it again. */
  worksheetUnits: unknown
  /** What was last typed into each worksheet. Parse it again. */
  [worksheet: `worksheet.${string}`]: unknown
}

/** A remembered value, or undefined. */
export async function getSetting<Key extends keyof Settings>(key: Key): Promise<Settings[Key] | undefined> {
  return (await (await database()).get('settings', key))?.value as Settings[Key] | undefined
}

/** Remembers a value; `undefined` forgets it. */
export async function setSetting<Key extends keyof Settings>(
  key: Key,
  value: Settings[Key] | undefined,
): Promise<void> {
  const tx = (await database()).transaction('settings', 'readwrite', strict)
  const write = value === undefined ? tx.store.delete(key) : tx.store.put({ key, value })
  await Promise.all([write, tx.done])
}
