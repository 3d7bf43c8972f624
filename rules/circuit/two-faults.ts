/** Two faults in one wiring, where both can be. */
import { magnitude } from './network.ts'
import type { Network } from './network.ts'
import { factor } from './solve.ts'
import type { ElectricalCause, WiringContext } from './wiring/context.ts'
import type { Edit } from './wiring/edits.ts'
import { faults } from './wiring/faults.ts'
import { canOccur } from './wiring/occurs.ts'
import type { Parameters } from './wiring/parameters.ts'
import { faultOnly } from './wiring/ranges.ts'
import { sampleFrom } from './wiring/sample.ts'
import type { Chance } from './wiring/sample.ts'
import { edited, editsOf, rangesWith } from './wiring/wire.ts'

export type TwoFaults = { network: Network; p: Parameters }

/** The parts an edit lays hands on. */
const touched = (edit: Edit): readonly string[] =>
  edit.do === 'swap' ? edit.wires : 'wire' in edit ? [edit.wire] : 'part' in edit ? [edit.part] : [edit.name]

/** More than this from a small source and something has tripped: such a pair is found dead, by its breaker. */
const mostAmps = 80

/** Whether it runs at all: no source is shorted. */
function stands(network: Network): boolean {
  const solved = factor(network)
  return network.branches.every((b) => b.kind !== 'source' || magnitude(solved.amps(b.name)) < mostAmps)
}

/** Whether two causes narrow the same thing of the wiring, apart from where each sits. */
function quarrel(context: WiringContext, one: ElectricalCause, other: ElectricalCause): boolean {
  const own = new Set<string>(faultOnly)
  const [a, b] = [one, other].map((c) => Object.keys(faults[c].needs?.(context) ?? {}))
  return (a ?? []).some((name) => !own.has(name) && (b ?? []).includes(name))
}

/**
 * Two faults in one wiring drawn by chance: the second has a place and ohms of its own.
 * @returns undefined where the two can't be there together: they lay hands on the same part, want different sources,
 *   or short the source
 */
export function wireTwo(
  chance: Chance,
  context: WiringContext,
  one: ElectricalCause,
  other: ElectricalCause,
): TwoFaults | undefined {
  if (one === other || !canOccur(one, context) || !canOccur(other, context)) return undefined
  if (quarrel(context, one, other)) return undefined
  const ranges = {
    ...rangesWith(context, other),
    ...Object.fromEntries(faultOnly.map((name) => [name, rangesWith(context, one)[name]])),
    ...faults[one].needs?.(context),
  }
  const p = sampleFrom(chance, ranges)
  const second = sampleFrom(chance, rangesWith(context, other))
  const ofOther = { ...p, ...Object.fromEntries(faultOnly.map((name) => [name, second[name]])) } as Parameters
  const [first, then] = [editsOf(context, one, p), editsOf(context, other, ofOther)]
  const hands = new Set(first.flatMap(touched))
  if (then.flatMap(touched).some((part) => hands.has(part))) return undefined
  const network = edited(context, p, [...first, ...then])
  return stands(network) ? { network, p } : undefined
}
