import { buildPart, celsiusPart, lengthPart, metalPart, sizePart } from './parts.ts'
import type { Form } from './parts.ts'

export const form: Form = {
  title: 'Voltage drop',
  lead: 'How much voltage the wires use up on the way to a load, along one run or several in series.',
  hasUnits: true,
  example: (units) => ({
    current: 'ac',
    volts: units === 'american' ? '120' : '230',
    powerFactor: '1',
    celsius: '75',
    'runs.0.length': units === 'american' ? '75' : '25',
    'runs.0.size': units === 'american' ? '12' : '2.5',
    'runs.0.metal': 'copper',
    'runs.0.build': 'cable',
    'runs.0.raceway': 'none',
    'runs.0.amps': '12',
  }),
  groups: (values, units) => [
    {
      title: 'The source',
      parts: [
        {
          kind: 'choice',
          name: 'current',
          label: 'Current',
          look: 'ways',
          ways: [
            { value: 'ac', label: 'AC' },
            { value: 'dc', label: 'DC' },
          ],
        },
        {
          kind: 'number',
          name: 'volts',
          label: 'Volts at the source',
          unit: 'V',
          help: 'Between the two conductors: 240 for a load from leg to leg.',
          often: (values['current'] === 'dc' ? [12, 24, 48] : [120, 240, 230]).map((v) => ({
            label: String(v),
            value: String(v),
          })),
        },
        {
          kind: 'number',
          name: 'powerFactor',
          label: 'Power factor',
          unit: '',
          help: '1 for heat and incandescent light, about 0.8 for a motor.',
          hidden: values['current'] === 'dc',
        },
        celsiusPart,
      ],
    },
    {
      title: 'Runs, from the source on',
      parts: [
        {
          kind: 'rows',
          name: 'runs',
          noun: 'Run',
          most: 8,
          blank: {
            length: units === 'american' ? '50' : '15',
            size: units === 'american' ? '12' : '2.5',
            metal: 'copper',
            build: 'cable',
            raceway: 'none',
            amps: '10',
          },
          row: (at) => [
            {
              kind: 'pair',
              parts: [
                lengthPart(`${at}.length`, 'Length, one way', units),
                { kind: 'number', name: `${at}.amps`, label: 'Current', unit: 'A' },
              ],
            },
            sizePart(`${at}.size`, 'Size', units),
            metalPart(`${at}.metal`),
            buildPart(`${at}.build`),
            {
              kind: 'choice',
              name: `${at}.raceway`,
              label: 'Laid in',
              look: 'select',
              ways: [
                { value: 'none', label: 'Cable or cord' },
                { value: 'pvc', label: 'PVC conduit' },
                { value: 'aluminum', label: 'Aluminum conduit' },
                { value: 'steel', label: 'Steel conduit' },
              ],
              hidden: units === 'metric' || values['current'] === 'dc',
            },
          ],
        },
      ],
    },
  ],
}
