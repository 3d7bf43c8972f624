import { readFile } from 'node:fs/promises'
import { describe, expect, test } from 'vitest'
import { answerCase } from '../../server/commands/answer.ts'
import { parseLine } from '../../server/commands/read-cases.ts'
import { score } from '../../server/commands/scoring.ts'
import { starter } from '../edition.ts'

const lines = async (name: string) =>
  (await readFile(new URL(`../cases/${name}`, import.meta.url), 'utf8')).trim().split('\n').map(parseLine)

// Two circuit simulators written apart from this project (ngspice underneath): a check from outside.
describe('on the 176 sample cases, flat priors', async () => {
  const cases = [...(await lines('sample-a.jsonl')), ...(await lines('sample-b.jsonl'))]
  test('every line was read', () => expect(cases).toHaveLength(176))
  test('everything found: the right cause leads in 95 of 100, is in the first three in 98.5, and a share means what it says', async () => {
    const s = await score(starter, cases, 'call', 'flat')
    expect(s.top1).toBeGreaterThanOrEqual(0.95)
    expect(s.top3).toBeGreaterThanOrEqual(0.985)
    expect(s.calibration).toBeLessThanOrEqual(0.08)
  })
  test('kit and three receptacle volts', async () => {
    const s = await score(starter, cases, 'meter', 'flat')
    expect(s.top1).toBeGreaterThanOrEqual(0.68)
    expect(s.top3).toBeGreaterThanOrEqual(0.91)
  })
  test('a plug-in tester and what people say', async () => {
    const s = await score(starter, cases, 'kit', 'flat')
    expect(s.top1).toBeGreaterThanOrEqual(0.52)
    expect(s.top3).toBeGreaterThanOrEqual(0.82)
  })
})

type Told = { id: string; truth: string; asGood?: string[]; stop?: boolean }

/** Leads, is in the first three, and the calls whose stop was missed or made up. */
async function scoreTold(calls: readonly Told[]) {
  let [leads, three] = [0, 0]
  const wrongStops: string[] = []
  for (const call of calls) {
    const answer = await answerCase(starter, call, 'field')
    if (!('ranking' in answer)) throw new Error(`${call.id}: ${JSON.stringify(answer.error)}`)
    const good = [call.truth, ...(call.asGood ?? [])]
    const order = answer.ranking.map((r) => r.cause)
    if (good.includes(order[0]!)) leads += 1
    if (order.slice(0, 3).some((c) => good.includes(c))) three += 1
    if (call.stop !== undefined && answer.stop !== call.stop) wrongStops.push(call.id)
  }
  return { leads: leads / calls.length, three: three / calls.length, wrongStops }
}

describe.each([
  ['forty calls as a tech would tell them', 'field.jsonl', 40],
  ['148 calls written blind', 'told.jsonl', 148],
])('%s, field priors', async (_, name, count) => {
  const calls = (await lines(name)) as Told[]
  test('every cause is among them', () => {
    expect(calls).toHaveLength(count)
    expect(starter.causeIds.filter((c) => !calls.some((t) => t.truth === c))).toEqual([])
  })
  test('the cause on the invoice leads in 80 of 100, is in the first three in 93, and no stop is missed', async () => {
    const told = await scoreTold(calls)
    expect(told.leads).toBeGreaterThanOrEqual(0.8)
    expect(told.three).toBeGreaterThanOrEqual(0.93)
    expect(told.wrongStops).toEqual([])
  })
})
