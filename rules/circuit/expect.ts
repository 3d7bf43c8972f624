/**
 * What a cause lets one expect: for every reading the band it falls in, for lamps, bulbs and GFCIs their states, over
 * all that is not known of a wiring.
 */
import { meterOf } from './instruments/meter.ts'
import type { Tester } from './instruments/plug-in-tester.ts'
import type { ElectricalCause, WiringContext } from './wiring/context.ts'
import { pointsIn } from './design.ts'
import { relations, valueOf } from './relations.ts'
import { measured } from './wiring/readings/measured.ts'
import { takeReadings } from './wiring/take-readings.ts'
import { typicalOf } from './wiring/parameters.ts'
import type { Parameters } from './wiring/parameters.ts'
import { rangesWith, wire } from './wiring/wire.ts'

/** Lowest, typical and highest value of a reading, in its unit; `overLimitOhms` where an ohmmeter shows over limit. */
export type Band = { low: number; typical: number; high: number }
/** An observation's typical value, and all that it can be. */
export type States = { typical: string; can: readonly string[] }
export type Expected = {
  readings: ReadonlyMap<string, Band>
  observations: ReadonlyMap<string, States>
  /** By the place of each in `relations`; a gap where one of the two is not read here. */
  together: readonly (Band | undefined)[]
}

const corners = 8
const inners = 2

/** Testers of both kinds, at the ends of what their lamps are made of. */
const testers: readonly Tester[] = [
  { kind: 'resistive', ohms: [100_000, 100_000, 100_000] },
  { kind: 'neon', ohms: [150_000, 150_000, 150_000], strikeVolts: [67, 67, 67] },
]
const bulbWatts = [60, 40] as const

const expected = new Map<string, Expected>()

/**
 * What a cause lets one expect in a context, through a meter of this input resistance. Kept once computed.
 * @param meterOhms input resistance of the voltmeter, ohms
 */
export function expect(context: WiringContext, cause: ElectricalCause, meterOhms: number): Expected {
  const key = `${context.source} ${context.system} ${context.wiring} ${cause} ${meterOhms}`
  const known = expected.get(key)
  if (known !== undefined) return known
  const made = predict(context, cause, meterOhms)
  expected.set(key, made)
  return made
}

/** Forgets what was computed: for measuring how long it takes. */
export function forgetExpected(): void {
  expected.clear()
}

function predict(context: WiringContext, cause: ElectricalCause, meterOhms: number): Expected {
  const ranges = rangesWith(context, cause)
  const readings = new Map<string, Band>()
  const observations = new Map<string, { typical: string; can: string[] }>()
  const meter = meterOf(meterOhms)
  const together: (Band | undefined)[] = []
  const widened = (band: Band | undefined, value: number): Band => {
    if (band === undefined) return { low: value, typical: value, high: value }
    band.low = Math.min(band.low, value)
    band.high = Math.max(band.high, value)
    return band
  }
  const take = (p: Parameters, turn: number) => {
    const m = measured(context, wire(context, cause, p), p)
    const tester = testers[turn % testers.length] as Tester
    const found = takeReadings(m, { meter, tester, bulbWatts: bulbWatts[turn % bulbWatts.length] ?? 60 })
    for (const [id, value] of Object.entries(found)) {
      if (typeof value === 'number') readings.set(id, widened(readings.get(id), value))
      else {
        const states = observations.get(id)
        if (states === undefined) observations.set(id, { typical: value, can: [value] })
        else if (!states.can.includes(value)) states.can.push(value)
      }
    }
    relations.forEach((relation, i) => {
      const value = valueOf(relation, found)
      if (value !== undefined) together[i] = widened(together[i], value)
    })
  }
  take(typicalOf(ranges), 0)
  pointsIn(ranges, corners, inners).forEach(take)
  return { readings, observations, together }
}
