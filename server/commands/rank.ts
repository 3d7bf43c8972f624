/** `npm run -s rank -- FILE [--priors flat|field]`: one answer a line for each case of a JSON Lines file. */
import { openEdition } from '../../rules/edition/open.ts'
import { readStarterDiagnosis } from '../editions/read-starter.ts'
import { answerCase } from './answer.ts'
import { callFolder } from './call-folder.ts'
import { badUsage, parseLine, readArguments, readLines } from './read-cases.ts'

// A reader that has seen enough closes the pipe: that is no fault of ours.
process.stdout.on('error', (fault: NodeJS.ErrnoException) => {
  if (fault.code === 'EPIPE') process.exit(0)
  throw fault
})

async function main(): Promise<number> {
  const args = readArguments(process.argv.slice(2), 1)
  if (args === undefined) {
    console.error(
      'usage: npm run -s rank -- FILE [--priors flat|field]   (FILE: JSON Lines, - for standard input)',
    )
    return badUsage
  }
  const lines = await readLines(args.files[0] ?? '-', callFolder()).catch((cause: unknown) => {
    console.error(`can't read ${args.files[0]}: ${cause instanceof Error ? cause.message : String(cause)}`)
    return undefined
  })
  if (lines === undefined) return badUsage
  const edition = openEdition(await readStarterDiagnosis())
  for (const line of lines) {
    const answer = await answerCase(edition, parseLine(line), args.priors)
    // Waits where the reader is slower than we are, so that nothing is lost at the end of a pipe.
    if (!process.stdout.write(`${JSON.stringify(answer)}\n`))
      await new Promise((resume) => process.stdout.once('drain', resume))
  }
  return 0
}

process.exitCode = await main()
