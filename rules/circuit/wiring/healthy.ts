/**
 * A sound wiring as a network: source, feeder, panel, circuit, receptacle, with its one bond, its rods, and all that
 * hangs on it without a wire. Faults change this network; see `faults.ts`.
 *
 *   source.hot ── feeder.hot ── panel.hot ── branch.hot ── joint.hot ── last.hot ── box.hot ── slot.hot ── receptacle.hot
 *
 * and likewise neutral and ground. `source.case` is the metal of the source, tied to its grounding terminal
 * `source.ground`. With two legs `hot` is the leg that feeds the circuit and `hot2` the other. `joint.*` is the
 * receptacle before this one: it shows how far a fault reaches. Loads plugged straight into the source have no
 * feeder and no panel: the circuit begins at the source.
 */
import { earth } from '../network.ts'
import type { Branch, Node } from '../network.ts'
import { hasPanel, hasTwoLegs, nominalVolts, ohmsScale } from './context.ts'
import type { WiringContext } from './context.ts'
import type { Parameters } from './parameters.ts'

/** About 20 pF a foot between two conductors of a cable: 14-2 cable measured at 21 pF/ft. */
export const cableFaradsPerFoot = 20e-12

export const resistance = (name: string, from: Node, to: Node, ohms: number): Branch => ({
  kind: 'resistance',
  name,
  from,
  to,
  ohms,
})
export const capacitance = (name: string, from: Node, to: Node, farads: number): Branch => ({
  kind: 'capacitance',
  name,
  from,
  to,
  farads,
})
const source = (
  name: string,
  from: Node,
  to: Node,
  volts: number,
  degrees: number,
  ohms: number,
): Branch => ({
  kind: 'source',
  name,
  from,
  to,
  volts,
  degrees,
  ohms,
})

/** The place a circuit begins: `panel`, or the source itself. */
export const feedOf = (context: WiringContext): 'panel' | 'source' => (hasPanel(context) ? 'panel' : 'source')

/**
 * Lengths in feet as built: a sound circuit is kept short enough that a 10 A load takes no more than some 3.5 % of
 * it (the 3 % that the NEC recommends, and a little), and the last stretch is a part of it.
 */
function lengthsOf(context: WiringContext, p: Parameters): { feeder: number; before: number; last: number } {
  const feeder = hasPanel(context) ? p.feederFeet : 0
  const drop =
    0.035 * nominalVolts(context) - 20 * feeder * p.feederOhmsPerFoot * (hasTwoLegs(context) ? 0.5 : 1)
  const longest = Math.max(10, drop / (20 * p.branchOhmsPerFoot))
  const branch = Math.min(p.branchFeet, longest)
  const last = Math.min(p.lastFeet, 0.9 * branch)
  return { feeder, before: branch - last, last }
}

function sourceParts(context: WiringContext, p: Parameters): Branch[] {
  const volts = nominalVolts(context) * p.sourceLevel
  const ohms = p.sourceOhms * ohmsScale(context)
  const utility = context.source === 'utility'
  const two = hasTwoLegs(context)
  const hotFilter = p.filterFarads * Math.exp(-p.filterSkew / 2)
  const neutralFilter = p.filterFarads * Math.exp(p.filterSkew / 2)
  const otherFilter = hotFilter * Math.exp(p.filterSkewOther)
  // A utility's neutral is earthed at its transformer, ahead of the service drop.
  const star = utility ? 'winding.neutral' : 'source.neutral'
  return [
    source('source.leg', star, 'source.hot', volts, 0, ohms),
    ...(two ? [source('source.leg2', star, 'source.hot2', volts * p.legRatio, 180, ohms)] : []),
    ...(utility
      ? [
          resistance('utility.neutral', star, 'source.neutral', p.utilityNeutralOhms),
          resistance('utility.earth', star, earth, p.utilityEarthOhms),
        ]
      : []),
    resistance('source.pin', 'source.case', 'source.ground', p.contactGroundOhms),
    capacitance('filter.hot', 'source.hot', 'source.case', hotFilter),
    capacitance('filter.neutral', 'source.neutral', 'source.case', neutralFilter),
    ...(two ? [capacitance('filter.hot2', 'source.hot2', 'source.case', otherFilter)] : []),
    capacitance('stray.hot', 'source.hot', earth, p.strayFarads),
    capacitance('stray.neutral', 'source.neutral', earth, p.strayFarads),
    ...(two ? [capacitance('stray.hot2', 'source.hot2', earth, p.strayFarads)] : []),
    capacitance('stray.case', 'source.case', earth, p.caseStrayFarads),
    ...(p.sourceRod ? [resistance('source.rod', 'source.case', earth, p.sourceRodOhms)] : []),
  ]
}

