/** The ranges themselves: source, strays, grounds, wires, loads, and what only a fault has. */
import { americanWireOhms } from '../conductors.ts'
import type { Gauge } from '../conductors.ts'
import { hasPanel } from './context.ts'
import type { WiringContext } from './context.ts'
import type { Choice, Choices, Place, Range, Ranges } from './parameters.ts'

export const even = (low: number, typical: number, high: number, unit: string, because: string): Range => ({
  low,
  typical,
  high,
  unit,
  spread: 'even',
  because,
})
export const log = (low: number, typical: number, high: number, unit: string, because: string): Range => ({
  ...even(low, typical, high, unit, because),
  spread: 'log',
})
/** Weighted options, the typical one first; those of weight 0 are left out. */
export const choice = <T>(because: string, ...options: (readonly [T, number])[]): Choice<T> => ({
  options: options.filter(([, weight]) => weight > 0).map(([value, weight]) => ({ value, weight })),
  because,
})

/** What a source gives, and how stiffly. */
function sourceRanges({ source }: WiringContext) {
  const utility = source === 'utility'
  const engine = source === 'generator'
  return {
    sourceLevel: utility
      ? even(
          0.955,
          1,
          1.045,
          'of nominal',
          'ANSI C84.1 service range A is 0.95 to 1.05; a little room for the meter',
        )
      : engine
        ? even(0.955, 1.02, 1.075, 'of nominal', 'engines idle at 125 to 129 V; common practice, no source')
        : even(0.965, 1, 1.035, 'of nominal', 'an inverter holds its output; common practice, no source'),
    sourceOhms: utility
      ? log(0.015, 0.04, 0.09, 'Ω a leg', 'transformer and service drop of a house, 50 to 300 ft')
      : engine
        ? log(0.08, 0.15, 0.3, 'Ω a leg', 'a 2 to 8 kW set sags 2 to 5 % at full load')
        : log(0.02, 0.06, 0.16, 'Ω a leg', 'a 1 to 6 kW inverter sags 1 to 3 % at full load'),
    legRatio: even(0.995, 1, 1.005, 'of the first leg', 'two halves of one winding'),
    hertzRatio: engine
      ? even(0.98, 1.02, 1.045, 'of nominal', 'engines idle near 62 Hz')
      : even(0.998, 1, 1.002, 'of nominal', 'a utility and a crystal hold within 0.2 %'),
    windingOhms: log(0.3, 1, 3, 'Ω', 'generator or transformer winding, by an ohmmeter'),
    electronicOffOhms: log(1e6, 4e6, 12e6, 'Ω', 'snubbers and sense resistors of an idle inverter'),
    offLooks: utility
      ? choice<Choices['offLooks']>('the main is open: nothing behind it', ['open', 1])
      : engine
        ? choice<Choices['offLooks']>('an alternator stays a winding', ['winding', 1])
        : choice<Choices['offLooks']>(
            'an output transformer reads as a winding, a bridge of transistors as megohms or nothing',
            ['electronic', 0.5],
            ['winding', source === 'power-station' ? 0.08 : 0.3],
            ['open', 0.2],
          ),
    utilityEarthOhms: log(3, 10, 25, 'Ω', "the utility's own earth at its transformer"),
    utilityNeutralOhms: even(0.01, 0.02, 0.04, 'Ω', 'neutral of the service drop'),
  }
}

/** What ties the wires to the case and to earth without a wire: filters, cables, the ground beneath. */
function strayRanges(context: WiringContext) {
  const panel = hasPanel(context)
  return {
    filterFarads: log(
      0.7e-9,
      2.2e-9,
      8e-9,
      'F',
      'Y2 capacitors, 1 to 4.7 nF each, 2.2 nF common (IEC 60384-14)',
    ),
    filterSkew: {
      ...even(-1.2, 0, 1.2, 'ln of ratio', 'one wire has more of them than the other: 25 to 75 % happens'),
      absent: 0.45,
    },
    filterSkewOther: { ...even(-1.2, 0, 1.2, 'ln of ratio', 'the other leg against this one'), absent: 0.45 },
    strayFarads: panel
      ? log(50e-12, 300e-12, 2e-9, 'F', 'wires of a house to earth')
      : log(10e-12, 80e-12, 500e-12, 'F', 'a portable set and its cords to earth'),
    caseStrayFarads: log(10e-12, 80e-12, 500e-12, 'F', 'a case standing on a floor'),
    houseFilterFarads: {
      ...log(0.2e-9, 1e-9, 3e-9, 'F', 'filters of the appliances plugged in about the house'),
      absent: 0.5,
    },
    slotFarads: log(5e-12, 15e-12, 50e-12, 'F', 'a receptacle and what hangs on its ground slot'),
    alongsideFeet: {
      ...even(3, 20, 50, 'ft', 'another live cable runs along the dead wire'),
      absent: panel ? 0.85 : 1,
    },
  }
}

