import { dangers, leaveFirst, worstFirst } from './dangers.ts'
import type { Danger } from './dangers.ts'
import type { Triage } from './triage-state.ts'

/** The questions of step 1 that were answered yes. */
export const dangersSaid = (triage: Triage): readonly Danger[] =>
  dangers.filter((danger) => triage.dangers[danger.id] === 'yes')

/** A stop as the page shows it. */
export type Here = { id: string; mayBeGhost: boolean }

/** Where a stop stands among the words: 0 is the worst. */
export const rank = (stop: string | undefined): number => {
  const at = worstFirst.indexOf(stop ?? '')
  return at < 0 ? worstFirst.length : at
}

/** The worst first. */
export const byWorst = (stops: Iterable<Here>): Here[] => [...stops].sort((a, b) => rank(a.id) - rank(b.id))

/** Stops that the answers to step 1 say, needing no edition, the worst first: an open "which" counts as the worst of its question. */
export function saidStops(triage: Triage): Here[] {
  const stops = dangersSaid(triage).flatMap((danger) => {
    const part = danger.parts.find((one) => one.id === triage.which[danger.id]) ?? danger.parts[0]
    return part.stop === undefined ? [] : [{ id: part.stop, mayBeGhost: false }]
  })
  return byWorst(stops)
}

/** Whether all that was said yes to is "a little warm": a caution, that circuit off until it was looked at. */
export const onlyWarm = (triage: Triage): boolean =>
  dangersSaid(triage).length > 0 && saidStops(triage).length === 0

/** Whether a yes to a danger stops the check: all but "a little warm". */
export const stoppedBySaying = (triage: Triage): boolean => saidStops(triage).length > 0

/** Whether the first thing to do is to leave and touch nothing. */
export const leave = (stops: readonly Here[]): boolean => stops.some(({ id }) => leaveFirst.includes(id))
