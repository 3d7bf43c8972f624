import type { Table } from '../result.ts'
import { between, inTimes } from '../written.ts'
import { clearingOf } from './clearing.ts'
import type { Clearing, Fault } from './clearing.ts'
import { whatClears } from './clearing-words.ts'

/** One operating mode of a system: what feeds the fault in it, and the way back. */
export type FaultInMode = { mode: string; fault: Fault }

/** What clears a fault in each mode. The bond audit gives the modes: its source, path (or none) and breaker of each. */
export const clearingByMode = (modes: readonly FaultInMode[]): (FaultInMode & { clearing: Clearing })[] =>
  modes.map((one) => ({ ...one, clearing: clearingOf(one.fault) }))

/** The same as a table. */
export const modesTable = (modes: readonly FaultInMode[]): Table => ({
  title: 'What clears a fault, by mode',
  head: ['Mode', 'Current, A', 'Breaker opens', 'Source lets go', 'Touch voltage, V', 'What clears it'],
  rows: clearingByMode(modes).map(({ mode, fault, clearing }) => [
    mode,
    clearing.amps.most > 0 ? between(clearing.amps.least, clearing.amps.most) : 'no way back',
    inTimes(clearing.breaker),
    inTimes(clearing.source),
    between(clearing.touchVolts.least, clearing.touchVolts.most),
    whatClears(clearing, fault),
  ]),
})
