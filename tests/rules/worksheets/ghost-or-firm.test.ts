import * as math from 'mathjs'
import type { Complex } from 'mathjs'
import { expect, test } from 'vitest'
import { ghostOrFirmSheet } from '../../../rules/worksheets/ghost-or-firm.ts'
import type { GhostInputs } from '../../../rules/worksheets/ghost-or-firm.ts'
import { computeWorksheet } from '../../../rules/worksheets/worksheets.ts'

const meter = (volts: number, ohms: number) => ({ with: 'meter', volts, ohms }) as const
const of = (one: GhostInputs['one'], other: GhostInputs['other'], hertz = 60) =>
  ghostOrFirmSheet({ hertz, one, other })
const figure = (result: ReturnType<typeof of>, label: string) =>
  Number(result.figures.find((one) => one.label === label)!.value.replace(/,/g, ''))

/** Volts that a meter with 100 pF beside its ohms shows on a voltage behind a capacitance. */
function shown(openVolts: number, farads: number, ohms: number, hertz: number): number {
  const scope = { u: openVolts, c: farads, r: ohms, w: 2 * Math.PI * hertz, k: 100e-12 }
  return math.abs(
    math.evaluate('u * (i * w * c) / (i * w * (c + k) + 1 / r)', scope) as Complex,
  ) as unknown as number
}

// NEMA Bulletin 88's case: a dead wire between hot and ground, 50 ft, 1.05 nF to each (60 V behind 2.1 nF); and
// other lengths, systems and meters, worked out by mathjs as complex numbers.
test.each([
  [60, 2.1e-9, 10e6, 400e3, 60],
  [60, 2.1e-9, 10e6, 3e3, 60],
  [60, 9.4e-9, 10e6, 3e3, 60],
  [115, 9.4e-9, 10e6, 100e3, 50],
  [110, 0.7e-9, 10e6, 400e3, 50],
  [76, 1.3e-9, 1e6, 100e3, 60],
])('%d V behind %d F, read with %d and %d Ω at %d Hz, is found again', (openVolts, farads, r1, r2, hertz) => {
  const result = of(
    meter(shown(openVolts, farads, r1, hertz), r1),
    meter(shown(openVolts, farads, r2, hertz), r2),
    hertz,
  )
  expect(result.verdict).toMatch(/^A ghost/)
  expect(figure(result, 'Behind it') / openVolts).toBeCloseTo(1, 2)
  expect(figure(result, 'Could drive') / (2 * Math.PI * hertz * farads * openVolts * 1e6)).toBeCloseTo(1, 2)
})

// Readings as a bench would take them: 59.53 V at 10 MΩ and 18.11 V at 400 kΩ give 60 V and 47.5 µA.
test('the worked case of two meters: 60 V, 47.5 µA', () => {
  const result = of(meter(59.53, 10e6), meter(18.11, 400e3))
  expect(figure(result, 'Behind it')).toBeCloseTo(60, -1)
  expect(Math.abs(figure(result, 'Could drive') / 47.5 - 1)).toBeLessThan(0.05)
})

test.each([
  // A sound wire stays; a balanced half stays; a test bulb that takes nothing away.
  ['Firm', meter(120, 10e6), meter(119.8, 3e3)],
  ['Firm', meter(59.8, 10e6), meter(59.7, 400e3)],
  ['Firm', meter(120, 10e6), { with: 'bulb', volts: 119, ratedWatts: 60, ratedVolts: 130 } as const],
  ['A ghost: nothing', meter(57, 10e6), { with: 'bulb', volts: 0, ratedWatts: 60, ratedVolts: 130 } as const],
  ['These two readings', meter(57, 10e6), meter(56, 5e6)],
  ['These two readings', meter(1.2, 10e6), meter(0.1, 3e3)],
  ['These two readings', meter(40, 10e6), meter(60, 3e3)],
])('%s …', (verdict, one, other) => {
  expect(of(one, other).verdict.startsWith(verdict)).toBe(true)
  expect(of(other, one).verdict).toBe(of(one, other).verdict)
})

test('firm is never leave to bond, and a bulb brings its warning', () => {
  expect(of(meter(59.8, 10e6), meter(59.7, 400e3)).because.join(' ')).toContain('no leave to install a bond')
  const bulb = of(meter(57, 10e6), { with: 'bulb', volts: 0, ratedWatts: 60, ratedVolts: 130 })
  expect(bulb.cautions[0]).toMatchObject({ word: 'warning' })
  expect(bulb.cautions[0]?.text).toContain('fused leads')
})

test('a resistance that would read the same is named, as Ohm’s law gives it', () => {
  const result = of(meter(100, 10e6), meter(50, 400e3))
  const expected = math.evaluate('(100 - 50) / (50 / 400e3 - 100 / 10e6) / 1000') as number
  expect(result.steps.find(({ name }) => name.includes('resistance'))?.filled).toContain(
    `${Math.round(expected)} kΩ`,
  )
})

test('an unreadable entry is named by its field', () => {
  expect(
    computeWorksheet('ghost-or-firm', {
      hertz: 60,
      one: meter(Number.NaN, 10e6),
      other: { with: 'meter', volts: 1 },
    }),
  ).toEqual({
    errors: {
      'one.volts': 'Type the volts it showed: a number from 0 to 1,000.',
      'other.ohms': 'Type the meter’s ohms: a number from 100 to 100,000,000.',
    },
  })
})
