import * as math from 'mathjs'
import { describe, expect, test } from 'vitest'
import { dropOf, voltageDrop } from '../../../rules/worksheets/voltage-drop/voltage-drop.ts'
import type { DropInputs } from '../../../rules/worksheets/voltage-drop/voltage-drop.ts'
import { runOhms } from '../../../rules/worksheets/voltage-drop/run.ts'
import type { Run } from '../../../rules/worksheets/voltage-drop/run.ts'
import { computeWorksheet } from '../../../rules/worksheets/worksheets.ts'
import { askNgspice } from './ask-ngspice.ts'

const run: Run = { length: 100, size: '12', metal: 'copper', build: 'cable', raceway: 'none', amps: 16 }
const plain: DropInputs = {
  units: 'american',
  current: 'dc',
  volts: 120,
  powerFactor: 1,
  celsius: 75,
  runs: [run],
}
const drop = (more: Partial<DropInputs>, ...runs: Partial<Run>[]): number => {
  const inputs = {
    ...plain,
    ...more,
    runs: runs.length > 0 ? runs.map((one) => ({ ...run, ...one })) : plain.runs,
  }
  return inputs.runs.reduce(
    (sum, one) =>
      sum +
      dropOf(
        one.amps,
        runOhms(one, inputs.units, inputs.celsius, inputs.current)!,
        inputs.current === 'dc' ? 1 : inputs.powerFactor,
      ),
    0,
  )
}

describe('published and tabled cases', () => {
  test.each([
    // NEC chapter 9 table 8: 2 × 16 A × 0.193 Ω.
    ['120 V, 16 A, 100 ft of 12 AWG solid', drop({}), 6.176],
    // NEC chapter 9 table 9, PVC, power factor 0.85: 2 · L · I · (R cos φ + X sin φ).
    ['the same by table 9', drop({ current: 'ac', powerFactor: 0.85 }, { raceway: 'pvc' }), 5.531],
    // Table 8: 14 AWG solid.
    ['10 A over 50 ft of 14 AWG', drop({}, { amps: 10, length: 50, size: '14' }), 3.07],
    ['10 A over 75 ft of 12 AWG', drop({}, { amps: 10, length: 75 }), 2.895],
    // IEC 60228 at 70 °C with 0.00393 per °C.
    [
      '230 V, 16 A, 20 m of 2.5 mm²',
      drop({ units: 'metric', celsius: 70 }, { length: 20, size: '2.5' }),
      5.674,
    ],
    // Table 8 with note 2 at 25 °C: 12 AWG stranded 1.66 Ω per 1000 ft.
    [
      '10 A through a 100 ft cord of 12 AWG at 25 °C',
      drop({ celsius: 25 }, { amps: 10, build: 'cord' }),
      3.32,
    ],
    // Table 9, 4/0 aluminum in PVC: 2 · 0.2 · 150 · (0.1 · 0.9 + 0.041 · 0.4359).
    [
      '150 A over 200 ft of 4/0 aluminum',
      drop(
        { current: 'ac', powerFactor: 0.9 },
        { amps: 150, length: 200, size: '4/0', metal: 'aluminum', raceway: 'pvc' },
      ),
      6.472,
    ],
    // Table 9, 1/0 copper in steel, heat alone.
    [
      '100 A over 100 ft of 1/0 in steel',
      drop({ current: 'ac' }, { amps: 100, size: '1/0', raceway: 'steel' }),
      2.4,
    ],
  ])('%s', (_what, found, expected) => {
    expect(found / expected).toBeCloseTo(1, 3)
  })

  // BS 7671 appendix 4, two-core copper at 70 °C, mV per A and m (from memory; the table rounds to two digits).
  test.each([
    ['1.5', 29],
    ['2.5', 18],
    ['4', 11],
    ['6', 7.3],
    ['10', 4.4],
    ['16', 2.8],
  ])('%s mm²: %d mV per A and m', (size, milli) => {
    const found = 1000 * drop({ units: 'metric', celsius: 70 }, { size, length: 1, amps: 1 })
    expect(Math.abs(found / milli - 1)).toBeLessThan(0.03)
  })
})

test('the NEC’s 3 and 5 % are judged by branch and in all', () => {
  expect(voltageDrop({ ...plain, runs: [{ ...run, length: 58 }] }).judgment).toBe('holds')
  expect(voltageDrop({ ...plain, runs: [{ ...run, length: 60 }] }).judgment).toBe('depends')
  const two = { ...run, length: 50 }
  expect(voltageDrop({ ...plain, runs: [two, two] }).judgment).toBe('depends')
  expect(voltageDrop({ ...plain, runs: [two, { ...two, length: 40 }] }).judgment).toBe('holds')
})

test('neutral–ground is half of it on hot and neutral, and not spoken of from leg to leg', () => {
  const ng = (volts: number) =>
    voltageDrop({ ...plain, current: 'ac', volts }).figures.find(({ label }) =>
      label.startsWith('Neutral–ground'),
    )
  // Table 8: half of 6.176 V.
  expect(ng(120)?.value).toBe('3.09')
  expect(ng(240)).toBeUndefined()
})

test('ngspice finds the same voltage at the end of three runs that carry different currents', () => {
  const runs = [
    { ...run, size: '2', amps: 60, length: 120 },
    { ...run, size: '8', amps: 25, length: 80 },
    { ...run, size: '14', amps: 6, length: 40 },
  ]
  // Table 8 at 75 °C, one way: 2 AWG 0.194, 8 AWG stranded 0.778, 14 AWG solid 3.07 Ω per 1000 ft.
  const said = askNgspice([
    'V1 a 0 240',
    'R1 a b 0.02328',
    'R2 z b0 0.02328',
    'I1 b b0 35',
    'R3 b c 0.06224',
    'R4 b0 c0 0.06224',
    'I2 c c0 19',
    'R5 c d 0.1228',
    'R6 c0 d0 0.1228',
    'I3 d d0 6',
    'V2 z 0 0',
  ])
  const left = said.get('d')! - said.get('d0')!
  const found = voltageDrop({ ...plain, volts: 240, runs })
  expect(Number(found.figures[2]!.value)).toBeCloseTo(left, 0)
  expect(240 - drop({ volts: 240 }, ...runs)).toBeCloseTo(left, 6)
})

test('mathjs works the formula of table 9 out alike', () => {
  const found = drop(
    { current: 'ac', powerFactor: 0.8 },
    { raceway: 'steel', size: '10', amps: 24, length: 150 },
  )
  const byMath = math.evaluate('2 * 0.15 * 24 * (1.2 * 0.8 + 0.063 * sin(acos(0.8)))') as number
  expect(found).toBeCloseTo(byMath, 9)
})

test('what the tables have no wire for is said at its field', () => {
  expect(
    computeWorksheet('voltage-drop', { ...plain, runs: [run, { ...run, metal: 'aluminum', size: '14' }] }),
  ).toEqual({
    errors: { 'runs.1.size': 'The table has no aluminum cable of 14 AWG.' },
  })
  expect(
    computeWorksheet('voltage-drop', { ...plain, volts: Number.NaN, runs: [{ ...run, amps: -1 }] }),
  ).toEqual({
    errors: {
      volts: 'Type the volts at the source: a number from 6 to 1,000.',
      'runs.0.amps': 'Type the current in amps: a number from 0.01 to 2,000.',
    },
  })
})
