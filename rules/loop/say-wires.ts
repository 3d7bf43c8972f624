/** Currents in words, and what is open, missing, poor, swapped or joined. */
import { inAmps, inVolts } from './amounts.ts'
import { worthTheName } from './loop-state.ts'
import type { LoopState, Run } from './loop-state.ts'
import { capital, listed } from './say-names.ts'
import { breakOf } from './way.ts'

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
export function currentsOf(state: LoopState): string[] {
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
export function faultsOf(state: LoopState): string[] {
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
  if (state.leak !== undefined && state.touch === undefined)
    says.push(`${inAmps(state.leak.amps)} leaks from hot to metal in what is plugged in.`)
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
    if (tie.kind === 'astray') says.push(`Neutral touches metal in what is plugged in.${carries}`)
    if (tie.kind === 'wanted' && (state.ties.length > 1 || tie.amps >= worthTheName))
      says.push(`The bond is at the ${tie.place}.${carries}`)
  }
  return says
}
