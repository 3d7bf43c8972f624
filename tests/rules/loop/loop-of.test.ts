import { describe, expect, test } from 'vitest'
import { breakerDoes } from '../../../rules/loop/breaker.ts'
import { drawnAs } from '../../../rules/loop/drawn-as.ts'
import { loopOf } from '../../../rules/loop/loop-of.ts'
import { isBrief } from '../../../rules/loop/way.ts'
import { starter } from '../../edition.ts'
import { abroad, cabin, cords, house, loop, metalAt, run } from './loops.ts'

describe('hot touches metal', () => {
  test('in a sound, bonded system hundreds of amps come back over the ground wire, and the breaker sees them', () => {
    const state = loop('sound', {}, house)
    expect(state.breaker.sees).toBeGreaterThan(200)
    expect(run(state, 'circuit', 'ground')).toMatchObject({ toward: 'source' })
    expect(run(state, 'circuit', 'ground').amps).toBeCloseTo(state.breaker.sees, 0)
    expect(run(state, 'circuit', 'neutral').amps).toBeLessThan(0.001)
    expect(breakerDoes(state.breaker)).toBe('at-once')
    expect(state.metal.filter((metal) => metal.is !== 'quiet').every((metal) => isBrief(state, metal))).toBe(
      true,
    )
  })
  test('with a rod as the only return a few amps flow, the breaker stays on and metal stays live at both ends', () => {
    const state = loop('rod-only-return')
    // 120 V through rods of 25 and 30 Ω: 2.2 A.
    expect(state.breaker.sees).toBeGreaterThan(2)
    expect(state.breaker.sees).toBeLessThan(2.4)
    expect(breakerDoes(state.breaker)).toBe('stays')
    expect(state.metal.map(({ is }) => is)).toEqual(['live', 'live', 'live'])
    expect(metalAt(state, 'source')!.volts + metalAt(state, 'receptacle')!.volts).toBeCloseTo(118, -1)
    expect(state.rods.map(({ amps }) => Math.round(amps * 10))).toEqual([22, 22])
  })
  test('one rod of 25 Ω more or less trips nothing: without a bond no current comes back', () => {
    for (const rod of [true, false]) {
      const state = loop('floating-neutral', { rod })
      expect(state.breaker.sees).toBeLessThan(0.001)
      expect(state.metal.every(({ is }) => is === 'joined')).toBe(true)
      expect(metalAt(state, 'receptacle')!.bodyAmps).toBeCloseTo(0.12, 2)
    }
  })
  test('a bond turned on gives the floating system its way back', () => {
    expect(loop('floating-neutral', { bond: true }).breaker.sees).toBeGreaterThan(200)
    expect(loop('sound', { bond: false }).breaker.sees).toBeLessThan(0.001)
  })
  test('an open ground wire leaves the metal behind it live, and no other', () => {
    const state = loop('open-ground')
    expect(state.metal.map(({ is }) => is)).toEqual(['quiet', 'quiet', 'live'])
    expect(metalAt(state, 'receptacle')!.bodyAmps).toBeGreaterThan(0.1)
    expect(state.breaker.sees).toBeLessThan(0.001)
  })
  test('a jumper at the receptacle sends the fault back on neutral, where a GFCI misses nothing', () => {
    const state = loop('bootleg-ground')
    expect(state.breaker.sees).toBeGreaterThan(200)
    expect(run(state, 'circuit', 'neutral').amps).toBeCloseTo(run(state, 'circuit', 'hot').amps, 0)
  })
  test('a balanced output pushes half its volts through the fault', () => {
    const half = loop('balanced-output')
    expect(half.breaker.sees / loop('sound').breaker.sees).toBeGreaterThan(0.4)
    expect(half.breaker.sees / loop('sound').breaker.sees).toBeLessThan(0.6)
  })
})

