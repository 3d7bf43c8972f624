import * as z from 'zod/mini'
import { throughPoints } from '../curve.ts'
import { count, mend, oneOf, quantity } from '../quantity.ts'
import { remembered, seen, whoDecides } from '../result.ts'
import type { Result, Step } from '../result.ts'
import { Units } from '../wire.ts'
import { written } from '../written.ts'
import { mutualOhms, oneRod, rodShortTimeAmps, rodsInLine, spacedFactors } from './dwight.ts'
import type { Rod } from './dwight.ts'
import { soilNames, soils } from './soils.ts'

/** What the ground-rod worksheet asks. Length and spacing in feet or meters, diameter in inches or millimeters. */
export const RodInputs = z
  .object({
    units: Units,
    /** `own`: `ohmMeters` was measured. */
    soil: oneOf([...soilNames, 'own']),
    ohmMeters: z.optional(quantity('the soil’s resistivity in ohm-meters', 0.5, 100_000)),
    length: quantity('the length in the earth', 0.5, 200),
    diameter: quantity('the diameter', 0.1, 200),
    number: count('how many rods', 1, 24),
    spacing: z.optional(quantity('the distance between rods', 0.3, 1000)),
    /** To ground, of the system whose fault might return through the rod. */
    volts: quantity('the volts to ground', 24, 400),
  })
  .check((payload) => {
    const { soil, ohmMeters, number, spacing, units, length, diameter } = payload.value
    if (soil === 'own' && ohmMeters === undefined)
      mend(payload, ['ohmMeters'], 'Type the measured resistivity in ohm-meters.')
    if (number > 1 && spacing === undefined) mend(payload, ['spacing'], 'Type the distance between rods.')
    if (inMeters(units, diameter, 'across') * 4 > inMeters(units, length, 'along'))
      mend(payload, ['diameter'], 'That is thicker than a rod of this length.')
  })
export type RodInputs = z.infer<typeof RodInputs>

const inMeters = (units: Units, x: number, way: 'along' | 'across'): number =>
  units === 'american' ? x * (way === 'along' ? 0.3048 : 0.0254) : way === 'along' ? x : x / 1000

/** NEC 250.53(A)(2), exception: a single rod of this or less needs no second. */
const enoughOhms = 25
/** NEC 250.53(A)(3): rods stand at least this far apart, ft. */
const leastFeetApart = 6

/** Ohms of all rods together, and how they were found. */
function together(rod: Rod, number: number, spacing: number): { ohms: number; step: Step } {
  const one = oneRod(rod)
  if (number === 2) {
    const mutual = mutualOhms(rod, spacing)
    const ohms = (one + mutual) / 2
    return {
      ohms,
      step: {
        name: 'Two rods',
        formula: 'R₂ = (R₁ + Rₘ) ÷ 2, Rₘ from Dwight’s series for two rods',
        filled: `R₂ = (${written(one)} + ${written(mutual)}) ÷ 2 = ${written(ohms)} Ω`,
      },
    }
  }
  const line = rodsInLine(rod, number, spacing)
  const factor = throughPoints(spacedFactors, number, 'straight')
  const table = (one * factor) / number
  const ohms = Math.max(line, table)
  return {
    ohms,
    step: {
      name: `${number} rods`,
      formula:
        'the larger of a straight line of rods by Dwight’s series, and R₁ × F ÷ n of IEEE 142 (F for one length apart)',
      filled: `line ${written(line)} Ω; table ${written(one)} × ${written(factor)} ÷ ${number} = ${written(table)} Ω`,
    },
  }
}

