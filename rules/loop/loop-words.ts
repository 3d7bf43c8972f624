/** The loop picture in words: everything it shows, for whoever can't see it and for whoever explains it. */
import { inAmps, inVolts } from './amounts.ts'
import { breakerDoes } from './breaker.ts'
import { gfciTrips, metalIsLive, worthTheName } from './loop-state.ts'
import type { LoopState, Metal, Place, Run } from './loop-state.ts'
import { breakOf, goesRound, isBrief } from './way.ts'

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

const listed = (names: readonly string[]): string =>
  names.length < 2 ? (names[0] ?? '') : `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`

const metalNames: Readonly<Record<Place, string>> = {
  source: 'the source’s case',
  panel: 'the panel’s metal',
  receptacle: 'metal of what is plugged in',
}
const capital = (words: string) => words.charAt(0).toUpperCase() + words.slice(1)

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

/** What the circuit's wires carry out on one and don't bring back on the other, A: what a GFCI looks at. */
function residual(state: LoopState): number {
  const live = state.runs.filter((run) => run.stretch === 'circuit' && run.from !== 'ground')
  return Math.abs(live.reduce((sum, run) => sum + (run.toward === 'load' ? run.amps : -run.amps), 0))
}

/** Less than this part of a current is the rounding of its parts, no leakage. */
const sameWithin = 0.0005

function verdictOf(state: LoopState): string {
  const does = breakerDoes(state.breaker)
  const source = state.limited ? 'or the source shuts down' : ''
  if (state.drawn === 'fault') {
    const on = state.metal.some((metal) => metalIsLive(metal) && !isBrief(state, metal))
    if (!goesRound(state))
      return on
        ? 'The breaker does not trip: no way back for the current'
        : 'Hot touches metal, and no current comes of it'
    if (does === 'stays') return `The breaker does not trip: ${inAmps(state.breaker.sees)} is too little`
    if (does === 'late') return 'The breaker trips late, if at all'
    return state.limited ? `The breaker likely trips, ${source}` : 'The breaker likely trips at once'
  }
  if (state.touch !== undefined || state.metal.some(metalIsLive)) return 'Metal is live, and nothing trips'
  if (!goesRound(state)) return 'No current: the loop is open'
  if (does === 'late') return 'More than the breaker carries for long'
  if (does !== 'stays')
    return state.limited ? `The breaker likely trips, ${source}` : 'The breaker likely trips at once'
  const strays = state.runs.some((run) => run.from === 'ground' && run.amps >= worthTheName)
  if (strays) return 'Part of the current comes back on the ground wire'
  if (
    state.house.length > 1 &&
    state.runs.some((run) => run.stretch === 'feeder' && run.from === 'neutral' && run.state === 'open')
  )
    return 'Two legs in series: one gets too much, the other too little'
  return 'Out on hot, back on neutral, none on ground'
}

const wireNames: Readonly<Record<Run['from'], string>> = {
  hot: 'hot',
  leg2: 'leg 2',
  neutral: 'neutral',
  ground: 'the ground wire',
}
const stretchNames = (state: LoopState, run: Run): string =>
  run.stretch === 'feeder'
    ? 'from source to panel'
    : state.places.includes('panel')
      ? 'from panel to receptacle'
      : 'from the source to the receptacle'

/** Currents of the circuit, then of the feeder where they differ. */
function currentsOf(state: LoopState): string[] {
  const stretches = state.places.includes('panel') ? (['circuit', 'feeder'] as const) : (['circuit'] as const)
  const said = stretches.map((stretch) => {
    const runs = state.runs.filter((run) => run.stretch === stretch && run.amps >= worthTheName)
    const where =
      stretch === 'feeder'
        ? 'Between source and panel'
        : state.places.includes('panel')
          ? 'Between panel and receptacle'
          : 'Between source and receptacle'
    if (runs.length === 0) return { where, key: '', text: 'no current worth the name' }
    const text = listed(
      runs.map(
        (run) => `${inAmps(run.amps)} ${run.toward === 'load' ? 'out on' : 'back on'} ${wireNames[run.from]}`,
      ),
    )
    return { where, key: text, text }
  })
  const [circuit, feeder] = said
  if (circuit === undefined) return []
  if (feeder === undefined) return [`${circuit.where}: ${circuit.text}.`]
  if (feeder.text === circuit.text)
    return [
      circuit.key === '' ? 'No current worth the name anywhere.' : `${capital(circuit.text)}, all the way.`,
    ]
  return [`${circuit.where}: ${circuit.text}.`, `${feeder.where}: ${feeder.text}.`]
}

