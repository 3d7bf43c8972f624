import { describe, expect, test } from 'vitest'
import { readStarter } from '../../server/editions/read-starter.ts'
import { starter } from '../edition.ts'

const { procedures, articles, diagnosis } = await readStarter()
const shelf = [...articles.everyone.articles, ...articles.qualified.articles]
const causeIds = starter.causeIds
const words = (body: string) => body.split(/\s+/).filter((w) => /\w/.test(w)).length

describe('articles', () => {
  test('one a cause, under the cause’s id, each linked to its cause', () => {
    expect(causeIds.filter((id) => !shelf.some((a) => a.slug === id && a.causes.includes(id)))).toEqual([])
  })
  test('slugs are single', () => expect(new Set(shelf.map((a) => a.slug)).size).toBe(shelf.length))
  test.each(shelf.map((a) => [a.slug, a] as const))(
    '%s: length, sources, links that lead somewhere, who decides',
    (_, a) => {
      expect(words(a.body)).toBeGreaterThanOrEqual(250)
      expect(words(a.body)).toBeLessThanOrEqual(720)
      expect(a.words.length).toBeGreaterThanOrEqual(6)
      for (const cause of a.causes) expect(causeIds).toContain(cause)
      for (const id of a.tests) expect([...starter.tests.keys()]).toContain(id)
      for (const [, kind, id] of a.body.matchAll(/\]\(\/(causes|tests|articles)\/([a-z0-9-]+)\)/g)) {
        const known =
          kind === 'causes'
            ? causeIds
            : kind === 'tests'
              ? [...starter.tests.keys()]
              : shelf.map((s) => s.slug)
        expect(known, a.slug).toContain(id)
      }
      expect(a.body).toMatch(/authority having jurisdiction/)
      expect(a.body).toMatch(/^> \*\*(Danger|Warning|Caution|Notice):\*\*/m)
      expect(a.body).not.toMatch(/<script|<iframe|javascript:/i)
    },
  )
  test('nothing promises that something is safe', () => {
    const promises = shelf.flatMap((a) =>
      [...a.body.matchAll(/[^.]*\b(is|are|it’s) safe\b[^.]*/gi)].map((m) => m[0]),
    )
    expect(promises).toEqual([])
  })
})

describe('procedures', () => {
  const everyone = new Map(procedures.everyone.causes.map((c) => [c.cause, c]))
  const qualified = new Map(procedures.qualified.causes.map((c) => [c.cause, c]))
  test.each(causeIds.map((id) => [id]))(
    '%s: what it is, its danger, homeowner’s words, look-alikes, proof',
    (id) => {
      const [plain, trade] = [everyone.get(id), qualified.get(id)]
      expect(plain?.means).toBeTruthy()
      expect(plain?.danger).toBeTruthy()
      expect(plain?.homeowner?.doNow.length).toBeGreaterThanOrEqual(1)
      expect(plain?.homeowner?.fits).not.toMatch(/\d+\s*%|percent/)
      expect(trade?.lookAlikes?.length).toBeGreaterThanOrEqual(1)
      expect(trade?.proof?.length).toBeGreaterThanOrEqual(1)
      for (const like of trade?.lookAlikes ?? []) {
        expect(causeIds).toContain(like.cause)
        expect(starter.tests.has(like.test)).toBe(true)
      }
      for (const proof of trade?.proof ?? []) expect(starter.tests.has(proof.test)).toBe(true)
    },
  )
  test('nothing for everyone opens a cover or can make metal live', () => {
    for (const c of procedures.everyone.causes)
      for (const r of c.remedies) {
        expect(r.hazard, c.cause).toBe('closed')
        expect(r.who, c.cause).toBe('anyone')
        expect(r.installsBond ?? false, c.cause).toBe(false)
      }
    for (const t of diagnosis.tests.filter((one) => one.who === 'anyone')) {
      expect(t.hazard, t.id).toBe('closed')
      expect(t.hazardDirect ?? 'closed', t.id).toBe('closed')
    }
  })
  test('a balanced output is never bonded, and whatever installs a bond says that it is held back', () => {
    expect(qualified.get('balanced-output')?.remedies.some((r) => r.installsBond)).toBe(false)
    const bonding = procedures.qualified.causes.flatMap((c) => c.remedies.filter((r) => r.installsBond))
    expect(bonding.length).toBeGreaterThan(0)
    for (const r of bonding) expect(r.steps.join(' ')).toMatch(/released/)
  })
  test('every remedy with a cover off starts with the sources off, locked and proved dead', () => {
    for (const c of procedures.qualified.causes)
      for (const r of c.remedies.filter((one) => one.hazard === 'open-dead'))
        expect(r.steps.slice(0, 2).join(' '), c.cause).toMatch(/prove|proved/i)
  })
  test('every test has its procedure; what anyone may do is open to everyone, the rest is not', () => {
    const forAll = new Set(procedures.everyone.tests.map((t) => t.test))
    const forTrade = new Set(procedures.qualified.tests.map((t) => t.test))
    for (const t of diagnosis.tests)
      expect(t.who === 'anyone' ? forAll.has(t.id) : forTrade.has(t.id), t.id).toBe(true)
  })
  test('every ohm test asks for the source off and proved dead', () => {
    const dead = diagnosis.tests.filter((t) => t.findings.some((f) => starter.readings.get(f)?.dead))
    for (const t of dead) {
      const steps = procedures.qualified.tests.find((p) => p.test === t.id)
      expect([...(steps?.before ?? []), ...(steps?.steps ?? [])].join(' '), t.id).toMatch(
        /proved dead|prove/i,
      )
    }
  })
})

// Figures of published standards that articles use; each named with its source.
describe('figures from outside', () => {
  const text = shelf.map((a) => a.body).join('\n')
  test('UL 943 Class A: trips at 6 mA; at 30 mA within 0.56 s', () => {
    const slowest = (milliamps: number) => (20 / milliamps) ** 1.43
    expect(slowest(30)).toBeCloseTo(0.56, 2)
    expect(starter.edges['gfci-milliseconds']).toBe(Math.round(slowest(30) * 1000))
    expect(text).toMatch(/6 mA/)
  })
  test('a rod is no way back: 120 V through 33 ohms is 3.6 A, through two rods of 25 ohms 2.4 A', () => {
    // 33.09 ohms: H. B. Dwight's formula for one rod, 10 ft by 5/8 in, in 10,000 ohm-centimeters.
    const [soil, length, radius] = [10_000, 304.8, 0.79375]
    const dwight = (soil / (2 * Math.PI * length)) * (Math.log((4 * length) / radius) - 1)
    expect(dwight).toBeCloseTo(33.09, 1)
    const rod = shelf.find((a) => a.slug === 'rod-only-return')?.body ?? ''
    expect(rod).toContain(`33 Ω drives ${(120 / dwight).toFixed(1)} A`)
    expect(rod).toContain(`two of 25 Ω, ${(120 / 50).toFixed(1)} A`)
  })
  test('IEC 61008: 0.3 s at the rated residual current', () =>
    expect(starter.edges['rcd-milliseconds']).toBe(300))
  test('ANSI C84.1 service range B on 120 V: 110 to 127 V (from memory)', () => {
    expect(starter.edges['utility-low']! * 120).toBeCloseTo(110, 0)
    expect(starter.edges['utility-high']! * 120).toBeCloseTo(127, 0)
  })
  test('EN 50160: 230 V ±10 % is 207 to 253 V', () => {
    expect(starter.edges['level-low']! * 230).toBeCloseTo(207, 6)
    expect(starter.edges['level-high']! * 230).toBeCloseTo(253, 6)
  })
})
