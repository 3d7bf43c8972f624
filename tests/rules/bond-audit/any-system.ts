import fc from 'fast-check'
import type { Feed, Part, Receptacle, Source, Switch, System } from '../../../rules/bond-audit/system.ts'
import { feed, source } from './build.ts'

const named = (id: string) => ({ id, name: id })
const joined = fc.constantFrom<Feed['joined']>('wired', 'wired', 'wired', 'cord', 'cord', 'taken-away')
const mostly = fc.constantFrom(true, true, true, false)

const anySource = (id: string): fc.Arbitrary<Source> =>
  fc
    .record({
      type: fc.constantFrom<Source['type']>(
        'utility',
        'inverter',
        'power-station',
        'portable-generator',
        'standby-generator',
      ),
      volts: fc.constantFrom<Source['volts']>('120', '120/240', '120/240', '230', '240'),
      output: fc.constantFrom<Source['output']>(
        'bonded',
        'relay',
        'relay',
        'floating',
        'floating',
        'isolated',
        'balanced',
      ),
      relay: fc.subarray<'own-power' | 'passing-through'>(['own-power', 'passing-through']),
      gfci: fc.boolean(),
    })
    .map((more) => source(id, more))

const anyFeed = (from: readonly string[]): fc.Arbitrary<Feed> =>
  fc
    .record({ from: fc.constantFrom(...from), joined, neutral: mostly, ground: mostly, gfci: fc.boolean() })
    .map(({ from: id, ...more }) => feed(id, more))

const anyPanel = (id: string, from: readonly string[]): fc.Arbitrary<Part> =>
  fc
    .record({
      feed: anyFeed(from),
      bond: fc.boolean(),
      multiwire: fc.boolean(),
      role: fc.constantFrom<'main' | 'sub'>('main', 'sub'),
      old: fc.option(fc.record({ oldFeeder: fc.boolean(), noMetalPath: fc.boolean() }), { nil: undefined }),
    })
    .map(({ old, ...more }) => ({ kind: 'panel', ...named(id), ...more, ...(old && { outbuilding: old }) }))

const anyReceptacle = (id: string, from: readonly string[]): fc.Arbitrary<Part> =>
  fc
    .record({
      feed: anyFeed(from),
      gfci: fc.boolean(),
      bond: fc.constantFrom<Receptacle['bond']>('none', 'none', 'jumper', 'existing-range'),
    })
    .map((more) => ({ kind: 'receptacle', ...named(id), ...more }))

const anySwitch = (id: string, from: readonly string[], sources: readonly Source[]): fc.Arbitrary<Part> =>
  fc
    .record({
      neutral: fc.constantFrom<Switch['neutral']>('switched', 'solid'),
      inputs: fc.uniqueArray(anyFeed(from), { minLength: 2, maxLength: 3, selector: ({ from: id }) => id }),
      builtIn: fc.boolean(),
    })
    .map(({ builtIn, ...more }): Switch => {
      const inverter = sources.find(({ id: own }) => own === more.inputs[0]?.from)
      return builtIn && inverter !== undefined
        ? { kind: 'switch', ...named(id), ...more, operated: 'built-in', inverter: inverter.id }
        : { kind: 'switch', ...named(id), ...more, operated: 'manual' }
    })

/** Sources, then parts that take power from what stands before them; parts in any order. */
export const anySystem: fc.Arbitrary<System> = fc
  .tuple(fc.integer({ min: 1, max: 4 }), fc.integer({ min: 1, max: 6 }))
  .chain(([sources, others]) =>
    fc.tuple(
      fc.tuple(...Array.from({ length: sources }, (_, i) => anySource(`source-${i}`))),
      fc.constant(others),
    ),
  )
  .chain(([sources, others]) => {
    const ids = sources.map(({ id }) => id)
    const parts: fc.Arbitrary<Part>[] = []
    for (let i = 0; i < others; i++) {
      const id = `part-${i}`
      const from = [...ids]
      parts.push(
        fc.oneof(
          { weight: 4, arbitrary: anyPanel(id, from) },
          {
            weight: from.length > 1 ? 3 : 0,
            arbitrary: from.length > 1 ? anySwitch(id, from, sources) : anyPanel(id, from),
          },
          { weight: 2, arbitrary: anyReceptacle(id, from) },
          {
            weight: 1,
            arbitrary: anyFeed(from).map((own): Part => ({
              kind: 'transformer',
              ...named(id),
              feed: own,
              volts: '120',
              bond: true,
            })),
          },
          {
            weight: 1,
            arbitrary: anyFeed(from).map((own): Part => ({
              kind: 'autotransformer',
              ...named(id),
              feed: own,
              bond: 'relay',
            })),
          },
        ),
      )
      ids.push(id)
    }
    const rods = fc
      .uniqueArray(fc.constantFrom(...ids), { maxLength: 3 })
      .map((at) => at.map((id): Part => ({ kind: 'rod', ...named(`rod-${id}`), at: id, ohms: 30 })))
    const wires = fc
      .array(fc.tuple(fc.constantFrom(...ids), fc.constantFrom(...ids)), { maxLength: 1 })
      .map((ends) =>
        ends.map(([from, to], i): Part => ({ kind: 'ground-wire', ...named(`wire-${i}`), from, to })),
      )
    return fc.tuple(fc.tuple(...parts), rods, wires).map(([own, atRods, apart]): System => ({
      name: '',
      units: 'us',
      parts: [...sources, ...own, ...atRods, ...apart],
    }))
  })

/** The same with one more place where neutral meets ground, or undefined where that part has one. */
export function withBondAt(system: System, id: string): System | undefined {
  let added = false
  const parts = system.parts.map((part): Part => {
    if (part.id !== id) return part
    const bonded: Part | undefined =
      part.kind === 'panel' && !part.bond
        ? { ...part, bond: true }
        : part.kind === 'receptacle' && part.bond === 'none'
          ? { ...part, bond: 'jumper' }
          : part.kind === 'source' && part.output === 'floating'
            ? { ...part, output: 'bonded' }
            : part.kind === 'transformer' && !part.bond
              ? { ...part, bond: true }
              : part.kind === 'autotransformer' && part.bond === 'none'
                ? { ...part, bond: 'fixed' }
                : undefined
    added ||= bonded !== undefined
    return bonded ?? part
  })
  return added ? { ...system, parts } : undefined
}
