import type { Form } from './parts.ts'

export const form: Form = {
  title: 'Lost neutral',
  lead: 'Two legs share a neutral, and it opens or goes poor. What each side gets, and which side burns.',
  hasUnits: false,
  example: () => ({
    volts: '120',
    neutral: 'open',
    'loads.0.leg': '1',
    'loads.0.watts': '1200',
    'loads.1.leg': '2',
    'loads.1.watts': '100',
  }),
  groups: (values) => [
    {
      title: 'The two legs',
      parts: [
        { kind: 'number', name: 'volts', label: 'Each leg to neutral', unit: 'V' },
        {
          kind: 'choice',
          name: 'neutral',
          label: 'The shared neutral is',
          look: 'ways',
          ways: [
            { value: 'open', label: 'Open' },
            { value: 'poor', label: 'Poor' },
          ],
          brings: { poor: { neutralOhms: '1' } },
        },
        ...(values['neutral'] === 'poor'
          ? [{ kind: 'number', name: 'neutralOhms', label: 'Resistance of the neutral', unit: 'Ω' } as const]
          : []),
      ],
    },
    {
      title: 'What is switched on',
      help: 'Leave out what runs from leg to leg.',
      parts: [
        {
          kind: 'rows',
          name: 'loads',
          noun: 'Load',
          most: 16,
          blank: { leg: '1', watts: '60' },
          row: (at) => [
            { kind: 'number', name: `${at}.watts`, label: 'Nameplate', unit: 'W' },
            {
              kind: 'choice',
              name: `${at}.leg`,
              label: 'Leg',
              look: 'ways',
              ways: [
                { value: '1', label: 'Leg 1' },
                { value: '2', label: 'Leg 2' },
              ],
            },
          ],
        },
      ],
    },
  ],
}
