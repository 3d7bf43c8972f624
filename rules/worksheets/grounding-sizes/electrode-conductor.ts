import { remembered, seen, whoDecides } from '../result.ts'
import type { Caution, Result } from '../result.ts'
import { inWords, thinner } from './conductor-sizes.ts'
import type { SizesInputs } from './grounding-sizes.ts'
import { electrodeCap, electrodeSize } from './nec-tables.ts'

type Inputs = Extract<SizesInputs, { which: 'electrode' }>

const electrodeWords = {
  rod: 'a rod, pipe or plate',
  concrete: 'a concrete-encased electrode',
  'water-or-steel': 'a metal water pipe or building steel',
} as const

const aluminumInGround: Caution = {
  word: 'warning',
  text: 'Bare aluminum may not touch masonry or earth, nor end within 18 in of the earth outdoors (NEC 250.64(A), from memory).',
}

/** Table 250.66, and the most that a rod or a concrete-encased electrode can ask for. */
export function electrodeConductor({ largest, largestMetal, metal, electrode }: Inputs): Result {
  const table = electrodeSize(largest, largestMetal, metal)
  const cap = electrodeCap(electrode, metal)
  const size = cap === undefined ? table.size : thinner(table.size, cap)
  const capped = size !== table.size
  return {
    judgment: 'said',
    verdict: `${inWords(size)} ${metal} or thicker.`,
    because: [
      `With ${inWords(largest)} ${largestMetal} as the largest ungrounded conductor table 250.66 wants ${inWords(table.size)} ${metal}.`,
      ...(cap === undefined
        ? []
        : capped
          ? [
              `To ${electrodeWords[electrode]} alone it need not be larger than ${inWords(cap)} ${metal} (250.66(${electrode === 'rod' ? 'A' : 'B'})), because the earth takes no more.`,
            ]
          : [
              `The most that ${electrodeWords[electrode]} can ask for is ${inWords(cap)} ${metal}; the table asks for less.`,
            ]),
    ],
    figures: [
      { label: 'Grounding electrode conductor', value: inWords(size), unit: metal },
      { label: 'By the table alone', value: inWords(table.size), unit: metal },
    ],
    tables: [],
    steps: [
      {
        name: 'Table 250.66',
        formula: 'the first row whose ungrounded conductor is not thinner than yours',
        filled: `${inWords(largest)} ${largestMetal}: ${inWords(table.size)} ${metal}${capped ? `, at most ${inWords(size)} to ${electrodeWords[electrode]}` : ''}`,
      },
    ],
    references: [
      table.fromMemory
        ? remembered('NEC table 250.66, its two largest rows')
        : seen('NEC table 250.66 (2008 to 2023 editions)'),
      seen('NEC 250.66(A) and (B): rods, pipes and plates; concrete-encased electrodes'),
    ],
    assumptions: [
      'The size of the largest ungrounded service-entrance conductor, or the equal area of parallel ones; for a separate source that of its own conductors.',
      'A ground ring’s conductor is no thinner than the ring itself (250.66(C)).',
    ],
    cautions: [
      ...(metal === 'aluminum' ? [aluminumInGround] : []),
      {
        word: 'caution',
        text: 'The electrode conductor holds the system at earth’s voltage. It does not clear a fault.',
      },
      {
        word: 'notice',
        text: 'Check your local code: it may have amended these tables or be of another edition.',
      },
      whoDecides,
    ],
  }
}
