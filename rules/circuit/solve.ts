import { minus, nothing, over, plus, times } from './complex.ts'
import { factorMatrix, zeros } from './complex-lu.ts'
import type { ComplexArray } from './complex-lu.ts'
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

/** The bare network, and the volts of every node for one amp driven in at `a` and out at `b`. */
type Bare = {
  equations: Equations
  hertz: number
  volts: ComplexArray
  drive: (a: Node, b: Node) => ComplexArray
}

/**
 * Solves a network once, so that meters, bulbs and loads can then be held to it at little cost: each is one more
 * substitution into the factors, kept for the next that touches the same two points.
 * @param network volts and amps RMS, at `network.hertz`; at 0 Hz sources give nothing
 * @throws Error as `nodalEquations` does
 */
export function factor(network: Network): Factored {
  const equations = nodalEquations(network)
  const { matrix, injected } = equations
  const n = injected.re.length
  const substitute = factorMatrix(n, matrix)
  substitute(injected)
  const driven = new Map<string, ComplexArray>()
  function drive(a: Node, b: Node): ComplexArray {
    const key = `${a}\n${b}`
    let answer = driven.get(key)
    if (answer === undefined) {
      const [from, to] = [nodeNumber(equations, a), nodeNumber(equations, b)]
      answer = zeros(n)
      if (from >= 0) answer.re[from]! += 1
      if (to >= 0) answer.re[to]! -= 1
      substitute(answer)
      driven.set(key, answer)
    }
    return answer
  }
  return holding({ equations, hertz: network.hertz, volts: injected, drive }, [])
}

/** The network with loads held to it. */
function holding(bare: Bare, loads: readonly Load[]): Factored {
  const { equations, hertz } = bare
  const relieve = loads.length === 0 ? (volts: ComplexArray) => volts : pullDown(bare, loads)
  const volts = relieve(bare.volts)
  const of = (node: Node) => at(volts, nodeNumber(equations, node))
  const between = (a: Node, b: Node) => minus(of(a), of(b))
  return {
    hertz,
    volts: of,
    between,
    amps: (name) => {
      const branch = equations.branches.get(name)
      if (!branch) throw new Error(`This network has no branch "${name}".`)
      const across = minus(at(volts, branch.from), at(volts, branch.to))
      return times(branch.admittance, plus(across, branch.push))
    },
    port: (a, b) => {
      const answer = relieve(bare.drive(a, b))
      const impedance = minus(at(answer, nodeNumber(equations, a)), at(answer, nodeNumber(equations, b)))
      return { open: between(a, b), impedance }
    },
    loaded: (more) => holding(bare, [...loads, ...more]),
  }
}

/**
 * What loads make of the volts the bare network has without them, whatever drives it. By superposition: each load's
 * current takes away what an amp there does. The currents follow from (1 + Y·Z)·i = Y·v, where v are the volts
 * across the loads without them, Y the loads' admittances, and Z what an amp at one load does at another.
 */
function pullDown(bare: Bare, loads: readonly Load[]): (volts: ComplexArray) => ComplexArray {
  const k = loads.length
  const held = loads.map(({ from, to, ohms, farads }) => {
    if (!(ohms >= 0)) throw new Error(`A load of ${ohms} Ω can't be.`)
    return {
      from: nodeNumber(bare.equations, from),
      to: nodeNumber(bare.equations, to),
      admittance: admittanceOf(ohms, farads ?? 0, bare.hertz),
      drives: bare.drive(from, to),
    }
  })
  const matrix = zeros(k * k)
  held.forEach(({ from, to, admittance }, row) =>
    held.forEach(({ drives }, column) => {
      const part = times(admittance, minus(at(drives, from), at(drives, to)))
      matrix.re[row * k + column] = part.re + (row === column ? 1 : 0)
      matrix.im[row * k + column] = part.im
    }),
  )
  const substitute = factorMatrix(k, matrix)
  return (volts) => {
    const amps = zeros(k)
    held.forEach(({ from, to, admittance }, i) => {
      const { re, im } = times(admittance, minus(at(volts, from), at(volts, to)))
      amps.re[i] = re
      amps.im[i] = im
    })
    substitute(amps)
    const left = { re: volts.re.slice(), im: volts.im.slice() }
    held.forEach(({ drives }, i) => {
      const [ir, ii] = [amps.re[i]!, amps.im[i]!]
      for (let node = 0; node < left.re.length; node++) {
        const [dr, di] = [drives.re[node]!, drives.im[node]!]
        left.re[node]! -= ir * dr - ii * di
        left.im[node]! -= ir * di + ii * dr
      }
    })
    return left
  }
}

const at = ({ re, im }: ComplexArray, i: number): Complex =>
  i < 0 ? nothing : { re: re[i] ?? 0, im: im[i] ?? 0 }

function nodeNumber({ nodes }: Equations, node: Node): number {
  const number = nodes.get(node)
  if (number === undefined) throw new Error(`This network has no node "${node}".`)
  return number
}

/** Volts left at a port across something of this admittance, siemens. */
export const acrossPort = ({ open, impedance }: Port, admittance: Complex): Complex =>
  over(open, plus({ re: 1, im: 0 }, times(admittance, impedance)))
