import type { Figure, Step } from '../result.ts'
import { between, inTimes, written } from '../written.ts'
import type { Clearing, Fault } from './clearing.ts'
import type { FaultInputs } from './fault-clearing.ts'
import { whatClears } from './clearing-words.ts'
import { loopOhms } from './loop.ts'
import type { Touch } from './touch.ts'

/** The numbers of the answer. */
export function faultFigures(clearing: Clearing, fault: Fault, touch: Touch): Figure[] {
  const { amps } = clearing
  const flowing = amps.most > 0
  return [
    { label: 'What clears it', value: whatClears(clearing, fault), unit: '' },
    {
      label: 'Fault current',
      value: flowing ? between(amps.least, amps.most) : 'none',
      unit: flowing ? 'A' : '',
    },
    {
      label: 'Loop resistance',
      value: flowing ? written(clearing.loopOhms) : 'open',
      unit: flowing ? 'Ω' : '',
    },
    { label: 'Breaker opens', value: inTimes(clearing.breaker), unit: '' },
    {
      label: 'Touch voltage',
      value: written(touch.volts),
      unit: 'V',
      note: flowing ? 'most, on the faulted metal' : 'against neutral, for as long as the fault stands',
    },
  ]
}

const sum = (parts: readonly number[]) => parts.map((x) => written(x)).join(' + ')

/** The working, with the numbers put in. */
export function faultSteps(inputs: FaultInputs, clearing: Clearing, fault: Fault, touch: Touch): Step[] {
  const { path, source, breaker } = fault
  if (path === undefined)
    return [
      {
        name: 'Fault current',
        formula: 'I = V ÷ R',
        filled: 'no bond: R is without limit, so I is stray current alone',
      },
    ]
  const ohms = loopOhms(inputs)
  const { panelOhms, sourceOhms } = inputs.rods
  const back: Record<Exclude<FaultInputs['bond'], 'none'>, [string, number[]]> = {
    panel: ['branch ground + feeder neutral', [ohms.branchGround, ohms.feederNeutral]],
    source: ['branch ground + feeder ground', [ohms.branchGround, ohms.feederGround]],
    rods: [
      'branch ground + rod at the panel + rod at the source',
      [ohms.branchGround, panelOhms, sourceOhms],
    ],
  }
  const [backWords, backParts] = back[inputs.bond === 'none' ? 'panel' : inputs.bond]
  const byLoop = source.volts / clearing.loopOhms
  const steps: Step[] = [
    {
      name: 'Loop resistance',
      formula: `R = source + feeder hot + branch hot + fault + ${backWords}`,
      filled: `R = ${sum([source.ohms, ohms.feederHot, ohms.branchHot, inputs.contactOhms, ...backParts])} = ${written(clearing.loopOhms)} Ω`,
    },
    {
      name: 'Current the loop lets through',
      formula: 'I = V ÷ R',
      filled: `I = ${written(source.volts)} V ÷ ${written(clearing.loopOhms)} Ω = ${written(byLoop)} A`,
    },
  ]
  if (source.kind !== 'utility')
    steps.push({
      name: 'Most the source gives',
      formula: 'rated watts ÷ rated volts × times',
      filled: `${written(source.ratedAmps)} A rated; ${between(source.limitAmps[0], source.limitAmps[1])} A in a fault`,
    })
  steps.push(
    {
      name: 'Breaker',
      formula: 'multiple = fault current ÷ rating, then the time from its band',
      filled: `${between(clearing.amps.least, clearing.amps.most)} A ÷ ${written(breaker.ratedAmps)} A = ${between(clearing.amps.least / breaker.ratedAmps, clearing.amps.most / breaker.ratedAmps)}: ${inTimes(clearing.breaker)}`,
    },
    {
      name: 'Touch voltage',
      formula:
        inputs.bond === 'rods' ? 'V = I × (branch ground + rod at the panel)' : 'V = I × grounding conductor',
      filled: `V = ${written(clearing.amps.most)} A × ${written(path.touchOhms)} Ω = ${written(touch.volts)} V`,
    },
    {
      name: 'Through a body',
      formula: 'I = V ÷ body resistance (5 % of people have less)',
      filled: `I = ${written(touch.volts)} V ÷ ${written(touch.bodyOhms)} Ω = ${written(touch.milliamps)} mA`,
    },
  )
  return steps
}
