import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { fitsContext } from '../../rules/edition/open.ts'
import type { RawFinding } from '../../rules/findings/sheet.ts'
import { diagnose } from '../../rules/ranking/diagnose.ts'
import { generator, lamps, sheetOf, splitPhase, starter, volts } from '../edition.ts'
import type { CaseContext } from '../edition.ts'
import { anyCase } from './any-case.ts'

const next = async (context: CaseContext, findings: Record<string, RawFinding>) =>
  (await diagnose(starter, sheetOf(context, findings))).nextTests

test('every finding this context allows and nobody took is in some test, and nothing else', async () => {
  await fc.assert(
    fc.asyncProperty(anyCase(starter), async ({ context, findings }) => {
      const tests = await next(context, findings)
      const listed = new Set(tests.filter((t) => t.mode === undefined).flatMap((t) => t.findings))
      const open = [
        ...starter.file.readings.filter((r) => fitsContext(r, context)).map((r) => r.id),
        ...starter.observations.keys(),
      ].filter((id) => !(id in findings))
      expect([...listed].sort()).toEqual(open.sort())
      for (const t of tests) {
        expect(t.findings.length).toBeGreaterThanOrEqual(1)
        expect(t.findings.length).toBeLessThanOrEqual(3)
      }
    }),
    { numRuns: 30 },
  )
})

test('by expected information, descending, never negative, six decimals, level ones by id', async () => {
  await fc.assert(
    fc.asyncProperty(anyCase(starter), async ({ context, findings }) => {
      const tests = await next(context, findings)
      tests.forEach((t, i) => {
        expect(t.gainBits).toBeGreaterThanOrEqual(0)
        expect(t.gainBits).toBe(Math.round(t.gainBits * 1e6) / 1e6)
        const before = tests[i - 1]
        if (before === undefined) return
        expect(before.gainBits).toBeGreaterThanOrEqual(t.gainBits)
        if (before.gainBits === t.gainBits) expect(before.test <= t.test).toBe(true)
      })
    }),
    { numRuns: 30 },
  )
})

test('a test stays listed while one of its findings isn’t taken, and names only that', async () => {
  const tests = await next(generator, { 'receptacle.hn.volts': 120, 'receptacle.hg.volts': 58 })
  expect(tests.find((t) => t.test === 'receptacle-volts' && t.mode === undefined)?.findings).toEqual([
    'receptacle.ng.volts',
  ])
  const done = await next(generator, volts(120, 58, 58))
  expect(done.some((t) => t.test === 'receptacle-volts' && t.mode === undefined)).toBe(false)
})

test('a test in another mode carries that mode', async () => {
  const tests = await next(
    { source: 'all-in-one-inverter', system: '120', wiring: 'panel', mode: 'battery' },
    volts(120, 58, 58),
  )
  expect(tests.find((t) => t.test === 'receptacle-volts')?.mode).toBe('pass-through')
})

test('no second leg is asked for on one leg, nor a panel where there is none', async () => {
  const tests = await next({ source: 'power-station', system: '120', wiring: 'direct' }, {})
  expect(tests.flatMap((t) => t.findings).filter((id) => id.startsWith('panel.'))).toEqual([])
})

describe('the fork', () => {
  test('its chances add to 1 and its shares are what the ranking itself would say', async () => {
    const findings = { ...lamps('lit', 'dim', 'dim'), extent: 'everything' }
    const tests = await next(generator, findings)
    for (const t of tests.slice(0, 12)) expect(t.outcomes.reduce((a, o) => a + o.chance, 0)).toBeCloseTo(1, 9)
    const volt = tests.find((t) => t.test === 'panel-volts')!
    const outcome = starter.tests.get('panel-volts')!.outcomes[0]!
    const typed = Object.fromEntries(
      Object.entries(outcome.findings).map(([id, v]) => [id, typeof v === 'object' ? v.times * 120 : v]),
    )
    const then = await diagnose(starter, sheetOf(generator, { ...findings, ...typed }))
    expect(volt.outcomes.find((o) => o.id === outcome.id)).toMatchObject({
      leads: then.ranking[0]!.cause,
      share: then.ranking[0]!.share,
    })
  })
  test('an outcome that would stop says so', async () => {
    const tests = await next(generator, volts(120, 58, 58))
    expect(tests.find((t) => t.test === 'bulb-neutral-ground')?.outcomes.some((o) => o.stop)).toBe(true)
  })
})

describe('what a good tech would do next', () => {
  test('halves at one receptacle: the panel parts an open ground from a floating source', async () => {
    const tests = await next(generator, volts(119.6, 57.2, 56.8))
    const rank = (id: string) => tests.findIndex((t) => t.test === id)
    expect(rank('panel-volts')).toBeGreaterThanOrEqual(0)
    expect(rank('panel-volts')).toBeLessThan(10)
    expect(rank('panel-volts')).toBeLessThan(rank('wire-metal'))
  })
  test('a test whose outcome is plain already tells nothing', async () => {
    const tests = await next(splitPhase, {
      ...volts(120, 120, 0.1),
      ...lamps('lit', 'lit', 'dark'),
      ...volts(120, 120, 0.1, 'panel'),
    })
    expect(tests.find((t) => t.test === 'panel-legs')!.gainBits).toBeLessThan(1)
  })
})
