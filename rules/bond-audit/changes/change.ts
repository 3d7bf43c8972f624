import type { Part, System } from '../system.ts'

/** One change to a system that an audit may ask for. */
export type Change = {
  part: string
  /** What is done, without the part's name before it. */
  says: string
  /** 1: a screw; 3: a setting, a cord; 5: a wire to run; 8: equipment to replace. */
  work: number
  /** A bond is put in: held back until readings and instructions release it. */
  bonds: boolean
  apply: (system: System) => System
}

const replaced = (id: string, how: (part: Part) => Part) => (system: System) => ({
  ...system,
  parts: system.parts.map((part) => (part.id === id ? how(part) : part)),
})
/** One part put another way. */
export const change = (part: Part, work: number, says: string, to: Part, bonds = false): Change => ({
  part: part.id,
  says,
  work,
  bonds,
  apply: replaced(part.id, () => to),
})
