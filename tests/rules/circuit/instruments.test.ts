import { describe, expect, test } from 'vitest'
import { clampReads } from '../../../rules/circuit/instruments/clamp.ts'
import { heldTo, meterFarads, meterOf, reads } from '../../../rules/circuit/instruments/meter.ts'
import { ohmsBetween } from '../../../rules/circuit/instruments/ohmmeter.ts'
import { testerShows, usualTesters } from '../../../rules/circuit/instruments/plug-in-tester.ts'
import type { Tester } from '../../../rules/circuit/instruments/plug-in-tester.ts'
import { bulbBetween, filamentOhms } from '../../../rules/circuit/instruments/test-bulb.ts'
import { earth, magnitude } from '../../../rules/circuit/network.ts'
import type { Network } from '../../../rules/circuit/network.ts'
import { factor } from '../../../rules/circuit/solve.ts'
import { overLimitOhms } from '../../../rules/findings/sheet.ts'
import { at50, at60, c, r, v } from './build.ts'
import { someWirings } from './some-networks.ts'

describe('the meter', () => {
  test('shows what the network has with the meter in it', () => {
    for (const { network } of someWirings(2)) {
      const net = factor(network)
      for (const ohms of [1e7, 4e5, 3e3]) {
        const meter = meterOf(ohms)
        const held = net.loaded([heldTo('receptacle.hot', 'receptacle.ground', meter)])
        const there = magnitude(held.between('receptacle.hot', 'receptacle.ground'))
        expect(reads(net, 'receptacle.hot', 'receptacle.ground', meter)).toBeCloseTo(there, 3)
      }
    }
  })
  test('shows the same with its leads exchanged', () => {
    const net = factor(at60(v('n', 'h', 120), c('h', 'g', 2e-9), c('n', 'g', 1e-9)))
    expect(reads(net, 'g', 'n', meterOf(1e7))).toBeCloseTo(reads(net, 'n', 'g', meterOf(1e7)), 9)
  })
  test('pulls a ghost down by its own capacitance too, and a wire by nothing', () => {
    const net = factor(at60(v(earth, 'h', 120), c('h', 'w', 1e-9), c('w', earth, 1e-9)))
    const without = reads(net, 'w', earth, { ohms: 1e7, farads: 0 })
    expect(reads(net, 'w', earth, { ohms: 1e7, farads: meterFarads }) / without).toBeCloseTo(2 / 2.1, 2)
    expect(reads(net, 'h', earth, meterOf(3000))).toBeCloseTo(120, 2)
  })
})

describe('the ohmmeter', () => {
  const dead = factor({
    hertz: 0,
    branches: [r('n', 'g', 0.3), r('h', 'n', 40e6), c('g', 'x', 1e-6), r('y', 'x', 1)],
  })
  test('shows resistance through whatever path there is', () => {
    expect(ohmsBetween(dead, 'n', 'g')).toBeCloseTo(0.3, 6)
    expect(ohmsBetween(dead, 'h', 'g') / 1e6).toBeCloseTo(40, 0)
  })
  test('is over limit past its range, and between parts tied by nothing', () => {
    expect(ohmsBetween(dead, 'h', 'g', 20e6)).toBe(overLimitOhms)
    expect(ohmsBetween(dead, 'n', 'y')).toBe(overLimitOhms)
    expect(ohmsBetween(dead, 'h', earth)).toBe(overLimitOhms)
  })
  test('refuses a circuit that is on', () => {
    expect(() => ohmsBetween(factor(at60(v('n', 'h', 120))), 'n', 'h')).toThrow('dead circuit')
  })
})

describe('the clamp', () => {
  const net = factor(
    at60(
      v('n', 'h', 120),
      r('n', earth, 0.001, 'bond'),
      r('h', 'load', 11.9, 'hot'),
      r('load', 'n', 0.15, 'neutral'),
      r('load', earth, 0.05, 'leak'),
    ),
  )
  test('one conductor: its current', () => {
    expect(clampReads(net, ['hot'])).toBeCloseTo(magnitude(net.amps('hot')), 9)
  })
  test('hot and neutral together: what returns another way', () => {
    const turned = factor(at60(v('n', 'h', 120), r('h', 'load', 12, 'hot'), r('n', 'load', 0.1, 'neutral')))
    expect(clampReads(turned, ['hot', 'neutral'], 0)).toBeLessThan(1e-6)
    expect(clampReads(turned, ['hot'])).toBeCloseTo(120 / 12.1, 2)
  })
  test('nothing under its floor', () => {
    const little = factor(at60(v('n', 'h', 120), r('h', 'n', 3000, 'load')))
    expect(clampReads(little, ['load'])).toBe(0)
    expect(clampReads(little, ['load'], 0.001)).toBeCloseTo(0.04, 4)
  })
})

