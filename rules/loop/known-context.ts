import { sourceKinds, systemKinds } from '../circuit/wiring/context.ts'
import type { WiringContext } from '../circuit/wiring/context.ts'
import { canOccur } from '../circuit/wiring/occurs.ts'
import { drawnAs } from './drawn-as.ts'

const among = <T extends string>(all: readonly T[], one: string): one is T =>
  (all as readonly string[]).includes(one)

/** A context that the circuit model can wire, or undefined: an edition may name sources and systems of its own. */
export function knownContext(context: {
  source: string
  system: string
  wiring: string
}): WiringContext | undefined {
  const { source, system, wiring } = context
  if (!among(sourceKinds, source) || !among(systemKinds, system) || !among(['panel', 'direct'], wiring))
    return undefined
  return { source, system, wiring }
}

const typicalContexts: readonly WiringContext[] = [
  { source: 'all-in-one-inverter', system: '120', wiring: 'panel' },
  { source: 'all-in-one-inverter', system: '120/240', wiring: 'panel' },
]

/** Where a cause is drawn when nobody says where: 120 V through a panel, with two legs where it needs them. */
export function typicalContext(cause: string): WiringContext {
  const as = drawnAs(cause)
  const [first, second] = typicalContexts as [WiringContext, WiringContext]
  return as !== undefined && 'wiring' in as && !canOccur(as.wiring, first) ? second : first
}
