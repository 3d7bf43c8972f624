import type { Point } from './geometry.ts'
import { cord, hooks, lineY, measure, onRail, rail } from './layout-parts.ts'
import type { Part, Scale } from './layout-parts.ts'
import type { Seat } from './seat.ts'
import { inVolts } from './sides.ts'
import type { Readings } from './sides.ts'

type Gap = Seat & { kind: 'gap' }

/** How a cord's end swings down under its hook: the edge of the skirt. Below the cord's own length it hangs plumb. */
function swing(hook: number, length: number, toward: 1 | -1, skirt: number): Point[] {
  const steps = 12
  return Array.from({ length: steps + 1 }, (_, i): Point => {
    const down = (i / steps) * skirt
    const deep = Math.min(down, length)
    return [hook + toward * Math.sqrt(Math.max(0, length * length - deep * deep)), lineY + down]
  })
}

/** Ground untied: the cords' ends miss each other, and the lamp drops between their swings. */
function groundUntied(s: Gap, ng: number, hg: number, { k, xN, xH, frame }: Scale): Part {
  const { drop, skirt } = frame.height < measure.tall ? measure.short : measure
  const [left, right] = [swing(xN, ng * k, 1, skirt), swing(xH, hg * k, -1, skirt)]
  const [a, b]: [Point, Point] = [
    [xN + ng * k, lineY],
    [xH - hg * k, lineY],
  ]
  const lamp: Point = [(a[0] + b[0]) / 2, lineY + drop]
  return {
    sides: [rail(xN, xH), cord('ng', [xN, lineY], a), cord('hg', [xH, lineY], b)],
    hooks: hooks(xN, xH),
    ends: [a, b],
    swings: [left, right],
    hatched: [...left, ...[...right].reverse()],
    nodes: [onRail('N', xN), onRail('H', xH), { corner: 'G', at: lamp, loose: true }],
    pull: lamp,
    gap: {
      at: [lamp[0], Math.min(lineY + skirt + 34, frame.height - 5)],
      text: s.nowhere ? 'nowhere' : `${inVolts(s.gap)} V missing`,
    },
  }
}

/** Neutral or hot untied: the gap is in the rail, and ground hangs at the other end of what should be its cord. */
function endUntied(s: Gap, hn: number, toGround: number, tie: number, scale: Scale): Part {
  const { k, frame } = scale
  const span = tie * k
  const from = (frame.width - span) / 2
  const untied = s.corner === 'N' ? 'N' : 'H'
  // The tied end keeps its place: hot at the right, neutral at the left.
  const [xTied, xLamp, toward] = untied === 'N' ? [from + span, from, -1] : [from, from + span, 1]
  const railEnd: Point = [xTied + toward * hn * k, measure.railY]
  const cordEnd: Point = [xLamp - toward * toGround * k, lineY]
  const middle = (railEnd[0] + cordEnd[0]) / 2
  const [left, right] = [Math.min(railEnd[0], cordEnd[0]), Math.max(railEnd[0], cordEnd[0])]
  const [top, bottom] = [measure.railY - 24, lineY + 12]
  const below = lineY + 44
  return {
    sides: [
      { side: 'hn', line: [[xTied, measure.railY], railEnd], look: 'rail' },
      cord(untied === 'N' ? 'ng' : 'hg', [xLamp, lineY], cordEnd),
      {
        side: untied === 'N' ? 'hg' : 'ng',
        line: [
          [xTied, below],
          [xLamp, below],
        ],
        look: 'tie',
      },
    ],
    hooks: hooks(xTied),
    ends: [railEnd, cordEnd],
    around: [
      [xTied, lineY],
      [xTied, below],
      [xLamp, below],
      [xLamp, lineY],
    ],
    hatched: [
      [left, top],
      [right, top],
      [right, bottom],
      [left, bottom],
    ],
    nodes: [
      onRail(untied === 'N' ? 'H' : 'N', xTied),
      onRail(untied, middle, true),
      { corner: 'G', at: [xLamp, lineY], loose: false },
    ],
    gap: { at: [middle, lineY + 30], text: `${inVolts(s.gap)} V missing` },
  }
}

/** A gap: two sides too short for the third, with the corner they should meet at dashed. */
export function layGap(s: Gap, readings: Readings, scale: Scale): Part {
  const { hn = 0, ng = 0, hg = 0 } = readings
  if (s.corner === 'G') return groundUntied(s, ng, hg, scale)
  return s.corner === 'N' ? endUntied(s, hn, ng, hg, scale) : endUntied(s, hn, hg, ng, scale)
}
