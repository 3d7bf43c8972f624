/**
 * Every electrical cause of the catalogue as a change of the sound wiring: what it narrows among the parameters,
 * and what it edits. The physics behind each row stands in words beside it.
 */
import type { Branch } from '../network.ts'
import { hasPanel, hasTwoLegs, nominalVolts, ohmsScale } from './context.ts'
import type { ElectricalCause, WiringContext } from './context.ts'
import { add, couple, join, move, open, remove, replace, swap } from './edits.ts'
import type { Edit } from './edits.ts'
import { cableFaradsPerFoot, capacitance, feedOf, resistance } from './healthy.ts'
import type { Choice, Parameters, Place, Ranges } from './parameters.ts'
import { choice as of, even } from './ranges.ts'

export type Fault = {
  /** What is wrong, in a few words. */
  is: string
  /** What it narrows: a range of its own, or the few choices in which it can be. */
  needs?: (context: WiringContext) => Partial<Ranges>
  edits: (p: Parameters, context: WiringContext) => Edit[]
}

/** Weighted places of a fault; a feeder only where there is one. */
const at = (context: WiringContext, places: Partial<Record<Place, number>>): Choice<Place> =>
  of(
    'where it is found; common practice, no source',
    ...(Object.entries(places) as [Place, number][]).filter(
      ([place]) => hasPanel(context) || (place !== 'feeder' && place !== 'panel'),
    ),
  )
const bondAtSource = of<'source' | 'panel'>('the bond is at the source', ['source', 1])

/** The stretch of a wire on which a fault sits. */
const stretch = (p: Parameters, wire: 'hot' | 'neutral' | 'ground'): string =>
  `${p.faultAt === 'feeder' ? 'feeder' : p.faultAt === 'branch' ? 'branch' : 'last'}.${wire}`

/** An open wire, and the live cable that may run along it. */
const opened = (p: Parameters, context: WiringContext, wire: 'hot' | 'neutral' | 'ground'): Edit[] => {
  const name = stretch(p, wire)
  const feed = feedOf(context)
  const dead =
    p.faultAt === 'feeder' ? `panel.${wire}` : p.faultAt === 'branch' ? `joint.${wire}` : `box.${wire}`
  const beside = p.alongsideFeet > 0 && p.faultAt !== 'feeder' && wire !== 'hot'
  return [
    open(name),
    ...(beside ? [couple('alongside', `${feed}.hot`, dead, cableFaradsPerFoot * p.alongsideFeet)] : []),
  ]
}

/** Two conductors exchanged: at the slots, before the receptacle ahead, or on the feeder. */
const crossed = (p: Parameters, one: 'hot' | 'neutral', other: 'neutral' | 'ground'): Edit =>
  p.faultAt === 'receptacle'
    ? swap(`slot.${one}`, `slot.${other}`)
    : swap(`${p.faultAt}.${one}`, `${p.faultAt}.${other}`)

/** The second bond, at whichever end the first is not. */
const otherBond = (p: Parameters): Edit =>
  p.bondAt === 'source'
    ? join('bond.second', 'panel.neutral', 'panel.ground', p.secondBondOhms)
    : join('bond.second', 'source.neutral', 'source.case', p.secondBondOhms)

/** How a balanced output holds its case in the middle. */
function balanced(p: Parameters, context: WiringContext): Edit[] {
  const volts = nominalVolts(context) * p.sourceLevel
  const ohms = (p.sourceOhms * ohmsScale(context)) / 2
  if (p.tie === 'bus' || p.tie === 'capacitors') {
    // Two capacitors of a DC bus are a thousand times those of a filter.
    const farads = p.tieFarads * (p.tie === 'bus' ? 250 : 1)
    return [
      remove('bond'),
      couple('tie.hot', 'source.hot', 'source.case', farads),
      couple('tie.neutral', 'source.neutral', 'source.case', farads),
    ]
  }
  const half = (name: string, from: string, to: string): Branch => ({
    kind: 'source',
    name,
    from,
    to,
    volts: volts / 2,
    degrees: 0,
    ohms,
  })
  return [
    remove('bond'),
    replace(
      'source.leg',
      half('source.leg', 'source.middle', 'source.hot'),
      half('source.half', 'source.neutral', 'source.middle'),
    ),
    join('tie', 'source.middle', 'source.case', p.tieOhms),
  ]
}

