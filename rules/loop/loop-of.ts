/** From the circuit model to what the loop picture shows. */
import { magnitude } from '../circuit/network.ts'
import type { Branch, Complex, Network } from '../circuit/network.ts'
import { factor } from '../circuit/solve.ts'
import type { Factored } from '../circuit/solve.ts'
import { hasPanel, hasTwoLegs, nominalVolts } from '../circuit/wiring/context.ts'
import type { WiringContext } from '../circuit/wiring/context.ts'
import { usualBreaker } from './breaker.ts'
import { drawnWiring } from './loop-wiring.ts'
import type { Drawn } from './loop-wiring.ts'
import type { LoopOptions } from './loop-options.ts'
import { metalOf } from './metal.ts'
import type { Flow, HouseLoad, LoopState, Place, Rod, Run, Tie, Touch, Wire } from './loop-state.ts'

const sourceLabels: Readonly<Record<WiringContext['source'], string>> = {
  'all-in-one-inverter': 'Inverter',
  'standalone-inverter': 'Inverter',
  'power-station': 'Power station',
  generator: 'Generator',
  utility: 'Utility service',
}

/** Ohms beside which a joint counts as poor: some ten times one in order. */
const poorOhms = 0.3

/** Which way an alternating current goes is told at the moment hot pushes; a capacitor's leads by a quarter turn. */
function flowOf(i: Complex): Flow {
  const along = Math.abs(i.re) > 0.2 * magnitude(i) ? i.re : i.im
  return { amps: magnitude(i), toward: along < 0 ? 'source' : 'load' }
}

const branchOf = ({ branches }: Network, name: string): Branch | undefined =>
  branches.find((one) => one.name === name)
const wireOf = (node: string): Wire => {
  const end = node.slice(node.indexOf('.') + 1)
  return end === 'hot2' ? 'leg2' : end === 'hot' || end === 'neutral' ? end : 'ground'
}

/** The conductors of the feeder: each from its terminal at the source to the one at the panel. */
function feederRuns({ context, network }: Drawn, solved: Factored): Run[] {
  if (!hasPanel(context)) return []
  const names = ['hot', 'neutral', ...(hasTwoLegs(context) ? ['hot2'] : []), 'ground']
  const pin = branchOf(network, 'source.pin')
  return names.map((name): Run => {
    const wire = branchOf(network, `feeder.${name}`)
    const own = wireOf(`.${name}`)
    const pinOpen = name === 'ground' && pin?.kind === 'capacitance'
    const run = {
      stretch: 'feeder' as const,
      from: own,
      openAt: pinOpen ? ('source' as const) : ('stretch' as const),
    }
    if (wire === undefined) return { ...run, to: own, state: 'absent', addedOhms: 0, amps: 0, toward: 'load' }
    const added = wire.kind === 'resistance' && wire.ohms > poorOhms ? wire.ohms : 0
    const state = wire.kind === 'capacitance' || pinOpen ? 'open' : added > 0 ? 'poor' : 'whole'
    return { ...run, to: wireOf(wire.to), state, addedOhms: added, ...flowOf(solved.amps(wire.name)) }
  })
}

/** The conductors of the circuit, each followed back from its terminal at the receptacle. */
function circuitRuns({ context, network }: Drawn, solved: Factored): Run[] {
  const direct = !hasPanel(context)
  const pinOpen = direct && branchOf(network, 'source.pin')?.kind === 'capacitance'
  const stretches = network.branches.filter((one) =>
    /^(?:branch|last|slot)\.(?:hot|neutral|ground)$/.test(one.name),
  )
  return (['hot', 'neutral', 'ground'] as const).map((terminal): Run => {
    const way: Branch[] = []
    for (let at: string | undefined = `receptacle.${terminal}`; at !== undefined;) {
      const before: Branch | undefined = stretches.find((one) => one.to === at)
      if (before !== undefined) way.push(before)
      at = before?.from
    }
    const begin = way.at(-1)
    if (begin === undefined) throw new Error(`no wire ends on the receptacle’s ${terminal}`)
    const from = wireOf(begin.from)
    const atSource = pinOpen && from === 'ground'
    const added = way.reduce(
      (sum, one) => sum + (one.kind === 'resistance' && one.ohms > poorOhms ? one.ohms : 0),
      0,
    )
    const open = way.some((one) => one.kind === 'capacitance')
    return {
      stretch: 'circuit',
      from,
      to: terminal,
      state: open || atSource ? 'open' : added > 0 ? 'poor' : 'whole',
      openAt: atSource && !open ? 'source' : 'stretch',
      addedOhms: added,
      ...flowOf(solved.amps(begin.name)),
    }
  })
}

