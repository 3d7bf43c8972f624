import { describe, expect, test } from 'vitest'
import { americanWireOhms, metricWireOhms } from '../../../rules/circuit/conductors.ts'
import { bulbBetween } from '../../../rules/circuit/instruments/test-bulb.ts'
import { heldTo, meterOf, reads } from '../../../rules/circuit/instruments/meter.ts'
import { earth, magnitude } from '../../../rules/circuit/network.ts'
import { factor } from '../../../rules/circuit/solve.ts'
import type { Factored } from '../../../rules/circuit/solve.ts'
import { at50, at60, c, r, v } from './build.ts'

/** Cases one can work out with a pencil, each with where it comes from. Ohm and Kirchhoff need no source. */
const amps = (net: Factored, branch: string) => magnitude(net.amps(branch))
const volts = (net: Factored, a: string, b: string) => magnitude(net.between(a, b))
const bare = (ohms: number) => ({ ohms, farads: 0 })

describe('a rod is no fault path', () => {
  test('25 Ω on 120 V passes 4.8 A: a 15 A breaker holds for ever (common practice)', () => {
    const net = factor(at60(v(earth, 'hot', 120), r('hot', earth, 25, 'rod')))
    expect(amps(net, 'rod')).toBeCloseTo(4.8, 3)
  })
  test('a person of 1000 Ω beside it carries 0.12 A (IEEE 80 takes 1000 Ω for a body)', () => {
    const net = factor(
      at60(v(earth, 'case', 120), r('case', earth, 25, 'rod'), r('case', earth, 1000, 'body')),
    )
    expect(amps(net, 'body')).toBeCloseTo(0.12, 4)
  })
  test('two rods of 25 Ω, one at each end: 2.4 A (Ohm)', () => {
    const net = factor(at60(v('n', 'hot', 120), r('n', earth, 25, 'far'), r('hot', earth, 25, 'near')))
    expect(amps(net, 'near')).toBeCloseTo(2.4, 3)
  })
  test('the ground wire is: 50 ft of solid 12 AWG out and back behind 0.05 Ω, 494 A, the case at 47.7 V', () => {
    // NEC chapter 9 table 8, 75 °C: 1.93 Ω per 1000 ft.
    const wire = 0.0965
    const net = factor(
      at60(
        v('panel', 'hot', 120, 0, 0.05),
        r('hot', 'case', wire),
        r('case', 'panel', wire, 'egc'),
        r('panel', earth, 25),
      ),
    )
    expect(amps(net, 'egc')).toBeCloseTo(493.8, 1)
    expect(volts(net, 'case', 'panel')).toBeCloseTo(47.7, 1)
  })
})

describe('drop along a run', () => {
  const solid = (gauge: '14' | '12', feet: number) =>
    americanWireOhms({ gauge, metal: 'copper', solid: true, feet, celsius: 75 })

  test('120 V, 16 A, 100 ft of solid 12 AWG: 6.176 V, 5.15 % (NEC chapter 9 table 8)', () => {
    const wire = solid('12', 100)
    // 16 A at 113.824 V.
    const net = factor(
      at60(v('n', 'h', 120), r('h', 'rh', wire), r('rh', 'rn', 113.824 / 16), r('rn', 'n', wire)),
    )
    expect(volts(net, 'h', 'n') - volts(net, 'rh', 'rn')).toBeCloseTo(6.176, 2)
  })
  test('one bond at the source: neutral–ground rises by half of what hot–neutral falls', () => {
    const wire = solid('14', 50)
    const net = factor(
      at60(
        v('n', 'h', 120),
        r('n', earth, 0.001),
        r('h', 'rh', wire),
        r('rh', 'rn', 116.93 / 10),
        r('rn', 'n', wire),
      ),
    )
    expect(volts(net, 'h', 'n') - volts(net, 'rh', 'rn')).toBeCloseTo(3.07, 2)
    expect(volts(net, 'rn', earth)).toBeCloseTo(1.535, 2)
    expect(volts(net, 'h', 'n') - volts(net, 'rh', earth)).toBeCloseTo(1.535, 2)
  })
  test('230 V, 16 A, 20 m of 2.5 mm² at 70 °C: 5.67 V, 2.47 % (IEC 60228; BS 7671’s table says 5.76 V)', () => {
    const wire = metricWireOhms({ mm2: '2.5', metal: 'copper', flexible: false, meters: 20, celsius: 70 })
    const net = factor(
      at50(v('n', 'h', 230), r('h', 'rh', wire), r('rh', 'rn', 224.326 / 16), r('rn', 'n', wire)),
    )
    expect(volts(net, 'h', 'n') - volts(net, 'rh', 'rn')).toBeCloseTo(5.674, 2)
  })
  test('230 V, line and protective conductor alike: a fault puts the case at half, 115 V (IEC 60364-4-41)', () => {
    const net = factor(at50(v(earth, 'l', 230), r('l', 'case', 0.2), r('case', earth, 0.2)))
    expect(volts(net, 'case', earth)).toBeCloseTo(115, 0)
  })
})

