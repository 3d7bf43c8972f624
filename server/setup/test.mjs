/** `npm test`: from a fresh clone to the last line "N passed, N failed". Types and the linter count as a test each. */
import { mkdirSync, readFileSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { needChromium } from './chromium.mjs'
import { needClient } from './client.mjs'
import { sayWhy } from './fault.mjs'
import { needNgspice } from './ngspice.mjs'
import { needPackages } from './packages.mjs'
import { dataFolder, root } from './places.mjs'
import { needPostgres } from './postgres-programs.mjs'
import { tryToRun } from './run.mjs'
import { isStopping, stopAll, stopOnSignals } from './stop.mjs'

const inModules = (path) => join(root, 'node_modules', path)
const count = { passed: 0, failed: 0 }

/** One check that passes or fails as a whole. */
async function check(words, program, args) {
  const since = Date.now()
  const { code, output } = await tryToRun(process.execPath, [inModules(program), ...args])
  if (isStopping()) return
  count[code === 0 ? 'passed' : 'failed'] += 1
  if (code !== 0) console.log(output.trimEnd())
  console.log(
    `${words}: ${code === 0 ? 'in order' : 'FAILED'} (${Math.round((Date.now() - since) / 1000)} s)`,
  )
}

/** Adds up what a report of the test runner says. A file that can't even be loaded has no tests, and is a failure. */
function countReport(path, code) {
  let report
  try {
    report = JSON.parse(readFileSync(path, 'utf8'))
  } catch {
    console.log('The test runner left no report.')
    count.failed += 1
    return
  }
  const broken = report.testResults.filter(
    (file) => file.status === 'failed' && file.assertionResults.length === 0,
  )
  const failed = report.numFailedTests + broken.length
  count.passed += report.numPassedTests
  // An error outside of every test fails the run without failing a test.
  count.failed += failed === 0 && code !== 0 ? 1 : failed
}

async function tests(project) {
  const report = join(dataFolder, `tests-${project}.json`)
  rmSync(report, { force: true })
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${report}`]
  const { code } = await tryToRun(
    process.execPath,
    [inModules('vitest/vitest.mjs'), 'run', '--project', project, ...reporters],
    { show: true },
  )
  if (!isStopping()) countReport(report, code)
}

async function main() {
  mkdirSync(dataFolder, { recursive: true })
  await needPackages()
  await needPostgres()
  await needChromium()
  await needNgspice()
  await needClient()
  await check('Types', 'typescript-native/bin/tsc', ['-p', 'tsconfig.json', '--noEmit'])
  await check('Types of the core', 'typescript-native/bin/tsc', ['-p', 'rules/tsconfig.json', '--noEmit'])
  await check('Linter and import fence', 'eslint/bin/eslint.js', ['.', '--max-warnings', '0'])
  await tests('node')
  await tests('browser')
}

stopOnSignals(130)
try {
  await main()
} catch (error) {
  if (!isStopping()) sayWhy(error)
  count.failed += 1
}
if (isStopping()) await stopAll(130)
console.log(`${count.passed} passed, ${count.failed} failed`)
process.exitCode = count.failed === 0 ? 0 : 1
