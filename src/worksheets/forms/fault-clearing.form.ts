import { typicalLimits } from '../../../rules/worksheets/fault-clearing/source-limit.ts'
import { gGRatings } from '../../../rules/worksheets/protective-devices/fuses.ts'
import { typicalMagnetic } from '../../../rules/worksheets/protective-devices/ul-489.ts'
import { flat } from '../../../rules/worksheets/address.ts'
import type { Flat } from '../../../rules/worksheets/address.ts'
import type { Units } from '../../../rules/worksheets/wire.ts'
import { buildPart, celsiusPart, lengthPart, metalPart, sizePart } from './parts.ts'
import type { ChoicePart, FieldPart, Form, Group, NumberPart } from './parts.ts'

const number = (name: string, label: string, unit: string, help?: string): NumberPart => ({
  kind: 'number',
  name,
  label,
  unit,
  ...(help !== undefined && { help }),
})
const pair = (one: NumberPart | ChoicePart, other: NumberPart | ChoicePart): FieldPart => ({
  kind: 'pair',
  parts: [one, other],
})
const limits = (kind: keyof typeof typicalLimits): Flat => flat({ source: typicalLimits[kind] })

function sourceParts(values: Flat): FieldPart[] {
  const kind = values['source.kind']
  const head: FieldPart[] = [
    {
      kind: 'choice',
      name: 'source.kind',
      label: 'Source',
      look: 'ways',
      ways: [
        { value: 'inverter', label: 'Inverter' },
        { value: 'generator', label: 'Generator' },
        { value: 'utility', label: 'Utility' },
      ],
      brings: { inverter: limits('inverter'), generator: limits('generator') },
    },
    {
      ...number('volts', 'Volts to ground', 'V'),
      often: [
        { label: '120', value: '120' },
        { label: '230', value: '230' },
      ],
    },
  ]
  if (kind === 'utility')
    return [
      ...head,
      number(
        'source.shortCircuitAmps',
        'Short-circuit current, line to neutral',
        'A',
        'From the utility, or measured with a loop tester. Where the panel is fed from far away, a few hundred.',
      ),
    ]
  return [
    ...head,
    pair(
      number('source.ratedWatts', 'Rated power', 'W'),
      number('source.ratedVolts', 'At', 'V', '240 where it feeds two legs of 120'),
    ),
    pair(
      number('source.timesLeast', 'In a fault, at least', '×', 'times its rated current'),
      number('source.timesMost', 'At most', '×', 'from its instructions'),
    ),
    pair(number('source.secondsLeast', 'For at least', 's'), number('source.secondsMost', 'At most', 's')),
    {
      kind: 'choice',
      name: 'source.then',
      label: 'And then',
      look: 'ways',
      ways: [
        { value: 'stops', label: kind === 'inverter' ? 'Shuts down' : 'Loses its field' },
        { value: 'holds', label: 'Goes on with less' },
      ],
      brings: { holds: { 'source.thenTimes': '1' } },
    },
    ...(values['source.then'] === 'holds'
      ? [
          number(
            'source.thenTimes',
            'It goes on with',
            '×',
            'times its rated current, for as long as the fault stands',
          ),
        ]
      : []),
  ]
}

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

function deviceParts(values: Flat): FieldPart[] {
  const kind = values['device.kind']
  const device: ChoicePart = {
    kind: 'choice',
    name: 'device.kind',
    label: 'Breaker or fuse',
    look: 'select',
    ways: [
      { value: 'ul489', label: 'Breaker, UL 489' },
      { value: 'iec60898', label: 'Breaker, IEC 60898' },
      { value: 'ul248', label: 'Fuse, UL 248' },
      { value: 'gG', label: 'Fuse, IEC 60269 gG' },
    ],
    brings: {
      ul489: {
        'device.amps': '20',
        'device.magneticLeast': String(typicalMagnetic.least),
        'device.magneticMost': String(typicalMagnetic.most),
      },
      iec60898: { 'device.amps': '16', 'device.curve': 'B' },
      ul248: { 'device.amps': '20' },
      gG: { 'device.rating': '16' },
    },
  }
  if (kind === 'gG')
    return [
      device,
      {
        kind: 'choice',
        name: 'device.rating',
        label: 'Rating',
        look: 'select',
        ways: gGRatings.map((value) => ({ value, label: `${value} A` })),
      },
    ]
  const amps = number('device.amps', 'Rating', 'A')
  if (kind === 'iec60898')
    return [
      device,
      amps,
      {
        kind: 'choice',
        name: 'device.curve',
        label: 'Type',
        look: 'ways',
        ways: ['B', 'C', 'D'].map((value) => ({ value, label: value })),
      },
    ]
  if (kind === 'ul248') return [device, amps]
  return [
    device,
    amps,
    pair(
      number('device.magneticLeast', 'Trips at once from', '×', 'times its rating; 5 to 10 is typical'),
      number('device.magneticMost', 'Surely from', '×', 'from its time-current curve'),
    ),
  ]
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
