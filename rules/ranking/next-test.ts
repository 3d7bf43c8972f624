import type { Edition } from '../edition/open.ts'
import type { Sheet } from '../findings/sheet.ts'
import type { ForkOutcome, NextTest } from './diagnosis-types.ts'
import type { Ranked } from './rank.ts'
import { stopsOf } from './stop.ts'
import { stillToDo, tryOutcomes } from './try-outcomes.ts'
import type { Tried } from './try-outcomes.ts'
import { powerOfTwo, sharesOf } from './weigh.ts'

const sixDecimals = (x: number) => Math.max(0, Math.round(x * 1e6) / 1e6)

/** Chance of each outcome given each cause: what the rules' tables make of it, over this test's outcomes. */
function chances(tried: readonly Tried[], now: Ranked): number[][] {
  return now.bits.map((bits, cause) => {
    const raw = tried.map((t) => t.weight * powerOfTwo((t.bits[cause] ?? 0) - bits))
    const sum = raw.reduce((a, b) => a + b, 0)
    return raw.map((r) => r / sum)
  })
}

/** Mutual information of cause and outcome, bits: what the test is expected to tell. */
function information(
  shares: readonly number[],
  given: readonly number[][],
  overall: readonly number[],
): number {
  let gain = 0
  shares.forEach((share, cause) => {
    if (share === 0) return
    given[cause]?.forEach((p, o) => {
      const all = overall[o] ?? 0
      if (p > 0 && all > 0) gain += share * p * Math.log2(p / all)
    })
  })
  return gain
}

/** The likeliest causes that the test would send different ways. */
function partedBy(edition: Edition, shares: readonly number[], given: readonly number[][]): string[] {
  const likely = shares
    .map((share, cause) => ({ share, cause }))
    .filter((c) => c.share > 0.02)
    .sort((a, b) => b.share - a.share)
    .slice(0, 6)
  const ways = new Map<number, string>()
  for (const { cause } of likely) {
    const chance = given[cause] ?? []
    const way = chance.indexOf(Math.max(...chance))
    if (!ways.has(way)) ways.set(way, edition.causeIds[cause] ?? '')
  }
  return ways.size < 2 ? [] : [...ways.values()].slice(0, 3)
}

/**
 * Tests still to do, by expected information in bits (rounded to six decimals before sorting), level ones by id
 * and mode. Chances come from the rules' own tables, the fork's shares from the ranking itself.
 */
export function nextTests(edition: Edition, sheet: Sheet, now: Ranked): NextTest[] {
  const stopsNow = stopsOf(edition, sheet).length
  const found = stillToDo(edition, sheet).map((doing): NextTest => {
    const tried = tryOutcomes(edition, sheet, doing, stopsNow)
    const given = chances(tried, now)
    const overall = tried.map((_, o) => now.shares.reduce((sum, s, c) => sum + s * (given[c]?.[o] ?? 0), 0))
    const outcomes = tried.map((t, o): ForkOutcome => {
      const shares = sharesOf(now.weights, t.bits)
      const best = shares.indexOf(Math.max(...shares))
      return {
        id: t.outcome.id,
        label: t.outcome.label,
        lamp: t.outcome.lamp,
        chance: overall[o] ?? 0,
        leads: edition.causeIds[best] ?? '',
        share: shares[best] ?? 0,
        stop: t.stop,
      }
    })
    return {
      test: doing.test.id,
      findings: doing.missing,
      mode: doing.mode === sheet.context.mode ? undefined : doing.mode,
      gainBits: tried.length < 2 ? 0 : sixDecimals(information(now.shares, given, overall)),
      parts: partedBy(edition, now.shares, given),
      outcomes,
    }
  })
  const key = (t: NextTest) => `${t.test} ${t.mode ?? ''}`
  return found.sort((a, b) => b.gainBits - a.gainBits || (key(a) < key(b) ? -1 : 1))
}
