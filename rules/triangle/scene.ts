import type { Line, Point } from './geometry.ts'
import type { Corner, Side } from './sides.ts'

export type Node = { corner: Corner; at: Point; loose: boolean }
/**
 * A side of the triangle as it is drawn; `side` says which reading a tap on it chooses. A `tie` is the part of
 * `around` that stands for its side.
 */
export type SideLine = { side: Side; line: Line; look: 'rail' | 'dotted' | 'cord' | 'tie' }

/** Everything the drawing consists of, px. The React part draws this and decides nothing. */
export type Scene = {
  width: number
  height: number
  sides: readonly SideLine[]
  /** From N and H down to the line the lamp hangs from. */
  hooks: readonly Line[]
  /** Ends of cords that meet nothing. */
  ends: readonly Point[]
  /** The dotted swings that bound a gap, or the half circle over the rail. */
  swings: readonly (readonly Point[])[]
  /** Where ground must lie: dashed arcs. */
  loci: readonly (readonly Point[])[]
  /** The hatched gap: what this meter pulls away. */
  hatched: readonly Point[] | undefined
  /** A tie drawn round the picture where the untied corner is an end of the rail. */
  around: readonly Point[] | undefined
  nodes: readonly Node[]
  /** Where the weight hangs, below the lamp. */
  pull: Point | undefined
  gap: { at: Point; text: string } | undefined
  /** The same place under a lighter meter: paler. */
  behind: { cords: readonly Line[]; ends: readonly Point[]; at: Point } | undefined
  /** A tick at the system's voltage on a rail far too long. */
  tick: { at: Point; text: string } | undefined
  /** Volts written on the sides, where the picture is only shown. */
  lengths: readonly { at: Point; text: string }[]
}
