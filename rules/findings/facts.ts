import type { Edition } from '../edition/open.ts'
import { acrossModes } from './across-modes.ts'
import { clampFacts } from './clamp-facts.ts'
import { deadFacts } from './dead-facts.ts'
import { ghostFacts } from './ghost-facts.ts'
import { legFacts } from './leg-facts.ts'
import { loadFacts } from './load-facts.ts'
import { placeFacts } from './place-facts.ts'
import type { Earlier, Sheet, Taken, TakenReading } from './sheet.ts'
import { sourceFacts } from './source-facts.ts'
import { testFacts } from './test-facts.ts'

export type FactValue = string | number
/** A derived or given fact, and the findings it rests on. */
export type Fact = { value: FactValue; from: readonly string[] }
export type Facts = ReadonlyMap<string, Fact>

/** What the fact functions read: the findings of one mode, and what they are measured against. */
export type Findings = {
  /** Value of a reading in its unit, undefined when it was not taken. */
  amount: (id: string) => number | undefined
  observed: (id: string) => string | undefined
  /** Input resistance of the instrument that took it, ohms. */
  meterOhms: (id: string) => number
  /** The same reading with another instrument before, where it was taken twice. */
  earlier: (id: string) => Earlier | undefined
  /** Source kind: the limits of its voltage are its own. */
  source: string
  nominalVolts: number
  hertz: number
  legs: 1 | 2
  edges: Readonly<Record<string, number>>
}
/** Adds a derived fact; `from` names the findings it rests on. */
export type Say = (fact: string, value: FactValue, from: readonly string[]) => void

const derivations = [
  placeFacts,
  ghostFacts,
  loadFacts,
  legFacts,
  deadFacts,
  testFacts,
  clampFacts,
  sourceFacts,
]

function deriveAt(
  edition: Edition,
  sheet: Sheet,
  taken: ReadonlyMap<string, Taken>,
  end: (r: TakenReading) => number,
): Map<string, Fact> {
  const { context } = sheet
  const system = edition.systems.get(context.system)
  if (system === undefined) throw new RangeError(`unknown system ${context.system}`)
  const facts = new Map<string, Fact>()
  const say: Say = (fact, value, from) => facts.set(fact, { value, from })
  say('context.source', context.source, [])
  say('context.system', context.system, [])
  say('context.wiring', context.wiring, [])
  say('context.legs', String(system.legs), [])
  for (const one of taken.values()) say(one.id, one.kind === 'reading' ? end(one) : one.value, [one.id])
  const findings: Findings = {
    amount: (id) => {
      const one = taken.get(id)
      return one?.kind === 'reading' ? end(one) : undefined
    },
    observed: (id) => {
      const one = taken.get(id)
      return one?.kind === 'observation' ? one.value : undefined
    },
    meterOhms: (id) => {
      const one = taken.get(id)
      return one?.kind === 'reading' ? one.meterOhms : context.meterOhms
    },
    earlier: (id) => {
      const one = taken.get(id)
      return one?.kind === 'reading' ? one.earlier : undefined
    },
    source: context.source,
    nominalVolts: system.nominalVolts,
    hertz: system.hertz,
    legs: system.legs,
    edges: edition.edges,
  }
  for (const derive of derivations) derive(findings, say)
  return facts
}

/** Facts that hold at both ends of every unsteady reading: one that wanders says only what both ends say. */
function atBothEnds(edition: Edition, sheet: Sheet, taken: ReadonlyMap<string, Taken>): Map<string, Fact> {
  const low = deriveAt(edition, sheet, taken, (r) => r.between?.[0] ?? r.value)
  if (![...taken.values()].some((t) => t.kind === 'reading' && t.between !== undefined)) return low
  const high = deriveAt(edition, sheet, taken, (r) => r.between?.[1] ?? r.value)
  return new Map([...low].filter(([name, fact]) => high.get(name)?.value === fact.value))
}

/** Modes in which something was taken, the sheet's own mode first. */
export function modesOf(sheet: Sheet): string[] {
  return [...new Set([sheet.context.mode, ...sheet.taken.map((t) => t.mode)])]
}

/**
 * Facts derived from the findings of each mode. Facts that compare modes stand with the sheet's own mode.
 * Every voltage is judged against the system's nominal and against the measured hot–neutral, so that
 * 120 V and 230 V systems share their rules.
 */
export function deriveFacts(edition: Edition, sheet: Sheet): ReadonlyMap<string, Facts> {
  const modes = modesOf(sheet)
  const perMode = new Map<string, Map<string, Fact>>()
  for (const mode of modes) {
    const taken = new Map(sheet.taken.filter((t) => t.mode === mode).map((t) => [t.id, t]))
    perMode.set(mode, atBothEnds(edition, sheet, taken))
  }
  const own = perMode.get(sheet.context.mode)
  if (own !== undefined && modes.length > 1)
    acrossModes(perMode, (fact, value, from) => own.set(fact, { value, from }))
  return perMode
}
