/**
 * How often each test ends each way when nothing is known: model cases of every cause, each put to the outcome whose
 * representative findings it is most like. What a table says of a cause, times this, is the outcome's chance with it.
 */
import { fitsContext } from '../../../rules/edition/open.ts'
import type { Edition } from '../../../rules/edition/open.ts'
import type { Outcome, Test } from '../../../rules/edition/schema.ts'
import type { ModelCase } from '../model/cases.ts'

/** Tests of which the model gives every finding, and no cause without a wiring decides the outcome. */
export const computedTests: readonly string[] = [
  'tester-lamps',
  'ask-lights',
  'ask-extent',
  'receptacle-volts',
  'receptacle-volts-loaded',
  'receptacle-ohms',
  'ground-to-earth',
  'loop-ohms',
  'ground-wire-ohms',
  'branch-ground-amps',
  'bulb-neutral-ground',
  'bulb-hot-ground',
  'panel-volts',
  'panel-legs',
  'panel-legs-ground',
  'panel-volts-loaded',
  'panel-ohms',
  'feeder-ground-amps',
  'rod-amps',
  'source-volts',
  'source-volts-loaded',
  'source-ohms',
  'source-bulb',
  'gfci-own-test',
  'gfci-plug-test',
  'gfci-in-use',
]

/** No outcome is rarer: the model knows no cause that shows it, and some house does. */
const rarest = 0.01
const fewestCases = 200

type Given = Outcome['findings'][string]

/** How unlike a finding is to an outcome's: 0 alike, 1 as far apart as full voltage and none. */
function unlike(id: string, found: number | string, given: Given, one: ModelCase, nominal: number): number {
  if (typeof found === 'string' || typeof given === 'string') return found === given ? 0 : 1
  if (id.endsWith('ohms') || id.endsWith('amps')) {
    const decades = (x: number) => Math.log10(Math.min(Math.max(x, 0.05), 1e6))
    return Math.abs(decades(found) - decades(typeof given === 'number' ? given : given.times)) / 3
  }
  // A loaded hot–neutral is told by what it was before the load.
  const before = id.endsWith('.hn.volts.loaded') ? one.findings[id.replace(/\.loaded$/, '')] : undefined
  const full = typeof before === 'number' && before > 0 ? before : nominal
  const expected = typeof given === 'number' ? given : given.times * full
  return Math.abs(found - expected) / nominal
}

/** A loaded pair differs by percents where volts of a place differ by halves: small things count more near nothing. */
const near = (test: Test, x: number) => (test.findings.some((f) => f.endsWith('.loaded')) ? x : x ** 2)

export class OutcomeTally {
  readonly #nominal: (system: string) => number
  readonly #tests: { test: Test; ends: Map<string, { could: number; ended: number }> }[]

  constructor(edition: Edition) {
    this.#nominal = (system) => edition.systems.get(system)?.nominalVolts ?? 120
    this.#tests = computedTests.map((id) => {
      const test = edition.tests.get(id)
      if (test === undefined) throw new RangeError(`no test ${id} in the edition`)
      return { test, ends: new Map(test.outcomes.map((o) => [o.id, { could: 0, ended: 0 }])) }
    })
  }

  add(one: ModelCase): void {
    for (const { test, ends } of this.#tests) {
      const taken = test.findings.filter((id) => one.findings[id] !== undefined)
      if (taken.length < test.findings.length) continue
      const open = test.outcomes.filter((o) => fitsContext(o, one.context))
      const distance = (o: Outcome) =>
        taken.reduce((sum, id) => {
          const [found, given] = [one.findings[id], o.findings[id]]
          if (found === undefined || given === undefined) return sum
          return sum + near(test, unlike(id, found, given, one, this.#nominal(one.context.system)))
        }, 0)
      const likest = open.reduce<Outcome | undefined>(
        (best, o) => (best === undefined || distance(o) < distance(best) ? o : best),
        undefined,
      )
      for (const o of open) {
        const end = ends.get(o.id)
        if (end === undefined) continue
        end.could += 1
        if (o === likest) end.ended += 1
      }
    }
  }

  /** By test and outcome, two decimals; tests met too seldom are left out. */
  weights(): ReadonlyMap<string, ReadonlyMap<string, number>> {
    return new Map(
      this.#tests
        .filter(({ ends }) => [...ends.values()].some((e) => e.could >= fewestCases))
        .map(({ test, ends }) => [
          test.id,
          new Map(
            [...ends].map(([id, { could, ended }]) => [
              id,
              Math.max(rarest, Math.round((100 * ended) / Math.max(1, could)) / 100),
            ]),
          ),
        ]),
    )
  }
}
