import { describe, expect, test } from 'vitest'
import { americanWireOhms, metricWireOhms } from '../../../rules/circuit/conductors.ts'

describe('American wires (NEC chapter 9 table 8, note 2)', () => {
  const perThousand = (
    gauge: Parameters<typeof americanWireOhms>[0]['gauge'],
    solid: boolean,
    celsius: number,
    metal: 'copper' | 'aluminum' = 'copper',
  ) => americanWireOhms({ gauge, metal, solid, feet: 1000, celsius })
  test.each([
    ['12 stranded at 25 °C', perThousand('12', false, 25), 1.66],
    ['12 solid at 20 °C', perThousand('12', true, 20), 1.587],
    ['14 solid at 20 °C', perThousand('14', true, 20), 2.525],
    ['10 stranded aluminum at 20 °C', perThousand('10', false, 20, 'aluminum'), 1.67],
    ['6 stranded at 75 °C', perThousand('6', false, 75), 0.491],
  ])('%s', (_, ohms, worked) => {
    expect(ohms).toBeCloseTo(worked, 3)
  })
  test('hot and ground there and back, 100 ft, 75 °C: 0.614, 0.386, 0.242 Ω', () => {
    const loop = (gauge: '14' | '12' | '10') =>
      2 * americanWireOhms({ gauge, metal: 'copper', solid: true, feet: 100, celsius: 75 })
    expect([loop('14'), loop('12'), loop('10')].map((ohms) => ohms.toFixed(3))).toEqual([
      '0.614',
      '0.386',
      '0.242',
    ])
  })
  test('thicker is less, and stranded more than solid', () => {
    const sizes = [
      '18',
      '16',
      '14',
      '12',
      '10',
      '8',
      '6',
      '4',
      '3',
      '2',
      '1',
      '1/0',
      '2/0',
      '3/0',
      '4/0',
    ] as const
    for (const metal of ['copper', 'aluminum'] as const) {
      const ohms = sizes.map((gauge) => perThousand(gauge, false, 75, metal))
      ohms.slice(1).forEach((one, i) => expect(one).toBeLessThan(ohms[i]!))
    }
    expect(perThousand('12', false, 75)).toBeGreaterThan(perThousand('12', true, 75))
  })
  test('by physics: 1.7241e-8 Ω·m over 12 AWG’s 3.31 mm² is within 2 % of the table at 20 °C', () => {
    const worked = (1.7241e-8 / 3.309e-6) * 304.8
    expect(Math.abs(perThousand('12', true, 20) / worked - 1)).toBeLessThan(0.02)
  })
  test('there is no solid 6 AWG', () => {
    expect(() => perThousand('6', true, 75)).toThrow('no solid copper of 6 AWG')
  })
})

describe('metric wires (IEC 60228)', () => {
  test('20 m of 2.5 mm² there and back at 70 °C, 16 A: 5.67 V', () => {
    const ohms = metricWireOhms({ mm2: '2.5', metal: 'copper', flexible: false, meters: 40, celsius: 70 })
    expect(16 * ohms).toBeCloseTo(5.674, 2)
  })
  test('BS 7671’s drop of a two-core cable at 70 °C, mV/A/m (from memory), within 3 %', () => {
    const table = { '1.5': 29, '2.5': 18, '4': 11, '6': 7.3, '10': 4.4, '16': 2.8 } as const
    for (const [mm2, drop] of Object.entries(table)) {
      const wire = {
        mm2: mm2 as keyof typeof table,
        metal: 'copper',
        flexible: false,
        meters: 2,
        celsius: 70,
      } as const
      expect(Math.abs((1000 * metricWireOhms(wire)) / drop - 1), mm2).toBeLessThan(0.03)
    }
  })
  test('flexible cords have more, aluminum more still; what has no row is said', () => {
    const of = (metal: 'copper' | 'aluminum', flexible: boolean, mm2: '2.5' | '16' = '16') =>
      metricWireOhms({ mm2, metal, flexible, meters: 1000, celsius: 20 })
    expect(of('copper', false)).toBe(1.15)
    expect(of('copper', true)).toBe(1.21)
    expect(of('aluminum', false)).toBe(1.91)
    expect(() => of('aluminum', true)).toThrow('flexible aluminum of 16')
    expect(() => of('aluminum', false, '2.5')).toThrow('aluminum of 2.5')
  })
})
