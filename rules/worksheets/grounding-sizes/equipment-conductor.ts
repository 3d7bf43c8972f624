import { remembered, seen, whoDecides } from '../result.ts'
import type { Result } from '../result.ts'
import { written } from '../written.ts'
import { circularMils, inWords, sizeOfArea, sizes, thicker, thinner } from './conductor-sizes.ts'
import type { Size } from './conductor-sizes.ts'
import type { SizesInputs } from './grounding-sizes.ts'
import { equipmentSize, seenTo, smallConductorLimit } from './nec-tables.ts'

type Inputs = Extract<SizesInputs, { which: 'equipment' }>

/** Table 250.122, enlarged with the hot conductors, but never larger than they are. */
export function equipmentConductor(inputs: Inputs): Result {
  const { ratedAmps, metal, hot, hotMetal, upsized, hotLeast } = inputs
  const base = equipmentSize(ratedAmps, metal)
  // The form's bounds end where the table does.
  if (base === undefined) throw new RangeError(`table 250.122 ends before ${ratedAmps} A`)
  const ratio = upsized === 'yes' && hotLeast ? circularMils[hot] / circularMils[hotLeast] : 1
  const enlarged = ratio > 1 ? (sizeOfArea(circularMils[base] * ratio) ?? sizes.at(-1)!) : base
  const grown = thicker(base, enlarged)
  // Only between conductors of one metal can the sizes be held against each other.
  const size = metal === hotMetal ? thinner(grown, hot) : grown
  const capped = size !== grown
  const limit = smallConductorLimit(hot, hotMetal)
  const over = limit !== undefined && ratedAmps > limit
  return {
    judgment: over ? 'fails' : 'said',
    verdict: `${inWords(size)} ${metal} or thicker.`,
    because: [
      `Behind a device of ${written(ratedAmps)} A table 250.122 wants ${inWords(base)} ${metal}.`,
      ...(ratio > 1
        ? [
            `The hot conductors were made ${written(ratio)} times as large, so the grounding conductor grows by as much (250.122(B)).`,
          ]
        : []),
      ...(capped ? ['It need never be larger than the circuit’s own conductors (250.122(A)).'] : []),
      ...(over
        ? [
            `Look at the hot conductor first: ${inWords(hot)} ${hotMetal} may have no more than ${limit} A ahead of it (240.4(D)), but for the exceptions named there.`,
          ]
        : []),
    ],
    figures: [
      { label: 'Equipment grounding conductor', value: inWords(size), unit: metal },
      { label: 'By the table alone', value: inWords(base), unit: metal },
    ],
    tables: [tableOf(ratedAmps)],
    steps: [
      {
        name: 'Table 250.122',
        formula: 'the first row whose rating is not under the device’s',
        filled: `${written(ratedAmps)} A: ${inWords(base)} ${metal}`,
      },
      ...(ratio > 1 && hotLeast
        ? [
            {
              name: 'Enlarged with the hot conductors',
              formula: 'circular mils × hot as run ÷ hot at least, then the next size',
              filled: `${written(circularMils[base], 5)} × ${written(circularMils[hot], 5)} ÷ ${written(circularMils[hotLeast], 5)} = ${written(circularMils[base] * ratio, 5)} circular mils: ${inWords(enlarged)}`,
            },
          ]
        : []),
    ],
    references: [
      ratedAmps <= seenTo
        ? seen('NEC table 250.122, 250.122(A) and (B) (2008 to 2023 editions)')
        : remembered('NEC table 250.122 above 400 A'),
      ...(over ? [seen('NEC 240.4(D)')] : []),
    ],
    assumptions: [
      'One grounding conductor for this circuit alone, as a wire. A raceway may serve as one too, by its own rules (250.118).',
    ],
    cautions: [
      {
        word: 'caution',
        text: 'The table’s size is a least. Whether it clears a fault on a long run, or on a source that gives little current, the fault-clearing worksheet tells.',
      },
      {
        word: 'notice',
        text: 'Check your local code: it may have amended these tables or be of another edition.',
      },
      whoDecides,
    ],
  }
}

const ratings = [15, 20, 60, 100, 200, 300, 400] as const
function tableOf(ratedAmps: number) {
  const rows = ratings.map((amps) => [
    `${amps}`,
    inWords(equipmentSize(amps, 'copper') as Size),
    inWords(equipmentSize(amps, 'aluminum') as Size),
  ])
  const chosen = ratings.findIndex((amps) => ratedAmps <= amps)
  return {
    title: 'Table 250.122, to 400 A',
    head: ['Device up to, A', 'Copper', 'Aluminum'],
    rows,
    ...(chosen >= 0 && { chosen }),
  }
}
