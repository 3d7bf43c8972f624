/** `npm run -s rank:steps -- FILE… [--priors flat|field]`: how many further tests from the kit to the cause. */
import { openEdition } from '../../rules/edition/open.ts'
import { readStarterDiagnosis } from '../editions/read-starter.ts'
import { badUsage, casesAsCalled, parseLine } from './read-cases.ts'
import { stepsOf } from './steps.ts'

async function main(): Promise<number> {
  const called = await casesAsCalled('npm run -s rank:steps -- FILE… [--priors flat|field]', Infinity)
  if (called === undefined) return badUsage
  const cases = called.lines.map(parseLine)
  const edition = openEdition(await readStarterDiagnosis())
  console.log('order    tests on average   leader right')
  for (const order of ['next', 'fixed'] as const) {
    let [tests, right, read] = [0, 0, 0]
    for (const raw of cases) {
      const steps = await stepsOf(edition, raw, called.priors, order)
      if (steps === undefined) continue
      read += 1
      tests += steps.tests
      right += steps.right ? 1 : 0
    }
    const n = Math.max(1, read)
    console.log(`${order.padEnd(9)}${(tests / n).toFixed(2)}               ${(right / n).toFixed(3)}`)
  }
  return 0
}

process.exitCode = await main()
