import { minus, nothing, over, plus, times } from './complex.ts'
import { factorMatrix, substitute, zeros } from './complex-lu.ts'
import type { ComplexArray, Factors } from './complex-lu.ts'
import { admittanceOf, nodalEquations } from './nodal.ts'
import type { Equations } from './nodal.ts'
import type { Complex, Network, Node } from './network.ts'

/** Something held or plugged between two points of a network: a meter, a bulb, a load. */
export type Load = {
  from: Node
  to: Node
  ohms: number
  /** Across the resistance. */
  farads?: number
}

/** What two points are to whatever is held between them: a voltage behind an impedance (Thévenin's theorem). */
export type Port = {
  /** Volts of the first point against the second with nothing held there. */
  open: Complex
  /** Ohms. */
  impedance: Complex
}

/** A solved network. Each function throws an Error that names a node or branch the network does not have. */
export type Factored = {
  readonly hertz: number
  /** Volts of a node against earth. */
  volts: (node: Node) => Complex
  /** Volts of `a` against `b`. */
  between: (a: Node, b: Node) => Complex
  /** Amps through a branch from its `from` to its `to`. */
  amps: (branch: string) => Complex
  port: (a: Node, b: Node) => Port
  /** The same with a few things held to it at once, beside those already there; nothing is factored again. */
  loaded: (loads: readonly Load[]) => Factored
}

/**
 * Solves a network once, so that meters, bulbs and loads can then be held to it at little cost: each is one more
 * substitution into the factors, kept for the next that touches the same two points.
 * @param network volts and amps RMS, at `network.hertz`; at 0 Hz sources give nothing
 * @throws Error as `nodalEquations` does
 */
export function factor(network: Network): Factored {
  const equations = nodalEquations(network)
  const { injected, matrix } = equations
  const factors = factorMatrix(equations.nodes.size - 1, matrix)
  substitute(factors, injected)
  const bare = { equations, factors, hertz: network.hertz, volts: injected, driven: new Map() }
  return new Holding(bare, [])
}

/** The network without loads. */
type Bare = {
  equations: Equations
  factors: Factors
  hertz: number
  volts: ComplexArray
  /** By the numbers of the two nodes. */
  driven: Map<number, ComplexArray>
}

/** Something held to the bare network. */
type Held = { from: number; to: number; admittance: Complex; drives: ComplexArray }

/** Volts of the bare network, whatever drives it, and the amps of each load because of them. */
type Driven = { bare: ComplexArray; amps: ComplexArray }

/**
 * A network with loads. By superposition each load's current takes away what an amp there does; the currents follow
 * from (1 + Y·Z)·i = Y·v, where v are the volts across the loads without them, Y the loads' admittances, and Z what
 * an amp at one load does at another.
 */
class Holding implements Factored {
  readonly hertz: number
  readonly #bare: Bare
  readonly #loads: readonly Load[]
  readonly #held: readonly Held[]
  /** Factors of 1 + Y·Z; none without loads. */
  readonly #interplay: Factors | undefined
  readonly #running: Driven

  constructor(bare: Bare, loads: readonly Load[]) {
    this.hertz = bare.hertz
    this.#bare = bare
    this.#loads = loads
    this.#held = loads.map((load) => hold(bare, load))
    this.#interplay = loads.length === 0 ? undefined : factorMatrix(loads.length, interplay(this.#held))
    this.#running = this.#flow(bare.volts)
  }

  volts(node: Node): Complex {
    return this.#at(this.#running, nodeNumber(this.#bare, node))
  }

  between(a: Node, b: Node): Complex {
    return this.#across(this.#running, nodeNumber(this.#bare, a), nodeNumber(this.#bare, b))
  }

  amps(name: string): Complex {
    const branch = this.#bare.equations.branches.get(name)
    if (!branch) throw new Error(`This network has no branch "${name}".`)
    const across = this.#across(this.#running, branch.from, branch.to)
    return times(branch.admittance, plus(across, branch.push))
  }

  port(a: Node, b: Node): Port {
    const [from, to] = [nodeNumber(this.#bare, a), nodeNumber(this.#bare, b)]
    const driven = this.#flow(drive(this.#bare, from, to))
    return { open: this.#across(this.#running, from, to), impedance: this.#across(driven, from, to) }
  }

  loaded(more: readonly Load[]): Factored {
    return new Holding(this.#bare, this.#loads.concat(more))
  }

  #flow(bare: ComplexArray): Driven {
    if (this.#interplay === undefined) return { bare, amps: noAmps }
    const amps = zeros(this.#held.length)
    for (let i = 0; i < this.#held.length; i++) {
      const { from, to, admittance } = this.#held[i]!
      put(amps, i, times(admittance, minus(at(bare, from), at(bare, to))))
    }
    substitute(this.#interplay, amps)
    return { bare, amps }
  }

  /** Volts of a node with the loads in place. */
  #at({ bare, amps }: Driven, node: number): Complex {
    let volts = at(bare, node)
    for (let i = 0; i < this.#held.length; i++)
      volts = minus(volts, times(at(amps, i), at(this.#held[i]!.drives, node)))
    return volts
  }

  #across(driven: Driven, from: number, to: number): Complex {
    return minus(this.#at(driven, from), this.#at(driven, to))
  }
}

const noAmps = zeros(0)

function hold(bare: Bare, { from, to, ohms, farads }: Load): Held {
  if (!(ohms >= 0)) throw new Error(`A load of ${ohms} Ω can't be.`)
  const [a, b] = [nodeNumber(bare, from), nodeNumber(bare, to)]
  const admittance = admittanceOf(ohms, farads ?? 0, bare.hertz)
  return { from: a, to: b, admittance, drives: drive(bare, a, b) }
}

/**
 * Volts of every node for one amp driven in at `from` and out at `to`. Always at two points at once: an amp into one
 * point of a floating wiring would lift all of it by gigavolts, and the difference of two such is noise.
 */
function drive({ factors, driven }: Bare, from: number, to: number): ComplexArray {
  const key = (from + 1) * (factors.n + 1) + to + 1
  const known = driven.get(key)
  if (known !== undefined) return known
  const volts = zeros(factors.n)
  if (from >= 0) volts[2 * from]! += 1
  if (to >= 0) volts[2 * to]! -= 1
  substitute(factors, volts)
  driven.set(key, volts)
  return volts
}

/** 1 + Y·Z, k × k in rows. */
function interplay(held: readonly Held[]): ComplexArray {
  const k = held.length
  const matrix = zeros(k * k)
  for (let row = 0; row < k; row++) {
    const { from, to, admittance } = held[row]!
    for (let column = 0; column < k; column++) {
      const { drives } = held[column]!
      put(matrix, row * k + column, times(admittance, minus(at(drives, from), at(drives, to))))
    }
    matrix[2 * (row * k + row)]! += 1
  }
  return matrix
}

const at = (array: ComplexArray, i: number): Complex =>
  i < 0 ? nothing : { re: array[2 * i]!, im: array[2 * i + 1]! }

function put(array: ComplexArray, i: number, { re, im }: Complex): void {
  array[2 * i] = re
  array[2 * i + 1] = im
}

function nodeNumber({ equations }: Bare, node: Node): number {
  const number = equations.nodes.get(node)
  if (number === undefined) throw new Error(`This network has no node "${node}".`)
  return number
}

/** Volts left at a port across something of this admittance, siemens. */
export const acrossPort = ({ open, impedance }: Port, admittance: Complex): Complex =>
  over(open, plus({ re: 1, im: 0 }, times(admittance, impedance)))
