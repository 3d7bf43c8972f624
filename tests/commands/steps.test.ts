import { readFile } from 'node:fs/promises'
import { expect, test } from 'vitest'
import { parseLine } from '../../server/commands/read-cases.ts'
import { stepsOf } from '../../server/commands/steps.ts'
import { joinAlike } from '../../server/commands/scoring.ts'
import { starter } from '../edition.ts'

test('from the kit, the next test gets there in fewer steps than one fixed order, and as often right', async () => {
  const text = await readFile(new URL('../cases/sample-b.jsonl', import.meta.url), 'utf8')
  const cases = text
    .trim()
    .split('\n')
    .map(parseLine)
    .filter((_, i) => i % 2 === 0)
  const sum = { next: 0, fixed: 0, nextRight: 0, fixedRight: 0 }
  for (const raw of cases) {
    const next = await stepsOf(starter, raw, 'flat', 'next')
    const fixed = await stepsOf(starter, raw, 'flat', 'fixed')
    if (next === undefined || fixed === undefined) throw new Error('a sample case can be read')
    sum.next += next.tests
    sum.fixed += fixed.tests
    sum.nextRight += next.right ? 1 : 0
    sum.fixedRight += fixed.right ? 1 : 0
  }
  expect(sum.next).toBeLessThan(sum.fixed)
  expect(sum.nextRight / cases.length).toBeGreaterThanOrEqual(0.9)
  expect(sum.nextRight).toBeGreaterThanOrEqual(sum.fixedRight - 2)
})

test('behind a panel an isolated output and a floating neutral are one answer', () => {
  const ranking = [
    { cause: 'sound', share: 0.4 },
    { cause: 'isolated-output', share: 0.3 },
    { cause: 'floating-neutral', share: 0.3 },
  ]
  expect(joinAlike(ranking, 'panel')[0]).toEqual({ cause: 'floating-neutral', share: 0.6 })
  expect(joinAlike(ranking, 'direct')).toEqual(ranking)
})
