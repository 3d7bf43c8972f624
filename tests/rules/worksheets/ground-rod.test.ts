import * as math from 'mathjs'
import { describe, expect, test } from 'vitest'
import {
  mutualOhms,
  oneRod,
  rodShortTimeAmps,
  rodsInLine,
} from '../../../rules/worksheets/ground-rod/dwight.ts'
import { groundRod } from '../../../rules/worksheets/ground-rod/ground-rod.ts'
import type { RodInputs } from '../../../rules/worksheets/ground-rod/ground-rod.ts'
import { computeWorksheet } from '../../../rules/worksheets/worksheets.ts'

const plain: RodInputs = {
  units: 'american',
  soil: 'own',
  ohmMeters: 100,
  length: 10,
  diameter: 0.625,
  number: 1,
  spacing: 10,
  volts: 120,
}
/** The sheet's first figure. */
const ohms = (more: Partial<RodInputs>): number =>
  Number(groundRod({ ...plain, ...more }).figures[0]!.value.replace(/,/g, ''))

describe('one rod, Dwight with the radius for a', () => {
  test.each([
    // MIL-HDBK-419A vol. 2: 32 Ω from its nomograph.
    [10, 0.75, 32.14],
    // IEEE 142’s formula at 10,000 Ω·cm, worked out beside it.
    [10, 0.625, 33.09],
    [8, 0.625, 39.9],
    [8, 0.5, 41.36],
    [20, 0.625, 18.35],
  ])('%d ft of %d in at 100 Ω·m: %d Ω', (length, diameter, expected) => {
    expect(ohms({ length, diameter }) / expected).toBeCloseTo(1, 2)
    const byMath = math.evaluate('rho / (2 pi L) * (log(4 L / a) - 1)', {
      rho: 100,
      L: length * 0.3048,
      a: (diameter * 0.0254) / 2,
    }) as number
    expect(byMath / expected).toBeCloseTo(1, 3)
    expect(oneRod({ ohmMeters: 100, length: length * 0.3048, radius: diameter * 0.0127 })).toBeCloseTo(
      byMath,
      9,
    )
  })

  // IEEE 142, soils and a rod of 5/8 in × 10 ft (from memory, within 15 %): Ω·cm and Ω.
  test.each([
    [5_000, 15],
    [20_000, 60],
    [30_000, 90],
    [60_000, 180],
    [100_000, 300],
    [250_000, 750],
  ])('%d Ω·cm: about %d Ω', (ohmCentimeters, expected) => {
    expect(Math.abs(ohms({ ohmMeters: ohmCentimeters / 100 }) / expected - 1)).toBeLessThan(0.15)
  })

  test('a diameter taken for the radius would come out a tenth low', () => {
    const rod = { ohmMeters: 100, length: 3.048, radius: 0.0079375 }
    expect(oneRod({ ...rod, radius: 2 * rod.radius }) / oneRod(rod)).toBeCloseTo(0.89, 2)
  })
})

describe('several rods', () => {
  // Dwight's two-rod series; s = L, 2 L, 4 L, and 6 ft.
  test.each([
    [10, 19.33],
    [20, 17.77],
    [40, 17.18],
    [6, 19.61],
  ])('two rods %d ft apart: %d Ω', (spacing, expected) => {
    expect(ohms({ number: 2, spacing }) / expected).toBeCloseTo(1, 2)
  })

  // IEEE 142, factors of rods one length apart, times R₁ ÷ n with R₁ = 33.09 Ω.
  test.each([
    [2, 19.19],
    [3, 14.23],
    [4, 11.25],
    [8, 6.95],
    [12, 4.96],
    [24, 2.98],
  ])('%d rods one length apart: %d Ω', (number, expected) => {
    expect(Math.abs(ohms({ number }) / expected - 1)).toBeLessThan(number === 2 ? 0.015 : 0.005)
  })

  test.each([2, 3, 5, 8])('mathjs solves the same line of %d rods', (number) => {
    const rod = { ohmMeters: 80, length: 2.4, radius: 0.008 }
    const rows = Array.from({ length: number }, (_, i) =>
      Array.from({ length: number }, (_, j) =>
        i === j ? oneRod(rod) : mutualOhms(rod, Math.abs(i - j) * 2),
      ),
    )
    const shares = math.lusolve(rows, new Array<number>(number).fill(1)) as number[][]
    expect(rodsInLine(rod, number, 2)).toBeCloseTo(1 / shares.flat().reduce((a, b) => a + b, 0), 9)
  })

  test('closer rods are never better, and never better than alone divided by their number', () => {
    let before = Infinity
    for (const spacing of [2, 4, 6, 8, 9.9]) {
      const now = ohms({ number: 3, spacing })
      expect(now).toBeLessThanOrEqual(before)
      expect(now).toBeGreaterThan(33.09 / 3)
      before = now
    }
  })
})

test('8 ft of 5/8 in at 200 Ω·m stands 95 A for a second (IEEE 142)', () => {
  expect(rodShortTimeAmps({ ohmMeters: 200, length: 2.4384, radius: 0.0079375 }, 1)).toBeCloseTo(95, 0)
})

test('120 V through 33.09 Ω is 3.63 A: a 15 A breaker stays on for ever', () => {
  expect(groundRod(plain).because.join(' ')).toContain('3.63 A')
  expect(groundRod(plain).because.join(' ')).toContain('trips no 15 A breaker')
})

test('25 Ω and 6 ft are the NEC’s (250.53(A)(2) and (3))', () => {
  expect(groundRod({ ...plain, ohmMeters: 75 }).judgment).toBe('said')
  expect(groundRod({ ...plain, ohmMeters: 76 }).judgment).toBe('depends')
  expect(groundRod({ ...plain, number: 2, spacing: 6 }).judgment).toBe('said')
  expect(groundRod({ ...plain, number: 2, spacing: 5.9 }).because.join(' ')).toContain('6 ft')
})

test('metric and American inputs of one rod agree; what is missing is asked for', () => {
  expect(ohms({ units: 'metric', length: 3.048, diameter: 15.875 })).toBeCloseTo(ohms({}), 2)
  expect(
    computeWorksheet('ground-rod', { ...plain, ohmMeters: undefined, number: 2, spacing: undefined }),
  ).toEqual({
    errors: {
      ohmMeters: 'Type the measured resistivity in ohm-meters.',
      spacing: 'Type the distance between rods.',
    },
  })
})
