import { inWords, sizes } from '../../../rules/worksheets/grounding-sizes/conductor-sizes.ts'
import { metalPart } from './parts.ts'
import type { ChoicePart, FieldPart, Form } from './parts.ts'

const size = (name: string, label: string, help?: string): ChoicePart => ({
  kind: 'choice',
  name,
  label,
  look: 'select',
  ways: sizes.map((value) => ({ value, label: inWords(value) })),
  ...(help !== undefined && { help }),
})

const equipment = (upsized: boolean): FieldPart[] => [
  { kind: 'number', name: 'ratedAmps', label: 'Breaker or fuse', unit: 'A' },
  metalPart('metal', 'Grounding conductor'),
  size('hot', 'Hot conductors, as run'),
  metalPart('hotMetal', 'Hot conductors'),
  {
    kind: 'choice',
    name: 'upsized',
    label: 'Made larger than the current needs, against voltage drop?',
    look: 'ways',
    ways: [
      { value: 'no', label: 'No' },
      { value: 'yes', label: 'Yes' },
    ],
    brings: { yes: { hotLeast: '12' } },
  },
  ...(upsized ? [size('hotLeast', 'Smallest that would have carried it')] : []),
]

const electrode: FieldPart[] = [
  size(
    'largest',
    'Largest ungrounded conductor',
    'Of the service, or of the separate source; of parallel ones the sum of their areas.',
  ),
  metalPart('largestMetal', 'Its metal'),
  {
    kind: 'choice',
    name: 'electrode',
    label: 'It goes to nothing but',
    look: 'list',
    ways: [
      { value: 'rod', label: 'Rods, pipes or plates' },
      { value: 'concrete', label: 'A concrete-encased electrode' },
      { value: 'water-or-steel', label: 'Water pipe or building steel' },
    ],
  },
  metalPart('metal', 'Electrode conductor'),
]

export const form: Form = {
  title: 'Grounding conductor sizes',
  lead: 'The smallest equipment grounding conductor behind a breaker, or grounding electrode conductor of a service, by the NEC’s tables.',
  hasUnits: false,
  example: () => ({
    which: 'equipment',
    ratedAmps: '20',
    metal: 'copper',
    hot: '12',
    hotMetal: 'copper',
    upsized: 'no',
    largest: '2/0',
    largestMetal: 'copper',
    electrode: 'rod',
  }),
  groups: (values) => [
    {
      title: 'Which conductor',
      parts: [
        {
          kind: 'choice',
          name: 'which',
          label: 'Size of',
          look: 'ways',
          ways: [
            { value: 'equipment', label: 'Equipment ground', note: 'NEC 250.122' },
            { value: 'electrode', label: 'Electrode conductor', note: 'NEC 250.66' },
          ],
        },
      ],
    },
    {
      title: values['which'] === 'electrode' ? 'The service' : 'The circuit',
      parts: values['which'] === 'electrode' ? electrode : equipment(values['upsized'] === 'yes'),
    },
  ],
}
