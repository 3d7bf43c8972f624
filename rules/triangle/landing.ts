/** The drawing on its way from one set of readings to the next: cords swing along their arcs, and meet or miss. */
import type { Point } from './geometry.ts'
import type { Scene, SideLine } from './scene.ts'

const swung = (50 * Math.PI) / 180 // how far below its place a cord begins its swing

const lerp = (a: number, b: number, part: number) => a + (b - a) * part
const lerpPoint = (a: Point, b: Point, part: number): Point => [
  lerp(a[0], b[0], part),
  lerp(a[1], b[1], part),
]

function turned(side: SideLine, part: number): SideLine {
  if (side.look !== 'cord') return side
  const [from, to] = side.line
  // From N a cord hangs down clockwise, from H the other way.
  const by = (side.side === 'ng' ? 1 : -1) * (1 - part) * swung
  const [x, y] = [to[0] - from[0], to[1] - from[1]]
  const [cos, sin] = [Math.cos(by), Math.sin(by)]
  return { ...side, line: [from, [from[0] + x * cos - y * sin, from[1] + x * sin + y * cos]] }
}

/** What shows only once the lamp has landed. */
const unlanded = { hatched: undefined, gap: undefined, pull: undefined, lengths: [], swings: [] } as const

function swingIn(to: Scene, part: number): Scene {
  const sides = to.sides.map((side) => turned(side, part))
  const tips = sides.filter((side) => side.look === 'cord').map((side) => side.line[1])
  const [a, b] = tips
  const middle: Point | undefined = a && b && lerpPoint(a, b, 0.5)
  return {
    ...to,
    ...unlanded,
    sides,
    ends: to.ends.length === tips.length ? tips : to.ends,
    nodes: to.nodes.map((node) =>
      node.corner === 'G' && middle ? { ...node, at: lerpPoint(middle, node.at, part) } : node,
    ),
  }
}

/** Whether two drawings consist of the same things, so that one can slide into the other. */
const alike = (a: Scene, b: Scene) =>
  a.sides.length === b.sides.length &&
  a.sides.every((side, i) => side.side === b.sides[i]?.side && side.look === b.sides[i]?.look) &&
  a.nodes.length === b.nodes.length &&
  a.nodes.every((node, i) => node.corner === b.nodes[i]?.corner && node.loose === b.nodes[i]?.loose) &&
  a.ends.length === b.ends.length

function slide(from: Scene, to: Scene, part: number): Scene {
  return {
    ...to,
    ...unlanded,
    sides: to.sides.map((side, i) => {
      const [a, b] = from.sides[i]?.line ?? side.line
      return { ...side, line: [lerpPoint(a, side.line[0], part), lerpPoint(b, side.line[1], part)] }
    }),
    hooks: to.hooks.map((hook, i) => {
      const [a, b] = from.hooks[i] ?? hook
      return [lerpPoint(a, hook[0], part), lerpPoint(b, hook[1], part)]
    }),
    ends: to.ends.map((end, i) => lerpPoint(from.ends[i] ?? end, end, part)),
    nodes: to.nodes.map((node, i) => ({
      ...node,
      at: lerpPoint(from.nodes[i]?.at ?? node.at, node.at, part),
    })),
  }
}

/**
 * The drawing part of the way from one scene to another; at 1 it is `to` itself. Alike scenes slide; else the cords
 * swing up from below.
 */
export function onTheWay(from: Scene, to: Scene, part: number): Scene {
  if (part >= 1) return to
  return alike(from, to) ? slide(from, to, part) : swingIn(to, part)
}
