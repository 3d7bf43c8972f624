import type { Gauge, Metal } from '../../circuit/conductors.ts'

/** What the conductors of an AC run lie in. */
export type Raceway = 'pvc' | 'aluminum' | 'steel'

type Row = {
  /** Reactance in PVC or aluminum, and in steel. */
  x: readonly [number, number]
  /** Copper in PVC and in steel. */
  copper: readonly [number, number]
  aluminum?: number
  fromMemory?: true
}

/** NEC chapter 9 table 9: ohms to neutral per 1000 ft at 60 Hz and 75 °C, three single conductors in a raceway. */
const rows: Partial<Record<Gauge, Row>> = {
  '14': { x: [0.058, 0.073], copper: [3.1, 3.1] },
  '12': { x: [0.054, 0.068], copper: [2.0, 2.0], aluminum: 3.2 },
  '10': { x: [0.05, 0.063], copper: [1.2, 1.2], aluminum: 2.0 },
  '8': { x: [0.052, 0.065], copper: [0.78, 0.78], aluminum: 1.3 },
  '6': { x: [0.051, 0.064], copper: [0.49, 0.49], aluminum: 0.81 },
  '4': { x: [0.048, 0.06], copper: [0.31, 0.31], aluminum: 0.51 },
  '3': { x: [0.047, 0.059], copper: [0.25, 0.25], aluminum: 0.4, fromMemory: true },
  '2': { x: [0.045, 0.057], copper: [0.19, 0.2], aluminum: 0.32 },
  '1': { x: [0.046, 0.057], copper: [0.15, 0.16], aluminum: 0.25, fromMemory: true },
  '1/0': { x: [0.044, 0.055], copper: [0.12, 0.12], aluminum: 0.2 },
  '2/0': { x: [0.043, 0.054], copper: [0.1, 0.1], aluminum: 0.16, fromMemory: true },
  '3/0': { x: [0.042, 0.052], copper: [0.077, 0.079], aluminum: 0.13, fromMemory: true },
  '4/0': { x: [0.041, 0.051], copper: [0.062, 0.063], aluminum: 0.1 },
}

/** Ohms per 1000 ft at 75 °C, or undefined where the table has no such row. */
export function table9(
  gauge: string,
  metal: Metal,
  raceway: Raceway,
): { resistance: number; reactance: number; fromMemory: boolean } | undefined {
  const row = rows[gauge as Gauge]
  const side = raceway === 'steel' ? 1 : 0
  const resistance = metal === 'copper' ? row?.copper[side] : row?.aluminum
  return row === undefined || resistance === undefined
    ? undefined
    : { resistance, reactance: row.x[side], fromMemory: row.fromMemory === true }
}
