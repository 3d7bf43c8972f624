/** `npm run -s rank -- FILE [--priors flat|field]`: one answer a line for each case of a JSON Lines file. */
import { openEdition } from '../../rules/edition/open.ts'
import { readStarterDiagnosis } from '../editions/read-starter.ts'
import { answerCase } from './answer.ts'
import { badUsage, casesAsCalled, parseLine } from './read-cases.ts'

// A reader that has seen enough closes the pipe: that is no fault of ours.
process.stdout.on('error', (fault: NodeJS.ErrnoException) => {
  if (fault.code === 'EPIPE') process.exit(0)
  throw fault
})

async function main(): Promise<number> {
  const called = await casesAsCalled(
    'npm run -s rank -- FILE [--priors flat|field]   (FILE: JSON Lines, - for standard input)',
    1,
  )
  if (called === undefined) return badUsage
  const edition = openEdition(await readStarterDiagnosis())
  for (const line of called.lines) {
    const answer = await answerCase(edition, parseLine(line), called.priors)
    // Waits where the reader is slower than we are, so that nothing is lost at the end of a pipe.
    if (!process.stdout.write(`${JSON.stringify(answer)}\n`))
      await new Promise((resume) => process.stdout.once('drain', resume))
  }
  return 0
}

process.exitCode = await main()
