import { fitsContext } from '../edition/open.ts'
import type { Edition } from '../edition/open.ts'
import type { Outcome, Test } from '../edition/schema.ts'
import { deriveFacts } from '../findings/facts.ts'
import { overLimitOhms } from '../findings/sheet.ts'
import type { Context, Sheet, Taken } from '../findings/sheet.ts'
import { ready } from './engine.ts'
import { totals } from './ledger.ts'
import { stopsOf } from './stop.ts'

/** A test as it could be done now: in which mode, for which of its findings. */
export type Doing = { test: Test; mode: string; missing: string[] }

/** Modes this source can be in, and any other in which something was taken. */
function modesFor(edition: Edition, sheet: Sheet): string[] {
  const own = edition.sources.get(sheet.context.source)?.modes ?? []
  return [...new Set([sheet.context.mode, ...own, ...sheet.taken.map((t) => t.mode)])]
}

/** Every test this context allows of which a finding isn't taken yet, in each mode worth doing it in. */
export function stillToDo(edition: Edition, sheet: Sheet): Doing[] {
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

/** An outcome tried out: the bits it would leave each cause with, by cause index, and whether it would stop. */
export type Tried = { outcome: Outcome; weight: number; bits: number[]; stop: boolean }

/** Takes each outcome of a test as if it had been found, and lets the edition’s own rules speak. */
export function tryOutcomes(edition: Edition, sheet: Sheet, doing: Doing, stopsNow: number): Tried[] {
  const { context } = sheet
  const fitting = doing.test.outcomes.filter((o) => fitsContext(o, context))
  const open = fitting.filter((o) => !contradicts(edition, sheet, doing, o))
  const { rules } = ready(edition)
  const unloaded = new Map(
    sheet.taken.flatMap((t) =>
      t.kind === 'reading' && t.mode === doing.mode ? [[t.id, t.value] as const] : [],
    ),
  )
  const seen = new Set<string>()
  return (open.length >= 2 ? open : fitting).flatMap((outcome) => {
    const added = doing.missing.flatMap(
      (id) => asTaken(edition, context, doing.mode, id, outcome, unloaded) ?? [],
    )
    // Outcomes that differ only in what is taken already are one.
    const key = added.map((t) => `${t.id}=${t.value}`).join()
    if (added.length === 0 || seen.has(key)) return []
    seen.add(key)
    const then: Sheet = { context, taken: [...sheet.taken, ...added] }
    const fired = [...deriveFacts(edition, then).values()].flatMap((facts) =>
      rules.filter((r) => r.holds(facts)),
    )
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
