import { meterOf } from '../instruments/meter.ts'
import type { Meter } from '../instruments/meter.ts'
import type { Tester } from '../instruments/plug-in-tester.ts'
import { defaultMeterOhms } from '../../findings/sheet.ts'
import { amps, loopOhms } from './readings/amps.ts'
import { deadOhms } from './readings/dead.ts'
import { gfci } from './readings/gfci.ts'
import { testBulbs, testerLamps } from './readings/lamps.ts'
import type { Found, Measured } from './readings/measured.ts'
import { volts } from './readings/volts.ts'

/** What a tech carries. */
export type Kit = { meter: Meter; tester: Tester; bulbWatts: number }
export const usualKit: Kit = {
  meter: meterOf(defaultMeterOhms),
  tester: { kind: 'resistive', ohms: [150_000, 150_000, 150_000] },
  bulbWatts: 60,
}

/**
 * Every reading and electrical observation of the catalogue that this wiring gives, by id: volts, lamps, bulbs, GFCI
 * running; amps and loop with the load on; ohms dead. What the wires alone don't decide (insulation, ratings, the
 * battery, a GFCI's time) is not among them, nor what people report: `readings/signs.ts` says what they notice.
 */
export function takeReadings(m: Measured, kit: Kit): Found {
  const found: Found = {}
  volts(m, kit.meter, found)
  testerLamps(m, kit.tester, found)
  testBulbs(m, kit.bulbWatts, kit.meter, found)
  deadOhms(m, found)
  amps(m, found)
  loopOhms(m, found)
  gfci(m, found)
  return found
}
