import { seen } from '../result.ts'

/** UL 943, Class A: must not trip under the first, must from the second, mA. */
export const gfciMilliamps = { mustNotUnder: 4, mustFrom: 6 } as const
/** The formula runs to here, mA; more current need not trip it faster. */
const formulaTo = 264

/** Longest time in seconds a Class A GFCI may take: T = (20 / I)^1.43, I in mA. Infinity under 6 mA. */
export function gfciLongest(milliamps: number): number {
  if (milliamps < gfciMilliamps.mustFrom) return Infinity
  return (20 / Math.min(milliamps, formulaTo)) ** 1.43
}

/** It is made to work down to this part of its rated voltage; less may leave its release without power (from memory). */
export const gfciLeastVoltage = 0.85

export const gfciReference = seen('UL 943, Class A ground-fault circuit interrupter')
