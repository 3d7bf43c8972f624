import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { ghostOrFirm } from '../../../rules/circuit/instruments/ghost-or-firm.ts'
import { meterOf, reads } from '../../../rules/circuit/instruments/meter.ts'
import { bulbBetween, filamentOhms } from '../../../rules/circuit/instruments/test-bulb.ts'
import { earth } from '../../../rules/circuit/network.ts'
import { factor } from '../../../rules/circuit/solve.ts'
import { at60, c, r, v } from './build.ts'

const bare = (ohms: number) => ({ ohms, farads: 0 })

describe('ghost or firm', () => {
  test('59.53 V at 10 MΩ and 18.11 V at 400 kΩ: 1.263 MΩ of capacitance behind 60 V, 47.5 µA (worked by hand)', () => {
    const told = ghostOrFirm({ volts: 59.53, meter: bare(1e7) }, { volts: 18.11, meter: bare(4e5) }, 60)
    if (told.kind !== 'ghost') throw new Error(told.kind)
    expect(told.farads * 1e9).toBeCloseTo(2.1, 2)
    expect(told.openVolts).toBeCloseTo(60, 1)
    expect(told.amps * 1e6).toBeCloseTo(47.5, 1)
  })
  test('finds the capacitance and the current of any ghost again, the meters’ own capacitance left out', () => {
    const kinds: string[] = []
    fc.assert(
      fc.property(
        fc.double({ min: 2e-10, max: 5e-9, noNaN: true }),
        fc.double({ min: 0.3, max: 3, noNaN: true }),
        fc.constantFrom(50, 60, 62),
        fc.constantFrom(120, 230),
        fc.constantFrom(4e5, 1e5, 1e4),
        (farads, ratio, hertz, supply, heavy) => {
          const net = factor({
            hertz,
            branches: [v(earth, 'h', supply), c('h', 'w', farads), c('w', earth, ratio * farads)],
          })
          const take = (ohms: number) => ({
            volts: reads(net, 'w', earth, meterOf(ohms)),
            meter: meterOf(ohms),
          })
          const told = ghostOrFirm(take(heavy), take(1e7), hertz)
          const behind = (1 + ratio) * farads
          kinds.push(told.kind)
          if (told.kind === 'ghost') {
            expect(told.farads / behind).toBeCloseTo(1, 2)
            expect(told.openVolts / (supply / (1 + ratio))).toBeCloseTo(1, 2)
            // What an ammeter across it would show.
            expect(told.amps / (supply * 2 * Math.PI * hertz * farads)).toBeCloseTo(1, 2)
          } else if (told.kind === 'firm') {
            // Strong enough to stay against 400 kΩ: more flows through a wire than flowed then.
            expect(told.atLeastAmps).toBeLessThan(supply * 2 * Math.PI * hertz * farads)
          } else {
            // It left too little for a handheld's last digit; then the bound holds.
            if (told.kind !== 'ghost-at-most') throw new Error(told.kind)
            expect(told.farads).toBeGreaterThan(0.99 * behind)
          }
        },
      ),
      { numRuns: 300, seed: 9 },
    )
    expect(kinds.filter((kind) => kind === 'ghost').length).toBeGreaterThan(200)
  })
  test('by meter and test bulb', () => {
    const bulb = { ratedWatts: 60, ratedVolts: 120 }
    const net = factor(at60(v('n', 'h', 120), c('h', 'g', 10e-9), c('n', 'g', 10e-9)))
    const { volts } = bulbBetween(net, 'n', 'g', bulb)
    const told = ghostOrFirm(
      { volts: reads(net, 'n', 'g', meterOf(1e7)), meter: meterOf(1e7) },
      { volts, meter: bare(filamentOhms(bulb, volts)) },
      60,
    )
    // 8 mV across the filament are under any handheld's digit: a bound is all there is, and it is over the truth.
    if (told.kind !== 'ghost-at-most') throw new Error(told.kind)
    expect(told.farads).toBeGreaterThan(20e-9)
    expect(told.amps).toBeGreaterThan(60 * 2 * Math.PI * 60 * 20e-9)
  })
  test('a wire stays: firm, with the current that flowed while it was read', () => {
    const net = factor(at60(v(earth, 'h', 120, 0, 0.1), r('h', 'w', 5)))
    const take = (ohms: number) => ({ volts: reads(net, 'w', earth, meterOf(ohms)), meter: meterOf(ohms) })
    const told = ghostOrFirm(take(1e7), take(3e3), 60)
    if (told.kind !== 'firm') throw new Error(told.kind)
    expect(told.atLeastAmps).toBeCloseTo(0.04, 3)
  })
  test.each([
    ['two meters alike', { volts: 60, meter: bare(1e7) }, { volts: 40, meter: bare(5e6) }],
    ['nothing there', { volts: 1.2, meter: bare(1e7) }, { volts: 0, meter: bare(3e3) }],
    ['more volts under the heavier meter', { volts: 40, meter: bare(1e7) }, { volts: 60, meter: bare(4e5) }],
  ])('%s: not told', (_, one, other) => {
    expect(ghostOrFirm(one, other, 60)).toEqual({ kind: 'not-told' })
    expect(ghostOrFirm(other, one, 60)).toEqual({ kind: 'not-told' })
  })
})
