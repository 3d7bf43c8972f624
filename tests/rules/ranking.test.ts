import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { diagnose } from '../../rules/ranking/diagnose.ts'
import type { RawFinding } from '../../rules/findings/sheet.ts'
import { priorWeights, powerOfTwo, sharesOf } from '../../rules/ranking/weigh.ts'
import { european, generator, lamps, powerStation, sheetOf, splitPhase, starter, volts } from '../edition.ts'
import type { CaseContext } from '../edition.ts'
import { anyCase } from './any-case.ts'

const found = (
  context: CaseContext,
  findings: Record<string, RawFinding>,
  priors: 'flat' | 'field' = 'field',
) => diagnose(starter, sheetOf(context, findings), { priors })
const first = async (context: CaseContext, findings: Record<string, RawFinding>) =>
  (await found(context, findings)).ranking[0]?.cause

describe('shares', () => {
  test('add to 1, level ones in the catalogue’s order, every cause listed', async () => {
    await fc.assert(
      fc.asyncProperty(
        anyCase(starter),
        fc.constantFrom('flat', 'field'),
        async ({ context, findings }, priors) => {
          const { ranking } = await found(
            context,
            findings as Record<string, RawFinding>,
            priors as 'flat' | 'field',
          )
          expect(ranking).toHaveLength(starter.causeIds.length)
          expect(Math.abs(ranking.reduce((sum, r) => sum + r.share, 0) - 1)).toBeLessThan(1e-9)
          ranking.slice(1).forEach((r, i) => {
            const before = ranking[i]!
            expect(before.share).toBeGreaterThanOrEqual(r.share)
            if (before.share === r.share)
              expect(starter.causeIds.indexOf(before.cause)).toBeLessThan(starter.causeIds.indexOf(r.cause))
          })
        },
      ),
      { numRuns: 60 },
    )
  })
  test('with nothing found they are the priors: flat over the electrical causes that can be', async () => {
    const { ranking } = await found(generator, {}, 'flat')
    const can = starter.file.causes.filter(
      (c) => c.electrical && (c.possible?.systems?.includes('120') ?? true),
    )
    const shares = ranking.filter((r) => r.share > 0)
    expect(shares).toHaveLength(can.length)
    for (const r of shares) expect(r.share).toBeCloseTo(1 / can.length, 12)
  })
  test('one bit doubles the odds', () => {
    expect(sharesOf([1, 1], [1, 0])).toEqual([2 / 3, 1 / 3])
    expect(powerOfTwo(-3)).toBe(0.125)
  })
  test('long ledgers neither overflow nor lose the leader', () =>
    expect(sharesOf([1, 1], [2000, 0])).toEqual([1, 0]))
  test('two hots are excluded where there is one leg, whatever was found', async () => {
    const { ranking } = await found(generator, volts(240, 120, 120))
    expect(ranking.find((r) => r.cause === 'two-hots')?.share).toBe(0)
    expect(
      priorWeights(starter, sheetOf(generator, {}).context, 'flat')[starter.causeIds.indexOf('two-hots')],
    ).toBe(0)
  })
  test('the same sheet gives the same answer, to the digit, whatever the order it was typed in', async () => {
    const findings = { ...volts(119.6, 57.2, 56.8), extent: 'everything', tingle: 'no' } as const
    const turned = Object.fromEntries(Object.entries(findings).reverse())
    expect(JSON.stringify((await found(generator, findings)).ranking.map((r) => [r.cause, r.share]))).toBe(
      JSON.stringify((await found(generator, turned)).ranking.map((r) => [r.cause, r.share])),
    )
  })
})