describe('a load running', () => {
  test('in a sound system all comes back on neutral and the ground wire is idle', () => {
    const state = loop('sound', { state: 'load' })
    expect(run(state, 'circuit', 'hot')).toMatchObject({ toward: 'load' })
    expect(run(state, 'feeder', 'neutral')).toMatchObject({ toward: 'source' })
    expect(run(state, 'feeder', 'neutral').amps).toBeCloseTo(state.load!.amps, 2)
    expect(run(state, 'feeder', 'ground').amps).toBeLessThan(0.001)
    expect(state.metal.every(({ is }) => is === 'quiet')).toBe(true)
  })
  test('with two bonds neutral and ground wire share the return by their ohms', () => {
    const state = loop('double-bond', { state: 'load' })
    const [neutral, ground] = [run(state, 'feeder', 'neutral').amps, run(state, 'feeder', 'ground').amps]
    expect(ground).toBeGreaterThan(1)
    expect(neutral + ground).toBeCloseTo(state.load!.amps, 1)
    // The same by turning a second bond on in the sound system.
    expect(run(loop('sound', { state: 'load', secondBond: true }), 'feeder', 'ground').amps).toBeCloseTo(
      ground,
      1,
    )
  })
  test('swapped wires are followed to the terminals they land on', () => {
    const state = loop('reversed-polarity', { state: 'load' })
    expect(run(state, 'circuit', 'hot')).toMatchObject({ to: 'neutral', toward: 'load' })
    expect(run(state, 'circuit', 'neutral')).toMatchObject({ to: 'hot', toward: 'source' })
  })
  test('hot on the ground terminal: metal is live with nothing on it', () => {
    const state = loop('hot-ground-swapped', { state: 'load' }, house)
    expect(metalAt(state, 'receptacle')).toMatchObject({ is: 'live' })
    expect(metalAt(state, 'receptacle')!.volts).toBeGreaterThan(110)
  })
  test('a lost neutral puts two legs in series: their volts add up to 240, one much higher', () => {
    const state = loop('shared-neutral-lost', { state: 'load' }, house)
    const [one, other] = state.house
    expect(one!.volts + other!.volts).toBeCloseTo(240, -1)
    expect(Math.max(one!.volts, other!.volts)).toBeGreaterThan(150)
    expect(run(state, 'feeder', 'neutral')).toMatchObject({ state: 'open' })
  })
  test('across both legs the load gets 240 V and twice the current', () => {
    const state = loop('two-hots', { state: 'load' }, house)
    expect(state.load!.volts).toBeGreaterThan(225)
    expect(run(state, 'circuit', 'leg2')).toMatchObject({ to: 'neutral', toward: 'source' })
  })
  test('a poor joint is named where it is, with what it takes', () => {
    const joint = run(loop('loose-neutral', { state: 'load' }), 'circuit', 'neutral')
    expect(joint).toMatchObject({ state: 'poor' })
    expect(joint.amps * joint.addedOhms).toBeGreaterThan(5)
  })
  test('15 mA leak to metal where nothing else is wrong', () => {
    const state = loop('leakage-to-ground', { state: 'load' })
    expect(state.leak!.amps).toBeCloseTo(0.0145, 3)
    expect(run(state, 'circuit', 'ground').amps).toBeCloseTo(state.leak!.amps, 3)
  })
})

describe('every cause of the catalogue', () => {
  const causes = starter.causeIds
  test.each(causes)('%s is drawn, or one sentence says why not', (cause) => {
    const as = drawnAs(cause)
    if (as === undefined) throw new Error('nobody says how it is drawn')
    if ('because' in as) expect(as.because).toMatch(/[a-z].*\.$/)
  })
  test.each(causes.filter((cause) => 'wiring' in (drawnAs(cause) ?? {})))(
    '%s: every current is a number in both states, wherever it can occur',
    (cause) => {
      let drawn = 0
      for (const context of [cabin, house, cords, abroad])
        for (const state of ['load', 'fault'] as const) {
          const options = { state, bond: true, rod: true, secondBond: false }
          const found = loopOf(context, cause, options)
          if (found === undefined) continue
          drawn += 1
          for (const one of [
            ...found.runs,
            ...found.ties,
            ...found.rods,
            ...found.metal.map((m) => ({ amps: m.bodyAmps })),
          ])
            expect(Number.isFinite(one.amps) && one.amps >= 0).toBe(true)
        }
      expect(drawn).toBeGreaterThanOrEqual(2)
    },
  )
  test('what can’t occur there is not drawn there', () => {
    expect(
      loopOf(cabin, 'two-hots', { state: 'load', bond: true, rod: true, secondBond: false }),
    ).toBeUndefined()
    expect(
      loopOf(cabin, 'no-such-cause', { state: 'load', bond: true, rod: true, secondBond: false }),
    ).toBeUndefined()
  })
})

describe('a breaker of the usual kind', () => {
  const of = (amps: number, sees: number, curve: 'household' | 'b' = 'household') =>
    breakerDoes({ amps, sees, curve })
  test('carries its rating, trips late at a little more, and at once from ten times on', () => {
    expect([of(15, 15), of(15, 20), of(15, 80), of(15, 150)]).toEqual(['stays', 'late', 'soon', 'at-once'])
  })
  test('B 16: 18.08 A carried, 48 A and less is thermal, 80 A trips at once (IEC 60898)', () => {
    expect([of(16, 18.08, 'b'), of(16, 48, 'b'), of(16, 60, 'b'), of(16, 80, 'b')]).toEqual([
      'stays',
      'late',
      'soon',
      'at-once',
    ])
  })
})
