import { describe, expect, test } from 'vitest'
import { magnitude } from '../../../rules/circuit/network.ts'
import { factor } from '../../../rules/circuit/solve.ts'
import { wireTwo } from '../../../rules/circuit/two-faults.ts'
import { electricalCauses, sourceKinds, systemKinds } from '../../../rules/circuit/wiring/context.ts'
import type { ElectricalCause, WiringContext } from '../../../rules/circuit/wiring/context.ts'
import { applyEdit, open, swap } from '../../../rules/circuit/wiring/edits.ts'
import { faults } from '../../../rules/circuit/wiring/faults.ts'
import { healthy } from '../../../rules/circuit/wiring/healthy.ts'
import { canOccur } from '../../../rules/circuit/wiring/occurs.ts'
import { isRange, typicalOf } from '../../../rules/circuit/wiring/parameters.ts'
import type { Choice, Range } from '../../../rules/circuit/wiring/parameters.ts'
import { rangesIn } from '../../../rules/circuit/wiring/ranges.ts'
import { chanceFrom, sampleParameters } from '../../../rules/circuit/wiring/sample.ts'
import { editsOf, rangesWith, wire } from '../../../rules/circuit/wiring/wire.ts'
import { starter } from '../../edition.ts'
import { generatorPanel, inverterPanel, splitGenerator, utilityPanel } from './found-in.ts'

const contexts: WiringContext[] = sourceKinds.flatMap((source) =>
  systemKinds.flatMap((system) =>
    (['panel', 'direct'] as const).map((wiring): WiringContext => ({ source, system, wiring })),
  ),
)
const entries = (ranges: object) => Object.entries(ranges) as [string, Range | Choice<unknown>][]

describe('the table of faults', () => {
  test('has the causes that the edition marks electrical, in its order', () => {
    expect([...electricalCauses]).toEqual(starter.file.causes.filter((c) => c.electrical).map((c) => c.id))
  })
  test('lets a cause occur where the edition does', () => {
    const excluded = (cause: (typeof electricalCauses)[number], c: WiringContext) => {
      const possible = starter.causes.get(cause)?.possible
      return (
        (possible?.sources?.includes(c.source) ?? true) &&
        (possible?.systems?.includes(c.system) ?? true) &&
        (possible?.wirings?.includes(c.wiring) ?? true)
      )
    }
    for (const cause of electricalCauses)
      for (const context of contexts)
        expect(canOccur(cause, context), `${cause} on ${Object.values(context).join(' ')}`).toBe(
          excluded(cause, context),
        )
  })
  test('changes something for every cause but sound and a level of the source', () => {
    const still = electricalCauses.filter((cause) => {
      const context = canOccur(cause, inverterPanel) ? inverterPanel : splitGenerator
      return editsOf(context, cause, typicalOf(rangesWith(context, cause))).length === 0
    })
    expect(still).toEqual(['sound', 'low-source-voltage', 'high-source-voltage'])
  })
  test('wires every cause wherever it can occur, with a voltage at every node', () => {
    for (const cause of electricalCauses)
      for (const context of contexts.filter((c) => canOccur(cause, c)))
        for (let n = 0; n < 6; n++) {
          const name = `${cause} ${Object.values(context).join(' ')} ${n}`
          const p = sampleParameters(chanceFrom(name), context, cause)
          const network = wire(context, cause, p)
          const solved = factor(network)
          for (const { from, to } of network.branches)
            for (const node of [from, to])
              expect(Number.isFinite(magnitude(solved.volts(node))), `${name}: ${node}`).toBe(true)
        }
  })
  test('draws no wiring in which a breaker would have tripped', () => {
    for (const cause of electricalCauses)
      for (const context of [generatorPanel, splitGenerator, utilityPanel].filter((c) => canOccur(cause, c)))
        for (let n = 0; n < 25; n++) {
          const p = sampleParameters(chanceFrom(`amps ${n}`), context, cause)
          const network = wire(context, cause, p)
          const solved = factor(network)
          for (const { kind, name } of network.branches)
            if (kind === 'source') expect(magnitude(solved.amps(name)), `${cause} ${n}`).toBeLessThan(60)
        }
  })
  test('says what is wrong in words', () => {
    for (const cause of electricalCauses) expect(faults[cause].is.length).toBeGreaterThan(6)
  })
})

