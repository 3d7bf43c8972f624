/** From volts to px: how the seat of ground is drawn. Everything is to scale but the hooks and the gap's drop. */
import { arcPoints, distanceTo } from './geometry.ts'
import type { Line, Point } from './geometry.ts'
import { layGap } from './layout-gap.ts'
import { cord, hooks, lineY, measure, onRail, rail } from './layout-parts.ts'
import type { Frame, Part, Scale } from './layout-parts.ts'
import type { Scene, SideLine } from './scene.ts'
import { seat } from './seat.ts'
import type { Seat } from './seat.ts'
import { inVolts, volts } from './sides.ts'
import type { Readings, Side } from './sides.ts'

const tooLong = 1.3 // × nominal: from there the rail carries a tick at the system's voltage

const none: Omit<Scene, 'width' | 'height'> = {
  sides: [],
  hooks: [],
  ends: [],
  swings: [],
  loci: [],
  hatched: undefined,
  around: undefined,
  nodes: [],
  pull: undefined,
  gap: undefined,
  behind: undefined,
  tick: undefined,
  lengths: [],
}

/** Volts the drawing must span, left and right of N and down. */
function extent(readings: Readings, s: Seat): { from: number; to: number; deep: number } {
  const { nominal } = readings
  const hn = volts(readings.hn) ?? nominal
  if (s.kind === 'needle') return { from: 0, to: nominal, deep: s.depth }
  if (s.kind === 'dead') return { from: 0, to: nominal, deep: 0 }
  if (s.kind === 'gap') return { from: 0, to: Math.max(hn, readings.hg ?? 0, readings.ng ?? 0), deep: 0 }
  if (s.kind === 'closed') return { from: Math.min(0, s.x), to: Math.max(hn, s.x), deep: s.y }
  // A cord may reach past the rail's other end while the third reading is missing.
  return {
    from: Math.min(0, hn - (volts(readings.hg) ?? 0)),
    to: Math.max(hn, volts(readings.ng) ?? 0),
    deep: 0,
  }
}

function scaleOf(readings: Readings, s: Seat, frame: Frame): Scale {
  const { from, to, deep } = extent(readings, s)
  const across = frame.width - 2 * measure.margin
  const below = frame.height - lineY - measure.node - 6 - (frame.weighted === true ? measure.pull : 0)
  const k = Math.min(across / Math.max(to - from, 1), deep > 0 ? below / deep : Infinity)
  const xN = (frame.width - (to - from) * k) / 2 - from * k
  const apart = (volts(readings.hn) ?? readings.nominal) * k
  // To scale, N and H would hide each other when hot–neutral is next to nothing.
  const aside = Math.max(0, measure.needle - apart / 2)
  return { k, xN: xN - aside, xH: xN + apart + aside, frame }
}

function layClosed(s: Seat & { kind: 'closed' }, { k, xN, xH }: Scale): Part {
  const tip: Point = [xN + s.x * k, lineY + s.y * k]
  const atAnEnd = s.at === 'neutral' || s.at === 'hot'
  // Taut cords run through the lamp's top, so the lamp sits a little lower than the line.
  const lamp: Point = [tip[0], tip[1] + (atAnEnd ? 8 : s.taut ? 6 : 0)]
  const middle: Point = [(xN + xH) / 2, lineY]
  return {
    sides: [rail(xN, xH), cord('ng', [xN, lineY], tip), cord('hg', [xH, lineY], tip)],
    hooks: hooks(xN, xH),
    swings: s.taut ? [] : [arcPoints(middle, (xH - xN) / 2, 0, Math.PI, 40)],
    nodes: [onRail('N', xN), onRail('H', xH), { corner: 'G', at: lamp, loose: false }],
    pull: lamp,
  }
}

/** N and H 48 px apart, since to scale they would hide each other; the lamp far below, or just under a dead rail. */
function layNeedle(depth: number | undefined, { k, frame }: Scale): Part {
  const middle = frame.width / 2
  const [xN, xH] = [middle - measure.needle, middle + measure.needle]
  const lamp: Point = [middle, depth === undefined ? lineY + 22 : lineY + depth * k]
  const system: SideLine = rail(measure.margin, frame.width - measure.margin, 'dotted')
  const tied: SideLine[] =
    depth === undefined ? [] : [cord('ng', [xN, measure.railY], lamp), cord('hg', [xH, measure.railY], lamp)]
  return {
    sides: [system, rail(xN, xH), ...tied],
    nodes: [onRail('N', xN), onRail('H', xH), { corner: 'G', at: lamp, loose: false }],
    pull: depth === undefined ? undefined : lamp,
  }
}

