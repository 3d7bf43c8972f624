import { nothing, plus } from '../complex.ts'
import { magnitude } from '../network.ts'
import type { Complex } from '../network.ts'
import type { Factored } from '../solve.ts'

/**
 * Common practice: an ordinary clamp has a last digit of 0.1 A and shows nothing under half of it. One for leakage
 * shows a hundredth of that.
 */
export const clampFloorAmps = 0.05

/**
 * RMS amps a clamp shows around one conductor, or around several at once: hot and neutral together show what
 * returns by another way.
 * @param branches names, all with their current counted from `from` to `to`
 * @param floorAmps less than this shows as 0
 */
export function clampReads(
  network: Factored,
  branches: readonly string[],
  floorAmps: number = clampFloorAmps,
): number {
  const amps = magnitude(branches.map((name) => network.amps(name)).reduce<Complex>(plus, nothing))
  return amps < floorAmps ? 0 : amps
}
