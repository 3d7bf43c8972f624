import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { clearingByMode, modesTable } from '../../../rules/worksheets/fault-clearing/by-mode.ts'
import { clearingOf } from '../../../rules/worksheets/fault-clearing/clearing.ts'
import type { FaultPath } from '../../../rules/worksheets/fault-clearing/clearing.ts'
import { faultClearing, faultOf } from '../../../rules/worksheets/fault-clearing/fault-clearing.ts'
import type { FaultInputs } from '../../../rules/worksheets/fault-clearing/fault-clearing.ts'
import { sourceLimit } from '../../../rules/worksheets/fault-clearing/source-limit.ts'
import { iec60898 } from '../../../rules/worksheets/protective-devices/iec-60898.ts'
import { ul489 } from '../../../rules/worksheets/protective-devices/ul-489.ts'
import { computeWorksheet } from '../../../rules/worksheets/worksheets.ts'
import { askNgspice } from './ask-ngspice.ts'

const stiff: FaultInputs['source'] = { kind: 'utility', shortCircuitAmps: 100_000 }
const inverter: FaultInputs['source'] = {
  kind: 'inverter',
  ratedWatts: 2000,
  ratedVolts: 120,
  timesLeast: 1.5,
  timesMost: 2,
  secondsLeast: 0.01,
  secondsMost: 10,
  then: 'stops',
}
const plain: FaultInputs = {
  units: 'american',
  volts: 120,
  source: stiff,
  bond: 'panel',
  feeder: { length: 0, size: '6', neutralSize: '6', groundSize: '10', metal: 'copper', build: 'cable' },
  branch: { length: 100, size: '12', groundSize: '12', metal: 'copper', build: 'cable' },
  celsius: 75,
  contactOhms: 0,
  device: { kind: 'ul489', amps: 20, magneticLeast: 5, magneticMost: 10 },
  leakage: 'none',
  rods: { panelOhms: 25, sourceOhms: 25 },
}
const of = (more: Partial<FaultInputs>): FaultInputs => ({ ...plain, ...more })
const branch = (size: string, length: number, groundSize = size) => ({
  ...plain.branch,
  size,
  groundSize,
  length,
})
const clearing = (more: Partial<FaultInputs>) => clearingOf(faultOf(of(more)))

describe('loop and current', () => {
  // From NEC chapter 9 table 8, solid copper at 75 °C, hot and grounding conductor of 100 ft each, stiff source.
  test.each([
    ['14', 0.614, 195],
    ['12', 0.386, 311],
    ['10', 0.242, 496],
  ])('100 ft of %s AWG out and back: %d Ω, %d A at 120 V', (size, ohms, amps) => {
    const found = clearing({ branch: branch(size, 100) })
    expect(found.loopOhms - 120 / 100_000).toBeCloseTo(ohms, 4)
    expect(120 / (found.loopOhms - 120 / 100_000)).toBeCloseTo(amps, 0)
    expect(found.clears).toBe('breaker')
  })

  test('50 ft of 12 AWG behind 0.05 Ω: 494 A, and the case stands 47.7 V above the panel (NEC table 8)', () => {
    const found = clearing({
      source: { kind: 'utility', shortCircuitAmps: 2400 },
      branch: branch('12', 50),
    })
    expect(found.amps.most).toBeCloseTo(493.8, 0)
    expect(found.touchVolts.most).toBeCloseTo(47.7, 1)
  })

  test('line and protective conductor alike at 230 V: the case stands at half, 115 V (IEC 60364-4-41)', () => {
    const found = clearing({ units: 'metric', volts: 230, branch: branch('2.5', 30) })
    expect(found.touchVolts.most).toBeCloseTo(115, 0)
  })

  test('1.5 mm² out and back for 10 m at 20 °C is 0.242 Ω (IEC 60228)', () => {
    const found = clearing({ units: 'metric', volts: 230, celsius: 20, branch: branch('1.5', 10) })
    expect(found.loopOhms - 230 / 100_000).toBeCloseTo(0.242, 4)
  })

  test('120 V through 25 Ω at each end: 2.4 A, 60 V on the metal (Ohm’s law, as IEEE 142 shows it)', () => {
    const found = clearing({
      source: { kind: 'utility', shortCircuitAmps: 1e5 },
      bond: 'rods',
      branch: branch('12', 1),
    })
    expect(found.amps.most).toBeCloseTo(2.4, 2)
    expect(found.touchVolts.most).toBeCloseTo(60, 0)
    expect(found.clears).toBe('nothing')
  })

  test.each([
    ['panel', 'panel'],
    ['source', 'source'],
    ['rods', 'rods'],
  ] as const)('ngspice finds the same current and touch voltage with the bond at the %s', (_, bond) => {
    const inputs = of({
      bond,
      source: { kind: 'utility', shortCircuitAmps: 1500 },
      feeder: { ...plain.feeder, length: 80 },
      branch: branch('14', 60),
      contactOhms: 0.03,
    })
    const found = clearingOf(faultOf(inputs))
    // Table 8 at 75 °C: 6 AWG stranded 0.491, 10 AWG solid 1.21, 14 AWG solid 3.07 Ω per 1000 ft.
    const way = {
      panel: ['Rback bar neutral 0.03928'],
      source: ['Rback bar neutral 0.0968'],
      rods: ['Rpanel bar soil 25', 'Rsource soil neutral 25'],
    }[bond]
    const said = askNgspice([
      'Vs emf neutral 120',
      'Rs emf hot 0.08',
      'Rfeed hot panel 0.03928',
      'Rbranch panel fault 0.1842',
      'Rcontact fault metal 0.03',
      'Rground metal bar 0.1842',
      ...way,
      'Vref neutral 0 0',
    ])
    const stands = bond === 'rods' ? 'soil' : bond === 'panel' ? 'bar' : undefined
    const touch = said.get('metal')! - (stands === undefined ? 0 : said.get(stands)!)
    expect(found.amps.most).toBeCloseTo(-said.get('vs#branch')!, 4)
    expect(found.touchVolts.most).toBeCloseTo(touch, 4)
  })
})

