import type { Point } from '../triangle/geometry.ts'
import type { Place, Wire } from './loop-state.ts'

export type { Point }
export type Points = readonly Point[]
type Anchor = 'start' | 'middle' | 'end'

/** Everything the picture consists of, px. The React part draws this and decides nothing. */
export type LoopScene = {
  width: number
  height: number
  /** Metal: `live` is hatched. */
  boxes: readonly { place: Place; x: number; y: number; width: number; height: number; live: boolean }[]
  /** In the order to draw them: later ones pass over earlier ones. */
  wires: readonly { wire: Wire; points: Points; look: 'whole' | 'absent' }[]
  /** Paths of current from its origin to its end; the wider, the more. `dots` is the width of what moves along it. */
  currents: readonly { points: Points; wash: number; dots: number }[]
  /** Degrees: 0 points right, 90 down. Hollow: no current worth the name. */
  arrows: readonly { at: Point; degrees: number; hollow: boolean }[]
  /** Ends of an open conductor. */
  ends: readonly Point[]
  /** Poor joints. */
  joints: readonly Point[]
  /** Neutral to ground; `open`: where a bond would be. */
  ties: readonly { points: Points; look: 'closed' | 'open' | 'middle' }[]
  /** From a conductor to the metal round it. */
  links: readonly Points[]
  rods: readonly { lead: Points; bars: readonly Points[] }[]
  /** Through the ground from rod to rod. */
  earthPath: Points | undefined
  coils: readonly { at: Point; radius: number; leads: readonly Points[] }[]
  breaker: { arc: Points; ends: readonly [Point, Point] }
  /** What draws current. */
  loads: readonly { leads: readonly Points[]; box: { x: number; y: number; width: number; height: number } }[]
  /** Hot on metal: a jagged line. */
  touch: Points | undefined
  discs: readonly { at: Point; wire: Wire; letter: string }[]
  /** `open`: dashed, names what is not there. `note`: names what is. */
  plates: readonly {
    x: number
    y: number
    width: number
    height: number
    look: 'open' | 'note'
    lines: readonly { text: string; strong: boolean }[]
    leader: Points
  }[]
  /** Metal that is live, in words on the metal itself. */
  labels: readonly {
    x: number
    y: number
    width: number
    height: number
    text: string
    look: 'live' | 'brief'
  }[]
  texts: readonly { at: Point; text: string; look: 'title' | 'name' | 'amps' | 'quiet'; anchor: Anchor }[]
}
