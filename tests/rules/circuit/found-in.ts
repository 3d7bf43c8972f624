import { meterOf } from '../../../rules/circuit/instruments/meter.ts'
import type { ElectricalCause, WiringContext } from '../../../rules/circuit/wiring/context.ts'
import { typicalOf } from '../../../rules/circuit/wiring/parameters.ts'
import type { Parameters } from '../../../rules/circuit/wiring/parameters.ts'
import { measured } from '../../../rules/circuit/wiring/readings/measured.ts'
import type { Measured } from '../../../rules/circuit/wiring/readings/measured.ts'
import { takeReadings, usualKit } from '../../../rules/circuit/wiring/take-readings.ts'
import type { Kit } from '../../../rules/circuit/wiring/take-readings.ts'
import { rangesWith, wire } from '../../../rules/circuit/wiring/wire.ts'

export const inverterPanel: WiringContext = {
  source: 'all-in-one-inverter',
  system: '120',
  wiring: 'panel',
}
export const stationAlone: WiringContext = { source: 'power-station', system: '120', wiring: 'direct' }
export const generatorPanel: WiringContext = { source: 'generator', system: '120', wiring: 'panel' }
export const splitGenerator: WiringContext = { source: 'generator', system: '120/240', wiring: 'panel' }
export const utilityPanel: WiringContext = { source: 'utility', system: '120/240', wiring: 'panel' }
export const european: WiringContext = { source: 'generator', system: '230', wiring: 'panel' }

/** A wiring with a fault, typical but for what is given. */
export function wired(
  cause: ElectricalCause,
  context: WiringContext = inverterPanel,
  given: Partial<Parameters> = {},
): Measured {
  const p = { ...typicalOf(rangesWith(context, cause)), ...given }
  return measured(context, wire(context, cause, p), p)
}

/** What is found there: `volts`, `observed`. */
export function foundIn(
  cause: ElectricalCause,
  context: WiringContext = inverterPanel,
  given: Partial<Parameters> = {},
  kit: Partial<Kit> = {},
) {
  const found = takeReadings(wired(cause, context, given), { ...usualKit, ...kit })
  const amount = (id: string): number => {
    const value = found[id]
    if (typeof value !== 'number') throw new Error(`${id} was not read`)
    return value
  }
  return {
    found,
    amount,
    seen: (id: string) => found[id],
    /** Hot–neutral, hot–ground and neutral–ground at a place. */
    sides: (place = 'receptacle') =>
      (['hn', 'hg', 'ng'] as const).map((pair) => amount(`${place}.${pair}.volts`)) as [
        number,
        number,
        number,
      ],
    lamps: ['hn', 'hg', 'ng'].map((pair) => found[`tester.${pair}-lamp`]).join('/'),
  }
}

export const lowResistance = { meter: meterOf(10_000) }
export const neon: Partial<Kit> = {
  tester: { kind: 'neon', ohms: [150_000, 150_000, 150_000], strikeVolts: [67, 67, 67] },
}
