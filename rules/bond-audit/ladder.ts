/** The ladder of a mode: neutral and ground as two rails, a rung for each bond. */
import type { Audited } from './audit.ts'
import { levelsOf } from './levels.ts'
import { groundPathOf } from './ground-path.ts'
import type { PowerPart, System } from './system.ts'
import { isPower } from './system.ts'

export type LadderPost = {
  id: string
  name: string
  /** Its neutral is joined to the live one. */
  inCircuit: boolean
  /** Its ground finds the bond by wire. */
  grounded: boolean
  /** The same for all posts whose grounds are joined by wire. */
  groundGroup: number
  /** `cut`: a bond that is there, but not on this neutral now. */
  rung: 'none' | 'in' | 'excepted' | 'cut'
  /** A finding names it. */
  marked: boolean
}

/** Parts in the order power takes: a part after what feeds it, a source just before; else as the system lists them. */
export function inOrder(system: System): PowerPart[] {
  const parts = system.parts.filter(isPower)
  const level = levelsOf(parts)
  return [...parts].sort((a, b) => (level.get(a.id) ?? 0) - (level.get(b.id) ?? 0))
}

/** Where a bond can be, other than a receptacle that has none: switches have none of their own. */
const hasPost = (part: PowerPart) =>
  part.kind !== 'switch' &&
  (part.kind !== 'receptacle' || part.bond !== 'none' || part.neutralAt !== undefined)

/** The posts of one mode, the same ones in the same order in every mode of a system. */
export function ladderOf({ circuit, counted, excepted, findings }: Audited): LadderPost[] {
  const { wiring, onNeutral, ground } = circuit
  const marked = new Set(findings.flatMap(({ parts }) => parts))
  const own = (part: PowerPart) => wiring.bonds.find((bond) => bond.part.id === part.id)
  return inOrder(wiring.system)
    .filter(hasPost)
    .map((part) => {
      const bond = own(part)
      const inside = part.kind === 'source' ? wiring.builtIn(part.id)?.switch.id : undefined
      const is = (list: readonly { part: PowerPart }[]) => list.some((one) => one.part.id === part.id)
      return {
        id: part.id,
        name: part.name,
        // An inverter with a transfer inside is on the neutral that its output is on.
        inCircuit:
          onNeutral(wiring.point(part.id)) || (inside !== undefined && onNeutral(wiring.point(inside))),
        grounded: groundPathOf(circuit, part) === 'metal',
        groundGroup: ground.of(wiring.point(part.id)),
        rung: is(counted) ? 'in' : is(excepted) ? 'excepted' : bond === undefined ? 'none' : 'cut',
        marked: marked.has(part.id),
      }
    })
}

/**
 * Whether a wire of ground passes between a post and the next. A group of joined grounds reaches from its first post
 * to its last, past those between that have none.
 */
export function groundBetween(posts: readonly LadderPost[], after: number): boolean {
  const before = new Set(posts.slice(0, after + 1).map(({ groundGroup }) => groundGroup))
  return posts.slice(after + 1).some(({ groundGroup }) => before.has(groundGroup))
}

/** The same for the neutral in circuit. */
export const neutralBetween = (posts: readonly LadderPost[], after: number): boolean =>
  posts.slice(0, after + 1).some(({ inCircuit }) => inCircuit) &&
  posts.slice(after + 1).some(({ inCircuit }) => inCircuit)

/** The ladder in words, for whoever can't see it. */
export function ladderWords(posts: readonly LadderPost[]): string {
  const rung = {
    in: 'a bond in circuit',
    excepted: 'a bond that may stay',
    cut: 'a bond, cut off',
    none: 'no bond',
  }
  return posts
    .map(
      ({ name, inCircuit, grounded, rung: is }) =>
        `${name}: neutral ${inCircuit ? 'in circuit' : 'cut off'}, ${rung[is]}${grounded ? '' : ', no wire to the bond'}`,
    )
    .join('; ')
}
