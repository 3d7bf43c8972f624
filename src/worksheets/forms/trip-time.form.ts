import type { FieldPart, Form } from './parts.ts'

export const form: Form = {
  title: 'GFCI and RCD trip time',
  lead: 'How long a GFCI or RCD may take at this current to ground, and what that means to a body in its way.',
  hasUnits: false,
  example: () => ({
    device: 'gfci',
    ratedMilliamps: '30',
    rcdKind: 'general',
    known: 'current',
    milliamps: '30',
    volts: '120',
    ohms: '1000',
  }),
  groups: (values) => {
    const hidden = values['device'] !== 'rcd'
    const rcd: FieldPart[] = [
      {
        kind: 'choice',
        name: 'ratedMilliamps',
        label: 'Rated residual current',
        look: 'select',
        ways: ['10', '30', '100', '300', '500'].map((value) => ({ value, label: `${value} mA` })),
        hidden,
      },
      {
        kind: 'choice',
        name: 'rcdKind',
        label: 'Kind',
        look: 'ways',
        ways: [
          { value: 'general', label: 'General' },
          { value: 'S', label: 'Type S', note: 'delayed' },
        ],
        hidden,
      },
    ]
    return [
      {
        title: 'The device',
        parts: [
          {
            kind: 'choice',
            name: 'device',
            label: 'Which',
            look: 'ways',
            ways: [
              { value: 'gfci', label: 'GFCI', note: 'UL 943, Class A' },
              { value: 'rcd', label: 'RCD', note: 'IEC 61008' },
            ],
          },
          ...rcd,
        ],
      },
      {
        title: 'The current to ground',
        parts: [
          {
            kind: 'choice',
            name: 'known',
            label: 'What is known',
            look: 'ways',
            ways: [
              { value: 'current', label: 'The current' },
              { value: 'path', label: 'Volts and ohms' },
            ],
          },
          ...(values['known'] === 'path'
            ? [
                {
                  kind: 'pair',
                  parts: [
                    { kind: 'number', name: 'volts', label: 'Volts to ground', unit: 'V' },
                    { kind: 'number', name: 'ohms', label: 'Whole way to ground', unit: 'Ω' },
                  ],
                } as const,
              ]
            : [{ kind: 'number', name: 'milliamps', label: 'Current', unit: 'mA' } as const]),
        ],
      },
    ]
  },
}
