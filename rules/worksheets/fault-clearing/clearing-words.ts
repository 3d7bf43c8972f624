import type { Judgment } from '../result.ts'
import { between, inTimes, written } from '../written.ts'
import type { Clearing, Fault } from './clearing.ts'
import { sourceWords } from './source-limit.ts'

/** Short, for a column: "the breaker", "nothing". */
export function whatClears(
  { clears }: Clearing,
  { source, leakage }: Pick<Fault, 'source' | 'leakage'>,
): string {
  switch (clears) {
    case 'breaker':
      return 'the breaker'
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

export const judgmentOf: Readonly<Record<Clearing['clears'], Judgment>> = {
  breaker: 'holds',
  leakage: 'holds',
  source: 'depends',
  'breaker-or-source': 'depends',
  'perhaps-breaker': 'fails',
  nothing: 'fails',
}

function verdictOf(clearing: Clearing, fault: Fault): string {
  if (fault.path === undefined) return 'The breaker does not trip: there is no way back for the current.'
  const leak = fault.leakage === 'rcd' ? 'RCD' : 'GFCI'
  switch (clearing.clears) {
    case 'breaker':
      return 'The breaker trips.'
    case 'leakage':
      return clearing.breaker.toSeconds === Infinity
        ? `The ${leak} trips; the breaker does not.`
        : `The ${leak} trips first.`
    case 'source':
      return `The breaker does not trip: ${sourceWords[fault.source.kind].name} ${sourceWords[fault.source.kind].stops} first.`
    case 'breaker-or-source':
      return `Don’t count on the breaker: ${sourceWords[fault.source.kind].name} may stop first.`
    case 'perhaps-breaker':
      return 'The breaker may not trip, and nothing else clears this fault.'
    case 'nothing':
      return 'The breaker does not trip, and nothing else clears this fault.'
  }
}

/** The verdict, and why: current, breaker, source, leakage device. */
export function clearingWords(clearing: Clearing, fault: Fault): { verdict: string; because: string[] } {
  const { amps, breaker } = clearing
  const { source, breaker: band, path } = fault
  const verdict = verdictOf(clearing, fault)
  if (path === undefined)
    return {
      verdict,
      because: [
        'Neutral meets ground nowhere, so a hot wire that touches metal makes it live and no breaker opens. Nobody notices until a second fault, or a person, closes the way.',
      ],
    }
  const name = sourceWords[source.kind].name
  const times = between(amps.least / band.ratedAmps, amps.most / band.ratedAmps)
  const flows =
    clearing.sourceLimits === 'no'
      ? `${between(amps.least, amps.most)} A flow, set by the whole loop: ${times} times the rating of the ${band.name}.`
      : `${name[0]?.toUpperCase()}${name.slice(1)} gives ${between(amps.least, amps.most)} A at most, where the loop would let ${written(source.volts / clearing.loopOhms)} A through. That is ${times} times the rating of the ${band.name}.`
  const because = [flows]
  because.push(
    breaker.fromSeconds === Infinity
      ? `With that the breaker stays on: it need not open under ${written(band.opensFrom * band.ratedAmps)} A.`
      : `With that it opens after ${inTimes(breaker).replace('never', 'no time')}.`.replace(
          /after (.*) or later\./,
          'after $1 or later, or not at all.',
        ),
  )
  if (source.kind !== 'utility')
    because.push(
      clearing.source.fromSeconds === Infinity
        ? source.thenAmps > 0 && amps.most > source.ratedAmps
          ? `${name[0]?.toUpperCase()}${name.slice(1)} does not stop: after ${inTimes(source.lasts)} it goes on with ${written(source.thenAmps)} A.`
          : `${name[0]?.toUpperCase()}${name.slice(1)} does not stop: this is no more than its rated current.`
        : `${name[0]?.toUpperCase()}${name.slice(1)} ${sourceWords[source.kind].stops} after ${inTimes(clearing.source)}.`,
    )
  if (clearing.leakageStarved)
    because.push(
      'The GFCI is not counted on: the source’s voltage falls so far in this fault that the GFCI may have no power to trip.',
    )
  else if (clearing.leakage.toSeconds < Infinity)
    because.push(
      `The ${fault.leakage === 'rcd' ? 'RCD' : 'GFCI'} trips within ${inTimes(clearing.leakage).replace(' or less', '')}.`,
    )
  return { verdict, because }
}
