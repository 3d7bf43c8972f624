import { openQuestions } from './read-out.ts'
import { stoppedBySaying } from './said-stops.ts'
import type { Triage } from './triage-state.ts'

/**
 * Where to go instead of this step, or undefined when it may open. Danger comes first: no step opens before all
 * eight questions are answered. After a stop nothing is plugged in and nothing measured; what feeds it and what
 * they notice may still be said, for the phone.
 */
export function insteadOf(step: number, triage: Triage): string | undefined {
  if (step === 1) return undefined
  if (stoppedBySaying(triage)) return step >= 4 ? '/check/stop' : undefined
  return openQuestions(triage) > 0 ? '/check/1' : undefined
}
