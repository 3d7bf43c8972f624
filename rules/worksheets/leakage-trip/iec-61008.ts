import { remembered, seen } from '../result.ts'

export type RcdKind = 'general' | 'S'

/** Longest times, s, from one, two and five times the rated residual current. */
const longest: Readonly<Record<RcdKind, readonly [number, number, number]>> = {
  general: [0.3, 0.15, 0.04],
  S: [0.5, 0.2, 0.15],
}
/** Type S waits at least this long, s, so that one behind it trips first. */
const shortestS = [0.13, 0.06, 0.05] as const

/** Up to 30 mA the standard lets 0.25 A stand for five times: only from there is the shortest time promised. */
export const fiveTimes = (ratedMilliamps: number): number =>
  ratedMilliamps <= 30 ? Math.max(250, 5 * ratedMilliamps) : 5 * ratedMilliamps

/**
 * Times of a residual current device in seconds, general or type S. It must not trip up to half its rated current,
 * and must from the whole; between them it may (`toSeconds` is Infinity).
 */
export function rcdTimes(
  milliamps: number,
  ratedMilliamps: number,
  kind: RcdKind,
): { fromSeconds: number; toSeconds: number } {
  if (milliamps <= 0.5 * ratedMilliamps) return { fromSeconds: Infinity, toSeconds: Infinity }
  const step = milliamps >= fiveTimes(ratedMilliamps) ? 2 : milliamps >= 2 * ratedMilliamps ? 1 : 0
  const fromSeconds = kind === 'S' ? shortestS[step] : 0
  return { fromSeconds, toSeconds: milliamps < ratedMilliamps ? Infinity : longest[kind][step] }
}

export const rcdReferences = [
  seen('IEC 61008-1 table 1, longest times of general and type S devices'),
  remembered('IEC 61008-1 table 1, shortest times of type S'),
]
