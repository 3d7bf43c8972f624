import type { Flat } from '../../../rules/worksheets/address.ts'
import type { FieldPart, Form } from './parts.ts'

const reading = (at: string, values: Flat): FieldPart[] => [
  { kind: 'number', name: `${at}.volts`, label: 'It showed', unit: 'V' },
  {
    kind: 'choice',
    name: `${at}.with`,
    label: 'Read with',
    look: 'ways',
    ways: [
      { value: 'meter', label: 'A meter' },
      { value: 'bulb', label: 'Test bulb', note: 'volts across it' },
    ],
    brings: {
      bulb: { [`${at}.ratedWatts`]: '60', [`${at}.ratedVolts`]: '130' },
      meter: { [`${at}.ohms`]: '10000000' },
    },
  },
  values[`${at}.with`] === 'bulb'
    ? {
        kind: 'pair',
        parts: [
          { kind: 'number', name: `${at}.ratedWatts`, label: 'Bulb', unit: 'W' },
          { kind: 'number', name: `${at}.ratedVolts`, label: 'Rated', unit: 'V' },
        ],
      }
    : {
        kind: 'number',
        name: `${at}.ohms`,
        label: 'Input resistance on AC volts',
        unit: 'Ω',
        help: 'In the meter’s data sheet: 10 MΩ for most digital ones; a low-impedance range has 3,000 to 400,000 Ω.',
        often: [
          { label: '10 MΩ', value: '10000000' },
          { label: '1 MΩ', value: '1000000' },
          { label: '400 kΩ', value: '400000' },
          { label: '3 kΩ', value: '3000' },
        ],
      },
]

export const form: Form = {
  title: 'Ghost or firm',
  lead: 'One voltage, read twice between the same two points: with a light meter and with a heavy load. A ghost falls away.',
  hasUnits: false,
  example: () => ({
    hertz: '60',
    'one.with': 'meter',
    'one.volts': '56.8',
    'one.ohms': '10000000',
    'other.with': 'meter',
    'other.volts': '0.7',
    'other.ohms': '3000',
  }),
  groups: (values) => [
    { title: 'First reading', parts: reading('one', values) },
    { title: 'Second reading', parts: reading('other', values) },
    {
      title: 'The system',
      parts: [
        {
          kind: 'number',
          name: 'hertz',
          label: 'Frequency',
          unit: 'Hz',
          often: [
            { label: '60', value: '60' },
            { label: '50', value: '50' },
          ],
        },
      ],
    },
  ],
}
