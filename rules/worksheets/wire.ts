import type * as z from 'zod/mini'
import { americanWireOhms, metricWireOhms } from '../circuit/conductors.ts'
import type { Gauge, Metal, SquareMillimeters } from '../circuit/conductors.ts'
import { oneOf } from './quantity.ts'
import { remembered, seen } from './result.ts'
import type { Reference } from './result.ts'

/** `american`: feet and AWG. `metric`: meters and mm². Every length and size of one worksheet is in one of them. */
export const Units = oneOf(['american', 'metric'])
export type Units = z.infer<typeof Units>

/** Sizes there are figures for, thinnest first. */
export const gauges: readonly Gauge[] = [
  ...(['18', '16', '14', '12', '10', '8', '6', '4', '3', '2', '1', '1/0', '2/0', '3/0', '4/0'] as const),
]
export const squareMillimeters: readonly SquareMillimeters[] = ['1.5', '2.5', '4', '6', '10', '16', '25']
export const sizesOf = (units: Units): readonly string[] =>
  units === 'american' ? gauges : squareMillimeters

/**
 * `cable`: solid up to 10 AWG and strands above, class 1 and 2 in mm². `cord`: strands, class 5 in mm².
 */
export const Build = oneOf(['cable', 'cord'])
export type Build = z.infer<typeof Build>
export const MetalOf = oneOf(['copper', 'aluminum'])

/** One conductor, one way. */
export type Wire = {
  units: Units
  /** AWG or mm². */
  size: string
  metal: Metal
  build: Build
  /** Feet or meters. */
  length: number
  /** Of the conductor itself. */
  celsius: number
}

const solidUpTo = gauges.indexOf('10')

/** Ohms of one conductor, or undefined where the tables have none of that kind. */
export function wireOhms({ units, size, metal, build, length, celsius }: Wire): number | undefined {
  try {
    if (units === 'american') {
      const at = gauges.indexOf(size as Gauge)
      if (at < 0 || (metal === 'aluminum' && (at < 3 || build === 'cord'))) return undefined
      const solid = build === 'cable' && at <= solidUpTo
      return americanWireOhms({ gauge: size as Gauge, metal, solid, feet: length, celsius })
    }
    const mm2 = squareMillimeters.find((known) => known === size)
    if (mm2 === undefined) return undefined
    return metricWireOhms({ mm2, metal, flexible: build === 'cord', meters: length, celsius })
  } catch (problem) {
    if (problem instanceof RangeError) return undefined
    throw problem
  }
}

/** Why there are no ohms for it, or undefined where there are. */
export function noSuchWire(wire: Omit<Wire, 'length' | 'celsius'>): string | undefined {
  if (wireOhms({ ...wire, length: 1, celsius: 20 }) !== undefined) return undefined
  const sizes = sizesOf(wire.units)
  if (!sizes.includes(wire.size))
    return `Choose a size from ${sizes[0]} to ${sizes.at(-1)} ${unitOf(wire.units)}.`
  return `The table has no ${wire.metal} ${wire.build} of ${wireSize(wire.units, wire.size)}.`
}

const unitOf = (units: Units) => (units === 'american' ? 'AWG' : 'mm²')
/** "12 AWG", "2.5 mm²". */
export const wireSize = (units: Units, size: string): string => `${size} ${unitOf(units)}`
/** "ft", "m". */
export const lengthUnit = (units: Units): string => (units === 'american' ? 'ft' : 'm')

/** Where a wire's ohms come from. */
export const wireReferences = (units: Units): Reference[] =>
  units === 'american'
    ? [seen('NEC chapter 9 table 8 and its note 2 (alike in the 2008 to 2023 editions)')]
    : [
        seen('IEC 60228, greatest resistance at 20 °C'),
        remembered('IEC 60287-1-1 table 1, change with temperature'),
      ]
