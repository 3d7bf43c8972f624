/** From counts to bits: how much likelier an outcome is with a cause than over all of them. */
import { electricalCauses } from '../../../rules/circuit/wiring/context.ts'
import type { ElectricalCause } from '../../../rules/circuit/wiring/context.ts'
import type { Tally } from './count.ts'
import { mixtures } from './mixtures.ts'
import { mostBits, usualSlips } from './plan.ts'
import type { Computed } from './plan.ts'

/** A cause met less often where the row can speak is taken not to occur there. */
const fewestCases = 10
/** A row seen less often over all causes is left as it stands. */
const fewestFirings = 12

/** Bits by cause id, 0 left out; undefined where the model has too few cases of the row. */
export type Bits = Record<string, number>

/**
 * Chance of the row with each electrical cause; absent where the cause can't occur there. A part of all outcomes owes
 * nothing to the cause: a slip shows what is common anyhow.
 */
function chances(tally: Tally, slips: number): Map<string, number> {
  const known = new Map<string, number>()
  electricalCauses.forEach((cause, c) => {
    const [could, fired] = [tally.could[c] ?? 0, tally.fired[c] ?? 0]
    if (could >= fewestCases) known.set(cause, fired / could)
  })
  const mean = meanOf(known)
  for (const [cause, p] of known) known.set(cause, (1 - slips) * p + slips * mean)
  return known
}

const meanOf = (chance: ReadonlyMap<string, number>) =>
  [...chance.values()].reduce((a, b) => a + b, 0) / chance.size

/**
 * The bits of a row: log2 of its chance with the cause over its mean chance, rounded, within the group's limits.
 * @param causeIds every cause of the edition; those without a wiring of their own are mixtures of others
 */
export function bitsOf(
  tally: Tally,
  plan: Computed,
  causeIds: readonly string[],
  written: (cause: string) => number,
): Bits | undefined {
  if (tally.fired.reduce((a, b) => a + b, 0) < fewestFirings) return undefined
  const chance = chances(tally, plan.slips ?? usualSlips)
  const mean = meanOf(chance)
  const most = plan.most ?? mostBits
  const says: Bits = {}
  const computed = (cause: string): number => {
    if (isWired(cause) ? plan.asWritten?.includes(cause) === true : plan.wiredOnly === true)
      return written(cause)
    const p = chance.get(cause) ?? mixed(cause, chance)
    if (p !== undefined) {
      const bits = Math.round((plan.counts ?? 1) * Math.log2(p / mean))
      return Math.max(bits, isWired(cause) ? (plan.atLeast?.[tally.rule]?.[cause] ?? bits) : bits)
    }
    return isWired(cause) ? (plan.cannot?.[cause] ?? 0) : 0
  }
  for (const cause of causeIds) {
    const bits = Math.max(-most, Math.min(most, computed(cause)))
    if (bits !== 0) says[cause] = bits
  }
  return says
}

const isWired = (cause: string): cause is ElectricalCause =>
  (electricalCauses as readonly string[]).includes(cause)

function mixed(cause: string, chance: ReadonlyMap<string, number>): number | undefined {
  let [sum, weight] = [0, 0]
  for (const [part, w] of Object.entries(mixtures[cause] ?? {})) {
    const p = chance.get(part)
    if (p === undefined) continue
    sum += w * p
    weight += w
  }
  return weight > 0 ? sum / weight : undefined
}
