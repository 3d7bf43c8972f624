import { describe, expect, test } from 'vitest'
import type { Metal } from '../../../rules/circuit/conductors.ts'
import { groundingSizes } from '../../../rules/worksheets/grounding-sizes/grounding-sizes.ts'
import type { SizesInputs } from '../../../rules/worksheets/grounding-sizes/grounding-sizes.ts'
import { computeWorksheet } from '../../../rules/worksheets/worksheets.ts'

type Equipment = Extract<SizesInputs, { which: 'equipment' }>
type Electrode = Extract<SizesInputs, { which: 'electrode' }>
const equipment: Equipment = {
  which: 'equipment',
  ratedAmps: 20,
  metal: 'copper',
  hot: '4/0',
  hotMetal: 'copper',
  upsized: 'no',
}
const electrode: Electrode = {
  which: 'electrode',
  largest: '2',
  largestMetal: 'copper',
  metal: 'copper',
  electrode: 'water-or-steel',
}
const answer = (inputs: SizesInputs) => groundingSizes(inputs).figures[0]!.value

describe('equipment grounding conductor', () => {
  // NEC table 250.122, 2008 to 2023.
  test.each([
    [15, '14 AWG', '12 AWG'],
    [20, '12 AWG', '10 AWG'],
    [25, '10 AWG', '8 AWG'],
    [30, '10 AWG', '8 AWG'],
    [50, '10 AWG', '8 AWG'],
    [60, '10 AWG', '8 AWG'],
    [100, '8 AWG', '6 AWG'],
    [125, '6 AWG', '4 AWG'],
    [200, '6 AWG', '4 AWG'],
    [300, '4 AWG', '2 AWG'],
    [400, '3 AWG', '1 AWG'],
    // From memory.
    [500, '2 AWG', '1/0 AWG'],
    [1200, '3/0 AWG', '250 kcmil'],
  ])('%d A: %s copper, %s aluminum', (ratedAmps, copper, aluminum) => {
    // The hot is of the other metal, so that it sets no ceiling.
    expect(answer({ ...equipment, ratedAmps, hotMetal: 'aluminum' })).toBe(copper)
    expect(answer({ ...equipment, ratedAmps, metal: 'aluminum' })).toBe(aluminum)
  })

  // 250.122(B): circular mils in proportion. 20 A, hot made 8 AWG in place of 12: 6530 × 16510 ÷ 6530.
  test.each([
    [20, '8', '12', '8 AWG'],
    [30, '6', '10', '6 AWG'],
    [100, '2', '3', '6 AWG'],
    [100, '1', '3', '4 AWG'],
    [60, '3', '6', '6 AWG'],
    [200, '350', '3/0', '2 AWG'],
  ] as [number, Equipment['hot'], Equipment['hot'], string][])(
    '%d A, hot of %s in place of %s AWG: %s',
    (ratedAmps, hot, hotLeast, expected) => {
      expect(answer({ ...equipment, ratedAmps, hot, hotLeast, upsized: 'yes' })).toBe(expected)
    },
  )

  test('it need not be larger than the hot conductors (250.122(A))', () => {
    expect(answer({ ...equipment, ratedAmps: 60, hot: '12' })).toBe('12 AWG')
  })

  test('14 AWG copper on 20 A breaks 240.4(D)', () => {
    const result = groundingSizes({ ...equipment, ratedAmps: 20, hot: '14' })
    expect(result.judgment).toBe('fails')
    expect(result.because.join(' ')).toContain('240.4(D)')
    expect(groundingSizes({ ...equipment, ratedAmps: 15, hot: '14' }).judgment).toBe('said')
  })
})

describe('grounding electrode conductor', () => {
  // NEC table 250.66, 2008 to 2023.
  test.each([
    ['2', 'copper', '8 AWG', '6 AWG'],
    ['1/0', 'aluminum', '8 AWG', '6 AWG'],
    ['1', 'copper', '6 AWG', '4 AWG'],
    ['1/0', 'copper', '6 AWG', '4 AWG'],
    ['2/0', 'aluminum', '6 AWG', '4 AWG'],
    ['3/0', 'copper', '4 AWG', '2 AWG'],
    ['250', 'aluminum', '4 AWG', '2 AWG'],
    ['4/0', 'copper', '2 AWG', '1/0 AWG'],
    ['350', 'copper', '2 AWG', '1/0 AWG'],
    ['400', 'copper', '1/0 AWG', '3/0 AWG'],
    ['600', 'copper', '1/0 AWG', '3/0 AWG'],
    // From memory.
    ['1000', 'copper', '2/0 AWG', '4/0 AWG'],
    ['1250', 'copper', '3/0 AWG', '250 kcmil'],
  ] as [Electrode['largest'], Metal, string, string][])(
    '%s %s: %s copper, %s aluminum',
    (largest, largestMetal, copper, aluminum) => {
      expect(answer({ ...electrode, largest, largestMetal })).toBe(copper)
      expect(answer({ ...electrode, largest, largestMetal, metal: 'aluminum' })).toBe(aluminum)
    },
  )

  // 250.66(A) and (B).
  test.each([
    ['rod', 'copper', '4/0', '6 AWG'],
    ['rod', 'aluminum', '4/0', '4 AWG'],
    ['concrete', 'copper', '4/0', '4 AWG'],
    ['rod', 'copper', '2', '8 AWG'],
    ['concrete', 'copper', '1', '6 AWG'],
  ] as [Electrode['electrode'], Metal, Electrode['largest'], string][])(
    'to a %s alone, in %s, with %s: %s at most',
    (what, metal, largest, expected) => {
      expect(answer({ ...electrode, electrode: what, metal, largest })).toBe(expected)
    },
  )
})

test('every answer says to check the local code, and names its edition', () => {
  for (const inputs of [equipment, electrode]) {
    const result = groundingSizes(inputs)
    expect(result.cautions.some(({ text }) => text.startsWith('Check your local code'))).toBe(true)
    expect(result.references[0]?.cite).toContain('editions')
  }
})

test('an upsized circuit needs both sizes', () => {
  expect(computeWorksheet('grounding-sizes', { ...equipment, upsized: 'yes' })).toEqual({
    errors: { hotLeast: 'Choose the smallest size that would have done.' },
  })
  expect(
    computeWorksheet('grounding-sizes', { ...equipment, hot: '12', upsized: 'yes', hotLeast: '8' }),
  ).toEqual({
    errors: { hotLeast: 'That is thicker than what was run.' },
  })
})