/** A hot on metal that nothing clears: the source floats, or the receptacle's ground wire is open behind it. */
function standing(p: Parameters, context: WiringContext): Edit[] {
  if (p.faultLacks === 'ground-wire')
    return [open('last.ground'), join('fault', 'box.hot', 'box.ground', p.faultOhms)]
  const place = p.faultAt === 'branch' ? 'joint' : p.faultAt === 'panel' ? 'panel' : 'source'
  const other = p.faultLeg === 'other' && hasTwoLegs(context)
  const hot = other ? `${place === 'joint' ? feedOf(context) : place}.hot2` : `${place}.hot`
  return [
    remove('bond'),
    join('fault', hot, place === 'source' ? 'source.case' : `${place}.ground`, p.faultOhms),
  ]
}

/** A neutral that two legs share, lost ahead of the panel or on a multiwire circuit. */
function sharedNeutral(p: Parameters, context: WiringContext): Edit[] {
  if (p.faultAt === 'feeder') return [open('feeder.neutral')]
  const ohms = (amps: number) => nominalVolts(context) / amps
  return [
    open('branch.neutral'),
    join('stuck.hot', 'joint.hot', 'joint.neutral', ohms(p.stuckAmps)),
    join('stuck.hot2', `${feedOf(context)}.hot2`, 'joint.neutral', ohms(p.stuckAmpsOther)),
  ]
}

/** Ohms in each conductor that make the drop of a run too long. */
const longRunOhms = (p: Parameters, context: WiringContext): number =>
  (p.runDrop * nominalVolts(context)) / 12 / 2

/** A dead output: its electromotive force gone, what it is when off left behind. */
function stopped(p: Parameters, context: WiringContext): Edit[] {
  const ohms = p.offLooks === 'winding' ? p.windingOhms : p.electronicOffOhms
  const rest = (name: string, to: string, degrees: number): Branch => ({
    kind: 'source',
    name,
    from: context.source === 'utility' ? 'winding.neutral' : 'source.neutral',
    to,
    volts: p.restVolts,
    degrees,
    ohms,
  })
  return [
    replace('source.leg', rest('source.leg', 'source.hot', 0)),
    ...(hasTwoLegs(context) ? [replace('source.leg2', rest('source.leg2', 'source.hot2', 180))] : []),
  ]
}

