import * as z from 'zod/mini'
import { oneOf, quantity } from '../quantity.ts'
import { Build, MetalOf, wireOhms } from '../wire.ts'
import type { Units } from '../wire.ts'
import { table9 } from './table-9.ts'

/** One run of a circuit: from a panel to the next, or to the load. */
export const Run = z.object({
  length: quantity('the length one way', 0.1, 20_000),
  size: z.string({ error: 'Choose a size.' }),
  metal: MetalOf,
  build: Build,
  /** A cable or cord, or single wires in a raceway. */
  raceway: oneOf(['none', 'pvc', 'aluminum', 'steel']),
  amps: quantity('the current in amps', 0.01, 2000),
})
export type Run = z.infer<typeof Run>

/** IEC 60364-5-52 annex G: Ω/km of reactance where nothing better is known. */
const metricReactance = 0.08
/** From this size on table 9's resistance stands for cables too: by then alternating current crowds to the skin. */
const crowded = ['1/0', '2/0', '3/0', '4/0']
const riseOf = { copper: 0.00323, aluminum: 0.0033 } as const

/** Ohms of one conductor of the run, one way. */
export type RunOhms = { resistance: number; reactance: number; table: '8' | '9' | 'iec'; fromMemory: boolean }

/** Undefined where the tables have no such conductor. */
export function runOhms(run: Run, units: Units, celsius: number, current: 'ac' | 'dc'): RunOhms | undefined {
  const direct = wireOhms({ ...run, units, celsius })
  if (direct === undefined) return undefined
  if (units === 'metric')
    return {
      resistance: direct,
      reactance: current === 'ac' ? (metricReactance * run.length) / 1000 : 0,
      table: 'iec',
      fromMemory: false,
    }
  if (current === 'dc') return { resistance: direct, reactance: 0, table: '8', fromMemory: false }
  const row = table9(run.size, run.metal, run.raceway === 'none' ? 'pvc' : run.raceway)
  if (row === undefined) return { resistance: direct, reactance: 0, table: '8', fromMemory: false }
  const thousands = run.length / 1000
  const nine = run.raceway !== 'none' || crowded.includes(run.size)
  return {
    resistance: nine ? row.resistance * thousands * (1 + riseOf[run.metal] * (celsius - 75)) : direct,
    reactance: row.reactance * thousands,
    table: nine ? '9' : '8',
    fromMemory: row.fromMemory,
  }
}
