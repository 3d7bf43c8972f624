/** With two bonds or more: what returns over neutral, over each ground path and through soil. */
import { americanWireOhms, metricWireOhms } from '../circuit/conductors.ts'
import { leastOhms } from '../circuit/nodal.ts'
import { earth, magnitude } from '../circuit/network.ts'
import type { Branch } from '../circuit/network.ts'
import { factor } from '../circuit/solve.ts'
import type { Circuit } from './circuit.ts'
import { pointsApart } from './joined.ts'
import { wayTo } from './paths.ts'
import { withoutDeadEnds } from './loops-only.ts'
import { isChosen, isJoined } from './state.ts'
import { gauges, millimeters } from './system.ts'
import type { PowerPart, Run, System } from './system.ts'

/** What the load is taken to draw, amps: a typical kitchen or tool load on one circuit. */
export const loadAmps = 12

export type GroundCurrent = {
  /** Where the load runs. */
  at: string
  /** Amps of the load; the rest is in proportion. */
  loadAmps: number
  /** Each grounding conductor or piece of soil that carries some of it, most first, amps. */
  paths: readonly { key: string; from: string; to: string; through: 'wire' | 'soil'; amps: number }[]
  /** The most on any one grounding conductor, amps. */
  most: number
  /** Some runs had no length: taken as next to nothing. */
  assumed: boolean
}

/** Ohms of a run's neutral and of its grounding conductor, one way, stranded, at 75 °C. */
function runOhms(run: Run | undefined, units: System['units']): { neutral: number; ground: number } {
  if (run === undefined) return { neutral: leastOhms, ground: leastOhms }
  const ohms = (size: string) => {
    const gauge = gauges.find((one) => one === size)
    const mm2 = millimeters.find((one) => one === size)
    if (units === 'us' && gauge !== undefined)
      return americanWireOhms({ gauge, metal: run.metal, solid: false, feet: run.length, celsius: 75 })
    // IEC 60228 has no thin aluminum: taken as copper of the same size.
    const metal = run.metal === 'aluminum' && Number(size) < 10 ? 'copper' : run.metal
    if (mm2 !== undefined)
      return metricWireOhms({ mm2, metal, flexible: false, meters: run.length, celsius: 75 })
    throw new RangeError(`A wire of ${size} is not in the table for these units.`)
  }
  return { neutral: ohms(run.neutral), ground: ohms(run.ground) }
}

/**
 * Nodes of the network. What has no run between it is one node: the bars of a panel, both sides of a bond, the cases
 * of sources that stand side by side.
 */
function nodesOf({ wiring, state, bonds }: Circuit) {
  const { point, neutralPoints: grounds } = wiring
  const one = pointsApart(grounds + wiring.parts.size)
  for (const at of wiring.feeds)
    if (at.to.kind === 'switch' && (at.to.neutral === 'solid' || isChosen(at, state)))
      one.join(at.end, point(at.to.id))
  for (const { part, onto } of bonds) one.join(point(onto), grounds + point(part.id))
  for (const [first, ...others] of wiring.groups)
    for (const { id } of others)
      for (const offset of [0, grounds])
        if (first !== undefined) one.join(offset + point(first.id), offset + point(id))
  return {
    neutralAt: (at: number) => `node ${one.of(at)}`,
    groundAt: (partId: string) => `node ${one.of(grounds + point(partId))}`,
  }
}

type Path = { name: string; key: string; from: string; to: string; through: 'wire' | 'soil' }