describe('ghosts', () => {
  test('a dead wire between hot and ground, 50 ft of cable, 1.05 nF to each, by seven instruments', () => {
    // Thévenin: 60 V behind 1/(ω · 2.1 nF) = 1.263 MΩ of capacitance; across R that is 60 / √(1 + (1.263 MΩ / R)²).
    const net = factor(at60(v(earth, 'hot', 120), c('hot', 'wire', 1.05e-9), c('wire', earth, 1.05e-9)))
    const by = [1e7, 1e6, 4e5, 1e5, 2e4, 3e3].map((ohms) => reads(net, 'wire', earth, bare(ohms)))
    const worked = [59.53, 37.24, 18.11, 4.735, 0.95, 0.1425]
    by.forEach((volts, i) => expect(Math.abs(volts / worked[i]! - 1)).toBeLessThan(5e-4))
    expect(reads(net, 'wire', earth, meterOf(1e7))).toBeCloseTo(56.86, 2)
  })
  test('two unequal Y capacitors, 1 and 3 nF, through a 10 MΩ meter: 89.8 and 29.9 V', () => {
    // Open: 120 V divided 3 to 1. Behind 1/(ω · 4 nF) = 663 kΩ: less by 1 / √(1 + 0.0663²) = 0.9978.
    const net = factor(
      at60(v('n', 'h', 120), c('h', 'case', 1e-9), c('n', 'case', 3e-9), c('case', earth, 1e-12)),
    )
    expect(reads(net, 'h', 'case', bare(1e7))).toBeCloseTo(89.803, 2)
    expect(reads(net, 'n', 'case', bare(1e7))).toBeCloseTo(29.934, 2)
    // Their sum is short of 120 V by 0.2 %: it closes, and tells nothing of a bond.
  })
  test.each([
    ['120 V, 60 Hz', at60, 120, 60, 0.2126],
    ['230 V, 50 Hz', at50, 230, 115, 0.3396],
  ] as const)(
    '%s floating on 4.7 nF a leg: half each side, a fraction of a milliamp',
    (_, at, supply, half, mA) => {
      const net = factor(at(v('n', 'h', supply), c('h', 'case', 4.7e-9), c('n', 'case', 4.7e-9)))
      expect(volts(net, 'h', 'case')).toBeCloseTo(half, 2)
      // Through 1000 Ω, little beside the 282 kΩ of the two, from case to neutral: ω · C · V (Ohm).
      const body = net.loaded([{ from: 'case', to: 'n', ohms: 1000 }])
      expect(volts(body, 'case', 'n')).toBeCloseTo(mA, 2)
    },
  )
})

/** The bond gate of the contract: what the bulb shows at the source's own terminals, to its case. */
describe('the test bulb at the terminals', () => {
  const bulb = { ratedWatts: 60, ratedVolts: 120 }

  test.each([
    [
      '120 V, 60 Hz, 4.7 nF a leg',
      at60(v('n', 'h', 120), c('h', 'case', 4.7e-9), c('n', 'case', 4.7e-9)),
      120,
      2,
    ],
    [
      '120 V, 60 Hz, 10 nF a leg',
      at60(v('n', 'h', 120), c('h', 'case', 10e-9), c('n', 'case', 10e-9)),
      120,
      2,
    ],
    [
      '230 V, 50 Hz, 10 nF a leg',
      at50(v('n', 'h', 230), c('h', 'case', 10e-9), c('n', 'case', 10e-9)),
      230,
      4,
    ],
  ] as const)(
    'a floating source, %s: ground follows the bulb to whichever wire it hangs on',
    (_, net, supply, limit) => {
      const source = factor(net)
      const rated = { ratedWatts: 60, ratedVolts: supply }
      for (const wire of ['n', 'h']) {
        const on = bulbBetween(source, wire, 'case', rated)
        expect(on.volts).toBeLessThan(limit)
        expect(on.look).toBe('dark')
      }
      // A meter would have shown a full half on either side.
      expect(reads(source, 'n', 'case', meterOf(1e7))).toBeGreaterThan(0.45 * supply)
    },
  )
  test.each([
    [
      'a wire from the middle of the winding',
      at60(v('mid', 'h', 60, 0, 0.05), v('n', 'mid', 60, 0, 0.05), r('mid', 'case', 0.1)),
    ],
    ['two capacitors of 100 µF', at60(v('n', 'h', 120, 0, 0.1), c('h', 'case', 1e-4), c('n', 'case', 1e-4))],
  ] as const)('a balanced source, held by %s: half the volts both ways, a glow, never released', (_, net) => {
    for (const wire of ['n', 'h']) {
      const on = bulbBetween(factor(net), wire, 'case', bulb)
      expect(on.volts).toBeGreaterThan(57)
      expect(on.volts).toBeLessThan(61)
      expect(on.look).toBe('dim')
      // A third of its watts, a tenth of its light.
      expect(on.watts).toBeCloseTo(20.5, -0.5)
      expect(on.light).toBeCloseTo(0.095, 2)
    }
  })
  test('a bonded source: nothing on neutral, the whole on hot', () => {
    const source = factor(at60(v('n', 'h', 120, 0, 0.05), r('n', 'case', 0.02)))
    expect(bulbBetween(source, 'n', 'case', bulb)).toMatchObject({ look: 'dark' })
    expect(bulbBetween(source, 'h', 'case', bulb)).toMatchObject({ look: 'bright' })
    expect(bulbBetween(source, 'h', 'case', bulb).volts).toBeCloseTo(120, 1)
  })
})

