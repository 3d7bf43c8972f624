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

export type Solution = {
  /** Volts of a node against earth. */
  volts: (node: Node) => Complex
  /** Volts of `a` against `b`. */
  between: (a: Node, b: Node) => Complex
  /** Amps through a branch from its `from` to its `to`. */
  amps: (branch: string) => Complex
}

/** What two points are to whatever is held between them: a voltage behind an impedance (Thévenin's theorem). */
export type Port = { open: Complex; impedance: Complex }

export type Factored = Solution & {
  readonly hertz: number
  port: (a: Node, b: Node) => Port
  /** The same network with a few things held to it at once; nothing is factored again. */
  loaded: (loads: readonly Load[]) => Solution
}

/** A port, and the volts of every node for one amp driven into `from` and out of `to`. */
type Driven = Port & { answers: ComplexArray }

/**
 * Solves a network once, so that meters, bulbs and loads can then be held to it at little cost: each is one more
 * substitution into the factors, kept for the next that touches the same two points.
 * @param network volts and amps RMS, at `network.hertz`; at 0 Hz sources give nothing
 * @returns what answers for nodes and branches by name, and throws an Error that names one it does not know
 * @throws Error as `nodalEquations` does
 */
export function factor(network: Network): Factored {
  const equations = nodalEquations(network)
  const n = equations.nodes.size - 1
  const substitute = factorMatrix(n, { re: equations.matrix.re.slice(), im: equations.matrix.im.slice() })
  const plain: ComplexArray = { re: equations.injected.re.slice(), im: equations.injected.im.slice() }
  substitute(plain)
  const unloaded = solution(equations, plain)

  const ports = new Map<string, Driven>()
  function drive(a: Node, b: Node): Driven {
    const key = `${a}\n${b}`
    const known = ports.get(key)
    if (known) return known
    const [from, to] = [nodeNumber(equations, a), nodeNumber(equations, b)]
    const answers = zeros(n)
    if (from >= 0) answers.re[from]! += 1
    if (to >= 0) answers.re[to]! -= 1
    substitute(answers)
    const impedance = minus(at(answers, from), at(answers, to))
    const driven = { open: unloaded.between(a, b), impedance, answers }
    ports.set(key, driven)
    return driven
  }

  /**
   * By superposition: the volts without loads, less what each load's current does. The currents follow from the
   * loads' own equations, (1 + Y·Z)·i = Y·open, Z being what an amp at one load does at another.
   */
  function loaded(loads: readonly Load[]): Solution {
    if (loads.length === 0) return unloaded
    const driven = loads.map((load) => drive(load.from, load.to))
    const k = loads.length
    const [matrix, amps] = [zeros(k * k), zeros(k)]
    loads.forEach((load, row) => {
      if (!(load.ohms >= 0)) throw new Error(`A load of ${load.ohms} Ω can't be.`)
      const y = admittanceOf(load.ohms, load.farads ?? 0, network.hertz)
      const [from, to] = [nodeNumber(equations, load.from), nodeNumber(equations, load.to)]
      driven.forEach(({ answers }, column) => {
        const part = times(y, minus(at(answers, from), at(answers, to)))
        matrix.re[row * k + column] = part.re + (row === column ? 1 : 0)
        matrix.im[row * k + column] = part.im
      })
      const short = times(y, driven[row]?.open ?? nothing)
      amps.re[row] = short.re
      amps.im[row] = short.im
    })
    factorMatrix(k, matrix)(amps)
    const volts: ComplexArray = { re: plain.re.slice(), im: plain.im.slice() }
    driven.forEach(({ answers }, load) => {
      const i = at(amps, load)
      for (let node = 0; node < n; node++) {
        const less = times(i, at(answers, node))
        volts.re[node]! -= less.re
        volts.im[node]! -= less.im
      }
    })
    return solution(equations, volts)
  }

  return {
    ...unloaded,
    hertz: network.hertz,
    port: (a, b) => {
      const { open, impedance } = drive(a, b)
      return { open, impedance }
    },
    loaded,
  }
}

const at = ({ re, im }: ComplexArray, i: number): Complex =>
  i < 0 ? nothing : { re: re[i] ?? 0, im: im[i] ?? 0 }

function nodeNumber({ nodes }: Equations, node: Node): number {
  const number = nodes.get(node)
  if (number === undefined) throw new Error(`This network has no node "${node}".`)
  return number
}

function solution(equations: Equations, volts: ComplexArray): Solution {
  const of = (node: Node) => at(volts, nodeNumber(equations, node))
  return {
    volts: of,
    between: (a, b) => minus(of(a), of(b)),
    amps: (name) => {
      const branch = equations.branches.get(name)
      if (!branch) throw new Error(`This network has no branch "${name}".`)
      const across = minus(at(volts, branch.from), at(volts, branch.to))
      return times(branch.admittance, plus(across, branch.push))
    },
  }
}

/** Volts left across a load of this admittance, siemens, at a port. */
export const acrossLoad = ({ open, impedance }: Port, load: Complex): Complex =>
  over(open, plus({ re: 1, im: 0 }, times(load, impedance)))