/** Bonds and rods. */
function groundRanges(context: WiringContext) {
  const { source } = context
  const portable = source !== 'utility' && source !== 'generator'
  return {
    bondOhms: log(0.005, 0.02, 0.06, 'Ω', 'a screw or jumper of some inches'),
    secondBondOhms: log(0.005, 0.02, 0.06, 'Ω', 'the same'),
    bondAt: hasPanel(context)
      ? choice<Choices['bondAt']>(
          'bonded at the source or at the first disconnect',
          ['source', 1],
          ['panel', 1],
        )
      : choice<Choices['bondAt']>('no panel: the source holds the bond', ['source', 1]),
    bondBy: portable
      ? choice<Choices['bondBy']>(
          'some inverters bond by a relay that closes only while inverting',
          ['wire', 4],
          ['relay', 1],
        )
      : choice<Choices['bondBy']>('a wire', ['wire', 1]),
    panelRodOhms: log(8, 25, 150, 'Ω', 'one 8 or 10 ft rod in 25 to 400 Ω·m of soil (Dwight)'),
    sourceRodOhms:
      source === 'utility'
        ? log(5, 15, 60, 'Ω', 'electrode at the service')
        : log(10, 30, 150, 'Ω', 'a rod of its own'),
    panelRod: hasPanel(context)
      ? choice('most panels have a rod', [true, 9], [false, 1])
      : choice('no panel, no rod of it', [false, 1]),
    sourceRod:
      source === 'utility'
        ? choice('a service has an electrode', [true, 1])
        : choice(
            'a hard-wired source has a rod now and then, a portable one seldom',
            [false, 4],
            [true, hasPanel(context) ? 2 : source === 'generator' ? 0.6 : 0.2],
          ),
    leadEarthOhms: log(5, 20, 60, 'Ω', 'the independent earth at the end of the long lead'),
  }
}

/** Ω a foot of a copper conductor, one way. */
const copper = (gauge: Gauge, solid: boolean, celsius: number): number =>
  americanWireOhms({ gauge, metal: 'copper', solid, feet: 1, celsius })

/** Wires and joints from the source to the slots. */
function wireRanges(context: WiringContext) {
  const panel = hasPanel(context)
  const contact = log(0.003, 0.01, 0.03, 'Ω a joint', 'a screw or a push-in joint in order')
  return {
    feederFeet: log(5, 30, 100, 'ft', 'source to panel, from wall to wall or across a yard'),
    feederOhmsPerFoot: log(
      copper('6', false, 25),
      copper('8', false, 40),
      copper('10', false, 75),
      'Ω/ft',
      '6 to 10 AWG copper stranded, 25 to 75 °C',
    ),
    feederGroundOhmsPerFoot: even(
      copper('10', false, 25),
      copper('10', false, 40),
      copper('10', false, 75),
      'Ω/ft',
      '10 AWG copper stranded, 25 to 75 °C',
    ),
    branchFeet: panel
      ? even(12, 45, 150, 'ft', 'panel to the farthest receptacle of a house')
      : log(0.3, 6, 60, 'ft', 'a cord, or the few inches to a receptacle on the case'),
    lastFeet: panel
      ? log(3, 12, 120, 'ft', 'from the receptacle before this one')
      : log(0.2, 2, 55, 'ft', 'the last cord'),
    branchOhmsPerFoot: panel
      ? even(
          copper('12', true, 25),
          copper('12', true, 40),
          copper('14', true, 75),
          'Ω/ft',
          '12 and 14 AWG copper solid, 25 to 75 °C',
        )
      : log(
          copper('12', false, 25),
          copper('14', false, 25),
          copper('16', false, 75),
          'Ω/ft',
          'cords of 12 to 16 AWG copper stranded, 25 to 75 °C',
        ),
    contactHotOhms: contact,
    contactNeutralOhms: contact,
    contactGroundOhms: contact,
  }
}