describe('two bonds', () => {
  // 100 ft: neutral 6 AWG 0.0491 Ω, grounding conductor 10 AWG stranded 0.124 Ω (NEC chapter 9 table 8); 40 A.
  const subpanel = (second: boolean) =>
    factor(
      at60(
        v('n', 'h', 120),
        r('n', earth, 0.001),
        r('h', 'ph', 0.001),
        r('ph', 'pn', 118.6 / 40),
        r('pn', 'n', 0.0491, 'neutral'),
        r(second ? 'pn' : 'pg', 'n', 0.124, 'egc'),
      ),
    )
  test('40 A divides inversely as the ohms: 28.65 A in the neutral, 11.35 A in the ground wire', () => {
    const net = subpanel(true)
    expect(amps(net, 'egc') / amps(net, 'neutral')).toBeCloseTo(0.0491 / 0.124, 5)
    expect(amps(net, 'egc')).toBeCloseTo(11.35, 1)
    expect(volts(net, 'pn', 'n')).toBeCloseTo(1.407, 2)
  })
  test('with one bond the ground wire carries nothing, and neutral–ground shows 1.96 V', () => {
    const net = subpanel(false)
    expect(amps(net, 'egc')).toBeLessThan(1e-6)
    expect(volts(net, 'pn', 'pg')).toBeCloseTo(1.964, 1)
  })
  test('generator and house bonded, neutral not switched, wires alike: half of 12 A runs in the ground wire', () => {
    const net = factor(
      at60(
        v('gn', 'gh', 120),
        r('gh', 'pn', 10),
        r('pn', 'gn', 0.0372, 'neutral'),
        r('pg', 'gn', 0.0372, 'egc'),
        r('pn', 'pg', 0.001),
      ),
    )
    expect(amps(net, 'egc')).toBeCloseTo(6, 0)
    // NEC 250.6 calls it objectionable; UL 943 class A trips from 6 mA.
    expect(amps(net, 'egc')).toBeGreaterThan(0.006)
  })
})

describe('a lost neutral', () => {
  const legs = (one: number, other: number, neutralOhms?: number) =>
    factor(
      at60(
        v('n', 'a', 120),
        v('n', 'b', 120, 180),
        r('n', earth, 25),
        r('a', 'p', one, 'one'),
        r('b', 'p', other, 'other'),
        ...(neutralOhms === undefined ? [] : [r('p', 'n', neutralOhms, 'neutral')]),
      ),
    )
  test('100 W and 200 W on 120/240 V with the neutral open: 160 V and 80 V, 1.111 A (a common textbook case)', () => {
    const net = legs(144, 72)
    expect(volts(net, 'a', 'p')).toBeCloseTo(160, 1)
    expect(volts(net, 'b', 'p')).toBeCloseTo(80, 1)
    expect(amps(net, 'one')).toBeCloseTo(1.111, 3)
  })
  test.each([
    [0.1, 119.09, 120.91],
    [1, 111.59, 128.41],
    [10, 71.82, 168.18],
    [25, 49.64, 190.36],
  ])(
    '1200 W against 100 W through a neutral of %f Ω: %f V and %f V (Millman’s theorem)',
    (ohms, heavy, light) => {
      const net = legs(12, 144, ohms)
      expect(Math.abs(volts(net, 'a', 'p') - heavy)).toBeLessThan(0.03)
      expect(Math.abs(volts(net, 'b', 'p') - light)).toBeLessThan(0.03)
    },
  )
  test('whatever the neutral is, the two legs add up to 240 V', () => {
    for (const ohms of [undefined, 0.1, 25]) {
      const net = legs(12, 144, ohms)
      expect(volts(net, 'a', 'p') + volts(net, 'b', 'p')).toBeCloseTo(240, 1)
    }
  })
  test('10 kW on each leg: 83.33 A in the hots, nothing in the neutral (Kirchhoff)', () => {
    const net = legs(1.44, 1.44, 0.01)
    expect(amps(net, 'one')).toBeCloseTo(83.3, 0)
    expect(amps(net, 'neutral')).toBeLessThan(1e-3)
  })
})

test('a meter is in the circuit: it loads its own side alone', () => {
  const net = factor(at60(v('n', 'h', 120), c('h', 'g', 1e-9), c('n', 'g', 1e-9)))
  const held = net.loaded([heldTo('n', 'g', bare(1e5))])
  expect(volts(held, 'n', 'g')).toBeLessThan(10)
  expect(volts(held, 'h', 'g')).toBeGreaterThan(119)
  expect(volts(held, 'h', 'n')).toBeCloseTo(120, 3)
})
