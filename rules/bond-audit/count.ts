/** How many bonds are in circuit on the live source's neutral, those that the code lets stand left out. */
import type { Circuit } from './circuit.ts'
import { isProtected } from './paths.ts'
import type { Bond } from './wiring.ts'

export type Count = {
  /** Bonds that count: exactly one is wanted. */
  counted: readonly Bond[]
  /** Bonds that may stand beside it, and why. */
  excepted: readonly { bond: Bond; why: 'outbuilding' | 'existing-range' }[]
}

/** Which exception lets this bond stand beside another, if one does. */
function exceptionOf(circuit: Circuit, bond: Bond): 'outbuilding' | 'existing-range' | undefined {
  const { part } = bond
  const { ground, bonds, reached } = circuit
  const { point } = circuit.wiring
  if (!reached.has(part.id) || (part.kind !== 'panel' && part.kind !== 'receptacle')) return undefined
  // All of them hold only where no metal joins this bond's ground to another's: else the two share the current.
  const joined = bonds.some(
    (other) => other !== bond && ground.of(point(other.part.id)) === ground.of(point(part.id)),
  )
  if (joined || part.feed.ground) return undefined
  if (part.kind === 'receptacle') return bond.how === 'existing-range' ? 'existing-range' : undefined
  const old = part.outbuilding?.oldFeeder === true && part.outbuilding.noMetalPath
  return old && !isProtected(circuit, part) ? 'outbuilding' : undefined
}

/** Counts the bonds of one mode. Adding a bond never lowers the count. */
export function countBonds(circuit: Circuit): Count {
  const judged = circuit.bonds.map((bond) => ({ bond, why: exceptionOf(circuit, bond) }))
  return {
    counted: judged.filter(({ why }) => why === undefined).map(({ bond }) => bond),
    excepted: judged.flatMap(({ bond, why }) => (why === undefined ? [] : [{ bond, why }])),
  }
}
