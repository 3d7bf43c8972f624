import { bodyOhms, longestDisconnection, standingTouchVolts, zoneOf, zoneWords } from '../body.ts'
import type { Zone } from '../body.ts'
import { inTime, written } from '../written.ts'
import type { Clearing } from './clearing.ts'

/** What the metal does to a hand meanwhile. */
export type Touch = {
  volts: number
  /** For how long, s; Infinity for as long as the fault stands. */
  seconds: number
  bodyOhms: number
  milliamps: number
  zone: Zone
  /** Whether IEC 60364-4-41's time is kept, or its 50 V. */
  iecHolds: boolean
  sentences: string[]
}

/** @param voltsToGround of the system, for the table of times */
export function touchOf({ touchVolts, lasts }: Clearing, voltsToGround: number): Touch {
  const volts = touchVolts.most
  const seconds = lasts.toSeconds
  const ohms = bodyOhms(volts, 'low')
  const milliamps = (1000 * volts) / ohms
  const zone = zoneOf(milliamps, seconds)
  const allowed = longestDisconnection(voltsToGround)
  const iecHolds = seconds <= allowed || volts <= standingTouchVolts
  const howLong = seconds === Infinity ? 'for as long as the fault stands' : `for up to ${inTime(seconds)}`
  const sentences = [
    `Meanwhile the metal stands at ${written(volts)} V ${howLong}. Through a body, hand to hand and dry, that drives up to ${written(milliamps)} mA, which ${zoneWords[zone]}.`,
    iecHolds
      ? seconds <= allowed
        ? `IEC 60364-4-41 allows ${inTime(allowed)} at ${written(voltsToGround)} V to ground; that is kept.`
        : `IEC 60364-4-41 would want it off within ${inTime(allowed)}, or no more than 50 V on the metal; the second is kept.`
      : `IEC 60364-4-41 allows ${inTime(allowed)} at ${written(voltsToGround)} V to ground; that is not kept, and the metal has more than 50 V.`,
  ]
  return { volts, seconds, bodyOhms: ohms, milliamps, zone, iecHolds, sentences }
}