/** The three capacitances of a stretch of cable, between each two of its conductors. */
function cable(name: string, at: string, feet: number): Branch[] {
  const farads = cableFaradsPerFoot * feet
  return [
    capacitance(`${name}.hot-ground`, `${at}.hot`, `${at}.ground`, farads),
    capacitance(`${name}.neutral-ground`, `${at}.neutral`, `${at}.ground`, farads),
    capacitance(`${name}.hot-neutral`, `${at}.hot`, `${at}.neutral`, farads),
  ]
}

function feederAndPanel(context: WiringContext, p: Parameters): Branch[] {
  const two = hasTwoLegs(context)
  const feet = lengthsOf(context, p).feeder
  const ohms = feet * p.feederOhmsPerFoot
  const volts = nominalVolts(context)
  const load = (name: string, from: Node, to: Node, amps: number, across: number): Branch[] =>
    amps > 0 ? [resistance(name, from, to, (across * ohmsScale(context)) / amps)] : []
  const filters = p.houseFilterFarads
  return [
    resistance('feeder.hot', 'source.hot', 'panel.hot', ohms + p.contactHotOhms),
    ...(two ? [resistance('feeder.hot2', 'source.hot2', 'panel.hot2', ohms + p.contactHotOhms)] : []),
    resistance('feeder.neutral', 'source.neutral', 'panel.neutral', ohms + p.contactNeutralOhms),
    resistance(
      'feeder.ground',
      'source.ground',
      'panel.ground',
      feet * p.feederGroundOhmsPerFoot + p.contactGroundOhms,
    ),
    ...cable('feeder.cable', 'panel', feet),
    ...(two
      ? [capacitance('feeder.cable.hot2-ground', 'panel.hot2', 'panel.ground', cableFaradsPerFoot * feet)]
      : []),
    ...(p.panelRod ? [resistance('panel.rod', 'panel.ground', earth, p.panelRodOhms)] : []),
    capacitance('stray.panel', 'panel.ground', earth, p.strayFarads),
    ...(filters > 0
      ? [
          capacitance('house.filter.hot', 'panel.hot', 'panel.ground', filters),
          capacitance('house.filter.neutral', 'panel.neutral', 'panel.ground', filters),
          ...(two ? [capacitance('house.filter.hot2', 'panel.hot2', 'panel.ground', filters)] : []),
        ]
      : []),
    ...load('house.hot', 'panel.hot', 'panel.neutral', p.houseAmps, volts),
    ...(two ? load('house.hot2', 'panel.hot2', 'panel.neutral', p.houseAmpsOther, volts) : []),
    ...(two ? load('house.across', 'panel.hot', 'panel.hot2', p.houseAmpsAcross, 2 * volts) : []),
  ]
}

function circuit(context: WiringContext, p: Parameters): Branch[] {
  const feed = feedOf(context)
  const { before, last } = lengthsOf(context, p)
  const contact = { hot: p.contactHotOhms, neutral: p.contactNeutralOhms, ground: p.contactGroundOhms }
  const wires = (['hot', 'neutral', 'ground'] as const).flatMap((wire) => [
    resistance(
      `branch.${wire}`,
      `${feed}.${wire}`,
      `joint.${wire}`,
      before * p.branchOhmsPerFoot + contact[wire],
    ),
    resistance(`last.${wire}`, `joint.${wire}`, `box.${wire}`, last * p.branchOhmsPerFoot + contact[wire]),
    resistance(`slot.${wire}`, `box.${wire}`, `receptacle.${wire}`, slotOhms),
  ])
  return [
    ...wires,
    ...cable('branch.cable', 'joint', before),
    ...cable('last.cable', 'box', Math.max(last, 0.15)),
    capacitance('stray.receptacle', 'receptacle.ground', earth, p.slotFarads),
    // The independent earth that the long test lead goes to.
    resistance('lead.earth', 'lead', earth, p.leadEarthOhms),
  ]
}

/** A terminal and its blade. */
const slotOhms = 0.003

/** The sound wiring of a context, source running, the house's loads on, nothing of ours connected. */
export function healthy(context: WiringContext, p: Parameters): Branch[] {
  const panel = hasPanel(context)
  const bond = panel ? p.bondAt : 'source'
  return [
    ...sourceParts(context, p),
    ...(panel ? feederAndPanel(context, p) : []),
    ...circuit(context, p),
    bond === 'source'
      ? resistance('bond', 'source.neutral', 'source.case', p.bondOhms)
      : resistance('bond', 'panel.neutral', 'panel.ground', p.bondOhms),
  ]
}
