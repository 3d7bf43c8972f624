import { describe, expect, test } from 'vitest'
import { arrangements } from '../../../rules/bond-audit/arrangements.ts'
import { auditSystem } from '../../../rules/bond-audit/audit.ts'
import { checkSystem } from '../../../rules/bond-audit/check-system.ts'
import { System } from '../../../rules/bond-audit/system.ts'
import type { Part } from '../../../rules/bond-audit/system.ts'
import {
  feed,
  generator,
  inverter,
  main,
  panel,
  receptacle,
  rod,
  system,
  through,
  transfer,
  utility,
} from './build.ts'

describe('arrangements to start from', () => {
  test('a dozen or more, each a system of the form with nothing in it that can’t be', () => {
    expect(arrangements.length).toBeGreaterThanOrEqual(12)
    for (const { system: start } of arrangements) {
      expect(System.parse(start)).toEqual(start)
      expect(checkSystem(start)).toEqual([])
    }
  })

  test.each<[id: string, modes: Record<string, number | string>]>([
    ['cabin-inverter', { 'On battery': 'two-bonds' }],
    ['pass-through', { 'On utility': 1, 'On battery': 1 }],
    [
      'inlet-generator',
      {
        'On utility': 1,
        'On utility, Generator plugged in': 'two-bonds',
        'On generator': 'two-bonds gfci-trips',
      },
    ],
    ['standby-switched', { 'On utility': 1, 'On generator': 1 }],
    ['standby-solid', { 'On utility': 1, 'On generator': 1 }],
    ['power-station-panel', { 'On battery': 'no-bond' }],
    ['balanced-panel', { 'On battery': 'balanced-into-panel' }],
    ['balanced-transformer', { 'On battery': 0, 'Through Isolation transformer': 1 }],
    [
      'two-inverters',
      { 'On Inverter A and Inverter B': 'two-bonds', 'On Inverter A': 1, 'On Inverter B': 1 },
    ],
    ['autotransformer', { 'On battery': 1 }],
    ['multiwire-120', { 'On battery': 'multiwire' }],
    ['subpanel', { 'On utility': 'two-bonds' }],
    ['old-outbuilding', { 'On utility': 1 }],
    ['plug-in-generator', { 'On generator': 0 }],
    ['three-sources', { 'On utility': 1, 'On generator': 1, 'On battery': 1 }],
  ])('%s', (id, modes) => {
    const start = arrangements.find((one) => one.id === id)?.system ?? system()
    const found = auditSystem(start).modes.map(({ name, count, findings }): [string, number | string] => [
      name,
      findings.length === 0 ? count : findings.map(({ kind }) => kind).join(' '),
    ])
    expect(Object.fromEntries(found)).toEqual(modes)
  })

  test('every start has its answer above', () => {
    expect(new Set(arrangements.map(({ id }) => id)).size).toBe(arrangements.length)
    expect(arrangements.length).toBe(15)
  })
})

describe('what can’t be is said beside its field', () => {
  test.each<[what: string, parts: Part[], fault: string]>([
    ['nothing to feed it', [panel('shed', 'gone')], 'shed.feed: Choose what it is fed from.'],
    ['a loop', [utility(), panel('a', 'b'), panel('b', 'a')], 'a.feed: b is fed from a already.'],
    [
      'one name twice',
      [utility(), { ...panel('shed', 'utility'), name: 'utility' }],
      'shed.name: Another part has this name.',
    ],
    [
      'one part at two inputs',
      [utility(), transfer('transfer', ['utility', 'utility']), main('transfer')],
      'transfer.inputs.1: Two inputs come from one part.',
    ],
    [
      'a switch built into nothing',
      [utility(), generator(), transfer('transfer', ['utility', 'generator'], { operated: 'built-in' })],
      'transfer.inverter: Choose the inverter it is built into; its own output is one of the inputs.',
    ],
    [
      'two switches inside one inverter',
      [
        utility(),
        inverter(),
        through('inverter', 'utility'),
        through('inverter', 'utility', { id: 'z', name: 'z' }),
      ],
      'z.inverter: inverter has a transfer switch inside already.',
    ],
    [
      'a neutral out of two hots',
      [inverter({ volts: '240' }), panel('shed', 'inverter')],
      'shed.feed: inverter has two hots and no neutral to run.',
    ],
    [
      'a bond on two hots',
      [inverter({ volts: '240', output: 'bonded' })],
      'inverter.output: Two hots without a neutral have nothing to bond.',
    ],
    [
      'a source beside itself',
      [inverter({ parallel: { with: 'inverter', alone: false } })],
      'inverter.parallel: Choose the other source.',
    ],
    [
      'a neutral that lands in no panel',
      [utility(), main('utility'), receptacle('hall', 'main', { neutralAt: 'utility' })],
      'hall.neutralAt: Choose the panel its neutral lands in.',
    ],
    ['a rod at nothing', [utility(), rod('gone')], 'rod-gone.at: Choose the part it is tied to.'],
    [
      'a wire of the other system of units',
      [
        utility(),
        main(feed('utility', { run: { length: 10, neutral: '2.5', ground: '2.5', metal: 'copper' } })),
      ],
      'main.feed: Choose wire sizes in AWG.',
    ],
    [
      'six sources',
      ['a', 'b', 'c', 'd', 'e', 'f'].map((id) => inverter({ id, name: id })),
      'f.kind: Up to 5 sources.',
    ],
  ])('%s', (_, parts, fault) => {
    expect(
      checkSystem(system(...parts)).map(({ part, field, says }) => `${part}.${field}: ${says}`),
    ).toContain(fault)
  })
})
