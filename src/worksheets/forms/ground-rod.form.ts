import { soils } from '../../../rules/worksheets/ground-rod/soils.ts'
import { lengthPart } from './parts.ts'
import type { Form } from './parts.ts'

export const form: Form = {
  title: 'Ground rod',
  lead: 'How many ohms one rod or several have to earth, and what that does as the way back of a fault.',
  hasUnits: true,
  example: (units) => ({
    soil: 'clay',
    length: units === 'american' ? '8' : '2.4',
    diameter: units === 'american' ? '0.625' : '16',
    number: '1',
    spacing: units === 'american' ? '8' : '2.4',
    volts: units === 'american' ? '120' : '230',
  }),
  groups: (values, units) => [
    {
      title: 'The soil',
      parts: [
        {
          kind: 'choice',
          name: 'soil',
          label: 'Kind of soil',
          look: 'list',
          ways: [
            ...Object.entries(soils).map(([value, { label, average }]) => ({
              value,
              label,
              note: `${average} Ω·m on average`,
            })),
            { value: 'own', label: 'Measured', note: 'with a four-point earth tester' },
          ],
        },
        ...(values['soil'] === 'own'
          ? [
              {
                kind: 'number',
                name: 'ohmMeters',
                label: 'Resistivity',
                unit: 'Ω·m',
                help: '100 Ω·m is 10,000 Ω·cm.',
              } as const,
            ]
          : []),
      ],
    },
    {
      title: 'The rods',
      parts: [
        lengthPart('length', 'Length in the earth', units),
        {
          kind: 'number',
          name: 'diameter',
          label: 'Diameter',
          unit: units === 'american' ? 'in' : 'mm',
          is: 'across',
          ...(units === 'american' && {
            often: [
              { label: '1/2 in', value: '0.5' },
              { label: '5/8 in', value: '0.625' },
              { label: '3/4 in', value: '0.75' },
            ],
          }),
        },
        {
          kind: 'number',
          name: 'number',
          label: 'How many',
          unit: '',
          often: [1, 2, 3, 4].map((n) => ({ label: String(n), value: String(n) })),
        },
        ...(values['number']?.trim() === '1' ? [] : [lengthPart('spacing', 'Apart', units)]),
      ],
    },
    {
      title: 'The system',
      parts: [{ kind: 'number', name: 'volts', label: 'Volts to ground', unit: 'V' }],
    },
  ],
}
