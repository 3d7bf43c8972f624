import { fitsContext } from '../../rules/edition/open.ts'
import type { Edition } from '../../rules/edition/open.ts'
import type { Outcome, Test } from '../../rules/edition/schema.ts'
import { deriveFacts } from '../../rules/findings/facts.ts'
import { readSheet } from '../../rules/findings/parse.ts'
import type { RawSheet, Sheet } from '../../rules/findings/sheet.ts'
import { ready } from '../../rules/ranking/engine.ts'
import { totals } from '../../rules/ranking/ledger.ts'
import { stopsOf } from '../../rules/ranking/stop.ts'

export type OutcomeSays = {
  outcome: Outcome
  /** Causes it speaks for, the strongest first; none where too many stand level to name. */
  for: readonly Weighed[]
  /** How many stand level, where they are too many to name. */
  alike: number
  /** Causes it speaks against most. */
  against: readonly Weighed[]
  /** Titles of the stops it would mean. */
  stops: readonly string[]
}
export type Weighed = { cause: string; bits: number }

/** A sheet on which nothing but this outcome was found, on the first system and wiring where it can be. */
function sheetOf(edition: Edition, test: Test, outcome: Outcome): Sheet | undefined {
  const source = (edition.file.sources.find((one) => one.engine) ?? edition.file.sources[0])?.id ?? ''
  for (const system of edition.file.systems)
    for (const wiring of edition.file.wirings) {
      const context = { source, system: system.id, wiring: wiring.id }
      const readings = test.findings.flatMap((id) => edition.readings.get(id) ?? [])
      if (!fitsContext(outcome, context) || !readings.every((one) => fitsContext(one, context))) continue
      const findings: NonNullable<RawSheet['findings']> = {}
      for (const [id, value] of Object.entries(outcome.findings))
        findings[id] = typeof value === 'object' ? value.times * system.nominalVolts : value
      const read = readSheet(edition, { context, findings })
      if (read.ok) return read.sheet
    }
  return undefined
}

const shown = 3

/** The strongest, and whatever stands level with the last of them: else the cut would be an accident of order. */
function strongest(weighed: readonly Weighed[]): Weighed[] {
  const sorted = [...weighed].sort((a, b) => Math.abs(b.bits) - Math.abs(a.bits))
  const least = Math.abs(sorted[shown - 1]?.bits ?? 0)
  const level = sorted.filter((one) => Math.abs(one.bits) >= least)
  return level.length <= 2 * shown ? level : sorted.filter((one) => Math.abs(one.bits) > least)
}

/** What each outcome of a test would say by itself, from the edition's own rules. */
export function outcomesSay(edition: Edition, test: Test): OutcomeSays[] {
  const { rules } = ready(edition)
  const titles = new Map(edition.file.stops.map((stop) => [stop.id, stop.title]))
  return test.outcomes.map((outcome) => {
    const sheet = sheetOf(edition, test, outcome)
    if (sheet === undefined) return { outcome, for: [], alike: 0, against: [], stops: [] }
    const fired = [...deriveFacts(edition, sheet).values()].flatMap((facts) =>
      rules.filter((rule) => rule.holds(facts)),
    )
    const bits = totals(edition.causeIds.length, [...new Set(fired)])
    const weighed = edition.causeIds.map((cause, index) => ({ cause, bits: bits[index] ?? 0 }))
    const speaksFor = weighed.filter((one) => one.bits > 0)
    const named = strongest(speaksFor)
    return {
      outcome,
      for: named,
      alike: named.length === 0 ? speaksFor.length : 0,
      against: strongest(weighed.filter((one) => one.bits < 0)),
      stops: stopsOf(edition, sheet).flatMap((stop) => titles.get(stop.id) ?? []),
    }
  })
}
