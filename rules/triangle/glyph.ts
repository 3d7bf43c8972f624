import type { Line, Point } from './geometry.ts'
import { seat } from './seat.ts'
import { volts } from './sides.ts'
import type { Readings } from './sides.ts'

/** The triangle in a list, 44 × 30: no letters. Hollow is neutral, solid is hot, the big dot ground, dashed untied. */
export type Glyph = {
  rail: Line | undefined
  /** Nothing to draw yet: the rail is dotted. */
  faint: boolean
  cords: readonly Line[]
  neutral: Point
  hot: Point
  ground: { at: Point; loose: boolean } | undefined
  tick: Point | undefined
}

export const glyphSize = { width: 44, height: 30 } as const
const [left, right, railY, line] = [5, 39, 6, 15]
const across = right - left
const lowest = glyphSize.height - 6

const hook = (x: number): Line => [
  [x, railY],
  [x, line],
]
const clamp = (x: number, least: number, most: number) => Math.min(most, Math.max(least, x))

/** The list glyph of these readings. */
export function glyphOf(readings: Readings): Glyph {
  const s = seat(readings)
  const [hn, ng, hg] = [volts(readings.hn) ?? 0, volts(readings.ng) ?? 0, volts(readings.hg) ?? 0]
  const [N, H]: [Point, Point] = [
    [left, railY],
    [right, railY],
  ]
  const tick: Point | undefined =
    hn > 1.3 * readings.nominal ? [left + (readings.nominal / hn) * across, railY] : undefined
  const plain: Glyph = { rail: [N, H], faint: false, cords: [], neutral: N, hot: H, ground: undefined, tick }
  if (s.kind === 'closed') {
    const tip: Point = [
      clamp(left + (s.x / hn) * across, 1, glyphSize.width - 1),
      Math.min(lowest, line + (s.y / hn) * across),
    ]
    return {
      ...plain,
      cords: [hook(left), hook(right), [[left, line], tip], [[right, line], tip]],
      ground: { at: [tip[0], tip[1] + (s.taut ? 3 : 0)], loose: false },
    }
  }
  if (s.kind === 'needle') {
    const [n, h, tip]: [Point, Point, Point] = [
      [17, railY],
      [27, railY],
      [22, lowest],
    ]
    return {
      ...plain,
      rail: [n, h],
      cords: [
        [n, tip],
        [h, tip],
      ],
      neutral: n,
      hot: h,
      ground: { at: tip, loose: false },
      tick: undefined,
    }
  }
  if (s.kind !== 'gap') return { ...plain, faint: true, tick: undefined }
  const k = across / Math.max(hn, ng, hg)
  if (s.corner === 'G') {
    const [a, b] = [left + ng * k, right - hg * k]
    return {
      ...plain,
      cords: [
        hook(left),
        hook(right),
        [
          [left, line],
          [a, line],
        ],
        [
          [right, line],
          [b, line],
        ],
      ],
      ground: { at: [(a + b) / 2, line + 9], loose: true },
    }
  }
  // The untied end of the rail moves inward, and ground hangs where it should have been.
  const untied = s.corner === 'N'
  return {
    ...plain,
    rail: untied ? [[right - hn * k, railY], H] : [N, [left + hn * k, railY]],
    cords: [
      [
        [left, line],
        [right, line],
      ],
    ],
    neutral: untied ? [left + 9, railY] : N,
    hot: untied ? H : [right - 9, railY],
    ground: { at: [untied ? left : right, line + 3], loose: false },
    tick: undefined,
  }
}
