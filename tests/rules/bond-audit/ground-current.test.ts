import { describe, expect, test } from 'vitest'
import { auditSystem } from '../../../rules/bond-audit/audit.ts'
import type { GroundCurrent } from '../../../rules/bond-audit/ground-current.ts'
import { loadAmps } from '../../../rules/bond-audit/ground-current.ts'
import type { Part, Run } from '../../../rules/bond-audit/system.ts'
import { feed, generator, inverter, main, panel, rod, system, through, transfer, utility } from './build.ts'

const run = (length: number, neutral: string, ground: string): Run => ({
  length,
  neutral,
  ground,
  metal: 'copper',
})
const currentIn = (name: string, ...parts: Part[]): GroundCurrent => {
  const mode = auditSystem(system(...parts)).modes.find((one) => one.name === name)
  if (mode?.current === undefined) throw new Error(`no current ${name}`)
  return mode.current
}
const barn = (bond: boolean) => [
  utility(),
  main('utility'),
  panel('barn', feed('main', { run: run(100, '6', '10') }), { bond }),
]

describe('two bonds share the return', () => {
  // Worked by hand: 100 ft, neutral 6 AWG 0.0491 Ω, ground 10 AWG 0.124 Ω (NEC chapter 9 table 8): of 40 A unbalance
  // 28.65 A return on neutral and 11.35 A on the ground wire. Here of 12 A, in proportion.
  test('a subpanel 100 ft away', () => {
    const { most, at, paths } = currentIn('On utility', ...barn(true))
    expect(at).toBe('barn')
    expect((most * 40) / loadAmps).toBeCloseTo(11.35, 2)
    expect(paths[0]).toMatchObject({ key: 'barn', from: 'main', to: 'barn', through: 'wire' })
  })

  test('with one bond nothing is computed, because nothing returns by ground', () => {
    expect(auditSystem(system(...barn(false))).modes[0]?.current).toBeUndefined()
  })

  // 30 ft of 10 AWG, neutral and ground alike: half of 12 A each, which any GFCI takes for a fault.
  test('a bonded generator on a house that is bonded, neutral not switched', () => {
    const { most } = currentIn(
      'On generator',
      utility(),
      generator({ output: 'bonded' }),
      transfer('inlet', ['utility', feed('generator', { run: run(30, '10', '10') })]),
      main('inlet'),
    )
    expect(most).toBeCloseTo(6, 2)
  })

  // 12 A × 1.24 ÷ (1.24 + 1.98): neutral 10 AWG, ground 12 AWG over the same length.
  test('a backed-up panel bonded behind an inverter that passes through', () => {
    const { most } = currentIn(
      'On utility',
      utility(),
      main('utility'),
      inverter({ output: 'floating' }),
      through('inverter', feed('main', { run: run(20, '10', '12') })),
      panel('backed-up', feed('inverter-transfer', { run: run(30, '10', '12') }), { bond: true }),
    )
    expect(most).toBeCloseTo((12 * 1.24) / (1.24 + 1.98), 2)
  })

  test('rods carry next to nothing beside a wire, and all that is left without one', () => {
    const rods = (ground: boolean) =>
      currentIn(
        'On utility',
        utility(),
        main('utility'),
        rod('main', 25),
        panel('barn', feed('main', { ground, run: run(100, '6', '10') }), { bond: true }),
        rod('barn', 25),
      ).paths.filter(({ through: way }) => way === 'soil')
    for (const { amps } of rods(true)) expect(amps).toBeLessThan(0.02)
    // 0.0491 Ω of neutral beside 50 Ω of soil: 12 A × 0.0491 ÷ 50.05 = 11.8 mA.
    for (const { amps } of rods(false)) expect(amps).toBeCloseTo(0.01177, 4)
    expect(rods(false)).toHaveLength(2)
  })

  test('metric runs by IEC 60228', () => {
    const parts = [
      utility({ volts: '230', output: 'bonded' }),
      main('utility', { bond: false }),
      panel('annex', feed('main', { run: run(20, '6', '2.5') }), { bond: true }),
    ]
    const { current } = auditSystem({ ...system(...parts), units: 'metric' }).modes[0]!
    // Resistances in proportion 3.08 : 7.41 at any temperature; the utility’s own run has no length.
    expect(current?.most).toBeCloseTo((12 * 3.08) / (3.08 + 7.41 + 0), 1)
    expect(current?.assumed).toBe(true)
  })
})