describe('the test bulb', () => {
  const bulb = { ratedWatts: 60, ratedVolts: 120 }
  // From I ∝ V^0.55 about 0.5 A at 120 V (IES curves, from memory).
  test.each([
    [120, 0.5, 60, 240, 1],
    [108, 0.472, 51, 229, 0.699],
    [132, 0.527, 69.6, 251, 1.38],
    [60, 0.342, 20.5, 176, 0.095],
  ])('at %f V: %f A, %f W, %f Ω', (volts, amps, watts, ohms, light) => {
    const on = bulbBetween(factor(at60(v(earth, 'h', volts))), 'h', earth, bulb)
    expect(on.volts).toBeCloseTo(volts, 2)
    expect(on.amps).toBeCloseTo(amps, 2)
    expect(on.watts).toBeCloseTo(watts, 0)
    expect(on.ohms).toBeCloseTo(ohms, -0.3)
    expect(on.light).toBeCloseTo(light, 1)
  })
  test('cold it has 16 to 20 Ω', () => {
    expect(filamentOhms(bulb, 0)).toBeGreaterThanOrEqual(16)
    expect(filamentOhms(bulb, 0)).toBeLessThanOrEqual(20)
  })
  test('settles where its ohms are those of its volts, behind any impedance', () => {
    for (const { name, network } of someWirings(6)) {
      const net = factor(network)
      const on = bulbBetween(net, 'receptacle.hot', 'receptacle.ground', bulb)
      const held = net.loaded([{ from: 'receptacle.hot', to: 'receptacle.ground', ohms: on.ohms }])
      const there = magnitude(held.between('receptacle.hot', 'receptacle.ground'))
      expect(Math.abs(there - on.volts), name).toBeLessThan(1e-3 + 1e-4 * there)
      expect(Math.abs(filamentOhms(bulb, on.volts) / on.ohms - 1), name).toBeLessThan(1e-4)
    }
  })
  test('bright, dim, dark: whole, half and a tenth of its volts', () => {
    const look = (volts: number) => bulbBetween(factor(at60(v(earth, 'h', volts))), 'h', earth, bulb).look
    expect([115, 60, 12].map(look)).toEqual(['bright', 'dim', 'dark'])
  })
})

describe('the plug-in tester', () => {
  const slots = { hot: 'h', neutral: 'n', ground: 'g' }
  const [resistive, neon] = usualTesters as [Tester, Tester]
  const shows = (network: Network, tester: Tester, nominal = 120) => {
    const { hn, hg, ng } = testerShows(factor(network), slots, tester, nominal)
    return `${hn} ${hg} ${ng}`
  }
  const supply = [v('n', 'h', 120, 0, 0.1)]
  const bond = r('n', 'g', 0.1, 'bond')
  const filters = (farads: number) => [c('h', 'g', farads), c('n', 'g', farads)]

  test.each([
    ['sound', at60(...supply, bond), 'lit lit dark', 'lit lit dark'],
    [
      'hot and neutral swapped',
      at60(v('h', 'n', 120, 0, 0.1), r('h', 'g', 0.1)),
      'lit dark lit',
      'lit dark lit',
    ],
    [
      'hot and ground swapped',
      at60(v('n', 'g', 120, 0, 0.1), r('n', 'h', 0.1)),
      'dark lit lit',
      'dark lit lit',
    ],
    ['dead', at60(r('n', 'g', 0.1), c('h', 'n', 1e-9)), 'dark dark dark', 'dark dark dark'],
    // The two lamps share the volts, 60 each: short of what a neon strikes at.
    ['ground open, a short stub', at60(...supply, ...filters(1e-10)), 'lit dim dim', 'lit dark dark'],
    ['floating on its filters', at60(...supply, ...filters(4.7e-9)), 'lit dim dim', 'lit dark dark'],
    // Neutral hangs on two lamps, in line between hot and ground.
    [
      'neutral open',
      at60(v('x', 'h', 120, 0, 0.1), r('x', 'g', 0.1), c('n', 'g', 1e-10)),
      'dim lit dim',
      'dark lit dark',
    ],
    [
      'hot open',
      at60(v('n', 'x', 120, 0, 0.1), bond, c('h', 'g', 1e-10)),
      'dark dark dark',
      'dark dark dark',
    ],
    [
      'a balanced output',
      at60(v('m', 'h', 60), v('n', 'm', 60), r('m', 'g', 0.1)),
      'lit dim dim',
      'lit dark dark',
    ],
  ])('%s', (_, network, first, second) => {
    expect(shows(network, resistive)).toBe(first)
    expect(shows(network, neon)).toBe(second)
  })
  test('at 230 V half is 115 V: neons strike too', () => {
    const floating = at50(v('n', 'h', 230, 0, 0.1), ...filters(4.7e-9))
    expect(shows(floating, resistive, 230)).toBe('lit dim dim')
    expect(shows(floating, neon, 230)).toBe('lit dim dim')
  })
  test('two hots light all three', () => {
    const legs = at60(v('x', 'h', 120, 0, 0.1), v('x', 'n', 120, 180, 0.1), r('x', 'g', 0.1))
    expect(shows(legs, resistive)).toBe('lit lit lit')
    expect(shows(legs, neon)).toBe('lit lit lit')
  })
  test('a neon a weak source strikes pulls its volts down and goes out: seen if milliamps flow, else not', () => {
    // 80 V to one side, by 4 to 2: over the strike, but the lamp leaves little of it.
    const uneven = (farads: number) => at60(...supply, c('h', 'g', farads), c('n', 'g', 2 * farads))
    expect(shows(uneven(0.1e-9), neon)).toBe('lit dark dark')
    expect(shows(uneven(2e-9), neon)).toBe('lit dim dark')
  })
  test('always ends, whatever the wiring, and lights only lamps', () => {
    for (const { network } of someWirings(6))
      for (const tester of usualTesters) {
        const at = { hot: 'receptacle.hot', neutral: 'receptacle.neutral', ground: 'receptacle.ground' }
        const lamps = testerShows(factor(network), at, tester, 120)
        expect(Object.values(lamps).every((lamp) => ['lit', 'dim', 'dark'].includes(lamp))).toBe(true)
      }
  })
})