/** What draws current: the house, the known load, what was left in. */
function loadRanges(context: WiringContext) {
  const panel = hasPanel(context)
  return {
    houseAmps: { ...log(0.4, 3, 15, 'A', 'what else runs on this leg'), absent: panel ? 0.35 : 1 },
    houseAmpsOther: { ...log(0.4, 3, 15, 'A', 'what runs on the other leg'), absent: panel ? 0.35 : 1 },
    houseAmpsAcross: { ...log(1, 4, 12, 'A', 'what runs leg to leg'), absent: panel ? 0.7 : 1 },
    testAmps: even(8, 10, 12, 'A', 'the known load: 10 A or so'),
    pluggedInOhms: {
      ...log(20, 100, 500, 'Ω', 'something left plugged in further along: 30 to 700 W'),
      absent: 0.75,
    },
    pluggedInStays: choice(
      'it stays in for the meter too, or only the tester meets it',
      [true, 2],
      [false, 1],
    ),
    leftInOhms: {
      ...log(15, 100, 600, 'Ω', 'something hard-wired that stays in while ohms are taken'),
      absent: 0.88,
    },
    leftIn: panel
      ? choice<Choices['leftIn']>('on this circuit or elsewhere', ['on-circuit', 1], ['at-panel', 1])
      : choice<Choices['leftIn']>('on the cord', ['on-circuit', 1]),
    gfciAt: choice<Choices['gfciAt']>(
      'at the head of the circuit, or on a portable source itself',
      ['nowhere', 6],
      ['circuit', 3],
      ['source', context.source === 'utility' || context.source === 'all-in-one-inverter' ? 0 : 1],
    ),
    circuitLeg: choice<Choices['circuitLeg']>('either leg', [1, 1], [2, 1]),
  }
}

/** Numbers that only a fault has; `faults.ts` says which fault uses which. */
function faultRanges() {
  return {
    jointOhms: log(0.4, 1, 4, 'Ω', 'a poor joint that shows: 4 to 40 V at 10 A'),
    faultOhms: even(0, 0.5, 5, 'Ω', 'bare copper on metal, or through rust'),
    bootlegOhms: log(0.01, 0.02, 0.06, 'Ω', 'a jumper of some inches with two screws'),
    restVolts: even(0, 0, 1.2, 'V', 'what a dead output picks up'),
    runDrop: even(0.055, 0.08, 0.15, 'of nominal', 'twice the advised 3 % and more, at 12 A'),
    stuckAmps: log(0.3, 2, 8, 'A', 'what runs on a multiwire circuit when its neutral goes'),
    stuckAmpsOther: log(0.3, 2, 8, 'A', 'the same on its other leg'),
    tieOhms: log(0.02, 0.08, 0.3, 'Ω', 'a center tap wired to the case'),
    tieFarads: log(
      100e-9,
      1e-6,
      4e-6,
      'F',
      'filter capacitors of microfarads that hold the case in the middle',
    ),
    pinFarads: log(0.5e-12, 4e-12, 15e-12, 'F', 'a ground pin connected to nothing, beside the case'),
    faultAt: choice<Place>('on the last stretch or before it', ['receptacle', 3], ['branch', 2]),
    faultLeg: choice<Choices['faultLeg']>("this circuit's leg", ['circuit', 1]),
    tie: choice<Choices['tie']>(
      'a tapped winding, a wire to the bridge, or capacitors',
      ['wire', 4],
      ['tap', 2],
      ['bus', 2],
      ['capacitors', 2],
    ),
    groundWire: choice<Choices['groundWire']>('mostly a two-wire cable', ['none', 3], ['whole', 2]),
    faultLacks: choice<Choices['faultLacks']>(
      'mostly a source without a bond',
      ['bond', 17],
      ['ground-wire', 3],
    ),
  }
}

/** Parameters that only a fault has: two faults at once each have their own. */
export const faultOnly = Object.keys(faultRanges()) as (keyof ReturnType<typeof faultRanges>)[]

/** Every range and choice of a wiring in this context, before a fault narrows some of them. */
export function rangesIn(context: WiringContext): Ranges {
  return {
    ...sourceRanges(context),
    ...strayRanges(context),
    ...groundRanges(context),
    ...wireRanges(context),
    ...loadRanges(context),
    ...faultRanges(),
  }
}
