import type { Judgment } from '../result.ts'
import { between, inTime, inTimes, written } from '../written.ts'
import type { Clearing, Fault } from './clearing.ts'
import { sourceWords } from './source-limit.ts'

/** Longer than this, s, a breaker's opening is called late: IEC 60364-4-41's longest time for any circuit (TN). */
const lateFrom = 5
const isLate = ({ clears, lasts }: Clearing): boolean => clears === 'breaker' && lasts.toSeconds > lateFrom

/** Short, for a column: "the breaker", "nothing". */
export function whatClears(
  clearing: Clearing,
  { source, leakage }: Pick<Fault, 'source' | 'leakage'>,
): string {
  switch (clearing.clears) {
    case 'breaker':
      return isLate(clearing) ? `the breaker, after up to ${inTime(clearing.lasts.toSeconds)}` : 'the breaker'
    case 'leakage':
      return leakage === 'rcd' ? 'the RCD' : 'the GFCI'
    case 'source':
      return sourceWords[source.kind].stopping
    case 'breaker-or-source':
      return `the breaker or ${sourceWords[source.kind].stopping}`
    case 'perhaps-breaker':
      return 'perhaps the breaker, else nothing'
    case 'nothing':
      return 'nothing'
  }
}

const judged: Readonly<Record<Clearing['clears'], Judgment>> = {
  breaker: 'holds',
  leakage: 'holds',
  source: 'depends',
  'breaker-or-source': 'depends',
  'perhaps-breaker': 'fails',
  nothing: 'fails',
}

/**
 * Whether the fault is cleared as it must be. Too late with more than 50 V on the metal, it is not, whatever clears it.
 * @param iecHolds whether IEC 60364-4-41's time or its 50 V are kept
 */
export function judgmentOf(clearing: Clearing, iecHolds: boolean): Judgment {
  if (!iecHolds) return 'fails'
  return isLate(clearing) ? 'depends' : judged[clearing.clears]
}

function verdictOf(clearing: Clearing, fault: Fault): string {
  if (fault.path === undefined) return 'The breaker does not trip: there is no way back for the current.'
  const leak = fault.leakage === 'rcd' ? 'RCD' : 'GFCI'
  const { name, stops } = sourceWords[fault.source.kind]
  switch (clearing.clears) {
    case 'breaker':
      return isLate(clearing)
        ? `The breaker trips late: after up to ${inTime(clearing.lasts.toSeconds)}.`
        : 'The breaker trips.'
    case 'leakage':
      return clearing.breaker.toSeconds === Infinity
        ? `The ${leak} trips; the breaker does not.`
        : `The ${leak} trips first.`
    case 'source':
      return `The breaker does not trip: ${name} ${stops} first.`
    case 'breaker-or-source':
      return `Don’t count on the breaker: ${name} may stop first.`
    case 'perhaps-breaker':
      return 'The breaker may not trip, and nothing else clears this fault.'
    case 'nothing':
      return 'The breaker does not trip, and nothing else clears this fault.'
  }
}

const capital = (words: string) => `${words[0]?.toUpperCase() ?? ''}${words.slice(1)}`

function currentWords({ amps, sourceLimits, loopOhms }: Clearing, { source, breaker }: Fault): string {
  const times = between(amps.least / breaker.ratedAmps, amps.most / breaker.ratedAmps)
  const multiple = `${times} times the rating of the ${breaker.name}`
  return sourceLimits === 'no'
    ? `${between(amps.least, amps.most)} A flow, set by the whole loop: ${multiple}.`
    : `${capital(sourceWords[source.kind].name)} gives ${between(amps.least, amps.most)} A at most, where the loop would let ${written(source.volts / loopOhms)} A through. That is ${multiple}.`
}

function breakerWords({ breaker }: Clearing, { breaker: band }: Fault): string {
  if (breaker.fromSeconds === Infinity)
    return `With that the breaker stays on: it need not open under ${written(band.opensFrom * band.ratedAmps)} A.`
  return breaker.toSeconds === Infinity
    ? `With that it opens after ${inTime(breaker.fromSeconds)} or later, or not at all.`
    : `With that it opens after ${inTimes(breaker)}.`
}

function sourceStops({ source: stopping, amps }: Clearing, { source }: Fault): string[] {
  if (source.kind === 'utility') return []
  const { name, stops } = sourceWords[source.kind]
  if (stopping.fromSeconds === Infinity)
    return [
      source.thenAmps > 0 && amps.most > source.ratedAmps
        ? `${capital(name)} does not stop: after ${inTimes(source.lasts)} it goes on with ${written(source.thenAmps)} A.`
        : `${capital(name)} does not stop: this is no more than its rated current.`,
    ]
  return [
    stopping.toSeconds === Infinity
      ? `${capital(name)} may stop from ${inTime(stopping.fromSeconds)} on, or not at all: this is more than its rated current, but not the most it gives.`
      : `${capital(name)} ${stops} after ${inTimes(stopping)}.`,
  ]
}

function leakageWords({ clears, leakage, leakageStarved }: Clearing, { leakage: device }: Fault): string[] {
  if (leakageStarved)
    return clears === 'breaker'
      ? []
      : [
          'The GFCI is not counted on: the source’s voltage falls so far in this fault that the GFCI may have no power to trip.',
        ]
  if (leakage.toSeconds === Infinity) return []
  return [`The ${device === 'rcd' ? 'RCD' : 'GFCI'} trips within ${inTime(leakage.toSeconds)}.`]
}

/** The verdict, and why: current, breaker, source, leakage device. */
export function clearingWords(clearing: Clearing, fault: Fault): { verdict: string; because: string[] } {
  const verdict = verdictOf(clearing, fault)
  if (fault.path === undefined)
    return {
      verdict,
      because: [
        'Neutral meets ground nowhere, so a hot wire that touches metal makes it live and no breaker opens. Nobody notices until a second fault, or a person, closes the way.',
      ],
    }
  return {
    verdict,
    because: [
      currentWords(clearing, fault),
      breakerWords(clearing, fault),
      ...sourceStops(clearing, fault),
      ...leakageWords(clearing, fault),
    ],
  }
}