describe('edits', () => {
  const p = typicalOf(rangesIn(inverterPanel))
  const sound = healthy(inverterPanel, p)
  test('name a part that is there, or say which is not', () => {
    expect(() => applyEdit(sound, open('branch.fourth'))).toThrow('this wiring has no branch.fourth')
  })
  test('swapping twice is swapping nothing', () => {
    const once = applyEdit(sound, swap('slot.hot', 'slot.neutral'))
    expect(once).not.toEqual(sound)
    expect(applyEdit(once, swap('slot.hot', 'slot.neutral'))).toEqual(sound)
  })
  test('leave the wiring they were given as it was', () => {
    const before = structuredClone(sound)
    applyEdit(sound, open('branch.hot'))
    expect(sound).toEqual(before)
  })
})

describe('ranges', () => {
  test('stand in order, each with its unit and its reason', () => {
    for (const context of contexts)
      for (const cause of electricalCauses.filter((c) => canOccur(c, context)))
        for (const [name, one] of entries(rangesWith(context, cause))) {
          expect(one.because.length, name).toBeGreaterThan(5)
          if (!isRange(one)) expect(one.options.length, name).toBeGreaterThan(0)
          else {
            expect(one.low, `${cause} ${name}`).toBeLessThanOrEqual(one.typical)
            expect(one.typical, `${cause} ${name}`).toBeLessThanOrEqual(one.high)
            expect(one.unit.length, name).toBeGreaterThan(0)
          }
        }
  })
  test('hold what is drawn from them', () => {
    for (const cause of electricalCauses) {
      const context = canOccur(cause, inverterPanel) ? inverterPanel : splitGenerator
      const ranges = rangesWith(context, cause)
      for (let n = 0; n < 20; n++) {
        const drawn = sampleParameters(chanceFrom(`within ${cause} ${n}`), context, cause)
        for (const [name, one] of entries(ranges)) {
          const value = drawn[name as keyof typeof drawn]
          if (!isRange(one)) expect(one.options.map((o) => o.value)).toContain(value)
          else if (!(one.absent !== undefined && value === 0)) {
            expect(value, name).toBeGreaterThanOrEqual(one.low)
            expect(value, name).toBeLessThanOrEqual(one.high)
          }
        }
      }
    }
  })
  test('the same seed draws the same, another seed another', () => {
    const draw = (seed: string) => sampleParameters(chanceFrom(seed), inverterPanel, 'open-ground')
    expect(draw('a 1')).toEqual(draw('a 1'))
    expect(draw('a 1')).not.toEqual(draw('a 2'))
  })
})

describe('two faults at once', () => {
  const together = (one: ElectricalCause, other: ElectricalCause) =>
    wireTwo(chanceFrom(`${one} ${other}`), generatorPanel, one, other)
  test('each has its own place', () => {
    const both = together('open-ground', 'loose-neutral')
    expect(
      both?.network.branches.find((b) => b.kind === 'capacitance' && b.name.endsWith('.ground')),
    ).toBeDefined()
    expect(both?.p).toBeDefined()
  })
  test.each([
    ['floating-neutral', 'balanced-output', 'no bond can be taken away twice'],
    ['low-source-voltage', 'high-source-voltage', 'a source has one voltage'],
    ['two-hots', 'open-ground', 'no second leg on two wires'],
    ['open-ground', 'open-ground', 'one fault is not two'],
  ] as const)('%s and %s can’t be together: %s', (one, other, _why) => {
    expect(together(one, other)).toBeUndefined()
  })
})