/** The network of neutrals, grounds and rods, with the live source between its neutral and a hot of no resistance. */
function branchesOf(circuit: Circuit, { neutralAt, groundAt }: ReturnType<typeof nodesOf>) {
  const { wiring, state, live } = circuit
  const { units } = wiring.system
  const branches: Branch[] = []
  const wires: Path[] = []
  const without = new Set<string>()
  const add = (name: string, from: string, to: string, ohms: number) =>
    from !== to && branches.push({ kind: 'resistance', name, from, to, ohms })
  for (const at of wiring.feeds) {
    const { feed, key, to } = at
    if (!isJoined(at, state)) continue
    if (feed.run === undefined) for (const wire of ['neutral', 'ground']) without.add(`${wire} ${key}`)
    const ohms = runOhms(feed.run, units)
    if (at.neutral !== undefined)
      add(`neutral ${key}`, neutralAt(at.neutral[0]), neutralAt(at.neutral[1]), ohms.neutral)
    if (feed.ground) {
      add(`ground ${key}`, groundAt(feed.from), groundAt(to.id), ohms.ground)
      wires.push({ name: `ground ${key}`, key, from: feed.from, to: to.id, through: 'wire' })
    }
  }
  for (const { id, from, to, run } of wiring.groundWires) {
    if (run === undefined) without.add(`ground ${id}`)
    add(`ground ${id}`, groundAt(from), groundAt(to), runOhms(run, units).ground)
    wires.push({ name: `ground ${id}`, key: id, from, to, through: 'wire' })
  }
  for (const { id, at, ohms } of wiring.rods) {
    add(`soil ${id}`, groundAt(at), earth, ohms)
    wires.push({ name: `soil ${id}`, key: id, from: at, to: at, through: 'soil' })
  }
  const root = live[0]
  if (root !== undefined) {
    const derived = circuit.carrying.find(({ to }) => to.kind === 'autotransformer')
    const at = root.volts === '240' && derived !== undefined ? derived.to.id : root.id
    branches.push({
      kind: 'source',
      name: 'supply',
      from: neutralAt(wiring.point(at)),
      to: 'hot',
      volts: 120,
      degrees: 0,
      ohms: leastOhms,
    })
  }
  return { branches, wires, without }
}

/**
 * The currents while a load runs at the place that sends most over ground.
 * @returns undefined with fewer than two bonds in circuit, or where nothing is fed
 */
export function groundCurrent(circuit: Circuit): GroundCurrent | undefined {
  const { bonds, places, wiring } = circuit
  const loaded = places.filter(
    (place) =>
      (place.kind === 'panel' || place.kind === 'receptacle') && circuit.onNeutral(wiring.point(place.id)),
  )
  if (bonds.length < 2 || loaded.length === 0) return undefined
  const nodes = nodesOf(circuit)
  const { branches: all, wires, without } = branchesOf(circuit, nodes)
  const supply = all.find(({ name }) => name === 'supply')
  const { branches, hangsFrom } = withoutDeadEnds(all, new Set(supply && [supply.from, supply.to]))
  const network = factor({ hertz: 60, branches })
  const nameOf = (id: string) => wiring.parts.get(id)?.name ?? id
  const known = new Set(branches.map(({ name }) => name))
  const assumed = branches.some(({ name }) => without.has(name))
  const nodeOf = ({ id }: PowerPart) => hangsFrom(nodes.neutralAt(wiring.point(id)))
  const across = (place: PowerPart): GroundCurrent => {
    const node = nodeOf(place)
    // Some amps are drawn, whatever the wires leave of them; everything is then scaled to the load's.
    const held = network.loaded([{ from: 'hot', to: node, ohms: 10 }])
    const drawn = magnitude(held.between('hot', node)) / 10
    const paths = wires
      .filter(({ name }) => known.has(name))
      .map(({ name, key, from, to, through }) => ({
        key,
        from: nameOf(from),
        to: nameOf(to),
        through,
        amps: (magnitude(held.amps(name)) / drawn) * loadAmps,
      }))
      .filter(({ amps }) => amps >= 0.0005)
      .sort((a, b) => b.amps - a.amps || (a.key < b.key ? -1 : 1))
    const most = Math.max(0, ...paths.filter(({ through }) => through === 'wire').map(({ amps }) => amps))
    return { at: place.name, loadAmps, paths, most, assumed }
  }
  const farther = (a: PowerPart, b: PowerPart) => wayTo(circuit, b).length - wayTo(circuit, a).length
  // With several neutrals apart a load may be on one that the supply's loop does not touch: it sends nothing over it.
  const inNetwork = new Set(branches.flatMap(({ from, to }) => [from, to]))
  const farthest = loaded
    .filter((place) => inNetwork.has(nodeOf(place)))
    .sort((a, b) => farther(a, b) || (a.id < b.id ? -1 : 1))
  // Places that hang from one point send the same over ground.
  return farthest
    .filter((place, i) => farthest.findIndex((other) => nodeOf(other) === nodeOf(place)) === i)
    .map(across)
    .reduce<GroundCurrent | undefined>(
      (worst, one) => (worst === undefined || one.most > worst.most + 1e-9 ? one : worst),
      undefined,
    )
}
