/** The way round that current would take, and where it ends when it can't come back. */
import { breakerDoes } from './breaker.ts'
import { isAtReceptacle, metalIsLive, worthTheName } from './loop-state.ts'
import type { LoopState, Metal, Run, Stretch, Wire } from './loop-state.ts'

const runTo = (state: LoopState, stretch: Stretch, to: Wire): Run | undefined =>
  state.runs.find((run) => run.stretch === stretch && run.to === to)
const runFrom = (state: LoopState, stretch: Stretch, from: Wire): Run | undefined =>
  state.runs.find((run) => run.stretch === stretch && run.from === from)

/** The conductors of the loop: out on hot, back on neutral; or, with hot on metal, back on the ground wire. */
export function wayRound(state: LoopState): { out: readonly Run[]; back: readonly Run[] } {
  const taken = (...runs: (Run | undefined)[]) => runs.filter((run) => run !== undefined)
  const out = taken(runFrom(state, 'feeder', 'hot'), runFrom(state, 'circuit', 'hot'))
  if (state.drawn === 'load') {
    const other = out.at(-1)?.to === 'neutral' ? 'hot' : 'neutral'
    const last = runTo(state, 'circuit', other)
    return { out, back: taken(last, last && runFrom(state, 'feeder', last.from)) }
  }
  if (state.touch !== undefined && state.touch.place !== 'receptacle')
    return { out: out.slice(0, 1), back: taken(runFrom(state, 'feeder', 'ground')) }
  const jumper = state.ties.some(isAtReceptacle)
  const hotOnMetal = out.at(-1)?.to === 'ground'
  const last = jumper
    ? runFrom(state, 'circuit', 'neutral')
    : hotOnMetal
      ? undefined
      : runTo(state, 'circuit', 'ground')
  return { out, back: taken(last, last && runFrom(state, 'feeder', last.from)) }
}

/** Whether a current worth the name goes round the loop. */
export const goesRound = (state: LoopState): boolean =>
  (state.drawn === 'fault' || state.load === undefined
    ? Math.max(state.breaker.sees, state.touch?.amps ?? 0)
    : state.load.amps) >= worthTheName

/** Where the loop ends: the first open conductor on the way, or the bond that is missing at its end. */
export function breakOf(state: LoopState): Run | 'bond' | undefined {
  if (goesRound(state)) return undefined
  const { out, back } = wayRound(state)
  const run = [...out, ...back].find((one) => one.state === 'open' || one.state === 'absent')
  return run ?? (state.drawn === 'fault' && state.bondMissing !== undefined ? 'bond' : undefined)
}

/** Metal that is live only until the breaker has seen its fault: the loop does its work. */
export function isBrief(state: LoopState, metal: Metal): boolean {
  if (!metalIsLive(metal) || state.touch === undefined || state.touch.amps < worthTheName) return false
  const does = breakerDoes(state.breaker)
  return does === 'soon' || does === 'at-once'
}
