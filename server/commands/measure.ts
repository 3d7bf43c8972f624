/**
 * `npm run measure`: how long things take, as ratios within one run. Nothing here is a test: a machine's speed is
 * no fact about the product.
 */
import { performance } from 'node:perf_hooks'
import { Engine } from 'json-rules-engine'
import type { TopLevelCondition } from 'json-rules-engine'
import { openEdition } from '../../rules/edition/open.ts'
import type { Edition } from '../../rules/edition/open.ts'
import { deriveFacts } from '../../rules/findings/facts.ts'
import { readCase } from '../../rules/findings/parse.ts'
import { diagnose } from '../../rules/ranking/diagnose.ts'
import { readStarterDiagnosis } from '../editions/read-starter.ts'
import { answerCase } from './answer.ts'
import { measureAudit } from './measure-audit.ts'
import { measureCircuit } from './measure-circuit.ts'
import { measureSearch } from './measure-search.ts'

/** A sheet with nearly everything taken: the worst a screen has to keep live. */
const fullCase = {
  id: 'full',
  context: { source: 'all-in-one-inverter', system: '120/240', wiring: 'panel', mode: 'battery' },
  findings: {
    'receptacle.hn.volts': 119.6,
    'receptacle.hg.volts': 57.2,
    'receptacle.ng.volts': 56.8,
    'panel.hn.volts': 119.9,
    'panel.hg.volts': 57.5,
    'panel.ng.volts': 57,
    'panel.l1n.volts': 119.9,
    'panel.l2n.volts': 120.4,
    'panel.l1l2.volts': 240.2,
    'receptacle.hn.volts.loaded': 116,
    'receptacle.ng.volts.loaded': 55,
    'receptacle.ng.ohms': 1e9,
    'receptacle.hg.ohms': 1e9,
    'tester.hn-lamp': 'lit',
    'tester.hg-lamp': 'dim',
    'tester.ng-lamp': 'dim',
    'gfci.own-test': 'trips',
    'gfci.plug-test': 'holds',
    lights: 'steady',
    extent: 'everything',
    onset: 'only-on-battery',
    tingle: 'no',
  },
  otherModes: {
    'pass-through': { 'receptacle.hn.volts': 121, 'receptacle.hg.volts': 120.8, 'receptacle.ng.volts': 0.3 },
  },
}

async function median(runs: number, work: () => Promise<unknown>): Promise<number> {
  const times: number[] = []
  for (let i = 0; i < runs; i++) {
    const start = performance.now()
    await work()
    times.push(performance.now() - start)
  }
  return times.sort((a, b) => a - b)[Math.floor(runs / 2)] ?? NaN
}

/** The same rules in a bare json-rules-engine, run on the same facts. */
function rawEngine(edition: Edition): Engine {
  const engine = new Engine([], { allowUndefinedFacts: true })
  for (const rule of edition.file.groups.flatMap((g) => g.rules)) {
    const conditions = ('fact' in rule.when ? { all: [rule.when] } : rule.when) as TopLevelCondition
    engine.addRule({ conditions, event: { type: rule.id } })
  }
  return engine
}

const edition = openEdition(await readStarterDiagnosis())
const read = readCase(edition, fullCase)
if (!read.ok) throw new Error(JSON.stringify(read.errors))
const { sheet } = read
const rules = edition.file.groups.reduce((n, g) => n + g.rules.length, 0)

const engine = rawEngine(edition)
const facts = [...deriveFacts(edition, sheet).values()].map((own) =>
  Object.fromEntries([...own].map(([name, fact]) => [name, fact.value])),
)
await diagnose(edition, sheet) // engines are built once, before anything is timed
const raw = await median(200, async () => {
  for (const own of facts) await engine.run(own)
})
const whole = await median(200, () => diagnose(edition, sheet))
const many = 2000
const start = performance.now()
for (let i = 0; i < many; i++) await answerCase(edition, { ...fullCase, id: String(i) }, 'field')
const rank2000 = (performance.now() - start) / 1000

const row = (what: string, figure: string, ratio: string) =>
  console.log(`${what.padEnd(58)}${figure.padStart(12)}   ${ratio}`)
console.log(
  `${rules} rules, ${edition.tests.size} tests, ${sheet.taken.length} findings in ${facts.length} modes\n`,
)
row('what', 'median', 'against the bare engine')
row('json-rules-engine alone, the same rules and facts', `${raw.toFixed(2)} ms`, '1.0')
row(
  'ranking, evidence, misfit, bond gate and all next tests',
  `${whole.toFixed(2)} ms`,
  (whole / raw).toFixed(1),
)
row(
  '2,000 full cases through the command line’s answer',
  `${rank2000.toFixed(1)} s`,
  ((rank2000 * 1000) / many / raw).toFixed(1),
)
measureAudit()
measureCircuit()
await measureSearch()