/** What is open, missing, poor, swapped or joined that should not be. */
function faultsOf(state: LoopState): string[] {
  const says: string[] = []
  const broken = breakOf(state)
  const long = state.runs.filter((run) => run.state === 'poor').length > 1
  for (const run of state.runs) {
    const ends = run === broken ? '; the loop ends there' : ''
    if (run.state === 'absent') says.push(`No ground wire ${stretchNames(state, run)}${ends}.`)
    if (run.state === 'open')
      says.push(
        run.openAt === 'source'
          ? `The source’s ground pin is joined to nothing${ends}.`
          : `${capital(wireNames[run.from])} is open ${stretchNames(state, run)}${ends}.`,
      )
    if (run.state === 'poor' && !long)
      says.push(
        `A poor joint in ${wireNames[run.from]} ${stretchNames(state, run)}: ${Number(run.addedOhms.toPrecision(2))} Ω${run.amps >= worthTheName ? `, which take ${inVolts(run.addedOhms * run.amps)}` : ''}.`,
      )
    if (run.from !== run.to)
      says.push(`${capital(wireNames[run.from])} lands on the ${run.to} terminal of the receptacle.`)
  }
  if (long) {
    const run = state.runs.find((one) => one.state === 'poor' && one.amps >= worthTheName)
    const takes =
      run === undefined ? '' : ` At ${inAmps(run.amps)} each takes ${inVolts(run.addedOhms * run.amps)}.`
    says.push(`The run has too many ohms in every wire.${takes}`)
  }
  if (state.bondMissing !== undefined && !state.ties.some((tie) => tie.kind === 'middle'))
    says.push(`No bond joins neutral to ground${broken === 'bond' ? '; the loop ends there' : ''}.`)
  for (const tie of state.ties) {
    const carries = tie.amps >= worthTheName ? ` It carries ${inAmps(tie.amps)}.` : ''
    if (tie.kind === 'middle')
      says.push(
        `The case is tied to the middle of the output: hot and neutral both stand at half the volts to metal. Such an output gets no bond, ever.${carries}`,
      )
    if (tie.kind === 'second')
      says.push(`A second bond joins neutral and ground at the ${tie.place}.${carries}`)
    if (tie.kind === 'jumper') says.push(`Neutral and ground are joined at the receptacle.${carries}`)
    if (tie.kind === 'wanted' && (state.ties.length > 1 || tie.amps >= worthTheName))
      says.push(`The bond is at the ${tie.place}.${carries}`)
  }
  return says
}

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

function breakerSays(state: LoopState): string {
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
function gfciSays(state: LoopState): string | undefined {
  if (!state.limited && breakerDoes(state.breaker) === 'at-once') return undefined
  const lost = residual(state)
  const most = Math.max(...state.runs.filter((run) => run.stretch === 'circuit').map((run) => run.amps))
  const jumper = state.ties.some((tie) => tie.kind === 'jumper')
  if (lost >= gfciTrips && lost >= most * sameWithin)
    return `A GFCI at the head of this circuit misses ${inAmps(lost)} on the way back and likely trips.`
  return state.drawn === 'fault' && jumper && goesRound(state)
    ? 'A GFCI misses nothing here: the fault comes back on neutral.'
    : undefined
}

function earthSays(state: LoopState): string | undefined {
  const carrying = state.rods.filter((rod) => rod.amps >= worthTheName)
  if (carrying.length > 0)
    return `${carrying.length > 1 ? 'The rods pass' : 'The rod passes'} ${inAmps(Math.max(...carrying.map((rod) => rod.amps)))} through the ground${state.drawn === 'fault' ? ': too little for a breaker' : ''}.`
  return state.rods.length > 0 && breakOf(state) === 'bond'
    ? 'The ground rod changes nothing: without a bond, earth leads nowhere.'
    : undefined
}

/** Brief volts while a good loop is being cut off. */
function briefSays(state: LoopState): string | undefined {
  const brief = state.metal.filter((metal) => isBrief(state, metal))
  if (brief.length === 0) return undefined
  const worst = brief.reduce((a, b) => (b.volts > a.volts ? b : a))
  return `Until it is cut off, ${metalNames[worst.place]} stands at up to ${inVolts(worst.volts)} to earth.`
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
  const title = half === undefined ? verdictOf(state) : 'A bond here shorts half of the output'
  const says = [
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
