import { typicalLimits } from '../../../rules/worksheets/fault-clearing/source-limit.ts'
import { flat } from '../../../rules/worksheets/address.ts'
import type { Flat } from '../../../rules/worksheets/address.ts'
import { number, pair } from './parts.ts'
import type { FieldPart } from './parts.ts'

/** What a kind of source gives into a fault to begin with. */
export const limits = (kind: keyof typeof typicalLimits): Flat => flat({ source: typicalLimits[kind] })

/** What feeds the fault. */
export function sourceParts(values: Flat): FieldPart[] {
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