describe('what clears it', () => {
  const path: FaultPath = { outOhms: 0.1, backOhms: 0.1, touchOhms: 0.1 }

  test('a 2000 W inverter at twice its rating gives 33.3 A: a 20 A breaker stays on, the inverter stops (IEEE papers on inverter faults)', () => {
    const found = clearing({ source: { ...inverter, timesLeast: 2, timesMost: 2 } })
    expect(found.amps.most).toBeCloseTo(33.3, 1)
    expect(found.clears).toBe('source')
    expect(found.sourceLimits).toBe('yes')
    expect(faultClearing(of({ source: inverter })).verdict).toContain('does not trip')
  })

  test('3 kVA at 230 V and three times gives 39 A, where a B16 needs 80 A: 0.4 s is not kept (IEC 60898, IEC 60364-4-41)', () => {
    const source = sourceLimit(
      { ...inverter, ratedWatts: 3000, ratedVolts: 230, timesLeast: 3, timesMost: 3 },
      230,
    )
    const found = clearingOf({ source, path, breaker: iec60898(16, 'B'), leakage: 'none' })
    expect(found.amps.most).toBeCloseTo(39.1, 1)
    expect(found.breaker.fromSeconds).toBeGreaterThan(0.4)
    expect(found.clears).not.toBe('breaker')
  })

  test('no bond: no way back, the whole voltage on the metal, and nothing clears it, GFCI or not (NEC 250.4(A)(5))', () => {
    for (const leakage of ['none', 'gfci', 'rcd'] as const) {
      const found = clearing({ bond: 'none', leakage })
      expect(found).toMatchObject({ clears: 'nothing', amps: { most: 0 }, touchVolts: { most: 120 } })
    }
    expect(faultClearing(of({ bond: 'none' })).verdict).toBe(
      'The breaker does not trip: there is no way back for the current.',
    )
  })

  test('through two rods a GFCI trips in 25 ms where the breaker never does (UL 943)', () => {
    const found = clearing({ bond: 'rods', leakage: 'gfci' })
    expect(found.clears).toBe('leakage')
    expect(found.lasts.toSeconds).toBeCloseTo(0.025, 3)
    expect(found.breaker.fromSeconds).toBe(Infinity)
  })

  test('a GFCI on a source whose voltage collapses is not counted on; an RCD is, since it needs none', () => {
    expect(clearing({ source: inverter, leakage: 'gfci' })).toMatchObject({
      leakageStarved: true,
      clears: 'source',
    })
    expect(clearing({ source: inverter, leakage: 'rcd' }).clears).toBe('leakage')
  })

  test('a source that goes on with what the breaker carries: nothing clears it', () => {
    const source = { ...inverter, then: 'holds', thenTimes: 1 } as const
    expect(clearing({ source }).clears).toBe('nothing')
    const generator = { ...source, kind: 'generator', timesLeast: 8, timesMost: 10, thenTimes: 3 } as const
    // 3 × 16.7 A = 50 A: 2.5 times a 20 A breaker, which then opens after a while.
    expect(clearing({ source: generator }).clears).toBe('breaker')
  })

  test('a source that may give enough or not: don’t count on the breaker', () => {
    const source = {
      ...inverter,
      kind: 'generator',
      timesLeast: 5,
      timesMost: 15,
      secondsMost: 0.35,
    } as const
    expect(clearing({ source }).clears).toBe('breaker-or-source')
  })

  test('a current between holding and opening: perhaps the breaker, else nothing', () => {
    expect(clearing({ contactOhms: 4.6 }).clears).toBe('perhaps-breaker')
  })

  test('a weak current that an inverter carries for ever: nothing clears it, and it does not stop', () => {
    const found = clearing({ source: inverter, contactOhms: 10 })
    expect(found.source.fromSeconds).toBe(Infinity)
    expect(found.clears).toBe('nothing')
    expect(faultClearing(of({ source: inverter, contactOhms: 10 })).cautions[0]?.word).toBe('danger')
  })

  test('a breaker that opens late, with more than 50 V on the metal meanwhile, is no pass', () => {
    // 40 A on 20 A: within 2 min by UL 489; more than 0.8 s (IEC 60364-4-41), and 59 V on the metal.
    const result = faultClearing(of({ branch: branch('14', 480) }))
    expect(result.verdict).toMatch(/^The breaker trips late: after up to/)
    expect(result.judgment).toBe('fails')
    expect(result.cautions[0]?.word).toBe('danger')
    expect(result.because.join(' ')).toContain('AC-4')
    // With little on the metal it is late all the same, but not by that.
    const little = faultClearing(of({ contactOhms: 2.4, branch: branch('12', 20) }))
    expect([little.judgment, little.verdict.slice(0, 22)]).toEqual(['depends', 'The breaker trips late'])
  })

  test('more than its rating but not the most it gives: the source may stop or not, and is not counted on', () => {
    const inputs = of({ source: inverter, contactOhms: 5.5 })
    const found = clearingOf(faultOf(inputs))
    expect(found.source).toEqual({ fromSeconds: 0.01, toSeconds: Infinity })
    expect(faultClearing(inputs).because.join(' ')).toContain('or not at all')
  })

  test('without a bond nothing is said of a time that a fault loop would need', () => {
    const { because } = faultClearing(of({ bond: 'none' }))
    expect(because.join(' ')).toContain('To earth only stray current flows')
    expect(because.join(' ')).toContain('insulation monitoring')
    expect(because.join(' ')).not.toContain('that is kept')
  })

  test('the table by mode says it for each mode of a system', () => {
    const modes = [
      { mode: 'On utility', fault: faultOf(plain) },
      { mode: 'On battery', fault: faultOf(of({ source: inverter })) },
      { mode: 'On generator', fault: faultOf(of({ bond: 'none' })) },
    ]
    expect(clearingByMode(modes).map(({ clearing: { clears } }) => clears)).toEqual([
      'breaker',
      'source',
      'nothing',
    ])
    expect(modesTable(modes).rows.map((row) => row.at(-1))).toEqual([
      'the breaker',
      'the inverter shutting down',
      'nothing',
    ])
  })

  test('more resistance never clears a fault sooner, and no fault clears later than its parts', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.05, max: 100, noNaN: true }),
        fc.double({ min: 1, max: 3, noNaN: true }),
        (ohms, times) => {
          const fault = (back: number) => ({
            source: sourceLimit(stiff, 120),
            path: { outOhms: 0, backOhms: back, touchOhms: back },
            breaker: ul489(20),
            leakage: 'none' as const,
          })
          const [near, far] = [clearingOf(fault(ohms)), clearingOf(fault(ohms * times))]
          expect(far.lasts.toSeconds).toBeGreaterThanOrEqual(near.lasts.toSeconds)
          expect(near.lasts.toSeconds).toBeLessThanOrEqual(near.breaker.toSeconds)
        },
      ),
    )
  })
})

