/** `npm run -s rank:score -- FILE… [--priors flat|field]`: how often the right cause leads, cut by cut. */
import { openEdition } from '../../rules/edition/open.ts'
import { readStarterDiagnosis } from '../editions/read-starter.ts'
import { callFolder } from './call-folder.ts'
import { badUsage, parseLine, readArguments, readLines } from './read-cases.ts'
import { score } from './scoring.ts'
import type { Cut } from './scoring.ts'

const cuts: readonly Cut[] = ['kit', 'meter', 'call']

async function main(): Promise<number> {
  const args = readArguments(process.argv.slice(2), Infinity)
  if (args === undefined) {
    console.error('usage: npm run -s rank:score -- FILE… [--priors flat|field]')
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
  console.log(`${cases.length} cases, priors ${args.priors}`)
  console.log('cut     top-1   top-3   Brier   calibration   misfit')
  for (const cut of cuts) {
    const s = await score(edition, cases, cut, args.priors)
    const figures = [s.top1, s.top3, s.brier, s.calibration, s.misfits].map((x) => x.toFixed(3))
    console.log(
      `${cut.padEnd(8)}${figures[0]}   ${figures[1]}   ${figures[2]}   ${figures[3]}         ${figures[4]}`,
    )
    for (const [pair, count] of s.confused.slice(0, 12)) console.log(`          ${count} × ${pair}`)
  }
  return 0
}

process.exitCode = await main()
