import * as z from 'zod/mini'
import { bodyReferences, heartMilliamps, zoneOf, zoneWords } from '../body.ts'
import { mend, oneOf, quantity } from '../quantity.ts'
import { whoDecides } from '../result.ts'
import type { Result, Table } from '../result.ts'
import { inTime, written } from '../written.ts'
import { gfciLongest, gfciMilliamps, gfciReference } from './ul-943.ts'
import { fiveTimes, rcdReferences, rcdTimes } from './iec-61008.ts'

/** What the trip-time worksheet asks: the device, and the current that leaves the circuit, typed or from volts and ohms. */
export const LeakageInputs = z
  .object({
    device: oneOf(['gfci', 'rcd']),
    /** Of an RCD: rated residual current, mA, and its kind. */
    ratedMilliamps: oneOf(['10', '30', '100', '300', '500']),
    rcdKind: oneOf(['general', 'S']),
    known: oneOf(['current', 'path']),
    milliamps: z.optional(quantity('milliamps', 0.1, 100_000)),
    volts: z.optional(quantity('the volts to ground', 1, 1000)),
    ohms: z.optional(quantity('ohms of the whole way to ground', 0.01, 10_000_000)),
  })
  .check((payload) => {
    const { known, milliamps, volts, ohms, device, rcdKind, ratedMilliamps } = payload.value
    if (known === 'current' && milliamps === undefined) mend(payload, ['milliamps'], 'Type milliamps.')
    if (known === 'path' && volts === undefined) mend(payload, ['volts'], 'Type the volts to ground.')
    if (known === 'path' && ohms === undefined)
      mend(payload, ['ohms'], 'Type ohms of the whole way to ground.')
    if (device === 'rcd' && rcdKind === 'S' && Number(ratedMilliamps) <= 30)
      mend(payload, ['rcdKind'], 'Type S exists above 30 mA only.')
  })
export type LeakageInputs = z.infer<typeof LeakageInputs>

/** Rows of the table for a GFCI, mA. */
const someMilliamps = [6, 10, 20, 30, 60, 100, 120, 200, 264]

type Answer = { from: number; to: number; mustNot: number; must: number }

function timesOf({ device, ratedMilliamps, rcdKind }: LeakageInputs, milliamps: number): Answer {
  if (device === 'gfci') {
    const { mustNotUnder, mustFrom } = gfciMilliamps
    return {
      from: milliamps < mustNotUnder ? Infinity : 0,
      to: gfciLongest(milliamps),
      mustNot: mustNotUnder,
      must: mustFrom,
    }
  }
  const rated = Number(ratedMilliamps)
  const { fromSeconds, toSeconds } = rcdTimes(milliamps, rated, rcdKind)
  return { from: fromSeconds, to: toSeconds, mustNot: rated / 2, must: rated }
}

function tableOf(inputs: LeakageInputs): Table {
  const rated = Number(inputs.ratedMilliamps)
  const currents =
    inputs.device === 'gfci' ? someMilliamps : [rated, 2 * rated, fiveTimes(rated), 2 * fiveTimes(rated)]
  return {
    title: 'Longest time, by current',
    head: ['Current, mA', 'Trips within', 'Heart’s line c1 for that time, mA'],
    rows: currents.map((milliamps) => {
      const { to } = timesOf(inputs, milliamps)
      return [written(milliamps), inTime(to), written(heartMilliamps(to), 2)]
    }),
  }
}

/** How long a GFCI or RCD may take with this current, and what that does to a body it flows through. */
export function leakageTrip(inputs: LeakageInputs): Result {
  const { device, known } = inputs
  const milliamps =
    known === 'current'
      ? (inputs.milliamps ?? Number.NaN)
      : (1000 * (inputs.volts ?? Number.NaN)) / (inputs.ohms ?? 1)
  const { from, to, mustNot, must } = timesOf(inputs, milliamps)
  const name = device === 'gfci' ? 'GFCI' : 'RCD'
  const trips = to < Infinity
  const zone = zoneOf(milliamps, to)
  const verdict = trips
    ? `The ${name} trips within ${inTime(to)}.`
    : from === Infinity
      ? `The ${name} stays on: it must not trip on so little.`
      : `The ${name} may trip or stay on.`
  return {
    judgment: trips ? 'holds' : from === Infinity ? 'said' : 'depends',
    verdict,
    because: [
      trips
        ? from > 0
          ? `At ${written(milliamps)} mA it waits at least ${inTime(from)}, so that one behind it can go first.`
          : 'That is the longest its standard allows; most are quicker.'
        : `It must not trip ${device === 'gfci' ? 'under' : 'up to'} ${written(mustNot)} mA and must from ${written(must)} mA; between them either is in order.`,
      `${written(milliamps)} mA through a body ${trips ? `for ${inTime(to)}` : 'for as long as it is held'}: ${zoneWords[zone]}.`,
    ],
    figures: [
      { label: 'Current to ground', value: written(milliamps), unit: 'mA' },
      { label: 'Longest time to trip', value: trips ? inTime(to) : 'none promised', unit: '' },
      { label: 'Must trip from', value: written(must), unit: 'mA' },
    ],
    tables: [tableOf(inputs)],
    steps: [
      ...(known === 'path'
        ? [
            {
              name: 'Current to ground',
              formula: 'I = V ÷ R',
              filled: `I = ${written(inputs.volts ?? Number.NaN)} V ÷ ${written(inputs.ohms ?? Number.NaN)} Ω = ${written(milliamps)} mA`,
            },
          ]
        : []),
      device === 'gfci'
        ? {
            name: 'Longest time',
            formula: 'T = (20 ÷ I)^1.43, I in mA from 6 to 264',
            filled: trips
              ? `T = (20 ÷ ${written(Math.min(264, milliamps))})^1.43 = ${written(to)} s`
              : `${written(milliamps)} mA is under 6 mA`,
          }
        : {
            name: 'Multiple of its rating',
            formula: 'I ÷ IΔn, then the time of 1, 2 or 5 times',
            filled: `${written(milliamps)} mA ÷ ${inputs.ratedMilliamps} mA = ${written(milliamps / Number(inputs.ratedMilliamps))}`,
          },
    ],
    references: [...(device === 'gfci' ? [gfciReference] : rcdReferences), ...bodyReferences],
    assumptions: [
      'The device works, has its voltage, and the current returns outside it: neutral must be bonded to ground on the source’s side of it.',
      ...(device === 'rcd' && Number(inputs.ratedMilliamps) <= 30
        ? [
            'Up to 30 mA the standard lets 0.25 A stand for five times the rating, so 0.04 s counts from there.',
          ]
        : []),
      ...(device === 'rcd' ? ['Between two currents of the table the time of the smaller one counts.'] : []),
    ],
    cautions: [
      {
        word: 'warning',
        text: `A ${name} does not keep anyone from being shocked, only from being shocked for long. Between hot and neutral it does nothing.`,
      },
      {
        word: 'caution',
        text: 'Its own test button proves that it trips, not that there is a bond or a grounding conductor.',
      },
      whoDecides,
    ],
  }
}
