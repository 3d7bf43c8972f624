import { gGRatings } from '../../../rules/worksheets/protective-devices/fuses.ts'
import { typicalMagnetic } from '../../../rules/worksheets/protective-devices/ul-489.ts'
import type { Flat } from '../../../rules/worksheets/address.ts'
import { number, pair } from './parts.ts'
import type { ChoicePart, FieldPart } from './parts.ts'

/** The breaker or fuse ahead of the fault. */
export function deviceParts(values: Flat): FieldPart[] {
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
