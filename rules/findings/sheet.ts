/** A findings sheet as the core works on it: where the readings come from, and what was taken. */

export type Context = {
  source: string
  system: string
  wiring: string
  /** The operating mode the plain findings were taken in. */
  mode: string
  /** Input resistance of the meter for every voltage that names no instrument of its own, in ohms. */
  meterOhms: number
}

export const defaultMeterOhms = 10_000_000
/** An ohm reading at or above this is over limit (OL). */
export const overLimitOhms = 1e9

export type TakenReading = {
  kind: 'reading'
  id: string
  mode: string
  /** In the reading's own unit; for an unsteady one the middle of `between`. */
  value: number
  unit: string
  place: string
  pair: string | undefined
  loaded: boolean
  /** Input resistance of the instrument, ohms. */
  meterOhms: number
  overLimit: boolean
  /** The two numbers an unsteady reading wanders between. */
  between: readonly [number, number] | undefined
  /** The same taken before, with another instrument: its value in the same unit, and that instrument's ohms. */
  earlier?: Earlier
}
export type Earlier = { value: number; meterOhms: number }
export type TakenObservation = { kind: 'observation'; id: string; mode: string; value: string }
export type Taken = TakenReading | TakenObservation

export type Sheet = { context: Context; taken: readonly Taken[] }

/** A finding as the screens keep it: plain, or with its instrument, its wandering, its limit, or what it was before. */
export type RawFinding =
  | number
  | string
  | { value: number; meterOhms?: number; between?: [number, number]; earlier?: Earlier }
  | { overLimit: true; meterOhms?: number }

/** A sheet as it is typed, stored and sent; `findings` belong to `context.mode`. */
export type RawSheet = {
  context: { source: string; system: string; wiring: string; mode?: string; meterOhms?: number }
  findings?: Record<string, RawFinding>
  otherModes?: Record<string, Record<string, RawFinding>>
}
