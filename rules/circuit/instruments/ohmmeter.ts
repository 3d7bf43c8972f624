import { overLimitOhms } from '../../findings/sheet.ts'
import type { Node } from '../network.ts'
import type { Factored } from '../solve.ts'

/** Common practice: the top range of handheld meters ends at 40 to 60 MΩ. */
const topOhms = 50e6

/**
 * Ohms an ohmmeter shows between two points of a dead circuit; `overLimitOhms` where it shows over limit.
 * @param limitOhms end of its top range
 * @throws Error unless the network was solved at 0 Hz, with its sources off
 */
export function ohmsBetween(dead: Factored, a: Node, b: Node, limitOhms: number = topOhms): number {
  if (dead.hertz !== 0) throw new Error('An ohmmeter is for a dead circuit: solve the network at 0 Hz.')
  const ohms = Math.abs(dead.port(a, b).impedance.re)
  return ohms > limitOhms ? overLimitOhms : ohms
}
