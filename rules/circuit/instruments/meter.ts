import { magnitude } from '../network.ts'
import type { Node } from '../network.ts'
import { admittanceOf } from '../nodal.ts'
import { acrossPort } from '../solve.ts'
import type { Factored, Load } from '../solve.ts'

/** What a voltmeter is to the circuit: a resistance with a capacitance across it. */
export type Meter = { ohms: number; farads: number }

/**
 * Common practice: data sheets of handheld meters say under 100 pF, and a pair of test leads adds some tens. At
 * 60 Hz that is 27 MΩ beside the usual 10 MΩ: it moves a ghost, not a wire.
 */
export const meterFarads = 100e-12

/** A meter of this input resistance, ohms. */
export const meterOf = (ohms: number): Meter => ({ ohms, farads: meterFarads })

/** The meter as a load between two points. */
export const heldTo = (from: Node, to: Node, meter: Meter): Load => ({ from, to, ...meter })

/**
 * RMS volts a meter shows between two points. The model's waves are sines, so a true-RMS and an averaging meter
 * show the same.
 */
export const reads = (network: Factored, a: Node, b: Node, { ohms, farads }: Meter): number =>
  magnitude(acrossPort(network.port(a, b), admittanceOf(ohms, farads, network.hertz)))
