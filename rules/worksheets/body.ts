import { throughPoints } from './curve.ts'
import { remembered, seen } from './result.ts'

/**
 * A body in the circuit, after IEC 60479-1: hand to hand, dry, large contact. `low` is the value that 5 % of people
 * lie under. All from memory, edition of 2005 and 2018; wet skin has 10 to 25 % less at 50 V and under.
 */
const bodyOhmsAt = {
  low: [25, 1750, 50, 1375, 75, 1125, 100, 990, 125, 900, 150, 850, 200, 800, 225, 775, 1000, 575],
  half: [25, 3250, 50, 2500, 75, 2000, 100, 1725, 125, 1550, 150, 1400, 200, 1275, 225, 1225, 1000, 775],
} as const
export type People = keyof typeof bodyOhmsAt

const pairs = (flat: readonly number[]): [number, number][] =>
  flat.flatMap((x, i) => (i % 2 === 0 ? [[x, flat[i + 1] ?? Number.NaN] as [number, number]] : []))

/** Ohms of a body at this touch voltage; under 25 V as at 25 V. */
export function bodyOhms(touchVolts: number, people: People): number {
  const points = pairs(bodyOhmsAt[people])
  const [[least], [most]] = [points[0]!, points.at(-1)!]
  return throughPoints(points, Math.min(most, Math.max(least, touchVolts)), 'straight')
}

/** Seconds and milliamps of line b (let-go) and line c1 (the heart), left hand to feet, 15 to 100 Hz. */
const letGo: [number, number][] = [
  [0.01, 200],
  [10, 5],
]
const heart: [number, number][] = [
  [0.01, 500],
  [0.1, 400],
  [0.5, 93],
  [1, 50],
  [3, 40],
  [10, 40],
]
const longest = 10

/** Milliamps of line c1 at this time, s: below them the heart is not expected to fibrillate. */
export const heartMilliamps = (seconds: number): number =>
  throughPoints(heart, Math.min(longest, Math.max(0.01, seconds)), 'logarithmic')

const letGoMilliamps = (seconds: number): number =>
  throughPoints(letGo, Math.min(longest, Math.max(0.01, seconds)), 'logarithmic')

/** AC-1: hardly felt. AC-2: felt, no harm as a rule. AC-3: muscles cramp, can't let go. AC-4: the heart may stop. */
export type Zone = 'AC-1' | 'AC-2' | 'AC-3' | 'AC-4'

/** The zone of IEC 60479-1 figure 20 for a current through the body that lasts this long; Infinity counts as 10 s. */
export function zoneOf(milliamps: number, seconds: number): Zone {
  if (milliamps > heartMilliamps(seconds)) return 'AC-4'
  if (milliamps > letGoMilliamps(seconds)) return 'AC-3'
  return milliamps > 0.5 ? 'AC-2' : 'AC-1'
}

/** What a zone means, in words after "through a body". */
export const zoneWords: Readonly<Record<Zone, string>> = {
  'AC-1': 'is hardly felt (zone AC-1)',
  'AC-2': 'is felt, as a rule without harm (zone AC-2)',
  'AC-3': 'cramps the muscles: a hand may not let go, breathing may stop (zone AC-3)',
  'AC-4': 'can stop the heart (zone AC-4)',
}

export const bodyReferences = [
  remembered('IEC 60479-1, table 1 (body resistance, 2005 and 2018) and figure 20 (zones)'),
]

/** Longest time in seconds to disconnect a final circuit: IEC 60364-4-41 table 41.1, TN systems, AC. */
export function longestDisconnection(voltsToGround: number): number {
  if (voltsToGround <= 50) return Infinity
  if (voltsToGround <= 120) return 0.8
  if (voltsToGround <= 230) return 0.4
  return voltsToGround <= 400 ? 0.2 : 0.1
}
export const disconnectionReference = seen(
  'IEC 60364-4-41 table 41.1, TN systems, final circuits up to 32 A (the NEC sets no such time)',
)
/** Touch voltage that may stand for any time in dry places, V AC: IEC 60364-4-41 (50 V). */
export const standingTouchVolts = 50
