import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { RawFinding } from '../../rules/findings/sheet.ts'
import { bondGate } from '../../rules/ranking/bond-gate.ts'
import { european, generator, powerStation, sheetOf, starter, volts } from '../edition.ts'
import type { CaseContext } from '../edition.ts'
import { anyCase } from './any-case.ts'

/** All five lines hold: a floating source, proved at its own terminals. */
const five = {
  'source.bulb.ng.volts': 0.4,
  'source.bulb.hg.volts': 0.5,
  'source.bulb.hn.volts': 119,
  'bulb.proved': 'yes',
  'instructions.bond': 'allowed',
} satisfies Record<string, RawFinding>

const state = (
  findings: Record<string, RawFinding>,
  context: CaseContext = generator,
  other: Record<string, Record<string, RawFinding>> = {},
) => bondGate(starter, sheetOf(context, findings, other)).state

const without = (id: string) => Object.fromEntries(Object.entries(five).filter(([key]) => key !== id))

describe('five lines release installing a bond, and nothing less', () => {
  test('all five', () => expect(state(five)).toBe('released'))
  test.each(Object.keys(five))('not without %s', (id) => expect(state(without(id))).toBe('held-back'))
  test.each([
    ['2.1 V across the bulb, neutral–ground', { 'source.bulb.ng.volts': 2.1 }],
    ['2.1 V across the bulb, hot–ground', { 'source.bulb.hg.volts': 2.1 }],
    ['half on the bulb: a balanced output', { 'source.bulb.ng.volts': 57, 'source.bulb.hg.volts': 58 }],
    ['the source sagged while it hung there', { 'source.bulb.hn.volts': 107.9 }],
    ['bulb not proved', { 'bulb.proved': 'no' }],
    ['instructions forbid it', { 'instructions.bond': 'forbidden' }],
    ['instructions not found', { 'instructions.bond': 'not-found' }],
    ['source neutral tied', { 'source.ng.ohms': 0.2 }],
    ['panel neutral tied', { 'panel.ng.ohms': 4.9 }],
    ['receptacle neutral tied', { 'receptacle.ng.ohms': 1.2 }],
    ['ground holds on neutral at the panel', volts(120, 119.5, 0.4, 'panel')],
    ['ground holds on hot at the receptacle', volts(120, 0.4, 119)],
    ['a bulb glowed to ground', { 'bulb.hg': 'dim' }],
    ['a bulb bright to ground', { 'bulb.ng': 'bright' }],
    ['volts left across the bulb', { 'bulb.ng.volts': 2.2 }],
  ] as [string, Record<string, RawFinding>][])('held back: %s', (_, more) =>
    expect(state({ ...five, ...more })).toBe('held-back'),
  )
  test('half against a 10 kΩ meter holds it back, the same half at 10 MΩ does not', () => {
    const halves = { ...five, ...volts(120, 58, 57) }
    expect(state(halves, { ...generator, meterOhms: 10_000 })).toBe('held-back')
    expect(state(halves)).toBe('released')
  })
  test('4 V are allowed on 230 V systems', () => {
    const on230 = {
      ...five,
      'source.bulb.ng.volts': 3.9,
      'source.bulb.hg.volts': 3.9,
      'source.bulb.hn.volts': 229,
    }
    expect(state(on230, european)).toBe('released')
    expect(state({ ...on230, 'source.bulb.hg.volts': 4.1 }, european)).toBe('held-back')
  })
  test('the lines must hold in one mode: half of them in each of two modes release nothing', () => {
    const inverter = { source: 'all-in-one-inverter', system: '120', wiring: 'panel', mode: 'battery' }
    const { 'bulb.proved': proved, 'instructions.bond': allowed, ...bulb } = five
    expect(
      state(bulb, inverter, { 'pass-through': { 'bulb.proved': proved, 'instructions.bond': allowed } }),
    ).toBe('held-back')
    expect(state({}, inverter, { 'pass-through': five })).toBe('released')
  })
  test('what speaks against it in any mode holds it back', () => {
    const inverter = { source: 'all-in-one-inverter', system: '120', wiring: 'panel', mode: 'battery' }
    expect(state(five, inverter, { 'pass-through': { 'panel.ng.ohms': 0.1 } })).toBe('held-back')
  })
  test('a dark bulb at a receptacle and over-limit ohms release nothing', () => {
    const dark = {
      'bulb.ng': 'dark',
      'bulb.hg': 'dark',
      'bulb.proved': 'yes',
      'instructions.bond': 'allowed',
    }
    expect(state({ ...dark, 'source.ng.ohms': 1e9, 'panel.ng.ohms': 1e9 })).toBe('held-back')
  })
})

test('over random findings, and every prefix of them, nothing is released without the five lines', () => {
  fc.assert(
    fc.property(anyCase(starter), ({ context, findings }) => {
      const entries = Object.entries(findings)
      for (let n = 0; n <= entries.length; n++) {
        const taken = Object.fromEntries(entries.slice(0, n))
        if (state(taken, context) !== 'released') continue
        const limit = context.system === '230' ? 4 : 2
        const nominal = context.system === '230' ? 230 : 120
        expect(taken['source.bulb.ng.volts']).toBeLessThanOrEqual(limit)
        expect(taken['source.bulb.hg.volts']).toBeLessThanOrEqual(limit)
        expect(taken['source.bulb.hn.volts']).toBeGreaterThanOrEqual(0.9 * nominal)
        expect(taken['bulb.proved']).toBe('yes')
        expect(taken['instructions.bond']).toBe('allowed')
        for (const id of ['source.ng.ohms', 'panel.ng.ohms', 'receptacle.ng.ohms'])
          expect(taken[id] ?? Infinity).toBeGreaterThanOrEqual(5)
      }
    }),
    { numRuns: 400 },
  )
})

test('never on a balanced output: the bulb keeps 20 V or more of it, whatever else was found', () => {
  const balanced = fc.record({
    n: fc.double({ min: 20, max: 100, noNaN: true }),
    h: fc.double({ min: 20, max: 100, noNaN: true }),
  })
  fc.assert(
    fc.property(anyCase(starter), balanced, ({ findings, context }, { n, h }) => {
      const found = { ...findings, ...five, 'source.bulb.ng.volts': n, 'source.bulb.hg.volts': h }
      expect(state(found, context)).toBe('held-back')
    }),
  )
})

test('a power station’s halves alone, however many and however alike, release nothing', () => {
  expect(state({ ...volts(119.6, 59.8, 59.8), ...volts(119.6, 59.8, 59.8, 'source') }, powerStation)).toBe(
    'held-back',
  )
})
