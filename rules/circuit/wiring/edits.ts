/** The few things a fault can do to a wiring, as data, so that `faults.ts` reads as a table. */
import type { Branch, Node } from '../network.ts'
import { capacitance, resistance } from './healthy.ts'

export type Edit =
  /** Cut: nothing is left but what two ends in one box couple. */
  | { do: 'open'; wire: string }
  /** A poor joint in it. */
  | { do: 'add'; wire: string; ohms: number }
  /** The two wires' far ends exchanged. */
  | { do: 'swap'; wires: readonly [string, string] }
  /** Its near end on another terminal. */
  | { do: 'move'; wire: string; to: Node }
  /** Two points joined that should not be. */
  | { do: 'join'; name: string; between: readonly [Node, Node]; ohms: number }
  /** Two points coupled by a capacitor. */
  | { do: 'couple'; name: string; between: readonly [Node, Node]; farads: number }
  /** Not there at all. */
  | { do: 'remove'; part: string }
  /** Something else in its place. */
  | { do: 'replace'; part: string; by: readonly Branch[] }

export const open = (wire: string): Edit => ({ do: 'open', wire })
export const add = (wire: string, ohms: number): Edit => ({ do: 'add', wire, ohms })
export const swap = (one: string, other: string): Edit => ({ do: 'swap', wires: [one, other] })
export const move = (wire: string, to: Node): Edit => ({ do: 'move', wire, to })
export const join = (name: string, a: Node, b: Node, ohms: number): Edit => ({
  do: 'join',
  name,
  between: [a, b],
  ohms,
})
export const couple = (name: string, a: Node, b: Node, farads: number): Edit => ({
  do: 'couple',
  name,
  between: [a, b],
  farads,
})
export const remove = (part: string): Edit => ({ do: 'remove', part })
export const replace = (part: string, ...by: Branch[]): Edit => ({ do: 'replace', part, by })

/** Between the two ends of a cut wire: an inch of air. */
const gapFarads = 2e-12
/** Metal on metal at its best. */
const touchOhms = 0.002

const named = (branches: readonly Branch[], name: string): Branch => {
  const found = branches.find((b) => b.name === name)
  if (found === undefined) throw new Error(`this wiring has no ${name}`)
  return found
}
const exchange = (branches: readonly Branch[], name: string, by: readonly Branch[]): Branch[] => {
  named(branches, name)
  return branches.flatMap((b) => (b.name === name ? by : [b]))
}

/**
 * The wiring after one edit.
 * @throws Error where the wiring has no part of that name
 */
export function applyEdit(branches: readonly Branch[], edit: Edit): Branch[] {
  switch (edit.do) {
    case 'open': {
      const { from, to } = named(branches, edit.wire)
      return exchange(branches, edit.wire, [capacitance(edit.wire, from, to, gapFarads)])
    }
    case 'add': {
      const wire = named(branches, edit.wire)
      if (wire.kind !== 'resistance') throw new Error(`${edit.wire} is no wire to add ohms to`)
      return exchange(branches, edit.wire, [{ ...wire, ohms: wire.ohms + edit.ohms }])
    }
    case 'swap': {
      const [one, other] = edit.wires.map((name) => named(branches, name)) as [Branch, Branch]
      return branches.map((b) =>
        b === one ? { ...b, to: other.to } : b === other ? { ...b, to: one.to } : b,
      )
    }
    case 'move':
      return exchange(branches, edit.wire, [{ ...named(branches, edit.wire), from: edit.to }])
    case 'join':
      return [...branches, resistance(edit.name, ...edit.between, Math.max(edit.ohms, touchOhms))]
    case 'couple':
      return [...branches, capacitance(edit.name, ...edit.between, edit.farads)]
    case 'remove':
      return exchange(branches, edit.part, [])
    case 'replace':
      return exchange(branches, edit.part, edit.by)
  }
}
