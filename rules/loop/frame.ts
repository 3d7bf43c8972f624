/** Where everything stands: along the run from the source on, and across it; lying or standing. */
import type { LoopState, Place, Wire } from './loop-state.ts'
import type { Point, Points } from './scene.ts'

/** Lying: from left to right. Standing: from top to bottom, with what is said in a column at the right. */
export type Lie = 'lying' | 'standing'

type Along = {
  boxes: Partial<Record<Place, readonly [number, number]>>
  /** In the source: the tie, the winding, where a pin may be open, the disc, the rod. */
  tie: number
  coil: number
  pin: number
  sourceDisc: number
  sourceRod: number
  breaker: readonly [number, number]
  /** In the panel. */
  house: number
  bus: number
  panelDisc: number
  panelRod: number
  /** At the receptacle. */
  cross: readonly [number, number]
  slot: number
  jumper: number
  load: number
  touch: number
  metal: number
  /** Whole length of the picture. */
  length: number
}

const lying: Along = {
  boxes: { source: [10, 226], panel: [402, 640], receptacle: [812, 1050] },
  tie: 42,
  coil: 100,
  pin: 136,
  sourceDisc: 174,
  sourceRod: 206,
  breaker: [524, 568],
  house: 436,
  bus: 490,
  panelDisc: 612,
  panelRod: 584,
  cross: [746, 802],
  slot: 838,
  jumper: 866,
  load: 894,
  touch: 942,
  metal: 1034,
  length: 1060,
}
const lyingDirect: Along = {
  ...lying,
  boxes: { source: [10, 330], receptacle: [764, 1050] },
  breaker: [176, 220],
  sourceDisc: 268,
  sourceRod: 304,
  cross: [690, 750],
  slot: 794,
  jumper: 832,
}
const standing: Along = {
  boxes: { source: [10, 162], panel: [268, 420], receptacle: [526, 694] },
  tie: 32,
  coil: 74,
  pin: 102,
  sourceDisc: 126,
  sourceRod: 150,
  breaker: [332, 370],
  house: 288,
  bus: 312,
  panelDisc: 390,
  panelRod: 409,
  cross: [478, 516],
  slot: 548,
  jumper: 576,
  load: 608,
  touch: 644,
  metal: 682,
  length: 706,
}
const standingDirect: Along = {
  ...standing,
  boxes: { source: [10, 206], receptacle: [322, 490] },
  breaker: [116, 156],
  sourceDisc: 174,
  sourceRod: 195,
  cross: [272, 312],
  slot: 344,
  jumper: 372,
  load: 404,
  touch: 440,
  metal: 478,
  length: 502,
}

/** Rows of the conductors across the run. */
const rows = {
  lying: {
    one: { hot: 96, neutral: 150, ground: 204, leg2: 0 },
    two: { hot: 96, neutral: 150, leg2: 204, ground: 258 },
  },
  standing: {
    one: { hot: 38, neutral: 106, ground: 176, leg2: 0 },
    two: { hot: 30, neutral: 86, leg2: 138, ground: 188 },
  },
} as const
/** Metal's edges across the run. */
const edges = {
  lying: { one: [52, 252], two: [52, 306] },
  standing: { one: [8, 226], two: [8, 228] },
} as const

export type Frame = Along & {
  lie: Lie
  rows: Readonly<Record<Wire, number>>
  edge: readonly [number, number]
  width: number
  height: number
  at: (along: number, across: number) => Point
  line: (...pairs: (readonly [number, number])[]) => Points
  boxOf: (place: Place) => readonly [number, number]
}

/** Room below the metal for rods and plates where the picture lies. */
const below = 74
/** Width of a standing picture: the wires, and the column of words beside them. */
const standingWidth = 372

export function frameOf(state: LoopState, lie: Lie): Frame {
  const panel = state.places.includes('panel')
  const along = lie === 'lying' ? (panel ? lying : lyingDirect) : panel ? standing : standingDirect
  const legs = state.twoLegs ? 'two' : 'one'
  const edge = edges[lie][legs]
  const at = (a: number, c: number): Point => (lie === 'lying' ? [a, c] : [c, a])
  return {
    ...along,
    lie,
    rows: rows[lie][legs],
    edge,
    width: lie === 'lying' ? along.length : standingWidth,
    height: lie === 'lying' ? edge[1] + below : along.length,
    at,
    line: (...pairs) => pairs.map(([a, c]) => at(a, c)),
    boxOf: (place) => {
      const box = along.boxes[place]
      if (box === undefined) throw new Error(`this picture has no ${place}`)
      return box
    },
  }
}

/** The free stretch between two boxes, along the run. */
export function gapOf(frame: Frame, stretch: 'feeder' | 'circuit'): readonly [number, number] {
  const begin = stretch === 'circuit' && frame.boxes.panel !== undefined ? 'panel' : 'source'
  const end = stretch === 'feeder' ? 'panel' : 'receptacle'
  return [frame.boxOf(begin)[1], frame.boxOf(end)[0]]
}
