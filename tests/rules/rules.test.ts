import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { Condition, comparisons } from '../../rules/edition/condition.ts'
import { openEdition } from '../../rules/edition/open.ts'
import { deriveFacts } from '../../rules/findings/facts.ts'
import type { Facts } from '../../rules/findings/facts.ts'
import { fire, ready } from '../../rules/ranking/engine.ts'
import catalogue from '../references/catalogue.json' with { type: 'json' }
import { diagnose } from '../../rules/ranking/diagnose.ts'
import { generator, sheetOf, starter, volts } from '../edition.ts'
import { anyCase } from './any-case.ts'

const rules = starter.file.groups.flatMap((g) => g.rules)

test('with no findings every rule is silent, in every context', async () => {
  for (const source of starter.sources.keys())
    for (const system of starter.systems.keys())
      for (const wiring of starter.wirings) {
        const facts = [...deriveFacts(starter, sheetOf({ source, system, wiring }, {})).values()][0]!
        expect(await fire(starter, facts)).toEqual([])
        expect(ready(starter).rules.filter((r) => r.holds(facts))).toEqual([])
      }
})

test('compiled rules and json-rules-engine fire alike on random findings', async () => {
  await fc.assert(
    fc.asyncProperty(anyCase(starter), async ({ context, findings }) => {
      for (const facts of deriveFacts(starter, sheetOf(context, findings)).values()) {
        const byEngine = (await fire(starter, facts)).map((r) => r.id)
        const compiled = ready(starter)
          .rules.filter((r) => r.holds(facts))
          .map((r) => r.id)
        expect(compiled).toEqual(byEngine)
      }
    }),
    { numRuns: 150 },
  )
})

test('a fact of the wrong type never satisfies an order', () => {
  const facts: Facts = new Map([['receptacle.hn.volts', { value: '5', from: [] }]])
  const holds = ready(starter)
    .rules.filter((r) => r.facts.includes('receptacle.hn.volts'))
    .some((r) => r.holds(facts))
  expect(holds).toBe(false)
})

describe('conditions', () => {
  const compare = { fact: 'tingle', operator: 'equal', value: 'yes' }
  test.each([
    ['negation', { not: compare }],
    ['a decorated operator', { ...compare, operator: 'not:in', value: ['yes'] }],
    ['notEqual', { ...compare, operator: 'notEqual' }],
    ['an empty all', { all: [] }],
    ['an empty any', { any: [] }],
    ['a value taken from another fact', { ...compare, value: { fact: 'shock' } }],
    ['a path', { ...compare, path: '$.x' }],
    ['a named condition', { condition: 'x' }],
    ['an order against words', { ...compare, operator: 'lessThan', value: 'five' }],
    ['a list without in', { ...compare, value: ['yes'] }],
    ['five deep', { all: [{ any: [{ all: [{ any: [{ all: [compare] }] }] }] }] }],
    ['thirty-three comparisons', { any: Array.from({ length: 33 }, () => compare) }],
  ])('refuse %s', (_, when) => expect(Condition.safeParse(when).success).toBe(false))
  test('take a plain nest', () =>
    expect(Condition.safeParse({ all: [compare, { any: [compare, compare] }] }).success).toBe(true))
})

describe('the starter', () => {
  test('holds all causes, readings and observations of the catalogue, with its ids and values', () => {
    expect(starter.causeIds).toEqual(Object.keys(catalogue.causes))
    expect([...starter.readings.keys()]).toEqual(Object.keys(catalogue.readings))
    for (const [id, observation] of Object.entries(catalogue.observations))
      expect(starter.observations.get(id)?.values.map((v) => v.id)).toEqual(Object.keys(observation.values))
  })
  test('has forty tests and a hundred rules or more, each rule with its sentence and its source', () => {
    expect(starter.tests.size).toBeGreaterThanOrEqual(40)
    expect(rules.length).toBeGreaterThanOrEqual(100)
    for (const rule of rules) {
      expect(rule.because).toMatch(/[.!?]$/)
      expect(rule.source.length).toBeGreaterThan(5)
    }
  })
  test('speaks for every cause somewhere', () => {
    const silent = starter.causeIds.filter((c) => !rules.some((r) => (r.says[c] ?? r.others ?? 0) > 0))
    expect(silent).toEqual([])
  })
  test('holds no rule that doubles another in its group', () => {
    for (const group of starter.file.groups) {
      const conditions = group.rules.map((r) => JSON.stringify(r.when))
      expect(new Set(conditions).size).toBe(conditions.length)
    }
  })
  test('has every finding in some test', () => {
    const inTests = new Set(starter.file.tests.flatMap((t) => t.findings))
    const findings = [...starter.readings.keys(), ...starter.observations.keys()]
    expect(findings.filter((f) => !inTests.has(f))).toEqual([])
  })
})

test('an edition with a rule on an unknown fact, cause or value does not open', () => {
  const broken = structuredClone(starter.file)
  const rule = broken.groups[0]!.rules[0]!
  rule.says['no-such-cause'] = 1
  rule.when = {
    all: [
      { fact: 'no.such.fact', operator: 'equal', value: 'x' },
      { fact: 'tingle', operator: 'equal', value: 'maybe' },
    ],
  }
  expect(comparisons(rule.when)).toHaveLength(2)
  expect(() => openEdition(broken)).toThrow(/no-such-cause[\s\S]*no\.such\.fact[\s\S]*maybe/)
  expect(() => openEdition({ ...starter.file, format: 2 })).toThrow(/not an edition/)
  expect(sheetOf(generator, {}).taken).toEqual([])
})

test('sheets diagnosed at the same time don’t cut each other short', async () => {
  const sheets = Array.from({ length: 8 }, (_, i) =>
    sheetOf(generator, { ...volts(120, 57 + i, 58 - i), tingle: 'no', extent: 'everything' }),
  )
  const oneByOne: string[] = []
  for (const sheet of sheets) oneByOne.push(JSON.stringify(await diagnose(starter, sheet)))
  const together = await Promise.all(sheets.map((sheet) => diagnose(starter, sheet)))
  expect(together.map((d) => JSON.stringify(d))).toEqual(oneByOne)
})
