/** What would turn it off, in words: breaker, GFCI, earth. */
import { inAmps, inVolts } from './amounts.ts'
import { breakerDoes } from './breaker.ts'
import { flowsRodToRod, gfciTrips, isAtReceptacle, worthTheName } from './loop-state.ts'
import type { LoopState } from './loop-state.ts'
import { metalNames } from './say-names.ts'
import { breakOf, goesRound, isBrief } from './way.ts'

/** What the circuit's wires carry out on one and don't bring back on the other, A: what a GFCI looks at. */
function residual(state: LoopState): number {
  const live = state.runs.filter((run) => run.stretch === 'circuit' && run.from !== 'ground')
  return Math.abs(live.reduce((sum, run) => sum + (run.toward === 'load' ? run.amps : -run.amps), 0))
}

/** Less than this part of a current is the rounding of its parts, no leakage. */
const sameWithin = 0.0005

/** What the standards ask of a breaker that sees a little too much: UL 489, IEC 60898. */
function lateSays(times: number, curve: LoopState['breaker']['curve']): string {
  if (curve === 'b')
    return times < 1.45
      ? 'it may carry that for an hour'
      : times < 2.55
        ? 'it trips within the hour'
        : 'it trips within a minute or so'
  return times < 1.35
    ? 'it may carry that for hours'
    : times < 2
      ? 'it likely trips within the hour'
      : 'it likely trips within two minutes'
}

export function breakerSays(state: LoopState): string {
  const { amps, sees, curve } = state.breaker
  const does = breakerDoes(state.breaker)
  const name = `${amps} A breaker${curve === 'b' ? ' (B)' : ''}`
  const seen = `The ${name} sees ${inAmps(sees)}`
  if (does === 'stays') return `${seen} and stays on.`
  if (does === 'late') return `${seen}: ${lateSays(sees / amps, curve)}.`
  const how = does === 'soon' ? 'it likely trips within seconds, and may at once' : 'it likely trips at once'
  if (!state.limited) return `${seen}: ${how}.`
  return `The wires and the source’s windings would let ${inAmps(sees)} through the ${name}, and with that ${how}. An inverter or a small generator gives far less, typically 1.5 to 3 times its rating, and then shuts down: its instructions say.`
}

/** What a GFCI, which needs no ground, would make of it; said where the breaker alone may not turn it off. */
export function gfciSays(state: LoopState): string | undefined {
  if (!state.limited && breakerDoes(state.breaker) === 'at-once') return undefined
  const lost = residual(state)
  const most = Math.max(...state.runs.filter((run) => run.stretch === 'circuit').map((run) => run.amps))
  const jumper = state.ties.some(isAtReceptacle)
  if (lost >= gfciTrips && lost >= most * sameWithin)
    return `A GFCI at the head of this circuit misses ${inAmps(lost)} on the way back and likely trips.`
  return state.drawn === 'fault' && jumper && goesRound(state)
    ? 'A GFCI misses nothing here: the fault comes back on neutral.'
    : undefined
}

export function earthSays(state: LoopState): string | undefined {
  const carrying = state.rods.filter((rod) => rod.amps >= worthTheName)
  if (carrying.length > 0) {
    const most = inAmps(Math.max(...carrying.map((rod) => rod.amps)))
    const who = carrying.length > 1 ? 'The rods pass' : 'The rod passes'
    // What doesn't come out at another rod can only go to the utility's own earth.
    const where = flowsRodToRod(state)
      ? 'through the ground'
      : 'through the ground, to the utility’s own earth'
    return `${who} up to ${most} ${where}${state.drawn === 'fault' ? ': too little for a breaker' : ''}.`
  }
  return state.rods.length > 0 && breakOf(state) === 'bond'
    ? 'The ground rod changes nothing: without a bond, earth leads nowhere.'
    : undefined
}

/** Brief volts while a good loop is being cut off. */
export function briefSays(state: LoopState): string | undefined {
  const brief = state.metal.filter((metal) => isBrief(state, metal))
  if (brief.length === 0) return undefined
  const worst = brief.reduce((a, b) => (b.volts > a.volts ? b : a))
  return `Until it is cut off, ${metalNames[worst.place]} stands at up to ${inVolts(worst.volts)} to ${worst.is === 'joined' ? 'neutral' : 'earth'}.`
}