describe('the sheet', () => {
  test('names the field that can’t be', () => {
    const answer = computeWorksheet('fault-clearing', {
      ...plain,
      branch: { ...plain.branch, size: '14', metal: 'aluminum' },
      device: { kind: 'ul489', amps: 20, magneticLeast: 10, magneticMost: 5 },
    })
    expect(answer).toEqual({
      errors: { 'device.magneticMost': 'The upper end can’t lie under the lower one.' },
    })
    const sizes = computeWorksheet('fault-clearing', {
      ...plain,
      branch: { ...plain.branch, metal: 'aluminum', size: '14' },
    })
    expect(Object.keys('errors' in sizes ? sizes.errors : {})).toEqual(['branch.size'])
  })

  test('never calls it safe, and ends with who decides', () => {
    for (const bond of ['panel', 'source', 'rods', 'none'] as const)
      for (const source of [stiff, inverter]) {
        const result = faultClearing(of({ bond, source }))
        expect(JSON.stringify(result)).not.toMatch(/\bsafe(?!ty)/i)
        expect(result.cautions.at(-1)?.text).toContain('authority having jurisdiction')
      }
  })

  test('the plot holds the band and the point inside its field', () => {
    const { plot } = faultClearing(plain)
    const { field, band, operating } = plot!
    for (const [x, y] of band) {
      expect(x).toBeGreaterThanOrEqual(field.left - 0.01)
      expect(x).toBeLessThanOrEqual(field.right + 0.01)
      expect(y).toBeGreaterThanOrEqual(field.top - 0.01)
      expect(y).toBeLessThanOrEqual(field.bottom + 0.01)
    }
    expect(operating.left).toBeGreaterThan(field.left)
    expect(operating.bottom).toBeGreaterThan(operating.top)
  })
})
