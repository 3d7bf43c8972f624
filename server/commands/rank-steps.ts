/** `npm run -s rank:steps -- FILE… [--priors flat|field]`: how many further tests from the kit to the cause. */
import { openEdition } from '../../rules/edition/open.ts'
import { readStarterDiagnosis } from '../editions/read-starter.ts'
import { callFolder } from './call-folder.ts'
import { badUsage, parseLine, readArguments, readLines } from './read-cases.ts'
import { stepsOf } from './steps.ts'

async function main(): Promise<number> {
  const args = readArguments(process.argv.slice(2), Infinity)
  if (args === undefined) {
    console.error('usage: npm run -s rank:steps -- FILE… [--priors flat|field]')
    return badUsage
  }
  let cases: unknown[]
  try {
    cases = (await Promise.all(args.files.map((file) => readLines(file, callFolder())))).flat().map(parseLine)
  } catch (cause) {
    console.error(`can't read: ${cause instanceof Error ? cause.message : String(cause)}`)
    return badUsage
  }
  const edition = openEdition(await readStarterDiagnosis())
  console.log('order    tests on average   leader right')
  for (const order of ['next', 'fixed'] as const) {
    let [tests, right, read] = [0, 0, 0]
    for (const raw of cases) {
      const steps = await stepsOf(edition, raw, args.priors, order)
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
