import { readFile } from 'node:fs/promises'
import { describe, expect, test } from 'vitest'
import { answerCase } from '../../server/commands/answer.ts'
import { diagnose } from '../../rules/ranking/diagnose.ts'
import { parseLine } from '../../server/commands/read-cases.ts'
import { generator, sheetOf, starter, volts } from '../edition.ts'

const lines = async (name: string) =>
  (await readFile(new URL(`../cases/${name}`, import.meta.url), 'utf8')).trim().split('\n').map(parseLine)

type Nonsense = { id: string; want: 'misfit' | 'error' }
const nonsense = [...(await lines('nonsense.jsonl')), ...(await lines('nonsense-blind.jsonl'))] as Nonsense[]

describe('nonsense is called error or misfit, never shown with a verdict', () => {
  test('there are forty kinds and more', () => expect(nonsense.length).toBeGreaterThanOrEqual(40))
  test.each(nonsense.map((n) => [n.id, n] as const))('%s', async (_, raw) => {
    const answer = await answerCase(starter, raw, 'field')
    expect('error' in answer ? 'error' : answer.misfit ? 'misfit' : 'verdict').toBe(raw.want)
  })
  test('a misfit keeps its ranking, and names the reading to take again', async () => {
    const found = await diagnose(starter, sheetOf(generator, volts(120, 12, 0.1)))
    expect(found.misfit).toMatchObject({ again: 'receptacle.hg.volts' })
    expect(found.ranking).toHaveLength(starter.causeIds.length)
  })
})

type Odd = { id: string; truth: string }
const odd = (await lines('odd-but-true.jsonl')) as Odd[]
test.each(odd.map((o) => [o.id, o] as const))(
  '%s looks odd and is true of one cause: no misfit',
  async (_, raw) => {
    const answer = await answerCase(starter, raw, 'field')
    if (!('ranking' in answer)) throw new Error(JSON.stringify(answer.error))
    expect(answer.misfit).toBe(false)
    expect(answer.ranking.slice(0, 6).map((r) => r.cause)).toContain(raw.truth)
  },
)

test('the word is not spent: at most 3 in 100 of the single-fault samples', async () => {
  const cases = [...(await lines('sample-a.jsonl')), ...(await lines('sample-b.jsonl'))]
  let misfits = 0
  for (const raw of cases) {
    const answer = await answerCase(starter, raw, 'flat')
    if ('misfit' in answer && answer.misfit) misfits += 1
  }
  expect(misfits / cases.length).toBeLessThanOrEqual(0.03)
})
