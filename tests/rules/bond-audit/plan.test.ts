import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { arrangements } from '../../../rules/bond-audit/arrangements.ts'
import { auditSystem } from '../../../rules/bond-audit/audit.ts'
import { planFor } from '../../../rules/bond-audit/plan.ts'
import type { Part, System } from '../../../rules/bond-audit/system.ts'
import { anySystem } from './any-system.ts'
import {
  feed,
  generator,
  inverter,
  main,
  panel,
  station,
  system,
  through,
  transfer,
  utility,
} from './build.ts'
import { knownAnswers } from './known-answers.ts'

const planOf = (of: System) => planFor(of, auditSystem(of))
const steps = (...parts: Part[]) =>
  planOf(system(...parts))?.steps.map(({ part, says }) => `${part}: ${says}`)

describe('a plan asks for the least work that the code allows', () => {
  test('a subpanel’s screw, never the service’s (NEC 250.24, 250.142(B))', () => {
    expect(steps(utility(), main('utility'), panel('barn', 'main', { bond: true }))).toEqual([
      'barn: take the bond screw or strap out. Keep neutrals and grounds on separate bars.',
    ])
  })

  test('a relay that passes the bond along is set to its own power alone', () => {
    expect(
      steps(
        utility(),
        main('utility'),
        inverter({ output: 'relay', relay: ['own-power', 'passing-through'] }),
        through('inverter', 'main'),
        panel('backed-up', 'inverter-transfer'),
      ),
    ).toEqual(['inverter: set its bond relay to close on its own power alone.'])
  })

  test('a bonded GFCI generator comes off the inlet: a mode taken away', () => {
    const plan = planOf(
      system(
        utility(),
        generator({ output: 'bonded', gfci: true }),
        transfer('interlock', ['utility', feed('generator', { joined: 'cord' })]),
        main('interlock'),
      ),
    )
    expect(plan?.passes).toBe(true)
    expect(plan?.then.gone).toEqual([{ name: 'On generator', places: ['main'] }])
    expect(plan?.then.modes.map(({ name, count }) => [name, count])).toEqual([['On utility', 1]])
  })

  test('an isolated output on a cord is unplugged before a bond is thought of', () => {
    const of = steps(station({ output: 'isolated' }), panel('cabin', feed('station', { joined: 'cord' })))
    expect(of).toHaveLength(1)
    expect(of?.[0]).toMatch(/^cabin: take the cord from station away/)
  })

  test('an outbuilding without a way back gets a grounding conductor, not a second bond (NEC 250.32(B))', () => {
    expect(steps(utility(), main('utility'), panel('barn', feed('main', { ground: false })))).toEqual([
      'barn: run a grounding conductor to it with its power wires.',
    ])
  })

  test('where all passes there is none', () => {
    expect(planOf(system(utility(), main('utility')))).toBeUndefined()
  })
})

test('every arrangement of the tests and the starts but two has a plan that makes it pass', () => {
  const systems = [
    ...arrangements.map((one) => one.system),
    ...knownAnswers.map(({ parts }) => system(...parts)),
  ]
  const failing = systems.filter((one) => auditSystem(one).modes.some(({ passes }) => !passes))
  expect(failing.length).toBeGreaterThan(30)
  const left = failing.filter((one) => planOf(one)?.passes !== true)
  // Two hots with nothing that makes a neutral: the source decides what can be done.
  expect(left.map(({ parts }) => parts[0])).toEqual([inverter({ volts: '240' })])
})

describe('of any system', () => {
  test('a balanced output is never told to bond', () => {
    fc.assert(
      fc.property(anySystem, (one) => {
        const audit = auditSystem(one)
        const kinds = audit.modes.flatMap(({ findings }) => findings.map(({ kind }) => kind))
        fc.pre(kinds.includes('balanced-into-panel') || kinds.includes('bond-on-balanced'))
        const plan = planFor(one, audit)
        const first = plan?.steps.filter(({ bonds }) => bonds) ?? []
        const balanced = one.parts.flatMap((part) =>
          part.kind === 'source' && part.output === 'balanced' ? [part.id] : [],
        )
        for (const { part } of first) expect(balanced).not.toContain(part)
        const said = audit.modes
          .flatMap(({ findings }) => findings)
          .filter(({ kind }) => kind === 'balanced-into-panel' || kind === 'bond-on-balanced')
          .flatMap(({ change }) => change)
        expect(said.join(' ')).not.toMatch(/bond (screw|strap) in|install|one bond/i)
      }),
      { numRuns: 60 },
    )
  })

  test('what it promises is what an audit of the changed system finds', () => {
    fc.assert(
      fc.property(anySystem, (one) => {
        const plan = planOf(one)
        fc.pre(plan !== undefined)
        const failing = (modes: readonly { passes: boolean }[]) =>
          modes.filter(({ passes }) => !passes).length
        expect(plan?.passes).toBe(failing(plan?.then.modes ?? []) === 0)
        expect(failing(plan?.then.modes ?? [])).toBeLessThanOrEqual(failing(auditSystem(one).modes) + 1)
      }),
      { numRuns: 60 },
    )
  })
})

describe('what a finding says to change', () => {
  const changes = (...parts: Part[]) =>
    auditSystem(system(...parts))
      .modes.flatMap(({ findings }) => findings)
      .flatMap(({ change }) => change)
      .join(' ')

  test('never the service’s own bond (NEC 250.24, 250.28)', () => {
    for (const { parts } of knownAnswers)
      expect(changes(...parts)).not.toMatch(/main: (take|have)|bond screw in main, or/)
  })

  test('no bond in a panel that utility can feed too: it would be a second one there', () => {
    const says = changes(
      utility(),
      main('utility'),
      generator({ type: 'standby-generator' }),
      transfer('transfer', ['main', 'generator'], { neutral: 'switched' }),
      panel('backed-up', 'transfer'),
    )
    expect(says).toContain('bond in generator.')
    expect(says).not.toContain('in backed-up')
  })

  test('a bond that is missing is held back until Diagnosis releases it', () => {
    expect(changes(inverter(), panel('cabin', 'inverter'))).toMatch(
      /installed only after Diagnosis has released it/,
    )
  })
})