/** Ohms of one rod or several to earth, over the soil's range, and what that would do as the way back of a fault. */
export function groundRod(inputs: RodInputs): Result {
  const { units, soil, number, volts } = inputs
  const range =
    soil === 'own'
      ? {
          least: inputs.ohmMeters ?? Number.NaN,
          average: inputs.ohmMeters ?? Number.NaN,
          most: inputs.ohmMeters ?? Number.NaN,
        }
      : soils[soil]
  const length = inMeters(units, inputs.length, 'along')
  const radius = inMeters(units, inputs.diameter, 'across') / 2
  const spacing = inMeters(units, inputs.spacing ?? inputs.length, 'along')
  const rod = { ohmMeters: range.average, length, radius }
  const one = oneRod(rod)
  const all = number === 1 ? undefined : together(rod, number, spacing)
  const ohms = all?.ohms ?? one
  const [low, high] = [(ohms * range.least) / range.average, (ohms * range.most) / range.average]
  const enough = number > 1 || ohms <= enoughOhms
  const tooClose = number > 1 && spacing < leastFeetApart * 0.3048 - 1e-9
  return {
    judgment: tooClose || !enough ? 'depends' : 'said',
    verdict: `${number === 1 ? 'One rod' : `${number} rods together`}: about ${written(ohms)} Ω.`,
    because: [
      ...(soil === 'own'
        ? []
        : [
            `In this soil it can be anything from ${written(low, 2)} to ${written(high, 2)} Ω; dry and frozen ground lies at the upper end. Only a measurement at the rod tells.`,
          ]),
      number === 1
        ? enough
          ? 'A single rod of 25 Ω or less needs no second one (NEC 250.53(A)(2), exception): measured, not computed.'
          : 'A single rod over 25 Ω needs a second electrode, at least 6 ft away (NEC 250.53(A)(2) and (3)). With two there is no limit.'
        : tooClose
          ? 'Rods stand at least 6 ft (1.8 m) apart (NEC 250.53(A)(3)); closer they share one piece of ground.'
          : 'With two or more electrodes the NEC sets no limit in ohms.',
      `As the way back of a fault, ${written(ohms)} Ω alone lets ${written(volts / ohms)} A through at ${written(volts)} V. ${volts / ohms < 15 ? 'That trips no 15 A breaker.' : 'A rod is still no way back for a fault.'}`,
    ],
    figures: [
      {
        label: 'To earth',
        value: written(ohms),
        unit: 'Ω',
        note: soil === 'own' ? '' : 'in average soil of this kind',
      },
      ...(number > 1 ? [{ label: 'One rod alone', value: written(one), unit: 'Ω' }] : []),
      ...(soil === 'own'
        ? []
        : [{ label: 'Range of this soil', value: `${written(low, 2)} to ${written(high, 2)}`, unit: 'Ω' }]),
      {
        label: `Current at ${written(volts)} V`,
        value: written(volts / ohms),
        unit: 'A',
        note: 'with this rod alone in the way',
      },
      {
        label: 'Stands for 1 s',
        value: written(rodShortTimeAmps(rod, 1), 2),
        unit: 'A',
        note: 'each rod, before its soil dries',
      },
    ],
    tables: [],
    steps: [
      {
        name: 'One rod',
        formula: 'R₁ = ρ ÷ (2πL) × (ln(4L ÷ a) − 1), a is the radius',
        filled: `R₁ = ${written(range.average)} Ω·m ÷ (2π × ${written(length)} m) × (ln(4 × ${written(length)} ÷ ${written(radius)}) − 1) = ${written(one)} Ω`,
      },
      ...(all ? [all.step] : []),
    ],
    references: [
      seen('Dwight’s formula for driven rods, as in IEEE 142'),
      ...(number === 2 ? [remembered('Dwight’s two-rod series, higher terms')] : []),
      ...(number > 2 ? [seen('IEEE 142, factors for several rods one length apart')] : []),
      ...(soil === 'own' ? [] : [seen('National Bureau of Standards, Technical Report 108, soils')]),
      seen('NEC 250.53(A)(2) and (3) (2011 and later; 250.56 before)'),
      seen('NEC 250.4(A)(5): earth is no fault path'),
    ],
    assumptions: [
      'Soil alike all around and down the whole rod. Frost, drought and rock under it change the answer many times over.',
      ...(number > 2
        ? [
            'Rods in a straight line. The table is for one length apart; wider spacing is better than it says.',
          ]
        : []),
    ],
    cautions: [
      {
        word: 'warning',
        text: 'A ground rod does not make a breaker trip, however many there are. A fault needs a grounding conductor back to the source’s bond.',
      },
      { word: 'caution', text: 'Before driving a rod, have buried lines located.' },
      whoDecides,
    ],
  }
}
