/**
 * `npm run -s rank:model`: the rules against the circuit model. Wires every cause over sampled parameters, meters and
 * people, ranks what they find, and says how often the right cause leads. `model/options.ts` lists the options.
 */
import { writeFile } from 'node:fs/promises'
import { resolve } from 'node:path'
import { openEdition } from '../../rules/edition/open.ts'
import type { Edition } from '../../rules/edition/open.ts'
import { impossible } from '../../rules/circuit/possible.ts'
import { electricalCauses } from '../../rules/circuit/wiring/context.ts'
import { readStarterDiagnosis } from '../editions/read-starter.ts'
import { callFolder } from './call-folder.ts'
import { modelCase, pairCase } from './model/cases.ts'
import type { ModelCase, PairCase } from './model/cases.ts'
import { readOptions, usage } from './model/options.ts'
import type { Options } from './model/options.ts'
import { scorePairs } from './model/score-pairs.ts'
import { badUsage } from './read-cases.ts'
import { score } from './scoring.ts'
import { stepsOf } from './steps.ts'

const upTo = (n: number) => Array.from({ length: n }, (_, i) => i)
const row = (...cells: string[]) => console.log(cells.map((c, i) => c.padEnd(i === 0 ? 10 : 9)).join(''))
const three = (x: number) => x.toFixed(3)

async function singles(edition: Edition, cases: readonly ModelCase[], o: Options): Promise<void> {
  row('cut', 'top-1', 'top-3', 'Brier', 'calibr.', 'misfit')
  for (const cut of ['kit', 'meter', 'call'] as const) {
    const s = await score(edition, cases, cut, o.priors)
    row(cut, ...[s.top1, s.top3, s.brier, s.calibration, s.misfits].map(three))
    for (const [pair, count] of s.confused.slice(0, o.confused)) console.log(`          ${count} × ${pair}`)
  }
}

async function furtherTests(edition: Edition, cases: readonly ModelCase[], o: Options): Promise<void> {
  console.log(`\nfurther tests from the kit, ${cases.length} cases`)
  row('order', 'tests', 'right')
  const average: number[] = []
  for (const order of ['next', 'fixed'] as const) {
    let [tests, right] = [0, 0]
    for (const one of cases) {
      const steps = await stepsOf(edition, one, o.priors, order)
      if (steps === undefined) throw new Error(`${one.id} can't be read`)
      tests += steps.tests
      right += steps.right ? 1 : 0
    }
    average.push(tests / cases.length)
    row(order, (tests / cases.length).toFixed(2), three(right / cases.length))
  }
  console.log(`next ÷ fixed ${((average[0] ?? 0) / (average[1] ?? 1)).toFixed(2)}`)
}

async function pairs(edition: Edition, cases: readonly PairCase[], o: Options): Promise<void> {
  const s = await scorePairs(edition, cases, o.priors)
  console.log(
    `\ntwo faults at once, ${s.pairs} pairs: one of the two leads or misfit ${three(s.met)}, one of the two leads ` +
      `${three(s.named)}, misfit ${three(s.misfits)}`,
  )
  for (const [words, count] of s.missed.slice(0, o.confused)) console.log(`          ${count} × ${words}`)
}

/** How often no wiring of any one cause gives what was found: of one fault a false alarm, of two the truth. */
function byPhysics(cases: readonly ModelCase[], both: readonly PairCase[]): void {
  const called = (some: readonly ModelCase[]) =>
    some.filter((c) => impossible(c.context, c.findings, c.context.meterOhms) !== undefined).length /
    Math.max(1, some.length)
  console.log(
    `\nno wiring of any one cause gives the findings: ${three(called(cases))} of one fault, ` +
      `${three(called(both))} of two`,
  )
}

async function main(): Promise<number> {
  const o = readOptions(process.argv.slice(2))
  if (o === undefined) {
    console.error(`usage: ${usage}`)
    return badUsage
  }
  // The two parts share no seed, so what is fitted to one has never seen the other.
  const seed = `${o.part} ${o.seed}`
  const cases = electricalCauses.flatMap((cause) =>
    upTo(o.each).map((n) => modelCase(seed, cause, n, o.everything)),
  )
  const both = upTo(o.pairs).map((n) => pairCase(seed, n, o.everything))
  if (o.write !== undefined) {
    const lines = [...cases, ...both].map((one) => JSON.stringify(one) + '\n')
    await writeFile(resolve(callFolder(), o.write), lines.join(''))
    console.log(`${lines.length} cases written`)
    return 0
  }
  const edition = openEdition(await readStarterDiagnosis())
  console.log(`${cases.length} model cases, ${o.part}, seed ${o.seed}, priors ${o.priors}`)
  if (cases.length > 0) await singles(edition, cases, o)
  const counted = cases.filter((_, i) => i % o.each < o.steps)
  if (counted.length > 0) await furtherTests(edition, counted, o)
  if (both.length > 0) await pairs(edition, both, o)
  if (o.physics) byPhysics(cases, both)
  return 0
}

process.exitCode = await main()
