/** Resistance of driven rods to remote earth. Lengths in meters, resistivity in ohm-meters. */

export type Rod = {
  /** ρ of the soil, Ω·m. */
  ohmMeters: number
  /** In the earth, m. */
  length: number
  /** Radius, m: with the diameter in its place the answer comes out a tenth low. */
  radius: number
}

/** One rod: R = ρ/(2πL) · (ln(4L/a) − 1) (Dwight 1936, as in IEEE 142). */
export const oneRod = ({ ohmMeters, length, radius }: Rod): number =>
  (ohmMeters / (2 * Math.PI * length)) * (Math.log((4 * length) / radius) - 1)

/** What one rod's current lifts another at distance s, Ω; Dwight's series, one for rods apart and one for rods close. */
export function mutualOhms({ ohmMeters, length: L }: Rod, s: number): number {
  if (s >= L)
    return (ohmMeters / (2 * Math.PI * s)) * (1 - L ** 2 / (3 * s ** 2) + (2 * L ** 4) / (5 * s ** 4))
  const x = s / L
  return (ohmMeters / (2 * Math.PI * L)) * (Math.log(4 / x) - 1 + x / 2 - x ** 2 / 16 + x ** 4 / 512)
}

/**
 * Rods of one kind in a straight line, tied together: all at one voltage, so the currents solve Σ R·I = 1 and the
 * resistance is one over their sum.
 */
export function rodsInLine(rod: Rod, number: number, spacing: number): number {
  const rows = Array.from({ length: number }, (_, i) =>
    Array.from({ length: number }, (_, j) =>
      i === j ? oneRod(rod) : mutualOhms(rod, Math.abs(i - j) * spacing),
    ),
  )
  const shares = solveOnes(rows)
  return 1 / shares.reduce((sum, share) => sum + share, 0)
}

/** x in A·x = (1, 1, …), by elimination; A is symmetric with its largest values on the diagonal, so no pivot is sought. */
function solveOnes(rows: number[][]): number[] {
  const n = rows.length
  const a = rows.map((row) => [...row, 1])
  for (let i = 0; i < n; i++)
    for (let j = i + 1; j < n; j++) {
      const factor = a[j]![i]! / a[i]![i]!
      for (let k = i; k <= n; k++) a[j]![k]! -= factor * a[i]![k]!
    }
  const x = new Array<number>(n).fill(0)
  for (let i = n - 1; i >= 0; i--) {
    let rest = a[i]![n]!
    for (let k = i + 1; k < n; k++) rest -= a[i]![k]! * x[k]!
    x[i] = rest / a[i]![i]!
  }
  return x
}

/** IEEE 142, factors for rods one length apart: number, F in R = R₁ · F ÷ n. */
export const spacedFactors = [
  [1, 1],
  [2, 1.16],
  [3, 1.29],
  [4, 1.36],
  [8, 1.68],
  [12, 1.8],
  [16, 1.92],
  [20, 2.0],
  [24, 2.16],
] as const

/** Amps a rod carries for a time, s, before the soil at it dries: I = 34800 · d · L ÷ √(ρ · t) (IEEE 142; m, Ω·m). */
export const rodShortTimeAmps = ({ ohmMeters, length, radius }: Rod, seconds: number): number =>
  (34_800 * 2 * radius * length) / Math.sqrt(ohmMeters * seconds)