function tiesOf({ network }: Drawn, solved: Factored): Tie[] {
  const kinds = {
    bond: 'wanted',
    'bond.second': 'second',
    bootleg: 'jumper',
    astray: 'astray',
    tie: 'middle',
    'tie.hot': 'middle',
  } as const
  return Object.entries(kinds).flatMap(([name, kind]): Tie[] => {
    const branch = branchOf(network, name)
    if (branch === undefined) return []
    const place = branch.from.slice(0, branch.from.indexOf('.')) as Place
    const { amps, toward } = flowOf(solved.amps(name))
    return [{ place, kind, amps, toward: toward === 'load' ? 'ground' : 'neutral' }]
  })
}

function rodsOf({ network }: Drawn, solved: Factored): Rod[] {
  return (['source', 'panel'] as const).flatMap((place): Rod[] => {
    const rod = branchOf(network, `${place}.rod`)
    if (rod?.kind !== 'resistance') return []
    const { amps, toward } = flowOf(solved.amps(rod.name))
    return [{ place, ohms: rod.ohms, amps, toward: toward === 'load' ? 'earth' : 'metal' }]
  })
}

function houseOf({ network }: Drawn, solved: Factored): HouseLoad[] {
  return (['hot', 'hot2'] as const).flatMap((name): HouseLoad[] => {
    const load = branchOf(network, `house.${name}`)
    if (load === undefined) return []
    const volts = magnitude(solved.between(load.from, load.to))
    return [{ leg: name === 'hot' ? 'hot' : 'leg2', volts, amps: magnitude(solved.amps(load.name)) }]
  })
}

/** Metal of the receptacle's circuit belongs to the receptacle, wherever along the cable hot touches it. */
const placeOfNode = (node: string): Place =>
  node.startsWith('source.') ? 'source' : node.startsWith('panel.') ? 'panel' : 'receptacle'

function touchOf({ network, hotAt }: Drawn, solved: Factored): Touch | undefined {
  const touch = branchOf(network, 'touch') ?? branchOf(network, 'fault')
  if (touch === undefined)
    return hotAt === 'receptacle.ground' ? { place: 'receptacle', leg: 'hot', amps: 0 } : undefined
  return {
    place: placeOfNode(touch.from),
    leg: touch.from.endsWith('.hot2') ? 'leg2' : 'hot',
    amps: magnitude(solved.amps(touch.name)),
  }
}

/**
 * The loop of a cause, as the model computes it.
 * @param given what feeds it, which system, and how it is wired
 * @param cause a cause of the catalogue
 * @param options what is turned on and off; `loopDefaults` has those of the cause itself
 * @returns undefined where the picture can't draw this cause (`drawnAs` says why), or it can't occur there
 */
export function loopOf(given: WiringContext, cause: string, options: LoopOptions): LoopState | undefined {
  const drawn = drawnWiring(given, cause, options)
  if (drawn === undefined) return undefined
  const { context, network } = drawn
  const solved = factor(network)
  const nominal = nominalVolts(context)
  const load = branchOf(network, 'load')
  const leak = branchOf(network, 'leak')
  const bonded = branchOf(network, 'bond') !== undefined
  return {
    nominal,
    places: hasPanel(context) ? ['source', 'panel', 'receptacle'] : ['source', 'receptacle'],
    twoLegs: hasTwoLegs(context),
    sourceLabel: sourceLabels[context.source],
    sourceVolts: magnitude(solved.between('source.hot', 'source.neutral')),
    limited: context.source !== 'utility',
    drawn: options.state,
    runs: [...feederRuns(drawn, solved), ...circuitRuns(drawn, solved)],
    ties: tiesOf(drawn, solved),
    bondMissing: bonded || branchOf(network, 'bond.second') !== undefined ? undefined : drawn.bondPlace,
    rods: rodsOf(drawn, solved),
    house: houseOf(drawn, solved),
    load: load && {
      volts: magnitude(solved.between(load.from, load.to)),
      amps: magnitude(solved.amps('load')),
    },
    touch: touchOf(drawn, solved),
    leak: leak?.kind === 'resistance' ? { ohms: leak.ohms, amps: magnitude(solved.amps('leak')) } : undefined,
    metal: metalOf(drawn, solved),
    breaker: { ...usualBreaker(nominal), sees: magnitude(solved.amps('branch.hot')) },
    note: drawn.as.note,
  }
}
