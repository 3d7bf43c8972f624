import { describe, expect, test } from 'vitest'
import { deriveFacts } from '../../rules/findings/facts.ts'
import type { RawFinding } from '../../rules/findings/sheet.ts'
import { readSheet } from '../../rules/findings/parse.ts'
import { european, generator, lamps, sheetOf, splitPhase, starter, volts } from '../edition.ts'
import type { CaseContext } from '../edition.ts'

const facts = (context: CaseContext, findings: Record<string, RawFinding>) =>
  [...deriveFacts(starter, sheetOf(context, findings)).values()][0]!
const pattern = (context: CaseContext, hn: number, hg: number, ng: number) =>
  facts(context, volts(hn, hg, ng)).get('receptacle.pattern')?.value

// Patterns of three volts: common practice, no source; physics as the notes beside each say.
describe('three volts make one picture, on 120 V and on 230 V alike', () => {
  test.each([
    ['bonded: ground sits on neutral', 120, 119.9, 0.2, 'on-neutral'],
    ['swapped: ground sits on hot', 120, 0.3, 119.8, 'on-hot'],
    ['balanced: the halves add up', 119.6, 59.9, 59.8, 'half'],
    ['floating with unequal filters: a quarter and three quarters', 120, 34.8, 83.7, 'uneven'],
    [
      'a floating neutral reads about half to ground on both wires, a little short',
      119.6,
      57.2,
      56.8,
      'just-short',
    ],
    ['a dead ground wire of 10 ft falls shorter', 120, 51, 49, 'short'],
    ['open ground under a low-resistance meter', 119.6, 7.4, 7.5, 'nowhere'],
    ['open ground on a short stub', 118.6, 28, 26, 'far-short'],
    ['hot and ground swapped, or an open neutral with a load', 0.6, 119.8, 120, 'needle'],
    ['neutral open, nothing plugged in', 54.1, 116, 53.8, 'neutral-untied'],
    ['hot open, a ghost left on it', 45, 46, 0.2, 'hot-untied'],
    ['dead', 0.4, 0.2, 0.1, 'dead'],
    ['three live sides: two wires can’t', 120, 118, 119, 'three-live'],
  ])('%s', (_, hn, hg, ng, name) => {
    expect(pattern(generator, hn, hg, ng)).toBe(name)
    const k = 230 / 120
    expect(pattern(european, hn * k, hg * k, ng * k)).toBe(name)
  })
  test('two hots of a split phase', () => expect(pattern(splitPhase, 240, 120, 120)).toBe('across-legs'))
  test('a fault of the other leg', () => expect(pattern(splitPhase, 120, 240, 120)).toBe('other-leg'))
})

describe('levels follow the source’s own limits', () => {
  const supply = (context: CaseContext, v: number) =>
    facts(context, { 'source.hn.volts': v }).get('source.supply')?.value
  // ANSI C84.1 service range B: 110 to 127 V on 120 V, for utility systems (from memory).
  test('128 V is high on a utility, and still an idling generator', () => {
    expect(supply(splitPhase, 128)).toBe('high')
    expect(supply(generator, 128)).toBe('within')
  })
  test('109 V is low on a utility', () => expect(supply(splitPhase, 109)).toBe('low'))
  // EN 50160: 230 V ±10 %, 207 to 253 V.
  test('206 and 254 V are outside on 230 V, 215 and 245 V inside', () => {
    expect(['low', 'high']).toEqual([supply(european, 206), supply(european, 254)])
    expect(['within', 'within']).toEqual([supply(european, 215), supply(european, 245)])
  })
})

describe('a known load', () => {
  const load = (hn: number, hnOn: number, ng: number, ngOn: number) =>
    facts(generator, {
      ...volts(hn, hn, ng),
      'receptacle.hn.volts.loaded': hnOn,
      'receptacle.ng.volts.loaded': ngOn,
    })
  test('12 AWG, 75 ft, 10 A from one panel bond: half of the drop shows on neutral–ground', () => {
    // NEC chapter 9 table 8, 12 AWG solid 1.93 ohm per 1000 ft: HN 117.105, NG 1.448 of 120 V (computed).
    expect(load(120, 117.105, 0, 1.448).get('receptacle.rise-share')?.value).toBe('half')
  })
  test('a poor neutral shows nearly all of it, a poor hot nothing', () => {
    expect(load(120, 105, 0.2, 14.4).get('receptacle.rise-share')?.value).toBe('most')
    expect(load(120, 105, 0.2, 0.7).get('receptacle.rise-share')?.value).toBe('none')
  })
  test('without a drop worth reading nothing is said of its share', () =>
    expect(load(120, 119.6, 0.1, 0.2).get('receptacle.rise-share')).toBeUndefined())
})

test('legs that share a lost neutral stand opposite', () => {
  // 1200 W on one leg, 100 W on the other, neutral open: 18.5 and 221.5 V (handbook circuit, computed).
  const legs = { 'panel.l1n.volts': 18.46, 'panel.l2n.volts': 221.5, 'panel.l1l2.volts': 240 }
  expect(facts(splitPhase, legs).get('legs.pattern')?.value).toBe('opposite')
})

test('an unsteady reading says only what both its ends say', () => {
  const read = readSheet(starter, {
    context: generator,
    findings: {
      ...volts(120, 60, 0),
      'receptacle.ng.volts': { between: [50, 60] },
      'receptacle.hg.volts': 58,
    },
  })
  if (!read.ok) throw new Error('the sheet can be read')
  const own = [...deriveFacts(starter, read.sheet).values()][0]!
  expect(own.get('receptacle.ng.level')?.value).toBe('half')
  expect(own.get('receptacle.pattern')).toBeUndefined()
})

test('modes compared: a bond that comes and goes', () => {
  const sheet = sheetOf(
    { source: 'all-in-one-inverter', system: '120', wiring: 'panel', mode: 'battery' },
    volts(120, 57, 58),
    { 'pass-through': volts(121, 120.8, 0.2) },
  )
  expect(deriveFacts(starter, sheet).get('battery')?.get('modes.bond')?.value).toBe('comes-and-goes')
})

// A plug-in tester is three lamps, one a pair: what each pair's volts make of it follows from the pairs alone.
describe('tester lamps follow from the pairs', () => {
  const lampOf = (part: number) => (part > 0.7 ? 'lit' : part > 0.25 ? 'dim' : 'dark')
  test.each([
    ['as wired', 120, 119.8, 0.2, 'tester-as-wired'],
    ['hot and neutral swapped', 120, 0.2, 119.8, 'tester-ground-on-hot'],
    ['hot and ground swapped', 0.2, 119.8, 120, 'tester-needle'],
    ['neutral open', 0, 120, 0, 'tester-hot-ground-only'],
    ['hot open', 0, 0, 0, 'tester-all-dark'],
    ['both legs', 240, 120, 120, 'tester-all-lit'],
  ])('%s', (_, hn, hg, ng, rule) => {
    const seen = lamps(lampOf(hn / 120), lampOf(hg / 120), lampOf(ng / 120))
    const own = facts(splitPhase, seen)
    const fires = starter.file.groups
      .find((g) => g.id === 'tester-lamps')!
      .rules.filter((r) => JSON.stringify(r.when).includes(String(own.get('tester.lamps')?.value)))
    expect(fires.map((r) => r.id)).toContain(rule)
  })
})
