/**
 * The three readings of one place and their corners. Each side lies opposite a corner: hn–G, hg–N, ng–H.
 */
export type Side = 'hn' | 'ng' | 'hg'
export type Corner = 'N' | 'H' | 'G'

/** Volts between two points of one place; a side that was not taken is absent. */
type Sides = { hn?: number | undefined; ng?: number | undefined; hg?: number | undefined }
export type Readings = Sides & { nominal: number }

/** The order in which they are typed. */
export const sideOrder: readonly Side[] = ['hn', 'ng', 'hg']

export const cornerOpposite: Readonly<Record<Side, Corner>> = { hn: 'G', hg: 'N', ng: 'H' }

/** A side's volts when it was taken: a finite number of 0 or more. Anything else counts as not taken. */
export const volts = (x: number | undefined): number | undefined =>
  x !== undefined && Number.isFinite(x) && x >= 0 ? x : undefined

/** "5.6", "105": a tenth of a volt below a hundred, whole volts from there on. */
export const inVolts = (x: number): string => (x >= 99.95 ? x.toFixed(0) : x.toFixed(1).replace(/\.0$/, ''))
