/**
 * Resistance of wires.
 *
 * American sizes: NEC chapter 9 table 8, ohms per 1000 ft of direct current at 75 °C (the same in the 2008 to 2023
 * editions); other temperatures by the table's note 2. Metric sizes: IEC 60228, the most a conductor may have, ohms
 * per kilometer at 20 °C; other temperatures by IEC 60287-1-1 table 1. At 50 or 60 Hz these sizes have no more.
 */

export type Metal = 'copper' | 'aluminum'

type Row = { solid?: number; stranded: number; aluminumSolid?: number; aluminum?: number }

/** NEC chapter 9 table 8: uncoated copper solid and stranded, aluminum solid and stranded; Ω per 1000 ft, 75 °C. */
const american = {
  '18': { solid: 7.77, stranded: 7.95, aluminumSolid: 12.8, aluminum: 13.1 },
  '16': { solid: 4.89, stranded: 4.99, aluminumSolid: 8.05, aluminum: 8.21 },
  '14': { solid: 3.07, stranded: 3.14, aluminumSolid: 5.06, aluminum: 5.17 },
  '12': { solid: 1.93, stranded: 1.98, aluminumSolid: 3.18, aluminum: 3.25 },
  '10': { solid: 1.21, stranded: 1.24, aluminumSolid: 2.0, aluminum: 2.04 },
  '8': { solid: 0.764, stranded: 0.778, aluminumSolid: 1.26, aluminum: 1.28 },
  '6': { stranded: 0.491, aluminum: 0.808 },
  '4': { stranded: 0.308, aluminum: 0.508 },
  '3': { stranded: 0.245, aluminum: 0.403 },
  '2': { stranded: 0.194, aluminum: 0.319 },
  '1': { stranded: 0.154, aluminum: 0.253 },
  '1/0': { stranded: 0.122, aluminum: 0.201 },
  '2/0': { stranded: 0.0967, aluminum: 0.159 },
  '3/0': { stranded: 0.0766, aluminum: 0.126 },
  '4/0': { stranded: 0.0608, aluminum: 0.1 },
} satisfies Record<string, Row>
export type Gauge = keyof typeof american

/** IEC 60228, plain conductors, Ω/km at 20 °C: copper of class 1 and 2, of class 5 (flexible), aluminum 1 and 2. */
const metric = {
  '1.5': { copper: 12.1, flexible: 13.3 },
  '2.5': { copper: 7.41, flexible: 7.98 },
  '4': { copper: 4.61, flexible: 4.95 },
  '6': { copper: 3.08, flexible: 3.3 },
  '10': { copper: 1.83, flexible: 1.91, aluminum: 3.08 },
  '16': { copper: 1.15, flexible: 1.21, aluminum: 1.91 },
  '25': { copper: 0.727, flexible: 0.78, aluminum: 1.2 },
} satisfies Record<string, { copper: number; flexible: number; aluminum?: number }>
export type SquareMillimeters = keyof typeof metric

/** Per °C from 75 °C: NEC chapter 9 table 8, note 2. */
const americanRise: Record<Metal, number> = { copper: 0.00323, aluminum: 0.0033 }
/** Per °C from 20 °C: IEC 60287-1-1 table 1. */
const metricRise: Record<Metal, number> = { copper: 0.00393, aluminum: 0.00403 }

export type AmericanWire = {
  /** AWG. */
  gauge: Gauge
  metal: Metal
  /** One solid wire, as in building cable up to 10 AWG, or strands. */
  solid: boolean
  feet: number
  /** Of the conductor itself, which is warmer than the air where it carries much. */
  celsius: number
}

/**
 * Ohms of one conductor, one way.
 * @throws RangeError for a solid conductor over 8 AWG: the table has none
 */
export function americanWireOhms({ gauge, metal, solid, feet, celsius }: AmericanWire): number {
  const row: Row = american[gauge]
  const [one, many] = metal === 'copper' ? [row.solid, row.stranded] : [row.aluminumSolid, row.aluminum]
  const perThousand = solid ? one : many
  if (perThousand === undefined)
    throw new RangeError(
      `NEC chapter 9 table 8 has no ${solid ? 'solid' : 'stranded'} ${metal} of ${gauge} AWG`,
    )
  return (perThousand / 1000) * feet * (1 + americanRise[metal] * (celsius - 75))
}

export type MetricWire = {
  mm2: SquareMillimeters
  metal: Metal
  /** Class 5: the cords and leads of portable sources. */
  flexible: boolean
  meters: number
  /** Of the conductor itself. */
  celsius: number
}

/**
 * Ohms of one conductor, one way, at the most the standard lets it have.
 * @throws RangeError for what the standard has no row for: thin or flexible aluminum
 */
export function metricWireOhms({ mm2, metal, flexible, meters, celsius }: MetricWire): number {
  const row: { copper: number; flexible: number; aluminum?: number } = metric[mm2]
  const perKilometer = metal === 'copper' ? (flexible ? row.flexible : row.copper) : row.aluminum
  if (perKilometer === undefined || (flexible && metal === 'aluminum'))
    throw new RangeError(`IEC 60228 has no ${flexible ? 'flexible ' : ''}${metal} of ${mm2} mm² here`)
  return (perKilometer / 1000) * meters * (1 + metricRise[metal] * (celsius - 20))
}