/** Fewer than three: each ground reading is a cord laid along the line, and the arc its end can swing on. */
function layPartly(readings: Readings, { k, xN, xH, frame }: Scale): Part {
  const cords: SideLine[] = []
  const loci: Point[][] = []
  const deepest = frame.height - 6
  const lay = (side: 'ng' | 'hg', taken: number | undefined) => {
    if (taken === undefined) return
    const [from, toward] = side === 'ng' ? [xN, 1] : [xH, -1]
    const all = arcPoints([from, lineY], taken * k, toward > 0 ? 0 : Math.PI, Math.PI / 2)
    cords.push(cord(side, [from, lineY], [from + toward * taken * k, lineY]))
    loci.push(all.filter(([, y]) => y <= deepest))
  }
  lay('ng', volts(readings.ng))
  lay('hg', volts(readings.hg))
  return {
    sides: [rail(xN, xH, volts(readings.hn) === undefined ? 'dotted' : 'rail'), ...cords],
    hooks: hooks(xN, xH),
    ends: cords.map((c) => c.line[1]),
    loci,
    nodes: [onRail('N', xN), onRail('H', xH)],
  }
}

function behindOf(s: Seat, { k, xN, xH, frame }: Scale): Scene['behind'] {
  const { behind } = frame
  if (
    behind === undefined ||
    (s.kind === 'gap' && s.corner !== 'G') ||
    s.kind === 'needle' ||
    s.kind === 'dead'
  )
    return undefined
  const y = lineY + 11
  const [a, b]: [Point, Point] = [
    [xN + behind.ng * k, y],
    [xH - behind.hg * k, y],
  ]
  return {
    cords: [
      [[xN, y], a],
      [[xH, y], b],
    ],
    ends: [a, b],
    at: [xH + 14, y + 16],
  }
}

const exact = (x: number) => String(Math.round(x * 10) / 10)

function lengthsOf(readings: Readings, s: Seat, part: Part): Scene['lengths'] {
  const middle = ([a, b]: Line, dx: number, dy: number): Point => [
    (a[0] + b[0]) / 2 + dx,
    (a[1] + b[1]) / 2 + dy,
  ]
  return (part.sides ?? []).flatMap(({ side, line, look }) => {
    const taken = volts(readings[side])
    if (taken === undefined || look === 'dotted') return []
    const length = Math.hypot(line[1][0] - line[0][0], line[1][1] - line[0][1])
    // Over a short rail the volts stand above the nodes, which would hide them.
    if (side === 'hn') return [{ at: middle(line, 0, length < 110 ? -22 : -12), text: `${exact(taken)} V` }]
    if (length < 40) return []
    const hanging = s.kind === 'needle' || (s.kind === 'closed' && !s.taut)
    const aside = hanging ? (side === 'ng' ? -22 : 22) : 0
    return [{ at: middle(line, aside, hanging ? 8 : 24), text: exact(taken) }]
  })
}

/** The drawing of these readings in a frame. */
export function layOut(readings: Readings, frame: Frame): Scene {
  const s = seat(readings)
  const scale = scaleOf(readings, s, frame)
  const part: Part =
    s.kind === 'closed'
      ? layClosed(s, scale)
      : s.kind === 'gap'
        ? layGap(s, readings, scale)
        : s.kind === 'needle'
          ? layNeedle(s.depth, scale)
          : s.kind === 'dead'
            ? layNeedle(undefined, scale)
            : layPartly(readings, scale)
  const hn = volts(readings.hn) ?? 0
  const railIsWhole = s.kind !== 'needle' && !(s.kind === 'gap' && s.corner !== 'G')
  return {
    ...none,
    width: frame.width,
    height: frame.height,
    ...part,
    behind: behindOf(s, scale),
    tick:
      railIsWhole && hn > tooLong * readings.nominal
        ? {
            at: [scale.xN + readings.nominal * scale.k, measure.railY],
            text: `${inVolts(readings.nominal)} V`,
          }
        : undefined,
    lengths: frame.lengths === true ? lengthsOf(readings, s, part) : [],
  }
}

/** Which side a tap chooses: the nearest one within 24 px. A side that isn't drawn yet is reached by its field. */
export function sideAt(scene: Scene, tap: Point, reach = 24): Side | undefined {
  let best: { side: Side; far: number } | undefined
  for (const { side, line } of scene.sides) {
    const far = distanceTo(line, tap)
    if (far <= reach && (best === undefined || far < best.far)) best = { side, far }
  }
  return best?.side
}
