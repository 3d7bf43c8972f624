import { fitsContext } from '../edition/open.ts'
import type { Edition } from '../edition/open.ts'
import type { Outcome, Test } from '../edition/schema.ts'
import { deriveFacts } from '../findings/facts.ts'
import { overLimitOhms } from '../findings/sheet.ts'
import type { Context, Sheet, Taken } from '../findings/sheet.ts'
import type { ForkOutcome, NextTest } from './diagnosis-types.ts'
import { ready } from './engine.ts'
import { totals } from './ledger.ts'
import type { Ranked } from './rank.ts'
import { stopsOf } from './stop.ts'
import { powerOfTwo, sharesOf } from './weigh.ts'

type Doing = { test: Test; mode: string; missing: string[] }

/** Modes this source can be in, and any other in which something was taken. */
function modesFor(edition: Edition, sheet: Sheet): string[] {
  const own = edition.sources.get(sheet.context.source)?.modes ?? []
  return [...new Set([sheet.context.mode, ...own, ...sheet.taken.map((t) => t.mode)])]
}

/** Every test this context allows of which a finding isn't taken yet, in each mode worth doing it in. */
function stillToDo(edition: Edition, sheet: Sheet): Doing[] {
  const { context } = sheet
  const taken = new Set(sheet.taken.map((t) => `${t.mode} ${t.id}`))
  return modesFor(edition, sheet).flatMap((mode) =>
    edition.file.tests.flatMap((test) => {
      if (mode !== context.mode && !test.eachMode) return []
      const missing = test.findings.filter((id) => {
        const reading = edition.readings.get(id)
        return (reading === undefined || fitsContext(reading, context)) && !taken.has(`${mode} ${id}`)
      })
      return missing.length === 0 ? [] : [{ test, mode, missing }]
    }),
  )
}

/** An outcome's finding as if it had been taken. */
function asTaken(
  edition: Edition,
  context: Context,
  mode: string,
  id: string,
  outcome: Outcome,
  unloaded: ReadonlyMap<string, number>,
): Taken | undefined {
  const given = outcome.findings[id]
  if (given === undefined) return undefined
  if (typeof given === 'string') return { kind: 'observation', id, mode, value: given }
  const reading = edition.readings.get(id)
  if (reading === undefined || !fitsContext(reading, context)) return undefined
  const nominal = edition.systems.get(context.system)?.nominalVolts ?? 120
  // A loaded hot–neutral is told by what it was before the load, where that was taken.
  const before = id.endsWith('.hn.volts.loaded') ? unloaded.get(id.replace(/\.loaded$/, '')) : undefined
  const value = typeof given === 'number' ? given : given.times * (before ?? nominal)
  return {
    kind: 'reading',
    id,
    mode,
    value,
    unit: reading.unit,
    place: reading.place,
    pair: reading.pair,
    loaded: reading.loaded === true,
    meterOhms: context.meterOhms,
    overLimit: value >= overLimitOhms,
    between: undefined,
  }
}

/** Whether what was already taken of the test says that it can't end this way. */
function contradicts(edition: Edition, sheet: Sheet, doing: Doing, outcome: Outcome): boolean {
  const nominal = edition.systems.get(sheet.context.system)?.nominalVolts ?? 120
  return sheet.taken.some((t) => {
    if (t.mode !== doing.mode || !doing.test.findings.includes(t.id)) return false
    const given = outcome.findings[t.id]
    if (given === undefined) return false
    if (t.kind === 'observation') return given !== t.value
    if (t.unit !== 'V' || typeof given === 'string') return false
    const volts = typeof given === 'number' ? given : given.times * nominal
    return Math.abs(volts - t.value) > 0.2 * nominal
  })
}

type Tried = { outcome: Outcome; weight: number; bits: number[]; stop: boolean }

function tryOutcomes(edition: Edition, sheet: Sheet, doing: Doing, stopsNow: number): Tried[] {
  const { context } = sheet
  const fitting = doing.test.outcomes.filter((o) => fitsContext(o, context))
  const open = fitting.filter((o) => !contradicts(edition, sheet, doing, o))
  const { rules } = ready(edition)
  const unloaded = new Map(
    sheet.taken.flatMap((t) => (t.kind === 'reading' && t.mode === doing.mode ? [[t.id, t.value] as const] : [])),
  )
  const seen = new Set<string>()
  return (open.length >= 2 ? open : fitting).flatMap((outcome) => {
    const added = doing.missing.flatMap((id) => asTaken(edition, context, doing.mode, id, outcome, unloaded) ?? [])
    // Outcomes that differ only in what is taken already are one.
    const key = added.map((t) => `${t.id}=${t.value}`).join()
    if (added.length === 0 || seen.has(key)) return []
    seen.add(key)
    const then: Sheet = { context, taken: [...sheet.taken, ...added] }
    const fired = [...deriveFacts(edition, then).values()].flatMap((facts) => rules.filter((r) => r.holds(facts)))
    return [
      {
        outcome,
        weight: outcome.weight ?? 1,
        bits: totals(edition.causeIds.length, [...new Set(fired)]),
        stop: stopsOf(edition, then).length > stopsNow,
      },
    ]
  })
}

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
function information(shares: readonly number[], given: readonly number[][], overall: readonly number[]): number {
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
