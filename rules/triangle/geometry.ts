/** Points and lines of the drawing, px, y down. */
export type Point = readonly [number, number]
export type Line = readonly [Point, Point]

/** Points of a circle's arc about a middle, from angle `from` to `to` (radians; 0 right, a quarter turn down). */
export function arcPoints(middle: Point, radius: number, from: number, to: number, steps = 24): Point[] {
  return Array.from({ length: steps + 1 }, (_, i): Point => {
    const angle = from + ((to - from) * i) / steps
    return [middle[0] + radius * Math.cos(angle), middle[1] + radius * Math.sin(angle)]
  })
}

/** How far a point lies from a line between two ends. */
export function distanceTo([a, b]: Line, p: Point): number {
  const [dx, dy] = [b[0] - a[0], b[1] - a[1]]
  const length = dx * dx + dy * dy
  const along = length === 0 ? 0 : ((p[0] - a[0]) * dx + (p[1] - a[1]) * dy) / length
  const on = Math.min(1, Math.max(0, along))
  return Math.hypot(p[0] - a[0] - on * dx, p[1] - a[1] - on * dy)
}
