import { typicalMagnetic } from '../../../rules/worksheets/protective-devices/ul-489.ts'
import type { Flat } from '../../../rules/worksheets/address.ts'
import type { Units } from '../../../rules/worksheets/wire.ts'
import { deviceParts } from './fault-device.ts'
import { limits, sourceParts } from './fault-source.ts'
import { buildPart, celsiusPart, lengthPart, metalPart, number, pair, sizePart } from './parts.ts'
import type { ChoicePart, FieldPart, Form, Group } from './parts.ts'

const bond: ChoicePart = {
  kind: 'choice',
  name: 'bond',
  label: 'Where neutral meets ground',
  look: 'list',
  ways: [
    { value: 'panel', label: 'In the panel' },
    { value: 'source', label: 'In the source', note: 'a grounding conductor runs to the panel' },
    { value: 'rods', label: 'In the source, rods only', note: 'no grounding conductor between' },
    { value: 'none', label: 'Nowhere', note: 'floating' },
  ],
}

const leakage: ChoicePart = {
  kind: 'choice',
  name: 'leakage',
  label: 'On this circuit',
  look: 'ways',
  ways: [
    { value: 'none', label: 'Neither' },
    { value: 'gfci', label: 'GFCI' },
    { value: 'rcd', label: 'RCD, 30 mA' },
  ],
}

const wires = (of: 'feeder' | 'branch', values: Flat, units: Units): FieldPart[] => {
  const hidden = of === 'feeder' && values['feeder.length']?.trim() === '0'
  const length = lengthPart(
    `${of}.length`,
    'Length, one way',
    units,
    of === 'feeder' ? '0 where it is plugged into the source.' : undefined,
  )
  const size = (name: string, label: string) => ({ ...sizePart(`${of}.${name}`, label, units), hidden })
  const ground = size('groundSize', 'Ground')
  const hot = size('size', 'Hot')
  return [
    ...(of === 'feeder'
      ? [length, hot, pair(size('neutralSize', 'Neutral'), ground)]
      : [length, pair(hot, ground)]),
    { ...metalPart(`${of}.metal`), hidden },
    { ...buildPart(`${of}.build`), hidden },
  ]
}

export const form: Form = {
  title: 'What clears a fault',
  lead: 'A hot wire touches grounded metal. Does the breaker trip, does something else end it, or does the metal stay live?',
  hasUnits: true,
  example: (units) => ({
    volts: units === 'american' ? '120' : '230',
    'source.kind': 'inverter',
    'source.ratedWatts': '3000',
    'source.ratedVolts': units === 'american' ? '120' : '230',
    ...limits('inverter'),
    bond: 'panel',
    'feeder.length': units === 'american' ? '30' : '10',
    'feeder.size': units === 'american' ? '6' : '16',
    'feeder.neutralSize': units === 'american' ? '6' : '16',
    'feeder.groundSize': units === 'american' ? '10' : '16',
    'feeder.metal': 'copper',
    'feeder.build': 'cable',
    'branch.length': units === 'american' ? '50' : '15',
    'branch.size': units === 'american' ? '12' : '2.5',
    'branch.groundSize': units === 'american' ? '12' : '2.5',
    'branch.metal': 'copper',
    'branch.build': 'cable',
    ...(units === 'american'
      ? {
          'device.kind': 'ul489',
          'device.amps': '20',
          'device.magneticLeast': String(typicalMagnetic.least),
          'device.magneticMost': String(typicalMagnetic.most),
        }
      : { 'device.kind': 'iec60898', 'device.amps': '16', 'device.curve': 'B' }),
    leakage: 'none',
    celsius: '75',
    contactOhms: '0',
    'rods.panelOhms': '25',
    'rods.sourceOhms': '25',
  }),
  groups: (values, units): Group[] => [
    { title: 'What feeds it', parts: sourceParts(values) },
    { title: 'The bond', parts: [bond] },
    { title: 'Breaker', parts: [...deviceParts(values), leakage] },
    { title: 'Source to panel', parts: wires('feeder', values, units) },
    { title: 'Panel to the fault', parts: wires('branch', values, units) },
    {
      title: 'Also counts',
      parts: [
        celsiusPart,
        number('contactOhms', 'Resistance of the fault itself', 'Ω', '0 for metal on metal.'),
        pair(
          number('rods.panelOhms', 'Rod at the panel', 'Ω', 'measured'),
          number('rods.sourceOhms', 'Rod at the source', 'Ω', '25 is a guess'),
        ),
      ],
    },
  ],
}
