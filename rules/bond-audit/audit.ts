/** The bond audit: every operating mode of a system, its bonds counted and what is wrong with it named. */
import type { Circuit } from './circuit.ts'
import { findIn } from './findings.ts'
import type { Finding, FindingKind } from './findings.ts'
import type { Exception } from './exceptions.ts'
import { groundCurrent } from './ground-current.ts'
import type { GroundCurrent } from './ground-current.ts'
import { liveName, modeDetail, modeName } from './mode-names.ts'
import { modesOf, takenAway } from './modes.ts'
import type { Mode } from './modes.ts'
import type { System } from './system.ts'
import type { Bond } from './wiring.ts'
import { wiringOf } from './wiring.ts'

/** One mode with its answer. */
export type Audited = {
  name: string
  detail: string
  /** Bonds that count on the live source's neutral. */
  count: number
  counted: readonly Bond[]
  excepted: readonly Bond[]
  passes: boolean
  findings: readonly Finding[]
  exceptions: readonly Exception[]
  current: GroundCurrent | undefined
  circuit: Circuit
}

export type Audit = {
  modes: readonly Audited[]
  /** Modes a cord would make that stays unplugged: no bond is counted for them. */
  gone: readonly { name: string; places: readonly string[] }[]
  /** States looked at, of which those that differ in what is found are listed. */
  states: number
}

/** What is found in a mode, as one text: two states that have the same are one mode. */
const resultOf = (circuit: Circuit, findings: readonly Finding[], bonds: readonly Bond[]) =>
  [
    circuit.live.map(({ id }) => id).join(),
    bonds
      .map(({ part }) => part.id)
      .sort()
      .join(),
    findings
      .map(({ kind, parts }) => `${kind} ${[...parts].sort().join()}`)
      .sort()
      .join(';'),
  ].join('|')

function auditMode(mode: Mode): { result: string; audited: Audited } {
  const { circuit } = mode
  const { count, findings, exceptions } = findIn(circuit)
  return {
    result: resultOf(circuit, findings, circuit.bonds),
    audited: {
      name: modeName(mode),
      detail: modeDetail(mode),
      count: count.counted.length,
      counted: count.counted,
      excepted: count.excepted.map(({ bond }) => bond),
      passes: findings.length === 0,
      findings,
      exceptions,
      current: undefined,
      circuit,
    },
  }
}

/**
 * Audits a system: one row a mode, those of one source together, the state in which it feeds all it can first. A
 * system that `checkSystem` objects to is audited as far as its parts hang together.
 */
export function auditSystem(system: System): Audit {
  const states = modesOf(system)
  const rows = new Map<string, Audited>()
  for (const mode of states) {
    const { result, audited } = auditMode(mode)
    if (!rows.has(result)) rows.set(result, audited)
  }
  const wiring = wiringOf(system)
  return {
    modes: [...rows.values()].map((row) => ({ ...row, current: groundCurrent(row.circuit) })),
    gone: takenAway(system).map(({ live, places }) => ({ name: liveName(wiring, live), places })),
    states: states.length,
  }
}

/** The worst first: what a finding can do to whoever touches metal or opens a breaker. */
const gravity: readonly FindingKind[] = [
  'bond-on-balanced',
  'balanced-into-panel',
  'no-bond',
  'ground-missing',
  'rod-only',
  'no-neutral',
  'neutral-missing',
  'multiwire',
  'shared-neutral',
  'two-bonds',
  'wrong-place',
  'gfci-trips',
]
export const byGravity = (a: Finding, b: Finding) => gravity.indexOf(a.kind) - gravity.indexOf(b.kind)
