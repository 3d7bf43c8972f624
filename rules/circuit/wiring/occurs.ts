import { electricalCauses, sourceKinds } from './context.ts'
import type { ElectricalCause, WiringContext } from './context.ts'

type Possible = { sources?: readonly string[]; systems?: readonly string[]; wirings?: readonly string[] }
/** Where alone a cause can occur, as the edition's `causes.json` says it too. */
const possibleWhere: Partial<Record<ElectricalCause, Possible>> = {
  'floating-neutral': { sources: sourceKinds.filter((s) => s !== 'utility') },
  'balanced-output': { sources: sourceKinds.filter((s) => s !== 'utility'), systems: ['120', '230'] },
  'isolated-output': { sources: sourceKinds.filter((s) => s !== 'utility') },
  'double-bond': { wirings: ['panel'] },
  'rod-only-return': { wirings: ['panel'] },
  'two-hots': { systems: ['120/240'] },
  'bootleg-ground': { wirings: ['panel'] },
  'bootleg-ground-reversed': { wirings: ['panel'] },
  'shared-neutral-lost': { systems: ['120/240'] },
}

/** Whether a cause can occur in a context. */
export function canOccur(cause: ElectricalCause, context: WiringContext): boolean {
  const { sources, systems, wirings } = possibleWhere[cause] ?? {}
  return (
    (sources?.includes(context.source) ?? true) &&
    (systems?.includes(context.system) ?? true) &&
    (wirings?.includes(context.wiring) ?? true)
  )
}

export const causesIn = (context: WiringContext): ElectricalCause[] =>
  electricalCauses.filter((cause) => canOccur(cause, context))
