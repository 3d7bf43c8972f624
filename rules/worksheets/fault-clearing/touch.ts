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

function iecSays(
  seconds: number,
  volts: number,
  voltsToGround: number,
): { holds: boolean; sentence: string } {
  const allowed = longestDisconnection(voltsToGround)
  const asked = `IEC 60364-4-41 allows ${inTime(allowed)} at ${written(voltsToGround)} V to ground`
  if (voltsToGround <= standingTouchVolts)
    return { holds: true, sentence: 'IEC 60364-4-41 sets no time up to 50 V to ground.' }
  if (seconds <= allowed) return { holds: true, sentence: `${asked}; that is kept.` }
  return volts <= standingTouchVolts
    ? { holds: true, sentence: `${asked}, or no more than 50 V on the metal; the second is kept.` }
    : { holds: false, sentence: `${asked}; that is not kept, and the metal has more than 50 V.` }
}

/** @param voltsToGround of the system, for the table of times */
export function touchOf({ amps, touchVolts, lasts }: Clearing, voltsToGround: number): Touch {
  const volts = touchVolts.most
  const seconds = lasts.toSeconds
  const ohms = bodyOhms(volts, 'low')
  const milliamps = (1000 * volts) / ohms
  const zone = zoneOf(milliamps, seconds)
  const howLong = seconds === Infinity ? 'for as long as the fault stands' : `for up to ${inTime(seconds)}`
  const hand = `${written(milliamps)} mA, which ${zoneWords[zone]}`
  const touch = { volts, seconds, bodyOhms: ohms, milliamps, zone }
  if (amps.most === 0)
    return {
      ...touch,
      iecHolds: false,
      sentences: [
        `The metal stands at ${written(volts)} V against the other conductor, for as long as the fault stands: a body between the two gets up to ${hand}. To earth only stray current flows, until a second fault or an earthed wire closes the way.`,
        'IEC 60364-4-41 lets a first fault stand only in a system built for it: with insulation monitoring (IT), or with one piece of equipment on a separated source.',
      ],
    }
  const iec = iecSays(seconds, volts, voltsToGround)
  return {
    ...touch,
    iecHolds: iec.holds,
    sentences: [
      `Meanwhile the metal stands at ${written(volts)} V ${howLong}. Through a body, hand to hand and dry, that drives up to ${hand}.`,
      iec.sentence,
    ],
  }
}