export const faults: Readonly<Record<ElectricalCause, Fault>> = {
  sound: { is: 'nothing', edits: () => [] },

  // The source and its bond
  'floating-neutral': {
    is: 'no bond anywhere: filters alone hold the case between the wires',
    edits: () => [remove('bond')],
  },
  'balanced-output': {
    is: 'the case is tied to the middle of the output',
    edits: balanced,
  },
  'isolated-output': {
    is: 'no bond, and the ground pin hangs free beside the case',
    needs: (context) =>
      hasPanel(context) ? {} : { branchFeet: even(0.1, 0.4, 3, 'ft', 'mostly measured on the case itself') },
    edits: (p) => [
      remove('bond'),
      replace('source.pin', capacitance('source.pin', 'source.case', 'source.ground', p.pinFarads)),
    ],
  },
  'double-bond': {
    is: 'a second bond beside the wanted one: the ground wire carries its share',
    edits: (p) => [otherBond(p)],
  },
  'rod-only-return': {
    is: 'bonded at the source, and no grounding conductor to the panel: earth is the only way back',
    needs: () => ({
      bondAt: bondAtSource,
      panelRod: of('the panel stands on its rod', [true, 1]),
      sourceRod: of('and so does the source', [true, 1]),
    }),
    edits: () => [remove('feeder.ground')],
  },
  'standing-ground-fault': {
    is: 'a hot wire on metal, and no way back that would trip anything',
    needs: (context) => ({
      faultLacks:
        context.source === 'utility'
          ? of('a utility is bonded: the ground wire is open', ['ground-wire', 1] as const)
          : of(
              'mostly a source without a bond',
              ['bond', 17] as const,
              ['ground-wire', hasPanel(context) ? 3 : 2] as const,
            ),
      faultAt: at(context, { source: 1, panel: 1, branch: 1 }),
      faultLeg: hasTwoLegs(context)
        ? of('either leg', ['circuit', 1] as const, ['other', 1] as const)
        : of('the one leg', ['circuit', 1] as const),
    }),
    edits: standing,
  },
  'low-source-voltage': {
    is: 'the source gives too little',
    needs: () => ({ sourceLevel: even(0.64, 0.8, 0.885, 'of nominal', 'below every limit a source has') }),
    edits: () => [],
  },
  'high-source-voltage': {
    is: 'the source gives too much',
    needs: () => ({ sourceLevel: even(1.1, 1.16, 1.3, 'of nominal', 'above every limit a source has') }),
    edits: () => [],
  },
  'source-off': { is: 'the source gives nothing', edits: stopped },

  // The feed
  'shared-neutral-lost': {
    is: 'the neutral of a split-phase feed is open: two legs in series through what runs on them',
    needs: (context) => ({
      faultAt: at(context, { feeder: 7, branch: 3 }),
      houseAmps: { ...even(0.4, 3, 15, 'A', 'what runs on this leg when the neutral goes'), spread: 'log' },
      houseAmpsOther: { ...even(0.4, 6, 15, 'A', 'what runs on the other'), spread: 'log' },
    }),
    edits: sharedNeutral,
  },

  // The circuit: something open
  'open-ground': {
    is: 'the ground wire is open: cable capacitance alone holds the slot',
    edits: (p, context) => opened(p, context, 'ground'),
  },
  'open-neutral': {
    is: 'the neutral is open: what is plugged in carries the hot over',
    needs: (context) => ({
      // Ahead of a split-phase panel that is another cause: the neutral of the feed lost.
      faultAt: at(context, { receptacle: 4, branch: 4, ...(hasTwoLegs(context) ? {} : { feeder: 2 }) }),
    }),
    edits: (p, context) => opened(p, context, 'neutral'),
  },
  'open-hot': {
    is: 'the hot is open',
    needs: (context) => ({ faultAt: at(context, { receptacle: 4, branch: 4, feeder: 2 }) }),
    edits: (p, context) => opened(p, context, 'hot'),
  },

  // The circuit: something swapped or joined
  'reversed-polarity': {
    is: 'hot and neutral exchanged',
    needs: (context) => ({
      // On the feeder the neutral bar is then live, which only a bond at the source bears.
      faultAt: at(context, { receptacle: 6, branch: 3, ...(hasTwoLegs(context) ? {} : { feeder: 1 }) }),
    }),
    edits: (p) => [
      crossed(p, 'hot', 'neutral'),
      ...(p.faultAt === 'feeder'
        ? [replace('bond', resistance('bond', 'source.neutral', 'source.case', p.bondOhms))]
        : []),
    ],
  },
  'hot-ground-swapped': {
    is: 'hot and ground exchanged',
    edits: (p) => [crossed(p, 'hot', 'ground')],
  },
  'two-hots': {
    is: 'the neutral wire on the other leg',
    edits: (p, context) => [move(stretch(p, 'neutral'), `${feedOf(context)}.hot2`)],
  },
  'bootleg-ground': {
    is: 'the ground slot jumped to neutral, mostly where the cable has no ground wire',
    edits: (p) => [
      join('bootleg', 'receptacle.neutral', 'receptacle.ground', p.bootlegOhms),
      ...(p.groundWire === 'none' ? [open('last.ground')] : []),
    ],
  },
  'bootleg-ground-reversed': {
    is: 'the same with hot and neutral exchanged: ground and all metal is live',
    edits: (p) => [
      crossed(p, 'hot', 'neutral'),
      join('bootleg', 'receptacle.neutral', 'receptacle.ground', p.bootlegOhms),
      open('last.ground'),
    ],
  },

  // The circuit: too many ohms
  'loose-neutral': {
    is: 'a poor joint in the neutral',
    needs: (context) => ({ faultAt: at(context, { branch: 4, receptacle: 3, feeder: 3 }) }),
    edits: (p, context) => [add(stretch(p, 'neutral'), p.jointOhms * ohmsScale(context))],
  },
  'loose-hot': {
    is: 'a poor joint in the hot',
    needs: (context) => ({ faultAt: at(context, { branch: 4, receptacle: 3, feeder: 3 }) }),
    edits: (p, context) => [add(stretch(p, 'hot'), p.jointOhms * ohmsScale(context))],
  },
  'long-run': {
    is: 'the run is too long or its wire too thin: hot and neutral lose alike',
    needs: (context) => ({ faultAt: at(context, { branch: 3, feeder: 1 }) }),
    edits: (p, context) =>
      (['hot', 'neutral', 'ground'] as const).map((wire) => add(stretch(p, wire), longRunOhms(p, context))),
  },
}
