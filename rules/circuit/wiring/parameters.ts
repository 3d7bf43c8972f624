/**
 * What is not known of a wiring before somebody has looked: each range with its unit and the reason for it.
 * Ohms are those of a 120 V system; `healthy.ts` scales what grows with nominal volts.
 */
export type Range = {
  low: number
  typical: number
  high: number
  unit: string
  /** Spread evenly over the numbers, or over their orders of magnitude. */
  spread: 'even' | 'log'
  /** How often the thing is not there at all: its number is then 0. */
  absent?: number
  because: string
}
export type Option<T> = { value: T; weight: number }
/** The typical option stands first. */
export type Choice<T> = { options: readonly Option<T>[]; because: string }

/** Every number of a wiring, in the unit its range names. */
export type Numbers = {
  sourceLevel: number
  sourceOhms: number
  legRatio: number
  hertzRatio: number
  windingOhms: number
  electronicOffOhms: number
  filterFarads: number
  filterSkew: number
  filterSkewOther: number
  strayFarads: number
  caseStrayFarads: number
  bondOhms: number
  secondBondOhms: number
  panelRodOhms: number
  sourceRodOhms: number
  utilityEarthOhms: number
  utilityNeutralOhms: number
  feederFeet: number
  feederOhmsPerFoot: number
  feederGroundOhmsPerFoot: number
  branchFeet: number
  lastFeet: number
  branchOhmsPerFoot: number
  contactHotOhms: number
  contactNeutralOhms: number
  contactGroundOhms: number
  houseAmps: number
  houseAmpsOther: number
  houseAmpsAcross: number
  houseFilterFarads: number
  slotFarads: number
  testAmps: number
  pluggedInOhms: number
  leftInOhms: number
  leadEarthOhms: number
  alongsideFeet: number
  jointOhms: number
  faultOhms: number
  bootlegOhms: number
  restVolts: number
  runDrop: number
  stuckAmps: number
  stuckAmpsOther: number
  tieOhms: number
  tieFarads: number
  pinFarads: number
}
export type Place = 'source' | 'feeder' | 'panel' | 'branch' | 'receptacle'
/** Everything of a wiring that is one of a few. */
export type Choices = {
  /** Where the one wanted bond sits. */
  bondAt: 'source' | 'panel'
  /** What closes the bond: a wire, or a relay that lets go when the source is off. */
  bondBy: 'wire' | 'relay'
  /** What the output shows an ohmmeter when the source is off. */
  offLooks: 'winding' | 'electronic' | 'open'
  panelRod: boolean
  sourceRod: boolean
  /** The panel's leg that feeds the circuit. */
  circuitLeg: 1 | 2
  /** Something left on while ohms are taken, and where. */
  leftIn: 'nothing' | 'on-circuit' | 'at-panel'
  /** Whether what is plugged in stays in for every reading, or only while the tester is in. */
  pluggedInStays: boolean
  /** Where the fault sits: the stretch or the place. */
  faultAt: Place
  /** Which hot a fault takes: the circuit's, or the other leg's. */
  faultLeg: 'circuit' | 'other'
  /** How a balanced output is tied to the case. */
  tie: 'wire' | 'tap' | 'bus' | 'capacitors'
  /** Whether the cable of a bootleg has a sound ground wire beside the jumper. */
  groundWire: 'none' | 'whole'
  /** Where a GFCI or RCD stands, if anywhere. */
  gfciAt: 'nowhere' | 'circuit' | 'source'
  /** What a standing fault lacks to trip: a bond, or the ground wire. */
  faultLacks: 'bond' | 'ground-wire'
}
export type Parameters = Numbers & Choices
export type Ranges = { [K in keyof Numbers]: Range } & { [K in keyof Choices]: Choice<Choices[K]> }

export const isRange = (one: Range | Choice<unknown>): one is Range => 'spread' in one

/** The typical wiring of these ranges: what is mostly absent is absent, each choice its first option. */
export function typicalOf(ranges: Ranges): Parameters {
  const entries = Object.entries(ranges).map(([name, one]: [string, Range | Choice<unknown>]) => [
    name,
    isRange(one) ? ((one.absent ?? 0) > 0.5 ? 0 : one.typical) : one.options[0]?.value,
  ])
  return Object.fromEntries(entries) as Parameters
}
