import { nothing, over, polar } from './complex.ts'
import { zeros } from './complex-lu.ts'
import type { ComplexArray } from './complex-lu.ts'
import { earth } from './network.ts'
import type { Branch, Complex, Network, Node } from './network.ts'

/**
 * Leak from every node to earth: 50 GΩ, what air, dust and the case of a good instrument have. It gives a wire tied
 * to nothing a voltage of its own, 0 V, where the equations would have none. Beside the smallest stray capacitance
 * that matters (1 pF, 2.7 GΩ at 60 Hz) it moves a reading of a 10 MΩ meter by under 0.1 %.
 */
export const leakSiemens = 2e-11

/**
 * Anything of less resistance counts as this: about a foot of 10 AWG copper. Between it and the leak lie 14 of a
 * double's 16 digits, so that no wiring is singular to the computer.
 */
export const leastOhms = 1e-3

/** A branch by the numbers of its ends, −1 for earth. */
export type Conducts = {
  from: number
  to: number
  /** Siemens. */
  admittance: Complex
  /** Volts that push from `from` to `to`; 0 but for a source that runs. */
  push: Complex
}

/** Y·v = i over all nodes but earth: Kirchhoff's currents at each node, every source as its short-circuit current. */
export type Equations = {
  /** Number of each node; earth is −1. */
  nodes: ReadonlyMap<Node, number>
  branches: ReadonlyMap<string, Conducts>
  /** n × n in rows, siemens. */
  matrix: ComplexArray
  /** n, amps. */
  injected: ComplexArray
}

/** A resistance with a capacitance across it, siemens. `ohms` may be Infinity. */
export const admittanceOf = (ohms: number, farads: number, hertz: number): Complex => ({
  re: 1 / Math.max(ohms, leastOhms),
  im: 2 * Math.PI * hertz * farads,
})

function admittance(branch: Branch, hertz: number): Complex {
  if (branch.kind === 'capacitance') return admittanceOf(Infinity, branch.farads, hertz)
  if (branch.kind !== 'winding') return admittanceOf(branch.ohms, 0, hertz)
  const reactance = 2 * Math.PI * hertz * branch.henries
  return over({ re: 1, im: 0 }, { re: Math.max(branch.ohms, leastOhms), im: reactance })
}

/** A number that no circuit has would run through every answer as NaN; better said at once. */
function check(branch: Branch): void {
  const wrong = Object.entries(branch).find(
    ([part, value]) =>
      typeof value === 'number' &&
      (Number.isNaN(value) ||
        (part !== 'ohms' && !Number.isFinite(value)) ||
        (value < 0 && part !== 'degrees')),
  )
  if (wrong) throw new Error(`Branch "${branch.name}": ${wrong[0]} can't be ${String(wrong[1])}.`)
}

/** Nodes with the fewest branches first: eliminating those leaves the fewest new entries in the matrix. */
function numberNodes(branches: readonly Branch[]): Map<Node, number> {
  const ends = new Map<Node, number>()
  for (const { from, to } of branches)
    for (const node of [from, to]) if (node !== earth) ends.set(node, (ends.get(node) ?? 0) + 1)
  const fewestFirst = [...ends].sort((a, b) => a[1] - b[1])
  return new Map([[earth, -1], ...fewestFirst.map(([node], i): [Node, number] => [node, i])])
}

/**
 * The equations of a network at its frequency.
 *
 * They are never singular: every branch's conductance is 0 or more and every node has a leak, so the real part of
 * the matrix is positive definite.
 * @throws Error naming the branch, where two have one name or a value is negative or no number
 */
export function nodalEquations({ hertz, branches }: Network): Equations {
  const nodes = numberNodes(branches)
  const n = nodes.size - 1
  const [matrix, injected] = [zeros(n * n), zeros(n)]
  const named = new Map<string, Conducts>()
  const put = (row: number, column: number, { re, im }: Complex, sign: number) => {
    if (row < 0 || column < 0) return
    matrix.re[row * n + column]! += sign * re
    matrix.im[row * n + column]! += sign * im
  }
  const inject = (node: number, { re, im }: Complex, factor: number) => {
    if (node < 0) return
    injected.re[node]! += factor * re
    injected.im[node]! += factor * im
  }
  for (let i = 0; i < n; i++) matrix.re[i * n + i] = leakSiemens
  for (const branch of branches) {
    check(branch)
    if (named.has(branch.name)) throw new Error(`Two branches are named "${branch.name}".`)
    const [from, to] = [nodes.get(branch.from) ?? -1, nodes.get(branch.to) ?? -1]
    const y = admittance(branch, hertz)
    const runs = branch.kind === 'source' && hertz > 0
    const push = runs ? polar(branch.volts, branch.degrees) : nothing
    named.set(branch.name, { from, to, admittance: y, push })
    put(from, from, y, 1)
    put(to, to, y, 1)
    put(from, to, y, -1)
    put(to, from, y, -1)
    inject(to, push, y.re)
    inject(from, push, -y.re)
  }
  return { nodes, branches: named, matrix, injected }
}
