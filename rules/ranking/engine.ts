import { Engine } from 'json-rules-engine'
import type { TopLevelCondition } from 'json-rules-engine'
import { comparisons } from '../edition/condition.ts'
import type { Edition } from '../edition/open.ts'
import type { Facts } from '../findings/facts.ts'
import { compileCondition } from './compile-rule.ts'
import type { Holds } from './compile-rule.ts'

/** A rule made ready: its place, its bits per cause in the catalogue's order, and both ways to test it. */
export type ReadyRule = {
  id: string
  group: string
  because: string
  source: string
  /** Bits by cause index. */
  bits: Int8Array
  facts: readonly string[]
  holds: Holds
}
export type Ready = { rules: readonly ReadyRule[]; engine: Engine; lastRun: Promise<unknown> }

const made = new WeakMap<Edition, Ready>()

/** Rules and engine of an edition, built once. */
export function ready(edition: Edition): Ready {
  const before = made.get(edition)
  if (before !== undefined) return before
  const engine = new Engine([], { allowUndefinedFacts: true })
  const rules = edition.file.groups.flatMap((group) =>
    group.rules.map((rule): ReadyRule => {
      const when = rule.when
      const conditions = 'fact' in when ? { all: [when] } : when
      engine.addRule({ name: rule.id, conditions: conditions as TopLevelCondition, event: { type: rule.id } })
      return {
        id: rule.id,
        group: group.id,
        because: rule.because,
        source: rule.source,
        bits: Int8Array.from(edition.causeIds, (cause) => rule.says[cause] ?? rule.others ?? 0),
        facts: [...new Set(comparisons(when).map((c) => c.fact))],
        holds: compileCondition(when),
      }
    }),
  )
  const result: Ready = { rules, engine, lastRun: Promise.resolve() }
  made.set(edition, result)
  return result
}

/** The rules that fire on the facts of one mode, by json-rules-engine, in the edition's order. */
export async function fire(edition: Edition, facts: Facts): Promise<ReadyRule[]> {
  const prepared = ready(edition)
  const { engine, rules } = prepared
  const given = Object.fromEntries([...facts].map(([name, fact]) => [name, fact.value]))
  // One engine runs one sheet at a time: the first of two runs to finish would end the other half-way.
  const run = prepared.lastRun.then(() => engine.run(given))
  prepared.lastRun = run.catch(() => undefined)
  const { events } = await run
  const fired = new Set(events.map((e) => e.type))
  return rules.filter((rule) => fired.has(rule.id))
}
