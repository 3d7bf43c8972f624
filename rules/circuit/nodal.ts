import { nothing, over, polar, times } from './complex.ts'
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

/** What no circuit has would run through every answer as NaN; better said at once. */
function check(branch: Branch): void {
  const { kind } = branch
  if (kind !== 'capacitance' && !(branch.ohms >= 0)) refuse(branch, 'ohms', branch.ohms)
  if (kind === 'capacitance' && !isAmount(branch.farads)) refuse(branch, 'farads', branch.farads)
  if (kind === 'winding' && !isAmount(branch.henries)) refuse(branch, 'henries', branch.henries)
  if (kind === 'source' && !isAmount(branch.volts)) refuse(branch, 'volts', branch.volts)
  if (kind === 'source' && !Number.isFinite(branch.degrees)) refuse(branch, 'degrees', branch.degrees)
}
const isAmount = (value: number): boolean => value >= 0 && value < Infinity
function refuse({ name }: Branch, what: string, value: number): never {
  throw new Error(`Branch "${name}": ${what} can't be ${String(value)}.`)
}

/** The two ends of every branch by their nodes' numbers, −1 for earth. */
type Numbered = { nodes: Map<Node, number>; ends: number[] }

/**
 * Numbers the nodes from 0, those with the fewest branches first: eliminating them leaves the fewest new entries in
 * the matrix.
 */
function numberNodes(branches: readonly Branch[]): Numbered {
  const nodes = new Map<Node, number>([[earth, -1]])
  const ends: number[] = []
  const branchesAt: number[] = []
  for (let i = 0; i < 2 * branches.length; i++) {
    const branch = branches[i >> 1]!
    const node = i % 2 === 0 ? branch.from : branch.to
    let number = nodes.get(node)
    if (number === undefined) {
      number = branchesAt.push(0) - 1
      nodes.set(node, number)
    }
    if (number >= 0) branchesAt[number]! += 1
    ends.push(number)
  }
  const place = branchesAt.map(() => 0)
  const fewestFirst = branchesAt.map((_, number) => number).sort((a, b) => branchesAt[a]! - branchesAt[b]!)
  fewestFirst.forEach((number, i) => (place[number] = i))
  for (const [node, number] of nodes) if (number >= 0) nodes.set(node, place[number]!)
  return { nodes, ends: ends.map((number) => (number < 0 ? number : place[number]!)) }
}

/** Adds an admittance between two nodes to the matrix. */
function connect(matrix: ComplexArray, n: number, { from, to, admittance: { re, im } }: Conducts): void {
  if (from >= 0) add(matrix, from * n + from, re, im)
  if (to >= 0) add(matrix, to * n + to, re, im)
  if (from < 0 || to < 0) return
  add(matrix, from * n + to, -re, -im)
  add(matrix, to * n + from, -re, -im)
}

/** Adds a source's short-circuit current, which leaves `from` and enters `to`. */
function inject(injected: ComplexArray, { from, to, admittance, push }: Conducts): void {
  const { re, im } = times(admittance, push)
  if (from >= 0) add(injected, from, -re, -im)
  if (to >= 0) add(injected, to, re, im)
}

function add(array: ComplexArray, i: number, re: number, im: number): void {
  array[2 * i]! += re
  array[2 * i + 1]! += im
}

/**
 * The equations of a network at its frequency.
 *
 * They are never singular: every branch's conductance is 0 or more and every node has a leak, so the real part of
 * the matrix is positive definite.
 * @throws Error naming the branch, where two have one name or a value is negative or no number
 */
export function nodalEquations({ hertz, branches }: Network): Equations {
  const { nodes, ends } = numberNodes(branches)
  const n = nodes.size - 1
  const [matrix, injected] = [zeros(n * n), zeros(n)]
  const named = new Map<string, Conducts>()
  for (let i = 0; i < n; i++) add(matrix, i * n + i, leakSiemens, 0)
  branches.forEach((branch, i) => {
    check(branch)
    const runs = branch.kind === 'source' && hertz > 0
    const conducts = {
      from: ends[2 * i]!,
      to: ends[2 * i + 1]!,
      admittance: admittance(branch, hertz),
      push: runs ? polar(branch.volts, branch.degrees) : nothing,
    }
    named.set(branch.name, conducts)
    connect(matrix, n, conducts)
    if (runs) inject(injected, conducts)
  })
  if (named.size < branches.length) throw new Error(`Two branches have one name: ${twice(branches)}.`)
  return { nodes, branches: named, matrix, injected }
}

const twice = (branches: readonly Branch[]): string | undefined =>
  branches.map(({ name }) => name).find((name, i, names) => names.indexOf(name) < i)
