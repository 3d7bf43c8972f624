import type { SheetDoc } from './sheets.ts'

/** The id of a person as this device keeps them; null for nobody. */
export const idOf = (kept: unknown): string | null =>
  typeof kept === 'object' && kept !== null && 'id' in kept && typeof kept.id === 'string' ? kept.id : null

/** Whether somebody sees a sheet of this device: their own, and those begun while nobody was signed in. */
export const isSeenBy = ({ of = null }: Pick<SheetDoc, 'of'>, who: string | null): boolean =>
  of === null || of === who
