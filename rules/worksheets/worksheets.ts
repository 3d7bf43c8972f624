import type * as z from 'zod/mini'
import { faultClearing, FaultInputs } from './fault-clearing/fault-clearing.ts'
import { ghostOrFirmSheet, GhostInputs } from './ghost-or-firm.ts'
import { groundingSizes, SizesInputs } from './grounding-sizes/grounding-sizes.ts'
import { groundRod, RodInputs } from './ground-rod/ground-rod.ts'
import { LeakageInputs, leakageTrip } from './leakage-trip/leakage-trip.ts'
import { lostNeutral, LostNeutralInputs } from './lost-neutral.ts'
import type { Result } from './result.ts'
import { DropInputs, voltageDrop } from './voltage-drop/voltage-drop.ts'

/** What each worksheet asks. */
export type InputsOf = {
  'fault-clearing': FaultInputs
  'ground-rod': RodInputs
  'voltage-drop': DropInputs
  'lost-neutral': LostNeutralInputs
  'trip-time': LeakageInputs
  'ghost-or-firm': GhostInputs
  'grounding-sizes': SizesInputs
}
/** Its name in the address. */
export type WorksheetName = keyof InputsOf

/** A result, or one sentence for each field that can't be read: its name (`runs.0.length`) and what to type. */
export type Answer = { result: Result } | { errors: Readonly<Record<string, string>> }

type Compute = (typed: unknown) => Answer
function worksheet<Inputs>(schema: z.ZodMiniType<Inputs>, compute: (inputs: Inputs) => Result): Compute {
  return (typed) => {
    const read = schema.safeParse(typed)
    if (read.success) return { result: compute(read.data) }
    const errors: Record<string, string> = {}
    for (const { path, message, code } of read.error.issues) {
      // A whole part that is missing has no sentence of its own in its schema.
      const part = code === 'invalid_type' && message.startsWith('Invalid')
      errors[path.join('.')] ??= part ? 'This part is missing.' : message
    }
    return { errors }
  }
}

const computes: Readonly<Record<WorksheetName, Compute>> = {
  'fault-clearing': worksheet(FaultInputs, faultClearing),
  'ground-rod': worksheet(RodInputs, groundRod),
  'voltage-drop': worksheet(DropInputs, voltageDrop),
  'lost-neutral': worksheet(LostNeutralInputs, lostNeutral),
  'trip-time': worksheet(LeakageInputs, leakageTrip),
  'ghost-or-firm': worksheet(GhostInputs, ghostOrFirmSheet),
  'grounding-sizes': worksheet(SizesInputs, groundingSizes),
}

/** Reads what was typed and computes. Nothing typed is thrown away: an error names its field. */
export const computeWorksheet = (name: WorksheetName, typed: unknown): Answer => computes[name](typed)

export const worksheetNames = Object.keys(computes) as WorksheetName[]
