/** What is wrong in a mode, and what looks wrong but may stand. */
import type { Circuit } from './circuit.ts'
import { countBonds } from './count.ts'
import type { Count } from './count.ts'
import { balancedFindings } from './findings/balanced.ts'
import { countFindings } from './findings/bonds.ts'
import { gfciFindings } from './findings/gfci.ts'
import { groundPathFindings } from './findings/ground-path.ts'
import { neutralFindings } from './findings/neutral.ts'
import { exceptionsOf } from './exceptions.ts'
import type { Exception } from './exceptions.ts'
import type { SectionId } from './standards.ts'

export type FindingKind =
  | 'no-bond'
  | 'two-bonds'
  | 'wrong-place'
  | 'balanced-into-panel'
  | 'bond-on-balanced'
  | 'no-neutral'
  | 'neutral-missing'
  | 'ground-missing'
  | 'rod-only'
  | 'gfci-trips'
  | 'shared-neutral'
  | 'multiwire'

export type Finding = {
  kind: FindingKind
  /** Ids of the parts to mark. */
  parts: readonly string[]
  /** What is so, the parts named. */
  says: string
  /** What it can do. */
  danger: string
  /** What to change, the easiest that is allowed first. */
  change: readonly string[]
  sections: readonly SectionId[]
}

export type Found = { count: Count; findings: readonly Finding[]; exceptions: readonly Exception[] }

/** Whether the live output has no neutral to bond: both its wires stand at half voltage. */
const isBalanced = ({ live }: Circuit): boolean =>
  live.some((part) => part.kind === 'source' && part.output === 'balanced')

/** Everything found in one mode. No findings: it passes. */
export function findIn(circuit: Circuit): Found {
  const count = countBonds(circuit)
  const exceptions = exceptionsOf(circuit, count)
  const balanced = isBalanced(circuit)
  const findings = balanced
    ? balancedFindings(circuit)
    : [
        ...countFindings(circuit, count, exceptions),
        ...groundPathFindings(circuit, exceptions),
        ...gfciFindings(circuit),
      ]
  return { count, findings: [...findings, ...neutralFindings(circuit)], exceptions }
}
