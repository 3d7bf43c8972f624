import { readFile } from 'node:fs/promises'
import { expect, test } from 'vitest'
import { electricalCauses } from '../../rules/circuit/wiring/context.ts'
import { bitsOf } from '../../server/commands/fit/bits.ts'
import type { Tally } from '../../server/commands/fit/count.ts'
import { fittedBits } from '../../server/commands/fit/fitted.ts'
import { computedGroups } from '../../server/commands/fit/plan.ts'
import { shortened, withBits } from '../../server/commands/fit/write-bits.ts'
import { withWeights } from '../../server/commands/fit/write-weights.ts'
import { starter } from '../edition.ts'

/** A row that fires in so many of 100 cases of each cause named, and in `rest` of the others. */
const tally = (rest: number, fired: Partial<Record<string, number>>): Tally => ({
  rule: 'a-row',
  could: electricalCauses.map(() => 100),
  fired: electricalCauses.map((cause) => fired[cause] ?? rest),
})
const none = () => 0

test('bits are how much likelier an outcome is than over all causes; never more than a group allows', () => {
  // Mean chance (21 × 0.1 + 0.8) / 22 = 0.132: 0.8 is 2.6 bits above it, 0.1 is 0.4 below.
  const says = bitsOf(tally(10, { 'open-ground': 80 }), { group: 'g', slips: 0 }, starter.causeIds, none)
  expect(says).toEqual({ 'open-ground': 3 })
  const capped = { group: 'g', slips: 0, most: 2 }
  expect(bitsOf(tally(10, { 'open-ground': 80 }), capped, starter.causeIds, none)).toEqual({
    'open-ground': 2,
  })
})

test('what a cause never shows counts against it no more than slips allow', () => {
  const row = tally(50, { sound: 0 })
  const with3 = bitsOf(row, { group: 'g', slips: 0.03, wiredOnly: true }, starter.causeIds, none)
  const with25 = bitsOf(row, { group: 'g', slips: 0.25, wiredOnly: true }, starter.causeIds, none)
  expect(with3?.['sound']).toBe(-5)
  expect(with25?.['sound']).toBe(-2)
})

test('a cause without a wiring of its own reads as the wirings it is met with, or stays as written', () => {
  const row = tally(10, { 'double-bond': 80 })
  const mixed = bitsOf(row, { group: 'g', slips: 0 }, starter.causeIds, none)
  expect(mixed?.['unswitched-neutral']).toBe(mixed?.['double-bond'])
  const written = (cause: string) => (cause === 'backfeed' ? -2 : 0)
  const kept = bitsOf(row, { group: 'g', slips: 0, wiredOnly: true }, starter.causeIds, written)
  expect(kept).toEqual({ 'double-bond': 3, backfeed: -2 })
})

test('a row that the model hardly ever shows is left as written', () => {
  expect(bitsOf(tally(0, { sound: 5 }), { group: 'g' }, starter.causeIds, none)).toBeUndefined()
})

test('writing bits changes numbers and nothing else, and twice is once', async () => {
  const path = new URL('../../rules/starter/rules/50-tester.json', import.meta.url)
  const text = await readFile(path, 'utf8')
  const bits = new Map([['tester-as-wired', { sound: 4, 'open-ground': -3 }]])
  const written = withBits(text, bits, starter.causeIds)
  expect(withBits(written, bits, starter.causeIds)).toBe(written)
  const numbersGone = (t: string) =>
    t
      .split('\n')
      .filter((line) => !/"(says|others)":/.test(line))
      .join('\n')
  expect(numbersGone(written)).toBe(numbersGone(text))
  expect(written).toContain('"says": {"sound": 4, "open-ground": -3},')
  const same = new Map(
    starter.file.groups.flatMap((g) =>
      g.rules.map((r) => [
        r.id,
        Object.fromEntries(starter.causeIds.map((c) => [c, r.says[c] ?? r.others ?? 0])),
      ]),
    ),
  )
  expect(withBits(text, same, starter.causeIds)).toBe(text)
})

test('the commonest number of a row becomes its others', () => {
  const says = Object.fromEntries(starter.causeIds.map((cause) => [cause, -2]))
  expect(shortened({ ...says, sound: 1 }, starter.causeIds)).toEqual({ says: { sound: 1 }, others: -2 })
})

test('writing weights finds the outcome of the test it belongs to', () => {
  const text = `[{ "id": "a", "outcomes": [{ "id": "yes", "findings": { "x": "yes" }, "weight": 2 }] },
    { "id": "b", "outcomes": [{ "id": "yes", "findings": { "y": { "times": 1 } } }] }]`
  const weights = new Map([['b', new Map([['yes', 0.25]])]])
  const written = JSON.parse(withWeights(text, weights)) as { outcomes: { weight?: number }[] }[]
  expect(written.map((t) => t.outcomes[0]?.weight)).toEqual([2, 0.25])
  expect(withWeights(withWeights(text, weights), weights)).toBe(withWeights(text, weights))
  expect(() => withWeights(text, new Map([['b', new Map([['no', 1]])]]))).toThrow(/no outcome no/)
})

// Exactly the same cases take half a minute: `npm run rank:fit -- --check`. Here others, and fewer of them.
test('the starter’s computed bits and weights are what the circuit model gives, by other cases too', () => {
  const { bits, weights } = fittedBits(starter, 'fit by other cases', 100)
  const rules = new Map(starter.file.groups.flatMap((g) => g.rules.map((r) => [r.id, r] as const)))
  const apart: number[] = []
  for (const [id, says] of bits) {
    const rule = rules.get(id)!
    for (const cause of starter.causeIds)
      apart.push(Math.abs((says[cause] ?? 0) - (rule.says[cause] ?? rule.others ?? 0)))
  }
  expect(bits.size).toBeGreaterThan(150)
  expect(apart.reduce((a, b) => a + b, 0) / apart.length).toBeLessThan(0.35)
  expect(apart.filter((d) => d > 2).length / apart.length).toBeLessThan(0.04)
  for (const [id, ends] of weights)
    for (const outcome of starter.tests.get(id)!.outcomes)
      expect(Math.abs((outcome.weight ?? 1) - (ends.get(outcome.id) ?? 0))).toBeLessThan(0.15)
}, 60_000)

test('every group the plan names is there, with the rules it leaves to hand', () => {
  for (const { group, byHand } of computedGroups) {
    const ids = starter.file.groups.find((g) => g.id === group)?.rules.map((r) => r.id)
    expect(ids, group).toBeDefined()
    expect(ids).toEqual(expect.arrayContaining([...(byHand ?? [])]))
  }
})
