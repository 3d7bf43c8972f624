import * as z from 'zod/mini'
import { bandOf, Device } from '../protective-devices/device.ts'
import { oneOf, quantity } from '../quantity.ts'
import type { Result } from '../result.ts'
import { Units } from '../wire.ts'
import { bandPlot } from './band-plot.ts'
import { modesTable } from './by-mode.ts'
import { clearingOf } from './clearing.ts'
import type { Fault } from './clearing.ts'
import { clearingWords, judgmentOf } from './clearing-words.ts'
import { faultCautions, faultReferences } from './cautions.ts'
import { Bond, Branch, checkSizes, faultPath, Feeder, loopOhms, Rods } from './loop.ts'
import { Source, sourceLimit } from './source-limit.ts'
import { touchOf } from './touch.ts'
import { faultFigures, faultSteps } from './working.ts'

/** What the fault-clearing worksheet asks. Lengths and sizes in `units`. */
export const FaultInputs = z
  .object({
    units: Units,
    volts: quantity('the volts to ground', 24, 400),
    source: Source,
    bond: Bond,
    feeder: Feeder,
    branch: Branch,
    celsius: quantity('the temperature of the wires in °C', -40, 150),
    /** Of the fault itself: 0 for metal on metal. */
    contactOhms: quantity('ohms of the fault itself', 0, 100_000),
    device: Device,
    leakage: oneOf(['none', 'gfci', 'rcd']),
    rods: Rods,
  })
  .check(checkSizes)
export type FaultInputs = z.infer<typeof FaultInputs>

/** The fault of these inputs; `bond` put another way answers what would be. */
export function faultOf(inputs: FaultInputs, bond = inputs.bond): Fault {
  return {
    source: sourceLimit(inputs.source, inputs.volts),
    path: faultPath({ ...inputs, bond }, loopOhms(inputs)),
    breaker: bandOf(inputs.device),
    leakage: inputs.leakage,
  }
}

const bondWords = {
  panel: 'Bond at the panel',
  source: 'Bond at the source, with a grounding conductor',
  rods: 'Bond at the source, ground rods only between',
  none: 'No bond',
} as const

/** Whether the breaker trips on a fault from hot to grounded metal, and what clears it if not. */
export function faultClearing(inputs: FaultInputs): Result {
  const fault = faultOf(inputs)
  const clearing = clearingOf(fault)
  const touch = touchOf(clearing, inputs.volts)
  const { verdict, because } = clearingWords(clearing, fault)
  const bonds = ['panel', 'source', 'rods', 'none'] as const
  const plot = bandPlot(fault.breaker, clearing)
  return {
    judgment: judgmentOf(clearing, touch.iecHolds),
    verdict,
    because: [...because, ...touch.sentences],
    figures: faultFigures(clearing, fault, touch),
    tables: [
      {
        ...modesTable(bonds.map((bond) => ({ mode: bondWords[bond], fault: faultOf(inputs, bond) }))),
        title: 'The same fault, by where the bond is',
        chosen: bonds.indexOf(inputs.bond),
      },
    ],
    ...(plot && { plot }),
    steps: faultSteps(inputs, clearing, fault, touch),
    references: faultReferences(inputs, fault),
    assumptions: [
      'A fault from hot to metal with one bond, as this sheet says: a second bond would share the current.',
      'Wires count with their resistance alone; a utility’s own impedance is added to it as if it were resistance, so that the current comes out a little low.',
      ...fault.breaker.assumptions,
      'What energy is let through is not claimed.',
    ],
    cautions: faultCautions(clearing, fault, touch, inputs),
  }
}
