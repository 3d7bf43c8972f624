import * as math from 'mathjs'
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { legVolts, lostNeutral } from '../../../rules/worksheets/lost-neutral.ts'
import type { LostNeutralInputs } from '../../../rules/worksheets/lost-neutral.ts'
import { computeWorksheet } from '../../../rules/worksheets/worksheets.ts'
import { askNgspice } from './ask-ngspice.ts'

const loads = (...watts: [leg1: number, leg2: number]): LostNeutralInputs['loads'] => [
  { leg: '1', watts: watts[0] },
  { leg: '2', watts: watts[1] },
]
const figure = (inputs: LostNeutralInputs, label: string): number =>
  Number(
    lostNeutral(inputs)
      .figures.find((one) => one.label === label)!
      .value.replace(/,/g, ''),
  )

// Textbook case of two lamps on 120/240 V (first row), and the same circuit with other loads and a poor neutral.
const rows: [leg1: number, leg2: number, neutralOhms: number | undefined, volts1: number, volts2: number][] =
  [
    [100, 200, undefined, 160, 80],
    [1200, 100, undefined, 18.46, 221.54],
    [1200, 100, 0.1, 119.09, 120.91],
    [1200, 100, 1, 111.59, 128.41],
    [1200, 100, 10, 71.82, 168.18],
    [1200, 100, 25, 49.64, 190.36],
    [500, 500, undefined, 120, 120],
  ]

describe('two legs', () => {
  test.each(rows)('%d W and %d W, neutral of %s Ω: %d and %d V', (one, two, neutralOhms, volts1, volts2) => {
    const inputs: LostNeutralInputs = {
      volts: 120,
      neutral: neutralOhms === undefined ? 'open' : 'poor',
      neutralOhms,
      loads: loads(one, two),
    }
    const found = legVolts(120, one / 14_400, two / 14_400, neutralOhms === undefined ? 0 : 1 / neutralOhms)
    expect(found.first).toBeCloseTo(volts1, 2)
    expect(found.second).toBeCloseTo(volts2, 2)
    expect(found.first + found.second).toBeCloseTo(240, 9)
    expect(figure(inputs, 'Leg 1') / volts1).toBeCloseTo(1, 2)
    expect(figure(inputs, 'Leg 2') / volts2).toBeCloseTo(1, 2)

    const said = askNgspice([
      'V1 a 0 120',
      'V2 0 b 120',
      `R1 a n ${14_400 / one}`,
      `R2 n b ${14_400 / two}`,
      ...(neutralOhms === undefined ? [] : [`Rn n 0 ${neutralOhms}`]),
    ])
    expect(120 - said.get('n')!).toBeCloseTo(found.first, 6)
    const drift = math.evaluate('(120/r1 - 120/r2) / (1/r1 + 1/r2 + gn)', {
      r1: 14_400 / one,
      r2: 14_400 / two,
      gn: neutralOhms === undefined ? 0 : 1 / neutralOhms,
    }) as number
    expect(found.drift).toBeCloseTo(drift, 9)
  })

  test('1.111 A through both lamps, 177.8 and 88.9 W (the textbook’s figures)', () => {
    const inputs: LostNeutralInputs = { volts: 120, neutral: 'open', loads: loads(100, 200) }
    expect(figure(inputs, 'Through the loads')).toBeCloseTo(1.11, 2)
    const taken = lostNeutral(inputs).tables[0]!.rows.map((row) => Number(row[4]))
    expect(taken).toEqual([178, 88.9])
    expect(lostNeutral(inputs).verdict).toBe('Leg 1 gets 160 V: what runs there burns out.')
  })
})

test('one leg empty: the loaded one goes dark, and the empty one reads leg to leg', () => {
  const inputs: LostNeutralInputs = { volts: 120, neutral: 'open', loads: [{ leg: '2', watts: 60 }] }
  expect([
    figure(inputs, 'Leg 1'),
    figure(inputs, 'Leg 2'),
    figure(inputs, 'Neutral past the break'),
  ]).toEqual([240, 0, 120])
  expect(lostNeutral(inputs).verdict).toContain('Leg 2 goes dark')
  expect(lostNeutral(inputs).because[0]).toContain('live')
})

test('the legs always add up, and the lighter one never gets less', () => {
  const watts = fc.double({ min: 1, max: 20_000, noNaN: true })
  fc.assert(
    fc.property(watts, watts, fc.double({ min: 0, max: 100, noNaN: true }), (one, two, siemens) => {
      const { first, second } = legVolts(120, one / 14_400, two / 14_400, siemens)
      expect(first + second).toBeCloseTo(240, 6)
      if (one < two) expect(first).toBeGreaterThanOrEqual(second - 1e-9)
    }),
  )
})

test('every lost neutral begins with the danger', () => {
  for (const [one, two] of rows) {
    const { cautions } = lostNeutral({ volts: 120, neutral: 'open', loads: loads(one, two) })
    expect(cautions[0]?.word).toBe('danger')
  }
  expect(computeWorksheet('lost-neutral', { volts: 120, neutral: 'poor', loads: [] })).toHaveProperty(
    'errors',
  )
})