// Patterns as the trade reads them: common practice, no source.
describe('the right cause leads', () => {
  test('a bonded source and its panel read sound', async () => {
    const readings = {
      ...volts(120.4, 120.2, 0.2),
      ...volts(120.6, 120.5, 0.1, 'panel'),
      'gfci.plug-test': 'trips',
    }
    expect(await first(splitPhase, readings)).toBe('sound')
  })
  test('a floating neutral reads about half to ground on both wires, everywhere', async () =>
    expect(
      await first(generator, {
        ...volts(119.6, 57.2, 56.8),
        ...volts(120, 57.5, 57, 'panel'),
        extent: 'everything',
      }),
    ).toBe('floating-neutral'))
  test('the same halves at one receptacle with a right panel are an open ground', async () =>
    expect(await first(generator, { ...volts(119.6, 57.2, 56.8), ...volts(120, 119.8, 0.2, 'panel') })).toBe(
      'open-ground',
    ))
  test('a balanced output keeps half of itself on the bulb', async () =>
    expect(
      await first(powerStation, {
        ...volts(119.6, 59.8, 59.9),
        'source.bulb.ng.volts': 57,
        'source.bulb.hg.volts': 57,
        'source.bulb.hn.volts': 118,
      }),
    ).toBe('balanced-output'))
  test('a floating 230 V generator follows the same rules', async () =>
    expect(
      await first(european, {
        ...volts(229, 110, 112),
        ...volts(229, 111, 112, 'panel'),
        extent: 'everything',
      }),
    ).toBe('floating-neutral'))
  test('lamps alone: swapped at one receptacle', async () =>
    expect(await first(splitPhase, { ...lamps('lit', 'dark', 'lit'), extent: 'one-receptacle' })).toBe(
      'reversed-polarity',
    ))
  test('a bootleg shows when the load comes on: neutral–ground stays at nothing', async () => {
    const loaded = { 'receptacle.hn.volts.loaded': 115.6, 'receptacle.ng.volts.loaded': 0 }
    expect(await first(splitPhase, { ...volts(120, 119.9, 0), ...loaded, 'ground-wire': 'absent' })).toBe(
      'bootleg-ground',
    )
  })
})

describe('what the findings can’t part stands as one row', () => {
  test('tester as wired: several causes level, the more dangerous first', async () => {
    const { rows } = await found(splitPhase, lamps('lit', 'lit', 'dark'), 'flat')
    const either = rows.find((r) => r.causes.length > 1)!
    const danger = either.causes.map((c) => starter.causes.get(c.cause)!.danger)
    expect(either.causes.length).toBeGreaterThan(1)
    expect(danger).toEqual([...danger].sort((a, b) => b - a))
  })
  test('rows add up to the ranking', async () => {
    const { rows, ranking } = await found(generator, { ...volts(120, 1, 119), extent: 'everything' })
    expect(rows.flatMap((r) => r.causes)).toHaveLength(ranking.length)
    expect(rows.reduce((a, r) => a + r.share, 0)).toBeCloseTo(1, 9)
  })
})

test('evidence names its rule, its bits, its sentence, its source and the numbers behind', async () => {
  const { ranking } = await found(generator, volts(119.6, 57.2, 56.8))
  const leader = ranking[0]!
  expect(leader.evidence.length).toBeGreaterThan(0)
  for (const e of leader.evidence) {
    expect(Math.abs(e.bits)).toBeGreaterThanOrEqual(1)
    expect(Math.abs(e.bits)).toBeLessThanOrEqual(5)
    expect(e.because.length).toBeGreaterThan(10)
    expect(e.source.length).toBeGreaterThan(5)
  }
  expect(leader.evidence.some((e) => e.numbers.includes('57.2 V'))).toBe(true)
})

test('ruled out takes two groups against and eight bits together', async () => {
  const onHot = {
    ...volts(120, 0.2, 119.8),
    ...volts(120, 0.3, 119.7, 'panel'),
    ...lamps('lit', 'dark', 'lit'),
  }
  const { ranking } = await found(splitPhase, onHot)
  for (const r of ranking) {
    const net = new Map<string, number>()
    for (const e of r.evidence) net.set(e.group, (net.get(e.group) ?? 0) + e.bits)
    const against = [...net.values()].filter((n) => n < 0)
    expect(r.ruledOut).toBe(against.length >= 2 && against.reduce((a, b) => a + b, 0) <= -8)
  }
  expect(ranking.find((r) => r.cause === 'sound')?.ruledOut).toBe(true)
})
