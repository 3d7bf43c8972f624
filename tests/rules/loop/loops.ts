import type { WiringContext } from '../../../rules/circuit/wiring/context.ts'
import { loopOf } from '../../../rules/loop/loop-of.ts'
import type { LoopOptions } from '../../../rules/loop/loop-options.ts'
import type { LoopState, Place, Run, Stretch, Wire } from '../../../rules/loop/loop-state.ts'
import { loopDefaults } from '../../../rules/loop/loop-wiring.ts'

export const cabin: WiringContext = { source: 'all-in-one-inverter', system: '120', wiring: 'panel' }
export const house: WiringContext = { source: 'utility', system: '120/240', wiring: 'panel' }
export const cords: WiringContext = { source: 'power-station', system: '120', wiring: 'direct' }
export const abroad: WiringContext = { source: 'generator', system: '230', wiring: 'panel' }

/** The loop of a cause as its own wiring leaves it, with what the test turns. */
export function loop(cause: string, turned: Partial<LoopOptions> = {}, context = cabin): LoopState {
  const own = loopDefaults(context, cause)
  const state = own && loopOf(context, cause, { state: 'fault', ...own, ...turned })
  if (state === undefined) throw new Error(`${cause} is not drawn there`)
  return state
}

export function run(state: LoopState, stretch: Stretch, from: Wire): Run {
  const found = state.runs.find((one) => one.stretch === stretch && one.from === from)
  if (found === undefined) throw new Error(`no ${from} on the ${stretch}`)
  return found
}

export const metalAt = (state: LoopState, place: Place) => state.metal.find((metal) => metal.place === place)
