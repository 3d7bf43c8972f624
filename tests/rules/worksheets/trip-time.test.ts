import * as math from 'mathjs'
import { expect, test } from 'vitest'
import { bodyOhms, heartMilliamps, longestDisconnection, zoneOf } from '../../../rules/worksheets/body.ts'
import { rcdTimes } from '../../../rules/worksheets/leakage-trip/iec-61008.ts'
import type { RcdKind } from '../../../rules/worksheets/leakage-trip/iec-61008.ts'
import { leakageTrip } from '../../../rules/worksheets/leakage-trip/leakage-trip.ts'
import type { LeakageInputs } from '../../../rules/worksheets/leakage-trip/leakage-trip.ts'
import { gfciLongest } from '../../../rules/worksheets/leakage-trip/ul-943.ts'
import { computeWorksheet } from '../../../rules/worksheets/worksheets.ts'

// UL 943: T = (20 / I)^1.43 from 6 to 264 mA.
test.each([
  [6, 5.594],
  [10, 2.694],
  [20, 1.0],
  [30, 0.56],
  [60, 0.208],
  [100, 0.1],
  [120, 0.0771],
  [200, 0.0372],
  [264, 0.025],
])('a GFCI at %d mA trips within %d s', (milliamps, seconds) => {
  expect(gfciLongest(milliamps) / seconds).toBeCloseTo(1, 2)
  expect(gfciLongest(milliamps)).toBeCloseTo(math.evaluate(`(20 / ${milliamps}) ^ 1.43`) as number, 9)
})
test.each([3.9, 4, 5.9])('a GFCI need not trip at %d mA (UL 943, Class A)', (milliamps) => {
  expect(gfciLongest(milliamps)).toBe(Infinity)
})
test('above 264 mA it need be no faster', () => expect(gfciLongest(5000)).toBe(gfciLongest(264)))

// IEC 61008-1 table 1. Up to 30 mA five times may be 0.25 A.
test.each([
  [30, 15, 'general', Infinity],
  [30, 29, 'general', Infinity],
  [30, 30, 'general', 0.3],
  [30, 60, 'general', 0.15],
  [30, 250, 'general', 0.04],
  [300, 300, 'general', 0.3],
  [300, 600, 'general', 0.15],
  [300, 1500, 'general', 0.04],
  [100, 100, 'S', 0.5],
  [100, 200, 'S', 0.2],
  [100, 500, 'S', 0.15],
] as [number, number, RcdKind, number][])(
  'an RCD of %d mA at %d mA, %s: %d s',
  (rated, milliamps, kind, seconds) => {
    expect(rcdTimes(milliamps, rated, kind).toSeconds).toBe(seconds)
  },
)

// IEC 60479-1 table 1, 2005 and 2018, hand to hand, dry; from memory.
test.each([
  [50, 1375, 2500],
  [100, 990, 1725],
  [125, 900, 1550],
  [225, 775, 1225],
  [1000, 575, 775],
])('a body at %d V: %d Ω for one in twenty, %d Ω for one in two', (volts, low, half) => {
  expect(bodyOhms(volts, 'low')).toBe(low)
  expect(bodyOhms(volts, 'half')).toBe(half)
})
// IEC 60479-1 figure 20, line c1; from memory, within a fifth from 0.2 to 0.7 s.
test.each([
  [0.01, 500],
  [0.1, 400],
  [0.5, 93],
  [1, 50],
  [3, 40],
  [10, 40],
])('the heart’s line at %d s: %d mA', (seconds, milliamps) => expect(heartMilliamps(seconds)).toBe(milliamps))
test('77 mA for 25 ms lies below it, for 1 s beyond (IEC 60479-1)', () => {
  expect(zoneOf(77, 0.025)).not.toBe('AC-4')
  expect(zoneOf(77, 1)).toBe('AC-4')
  expect(zoneOf(0.4, 100)).toBe('AC-1')
  expect(zoneOf(4, Infinity)).toBe('AC-2')
  expect(zoneOf(20, Infinity)).toBe('AC-3')
})
// IEC 60364-4-41 table 41.1, TN, AC.
test.each([
  [120, 0.8],
  [230, 0.4],
  [277, 0.2],
  [400, 0.2],
  [480, 0.1],
])('at %d V to ground a final circuit goes off within %d s', (volts, seconds) => {
  expect(longestDisconnection(volts)).toBe(seconds)
})

const plain: LeakageInputs = {
  device: 'gfci',
  ratedMilliamps: '30',
  rcdKind: 'general',
  known: 'current',
  milliamps: 6,
}
test('the sheet: current from a path, a promise, no promise, a must-not', () => {
  const path = leakageTrip({ ...plain, known: 'path', volts: 120, ohms: 1000 })
  expect(path.steps[0]?.filled).toContain('120 mA')
  expect(path.verdict).toBe('The GFCI trips within 0.077 s.')
  expect(leakageTrip({ ...plain, milliamps: 5 })).toMatchObject({ judgment: 'depends' })
  expect(leakageTrip({ ...plain, milliamps: 3 }).verdict).toContain('must not trip')
  expect(leakageTrip({ ...plain, device: 'rcd', milliamps: 15 }).verdict).toContain('must not trip')
})
test('asks for what is missing, and knows no type S up to 30 mA', () => {
  expect(computeWorksheet('trip-time', { ...plain, known: 'path', device: 'rcd', rcdKind: 'S' })).toEqual({
    errors: {
      volts: 'Type the volts to ground.',
      ohms: 'Type ohms of the whole way to ground.',
      rcdKind: 'Type S exists above 30 mA only.',
    },
  })
})
