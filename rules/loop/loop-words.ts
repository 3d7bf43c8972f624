/** The loop picture in words: everything it shows, for whoever can't see it and for whoever explains it. */
import { inAmps, inVolts } from './amounts.ts'
import { breakerDoes } from './breaker.ts'
import { metalIsLive, worthTheName } from './loop-state.ts'
import type { LoopState, Run } from './loop-state.ts'
import { breakerSays, briefSays, earthSays, gfciSays } from './say-breaker.ts'
import { capital, listed, metalNames } from './say-names.ts'
import { currentsOf, faultsOf } from './say-wires.ts'
import { goesRound, isBrief } from './way.ts'

export type LoopWords = {
  /** The verdict, in a few words. */
  title: string
  /** Metal that is live, the worst first. Said before anything else. */
  danger: readonly string[]
  /** Where current goes, what is open, what the breaker sees and likely does. */
  says: readonly string[]
  /** One line for readers of the picture itself. */
  spoken: string
}

/** "53 to 64 V", "118 V". */
function spanOf(volts: readonly number[]): string {
  const [low, high] = [inVolts(Math.min(...volts)), inVolts(Math.max(...volts))]
  return low === high ? high : `${low.replace(' V', '')} to ${high}`
}

/** One sentence for all metal that is live against earth, one for all that hot is on. */
function dangerOf(state: LoopState): string[] {
  const live = state.metal.filter((metal) => metalIsLive(metal) && !isBrief(state, metal))
  return (['live', 'joined'] as const).flatMap((kind): string[] => {
    const group = live.filter(({ is }) => is === kind)
    if (group.length === 0) return []
    const who = capital(listed(group.map(({ place }) => metalNames[place])))
    const are = group.length > 1 ? 'are' : 'is'
    const volts = spanOf(group.map((metal) => metal.volts))
    const person = `a person of 1000 Ω gets up to ${inAmps(Math.max(...group.map((metal) => metal.bodyAmps)))}`
    return kind === 'joined'
      ? [
          `${who} ${are} live: hot is on that metal, and nothing turns it off. Between it and neutral, at ${volts}, ${person}.`,
        ]
      : [`${who} ${are} live: ${volts} to earth, and nothing turns it off at once; ${person}.`]
  })
}

/** Off, or next to it. That proves nothing dead. */
const givesNothing = (state: LoopState): boolean => state.sourceVolts < 0.05 * state.nominal

/** Metal that stays live: nothing on the way turns it off at once. */
const staysLive = (state: LoopState): boolean =>
  state.metal.some((metal) => metalIsLive(metal) && !isBrief(state, metal))

const tripsAtOnce = (state: LoopState): string =>
  state.limited ? 'The breaker likely trips, or the source shuts down' : 'The breaker likely trips at once'

function faultVerdict(state: LoopState): string {
  if (givesNothing(state)) return 'Hot touches metal, and the source gives nothing'
  if (!goesRound(state))
    return staysLive(state)
      ? 'The breaker does not trip: no way back for the current'
      : 'Hot touches metal, and no current comes of it'
  const does = breakerDoes(state.breaker)
  if (does === 'stays') return `The breaker does not trip: ${inAmps(state.breaker.sees)} is too little`
  return does === 'late' ? 'The breaker trips late, if at all' : tripsAtOnce(state)
}

function loadVerdict(state: LoopState): string {
  if (staysLive(state)) return 'Metal is live, and nothing trips'
  if (!goesRound(state))
    return givesNothing(state) ? 'No current: the source gives nothing' : 'No current: the loop is open'
  const does = breakerDoes(state.breaker)
  if (does === 'late') return 'More than the breaker carries for long'
  if (does !== 'stays') return tripsAtOnce(state)
  if (state.runs.some((run) => run.from === 'ground' && run.amps >= worthTheName))
    return 'Part of the current comes back on the ground wire'
  const lost = (run: Run) => run.stretch === 'feeder' && run.from === 'neutral' && run.state === 'open'
  if (state.house.length > 1 && state.runs.some(lost))
    return 'Two legs in series: one gets too much, the other too little'
  return 'Out on hot, back on neutral, none on ground'
}

/** A bond on an output tied in the middle shorts half of it. */
const shortsHalf = (state: LoopState): string | undefined =>
  state.ties.some((tie) => tie.kind === 'middle') &&
  state.ties.some((tie) => tie.kind === 'wanted' || tie.kind === 'second')
    ? 'A bond on this output shorts half of it: it can destroy the source or start a fire. Never bond a balanced output.'
    : undefined

/** What a loop picture says. */
export function loopWords(state: LoopState): LoopWords {
  const half = shortsHalf(state)
  const danger = [...(half === undefined ? [] : [half]), ...dangerOf(state)]
  const title =
    half === undefined
      ? state.drawn === 'fault'
        ? faultVerdict(state)
        : loadVerdict(state)
      : 'A bond here shorts half of the output'
  const says = [
    givesNothing(state)
      ? 'A source that is off is not proved dead: absence of voltage is verified first.'
      : undefined,
    ...currentsOf(state),
    breakerSays(state),
    ...faultsOf(state),
    briefSays(state),
    gfciSays(state),
    earthSays(state),
    state.note,
  ].filter((line) => line !== undefined)
  const drawn = state.drawn === 'fault' ? 'A hot wire touches metal' : 'A load is running'
  return {
    title,
    danger,
    says,
    spoken: `The loop. ${drawn}. ${title}. ${[...danger, ...says].join(' ')}`,
  }
}
