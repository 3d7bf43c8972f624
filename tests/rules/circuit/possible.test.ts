import { describe, expect, test } from 'vitest'
import { impossible } from '../../../rules/circuit/possible.ts'
import { electricalCauses } from '../../../rules/circuit/wiring/context.ts'
import { canOccur } from '../../../rules/circuit/wiring/occurs.ts'
import { modelCase, pairCase } from '../../../server/commands/model/cases.ts'
import { volts } from '../../edition.ts'
import { foundIn, generatorPanel, inverterPanel, splitGenerator } from './found-in.ts'

const light = 10_000_000

describe('findings that no wiring of any one cause gives', () => {
  test.each([
    ['twice the volts on two wires', volts(243, 121, 122), 'receptacle.hn.volts'],
    ['nothing on either side of a live receptacle', volts(120, 1.2, 0.1), 'receptacle.hg.volts'],
    ['three live sides on two wires', volts(120, 119, 118), 'receptacle.ng.volts'],
    [
      'half to ground at the receptacle and 120 V from neutral to ground at the panel',
      { ...volts(120, 119.5, 0.3), ...volts(120, 119.8, 118, 'panel') },
      'panel.ng.volts',
    ],
    [
      'a panel dead between a live source and a live receptacle',
      {
        ...volts(119, 119, 0.2),
        'panel.hn.volts': 0.3,
        ...volts(120, 120, 0.1, 'source'),
      },
      'panel.hn.volts',
    ],
  ])('%s: the reading to take again is named', (_, findings, again) => {
    expect(impossible(generatorPanel, findings, light)?.again).toBe(again)
  })
  test('says what the reading would have to be', () => {
    const { band } = impossible(generatorPanel, volts(120, 1.2, 0.1), light, ['sound'])!
    expect(band!.low).toBeGreaterThan(100)
    expect(band!.high).toBeLessThan(140)
  })
})

describe('what is true of one cause is never impossible', () => {
  test.each(electricalCauses)('%s, as it typically reads', (cause) => {
    for (const context of [inverterPanel, generatorPanel, splitGenerator].filter((c) => canOccur(cause, c)))
      expect(impossible(context, foundIn(cause, context).found, light)).toBeUndefined()
  })
  test('a reading alone, or none at all', () => {
    expect(impossible(generatorPanel, {}, light)).toBeUndefined()
    expect(impossible(generatorPanel, { 'receptacle.hn.volts': 61 }, light)).toBeUndefined()
  })
})

test('called of 3 in 100 model cases of one fault at most, and of a quarter of those with two', () => {
  const called = (cases: readonly ReturnType<typeof modelCase>[]) =>
    cases.filter((c) => impossible(c.context, c.findings, c.context.meterOhms) !== undefined).length /
    cases.length
  const singles = electricalCauses.flatMap((cause) =>
    [0, 1, 2].map((n) => modelCase('held-back misfit', cause, n)),
  )
  const pairs = Array.from({ length: 40 }, (_, n) => pairCase('held-back misfit', n))
  expect(called(singles)).toBeLessThanOrEqual(0.03)
  expect(called(pairs)).toBeGreaterThanOrEqual(0.2)
})
