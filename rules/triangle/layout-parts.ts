import type { Line, Point } from './geometry.ts'
import type { Node, Scene, SideLine } from './scene.ts'

export type Frame = {
  width: number
  height: number
  /** Volts on the sides: for a picture that is only shown. */
  lengths?: boolean
  /** A weight hangs from the lamp: room is left for it. */
  weighted?: boolean
  /** The same two ground readings under another meter. */
  behind?: { ng: number; hg: number } | undefined
}

/** Fixed measures of the drawing, px. */
export const measure = {
  margin: 46,
  railY: 40,
  hook: 34,
  node: 17,
  needle: 24,
  /** Room for the weight below the lamp. */
  pull: 44,
  /** How far the lamp drops, and its skirt is drawn, in a frame at least `tall`; and in a lower one. */
  tall: 220,
  drop: 58,
  skirt: 96,
  short: { drop: 44, skirt: 82 },
} as const
/** The line the lamp hangs from. */
export const lineY = measure.railY + measure.hook

/** What a drawing of one kind adds to the empty sheet. */
export type Part = Partial<Omit<Scene, 'width' | 'height'>>
/** Px per volt, and where N and H stand. */
export type Scale = { k: number; xN: number; xH: number; frame: Frame }

export const rail = (xN: number, xH: number, look: SideLine['look'] = 'rail'): SideLine => ({
  side: 'hn',
  line: [
    [xN, measure.railY],
    [xH, measure.railY],
  ],
  look,
})
export const hooks = (...xs: number[]): Line[] =>
  xs.map((x): Line => [
    [x, measure.railY],
    [x, lineY],
  ])
export const onRail = (corner: 'N' | 'H', x: number, loose = false): Node => ({
  corner,
  at: [x, measure.railY],
  loose,
})
export const cord = (side: 'ng' | 'hg', from: Point, to: Point): SideLine => ({
  side,
  line: [from, to],
  look: 'cord',
})
