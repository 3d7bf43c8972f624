import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { auditSystem } from '../../../rules/bond-audit/audit.ts'
import { circuitOf } from '../../../rules/bond-audit/circuit.ts'
import { findIn } from '../../../rules/bond-audit/findings.ts'
import { countBonds } from '../../../rules/bond-audit/count.ts'
import { liveSets, modesOf, productOfStates } from '../../../rules/bond-audit/modes.ts'
import { devicesOf } from '../../../rules/bond-audit/state.ts'
import type { State } from '../../../rules/bond-audit/state.ts'
import type { Part, System } from '../../../rules/bond-audit/system.ts'
import { wiringOf } from '../../../rules/bond-audit/wiring.ts'
import { anySystem, withBondAt } from './any-system.ts'

/** Every state of the plain product that feeds something, cut down to one that can be counted out. */
function everyState(system: System) {
  const wiring = wiringOf(system)
  const states = devicesOf(wiring).reduce<State[]>(
    (all, device) =>
      all.flatMap((state) =>
        Array.from({ length: device.ways }, (_, value) => new Map(state).set(device.key, value)),
      ),
    [new Map()],
  )
  return liveSets(wiring).flatMap((live) =>
    states.map((state) => circuitOf(wiring, live, state)).filter(({ places }) => places.length > 0),
  )
}

const summary = (system: System) =>
  auditSystem(system)
    .modes.map(({ name, count, findings, exceptions, current }) => ({
      name,
      count,
      findings: findings.map(({ kind, parts }) => `${kind} ${[...parts].sort().join()}`).sort(),
      exceptions: exceptions.map(({ kind, parts }) => `${kind} ${parts.join()}`).sort(),
      amps: Math.round((current?.most ?? 0) * 1e6),
    }))
    .sort((a, b) => (a.name < b.name ? -1 : 1))

describe('modes', () => {
  test('no fault hides in the product of all positions where every listed mode passes', () => {
    let held = 0
    fc.assert(
      fc.property(anySystem, (system) => {
        fc.pre(productOfStates(system) <= 500)
        const listed = modesOf(system).map(({ circuit }) => findIn(circuit).findings)
        if (listed.length === 0 || listed.some((findings) => findings.length > 0)) return
        for (const circuit of everyState(system)) expect(findIn(circuit).findings).toEqual([])
        held++
      }),
      { numRuns: 1000 },
    )
    expect(held).toBeGreaterThan(10)
  })

  test('every state that is searched is one of the product', () => {
    fc.assert(
      fc.property(anySystem, (system) => {
        fc.pre(productOfStates(system) <= 500)
        const key = ({ live, bonds, places }: ReturnType<typeof everyState>[number]) =>
          [live, bonds.map(({ part }) => part), places]
            .map((all) =>
              all
                .map(({ id }) => id)
                .sort()
                .join(),
            )
            .join('|')
        const all = new Set(everyState(system).map(key))
        for (const { circuit } of modesOf(system)) expect(all).toContain(key(circuit))
      }),
      { numRuns: 100 },
    )
  })

  test('what is found does not depend on the order of parts', () => {
    const shuffled = anySystem.chain((system) =>
      fc.tuple(
        fc.constant(system),
        fc
          .shuffledSubarray([...system.parts], { minLength: system.parts.length })
          .map((parts: Part[]): System => ({ ...system, parts })),
      ),
    )
    fc.assert(
      fc.property(shuffled, ([system, other]) => {
        expect(summary(other)).toEqual(summary(system))
      }),
      { numRuns: 100 },
    )
  })

  test('no two modes have the same name', () => {
    fc.assert(
      fc.property(anySystem, (system) => {
        const names = auditSystem(system).modes.map(({ name }) => name)
        expect(new Set(names).size).toBe(names.length)
      }),
      { numRuns: 100 },
    )
  })
})

test('adding a bond never lowers the count, in any mode', () => {
  const grown = anySystem.chain((system) =>
    fc.tuple(fc.constant(system), fc.constantFrom(...system.parts.map(({ id }) => id))),
  )
  let looked = 0
  fc.assert(
    fc.property(grown, ([system, id]) => {
      const more = withBondAt(system, id)
      fc.pre(more !== undefined)
      const wiring = wiringOf(more ?? system)
      for (const { circuit } of modesOf(system)) {
        const live = circuit.live.flatMap((part) => {
          const same = wiring.parts.get(part.id)
          return same?.kind === 'source' || same?.kind === 'transformer' ? [same] : []
        })
        const after = circuitOf(wiring, live, circuit.state)
        expect(countBonds(after).counted.length).toBeGreaterThanOrEqual(countBonds(circuit).counted.length)
        looked++
      }
    }),
    { numRuns: 250 },
  )
  expect(looked).toBeGreaterThan(250)
})
