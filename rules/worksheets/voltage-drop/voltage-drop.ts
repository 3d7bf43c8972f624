import * as z from 'zod/mini'
import { mend, oneOf, quantity, rows } from '../quantity.ts'
import { remembered, seen, whoDecides } from '../result.ts'
import type { Reference, Result } from '../result.ts'
import { lengthUnit, noSuchWire, Units, wireReferences, wireSize } from '../wire.ts'
import { written } from '../written.ts'
import { adviceOn } from './advice.ts'
import { Run, runOhms } from './run.ts'
import type { RunOhms } from './run.ts'

/** What the voltage-drop worksheet asks. The current of every run goes out on one conductor and back on another. */
export const DropInputs = z
  .object({
    units: Units,
    current: oneOf(['ac', 'dc']),
    /** Between the two conductors at the source: 120, or 240 leg to leg, or a battery's. */
    volts: quantity('the volts at the source', 6, 1000),
    /** Of the load; 1 for DC and for heat. */
    powerFactor: quantity('the power factor', 0.1, 1),
    celsius: quantity('the temperature of the wires in °C', -40, 150),
    runs: rows(Run, 'a run', 8),
  })
  .check((payload) => {
    const { units, runs } = payload.value
    runs.forEach((run, i) => {
      const wrong = noSuchWire({ ...run, units })
      if (wrong !== undefined) mend(payload, ['runs', i, 'size'], wrong)
    })
  })
export type DropInputs = z.infer<typeof DropInputs>

/** Up to these volts a circuit is taken to run from hot to neutral, not from leg to leg. */
const mostToNeutral = { american: 140, metric: 260 } as const

/** Volts lost in a run: 2 · I · (R·cos φ + X·sin φ). */
export const dropOf = (amps: number, { resistance, reactance }: RunOhms, powerFactor: number): number =>
  2 * amps * (resistance * powerFactor + reactance * Math.sqrt(1 - powerFactor ** 2))

/** Volts lost along the runs one after the other, and what the NEC advises. */
export function voltageDrop(inputs: DropInputs): Result {
  const { units, volts, celsius, current, runs } = inputs
  const powerFactor = current === 'dc' ? 1 : inputs.powerFactor
  const each = runs.map((run) => {
    const ohms = runOhms(run, units, celsius, current)
    if (ohms === undefined) throw new RangeError(`no ohms for ${run.size}`)
    return { run, ohms, drop: dropOf(run.amps, ohms, powerFactor) }
  })
  const total = each.reduce((sum, { drop }) => sum + drop, 0)
  const percent = (100 * total) / volts
  const worst = Math.max(...each.map(({ drop }) => (100 * drop) / volts))
  const advice = adviceOn(units, percent, worst, runs.length)
  const left = volts - total
  const broken = left <= 0
  return {
    judgment: broken ? 'fails' : advice.kept ? 'holds' : 'depends',
    verdict: broken
      ? 'These wires can’t carry that current: it would take more than all the voltage.'
      : `${written(total)} V lost, ${written(percent)} %: ${written(left)} V are left at the load.`,
    because: [
      advice.sentence,
      'Such drop is no danger by itself. Motors run hot and inverters shut down on it, and a poor joint looks the same: compare with a measurement.',
    ],
    figures: [
      { label: 'Lost', value: written(total), unit: 'V' },
      { label: 'Of the source’s voltage', value: written(percent), unit: '%' },
      { label: 'Left at the load', value: broken ? 'none' : written(left), unit: broken ? '' : 'V' },
      ...(current === 'ac' && !broken && volts <= mostToNeutral[units]
        ? [
            {
              label: 'Neutral–ground at the load',
              value: written(total / 2),
              unit: 'V',
              note: 'half of it, on a circuit of hot and neutral of one size, bonded once at the source',
            },
          ]
        : []),
    ],
    tables:
      runs.length > 1
        ? [
            {
              title: 'Run by run',
              head: ['Run', 'Wire', 'Current, A', 'Lost, V', 'Of the source, %', 'Volts at its end'],
              rows: each.map(({ run, drop }, i) => [
                `${i + 1}`,
                `${wireSize(units, run.size)} ${run.metal}, ${written(run.length)} ${lengthUnit(units)}`,
                written(run.amps),
                written(drop),
                written((100 * drop) / volts),
                written(volts - each.slice(0, i + 1).reduce((sum, one) => sum + one.drop, 0)),
              ]),
            },
          ]
        : [],
    steps: each.map(({ run, ohms, drop }, i) => ({
      name: runs.length === 1 ? 'Voltage lost' : `Run ${i + 1}`,
      formula: current === 'dc' ? 'V = 2 × I × R' : 'V = 2 × I × (R·cos φ + X·sin φ), R and X one way',
      filled:
        current === 'dc'
          ? `V = 2 × ${written(run.amps)} A × ${written(ohms.resistance)} Ω = ${written(drop)} V`
          : `V = 2 × ${written(run.amps)} A × (${written(ohms.resistance)} Ω × ${written(powerFactor)} + ${written(ohms.reactance)} Ω × ${written(Math.sqrt(1 - powerFactor ** 2))}) = ${written(drop)} V`,
    })),
    references: dropReferences(units, each),
    assumptions: [
      'The current goes out on one conductor and back on one of the same size: a two-wire circuit, or 240 V leg to leg.',
      `Conductors at ${written(celsius)} °C, joints without resistance.`,
      ...(each.some(({ ohms, run }) => ohms.table !== 'iec' && run.raceway === 'none' && current === 'ac')
        ? ['A cable’s reactance is taken from table 9’s column for PVC.']
        : []),
      ...(current === 'ac'
        ? ['The drop along the voltage, not across it: exact to a few hundredths of a volt here.']
        : []),
    ],
    cautions: [
      {
        word: 'caution',
        text: 'Thicker hot wires need a thicker grounding conductor too, by the same ratio (NEC 250.122(B)). Ampacity and the breaker are another question.',
      },
      whoDecides,
    ],
  }
}

function dropReferences(units: Units, each: readonly { ohms: RunOhms }[]): Reference[] {
  const nine = each.some(({ ohms }) => ohms.reactance > 0 && ohms.table !== 'iec')
  const memory = each.some(({ ohms }) => ohms.fromMemory)
  return [
    ...wireReferences(units),
    ...(nine ? [seen('NEC chapter 9 table 9 (60 Hz, 75 °C)')] : []),
    ...(memory ? [remembered('NEC chapter 9 table 9, rows of 3, 1, 2/0 and 3/0 AWG')] : []),
    ...(units === 'metric'
      ? [
          remembered('IEC 60364-5-52 annex G: 0.08 Ω/km of reactance'),
          seen(
            'IEC 60364-5-52 table G.52.1: 3 % lighting and 5 % other uses on the public network; 6 and 8 % on a private one',
          ),
        ]
      : []),
    seen(
      'NEC 210.19(A) and 215.2(A), informational notes: 3 % and 5 % are advice, not a rule (numbers of the notes shift by edition)',
    ),
  ]
}
