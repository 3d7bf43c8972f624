import { describe, expect as claim, test } from 'vitest'
import { expect } from '../../../rules/circuit/expect.ts'
import { electricalCauses, nominalVolts } from '../../../rules/circuit/wiring/context.ts'
import { causesIn } from '../../../rules/circuit/wiring/occurs.ts'
import { measured } from '../../../rules/circuit/wiring/readings/measured.ts'
import { chanceFrom, sampleContext, sampleParameters } from '../../../rules/circuit/wiring/sample.ts'
import { takeReadings, usualKit } from '../../../rules/circuit/wiring/take-readings.ts'
import { wire } from '../../../rules/circuit/wiring/wire.ts'
import { generatorPanel, inverterPanel, stationAlone, utilityPanel } from './found-in.ts'

const light = 10_000_000
const heavy = 10_000
const band = (...[context, cause, meter, id]: [...Parameters<typeof expect>, string]) => {
  const found = expect(context, cause, meter).readings.get(id)
  if (found === undefined) throw new Error(`nothing is expected of ${id}`)
  return found
}

describe('what a cause lets one expect', () => {
  test('a floating neutral: half to ground, typically, from a quarter to three quarters, whatever the source', () => {
    const hg = band(inverterPanel, 'floating-neutral', light, 'receptacle.hg.volts')
    claim(hg.typical / 120).toBeGreaterThan(0.42)
    claim(hg.typical / 120).toBeLessThan(0.55)
    claim(hg.low / 120).toBeLessThan(0.36)
    claim(hg.high / 120).toBeGreaterThan(0.62)
  })
  test('the same through a low-resistance meter: a tenth at the very most', () => {
    const { typical, high } = band(inverterPanel, 'floating-neutral', heavy, 'receptacle.hg.volts')
    claim(typical).toBeLessThan(3)
    claim(high).toBeLessThan(12)
  })
  test('a balanced output keeps its half on either meter', () => {
    for (const meter of [light, heavy]) {
      const half = band(inverterPanel, 'balanced-output', meter, 'receptacle.ng.volts')
      claim(half.typical / 120).toBeCloseTo(0.5, 1)
      // Tied through capacitors of a microfarad and less it gives a little to the heavy one.
      claim(half.low / 120).toBeGreaterThan(meter === light ? 0.4 : 0.25)
    }
  })
  test('sound: neutral–ground under a twentieth of nominal under load', () => {
    claim(band(generatorPanel, 'sound', light, 'receptacle.ng.volts.loaded').high).toBeLessThan(6)
  })
  test('two bonds: amps in the feeder’s ground wire, and none where there is one', () => {
    claim(band(generatorPanel, 'double-bond', light, 'feeder.egc.amps').high).toBeGreaterThan(1)
    claim(band(generatorPanel, 'sound', light, 'feeder.egc.amps').high).toBeLessThan(0.1)
  })
  test('a tester on a floating neutral: dim or dark between ground and either wire, never both lit', () => {
    const { observations } = expect(inverterPanel, 'floating-neutral', light)
    claim(observations.get('tester.hn-lamp')).toEqual({ typical: 'lit', can: ['lit'] })
    claim([...(observations.get('tester.hg-lamp')?.can ?? [])].sort()).toEqual(['dark', 'dim'])
    claim(observations.get('bulb.ng')?.can).toEqual(['dark'])
  })
  test('nothing of a panel where there is none, nothing of a second leg on two wires', () => {
    const alone = [...expect(stationAlone, 'sound', light).readings.keys()]
    claim(alone.filter((id) => id.startsWith('panel.') || id.startsWith('feeder.'))).toEqual([])
    claim(expect(inverterPanel, 'sound', light).readings.has('panel.l1n.volts')).toBe(false)
    claim(expect(utilityPanel, 'sound', light).readings.has('panel.l1n.volts')).toBe(true)
  })
  test('low, typical and high stand in order, for every cause and reading', () => {
    for (const context of [inverterPanel, utilityPanel, stationAlone])
      for (const cause of causesIn(context))
        for (const [id, { low, typical, high }] of expect(context, cause, light).readings) {
          claim(low, `${cause} ${id}`).toBeLessThanOrEqual(typical)
          claim(typical, `${cause} ${id}`).toBeLessThanOrEqual(high)
        }
  })
  test('is computed once', () => {
    claim(expect(inverterPanel, 'sound', light)).toBe(expect(inverterPanel, 'sound', light))
  })
})

/** Room beside a band: what a meter, an ohmmeter and a clamp are allowed to be off. */
function room(id: string, nominal: number, high: number): number {
  if (id.endsWith('.ohms')) return Math.max(0.5, 0.3 * high)
  if (id.endsWith('amps')) return Math.max(0.3, 0.2 * high)
  return 0.05 * nominal
}

test('wirings drawn by chance read within the bands: 98 of 100 readings, and the lamps too', () => {
  let [readings, outside, states, unexpected] = [0, 0, 0, 0]
  for (const cause of electricalCauses)
    for (let n = 0; n < 25; n++) {
      const chance = chanceFrom(`bands ${cause} ${n}`)
      const context = sampleContext(chance, cause)
      const p = sampleParameters(chance, context, cause)
      const found = takeReadings(measured(context, wire(context, cause, p), p), usualKit)
      const expected = expect(context, cause, light)
      for (const [id, value] of Object.entries(found)) {
        if (typeof value === 'number') {
          const known = expected.readings.get(id)
          readings += 1
          const off = room(id, nominalVolts(context), known?.high ?? 0)
          if (known === undefined || value < known.low - off || value > known.high + off) outside += 1
        } else {
          states += 1
          if (!expected.observations.get(id)?.can.includes(value)) unexpected += 1
        }
      }
    }
  claim(readings).toBeGreaterThan(10_000)
  claim(outside / readings).toBeLessThan(0.02)
  claim(unexpected / states).toBeLessThan(0.02)
})
