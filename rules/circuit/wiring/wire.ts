import type { Network } from '../network.ts'
import { hertzOf } from './context.ts'
import type { ElectricalCause, WiringContext } from './context.ts'
import { applyEdit } from './edits.ts'
import type { Edit } from './edits.ts'
import { faults } from './faults.ts'
import { healthy } from './healthy.ts'
import { rangesIn } from './ranges.ts'
import type { Parameters, Ranges } from './parameters.ts'

/** The ranges of a wiring with this fault: those of the context, narrowed to where the fault can be. */
export const rangesWith = (context: WiringContext, cause: ElectricalCause): Ranges => ({
  ...rangesIn(context),
  ...faults[cause].needs?.(context),
})

/** What a cause changes of the sound wiring. */
export const editsOf = (context: WiringContext, cause: ElectricalCause, p: Parameters): Edit[] =>
  faults[cause].edits(p, context)

/**
 * The sound wiring of these parameters with edits made to it, running, with the house's loads on.
 * @throws Error where an edit names a part that the wiring does not have
 */
export const edited = (context: WiringContext, p: Parameters, edits: readonly Edit[]): Network => ({
  hertz: hertzOf(context) * p.hertzRatio,
  branches: edits.reduce(applyEdit, healthy(context, p)),
})

/** The wiring with one fault in it: a named change of the sound one. */
export const wire = (context: WiringContext, cause: ElectricalCause, p: Parameters): Network =>
  edited(context, p, editsOf(context, cause, p))
