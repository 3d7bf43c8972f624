/** `npm run -s rank:score -- FILE… [--priors flat|field]`: how often the right cause leads, cut by cut. */
import { openEdition } from '../../rules/edition/open.ts'
import { readStarterDiagnosis } from '../editions/read-starter.ts'
import { badUsage, casesAsCalled, parseLine } from './read-cases.ts'
import { score } from './scoring.ts'
import type { Cut } from './scoring.ts'

const cuts: readonly Cut[] = ['kit', 'meter', 'call']

async function main(): Promise<number> {
  const called = await casesAsCalled('npm run -s rank:score -- FILE… [--priors flat|field]', Infinity)
  if (called === undefined) return badUsage
  const cases = called.lines.map(parseLine)
  const edition = openEdition(await readStarterDiagnosis())
  console.log(`${cases.length} cases, priors ${called.priors}`)
  console.log('cut     top-1   top-3   Brier   calibration   misfit')
  for (const cut of cuts) {
    const s = await score(edition, cases, cut, called.priors)
    const figures = [s.top1, s.top3, s.brier, s.calibration, s.misfits].map((x) => x.toFixed(3))
    console.log(
      `${cut.padEnd(8)}${figures[0]}   ${figures[1]}   ${figures[2]}   ${figures[3]}         ${figures[4]}`,
    )
    for (const [pair, count] of s.confused.slice(0, 12)) console.log(`          ${count} × ${pair}`)
  }
  return 0
}

process.exitCode = await main()
