import { magnitude } from '../network.ts'
import type { Node } from '../network.ts'
import { acrossPort } from '../solve.ts'
import type { Factored } from '../solve.ts'

/** A filament bulb by what is stamped on it. */
export type Bulb = { ratedWatts: number; ratedVolts: number }

/**
 * Amps go with volts to the power 0.55 about the rating, light to the power 3.4 (IES Lighting Handbook's curves for
 * gas-filled lamps, from memory; exact to a few per cent from 90 to 110 % of the rating, a guide far below). Ohms
 * then go with volts to the power 0.45 and watts to the power 1.55.
 */
const ampsPower = 0.55
const lightPower = 3.4

/** A cold filament has a twelfth to a fifteenth of its hot resistance (common practice, from memory). */
const coldShare = 1 / 13

/**
 * How a bulb looks, by the part of its rated volts across it. Chosen so that half voltage, with its tenth of the
 * light, is dim: it is easily taken for dark in daylight, so judge by the volts across the bulb.
 */
export const bulbLooks = [
  { look: 'bright', fromPart: 0.75, because: 'From three quarters it gives over a third of its light.' },
  { look: 'dim', fromPart: 0.2, because: 'Below a fifth even the red of the filament is gone.' },
  { look: 'dark', fromPart: 0, because: 'Nothing to see.' },
] as const
export type BulbLook = (typeof bulbLooks)[number]['look']

/** Ohms of the filament with these volts across it for longer than a second. */
export function filamentOhms({ ratedWatts, ratedVolts }: Bulb, volts: number): number {
  const hot = (ratedVolts * ratedVolts) / ratedWatts
  return hot * Math.max(coldShare, (volts / ratedVolts) ** (1 - ampsPower))
}

export type BulbBetween = {
  /** Across the bulb. */
  volts: number
  amps: number
  watts: number
  ohms: number
  /** Part of its full light, 1 at rated volts. */
  light: number
  look: BulbLook
}

/** Steps to one part in a million: each leaves less than half of the last one's error. */
const steps = 40

/**
 * What a bulb does between two points.
 *
 * Its ohms follow its volts and its volts its ohms. The two settle on one answer: volts across a resistance rise at
 * most in proportion with it, and the resistance with volts to the power 0.45, so each step shrinks the error.
 */
export function bulbBetween(network: Factored, a: Node, b: Node, bulb: Bulb): BulbBetween {
  const port = network.port(a, b)
  let ohms = filamentOhms(bulb, magnitude(port.open))
  let volts = 0
  for (let step = 0; step < steps; step++) {
    volts = magnitude(acrossPort(port, { re: 1 / ohms, im: 0 }))
    const next = filamentOhms(bulb, volts)
    const settled = Math.abs(next - ohms) < 1e-6 * ohms
    ohms = next
    if (settled) break
  }
  const part = volts / bulb.ratedVolts
  const look = bulbLooks.find(({ fromPart }) => part >= fromPart)?.look ?? 'dark'
  return { volts, amps: volts / ohms, watts: (volts * volts) / ohms, ohms, light: part ** lightPower, look }
}
