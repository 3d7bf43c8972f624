/**
 * `npm run -s rank:fit`: counts model cases, and writes the bits of the computed groups into the starter's rules
 * and the weights of the computed tests' outcomes into its tests. Run again it writes the same bytes.
 */
import { readdir, readFile, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { openEdition } from '../../rules/edition/open.ts'
import { readStarterDiagnosis } from '../editions/read-starter.ts'
import { badUsage } from './read-cases.ts'
import { fittedBits } from './fit/fitted.ts'
import { withBits } from './fit/write-bits.ts'
import { withWeights } from './fit/write-weights.ts'

const usage = `npm run -s rank:fit [-- --check]
  --check   writes nothing; ends with 1 where a file would change`
const folder = fileURLToPath(new URL('../../rules/starter/', import.meta.url))

/** Rewrites the files of a folder that change; their count. */
async function rewrite(part: string, check: boolean, change: (text: string) => string): Promise<number> {
  let changed = 0
  for (const name of (await readdir(join(folder, part))).filter((n) => n.endsWith('.json')).sort()) {
    const path = join(folder, part, name)
    const before = await readFile(path, 'utf8')
    const after = change(before)
    if (after === before) continue
    changed += 1
    console.log(`${check ? 'differs' : 'written'}: ${part}/${name}`)
    if (!check) await writeFile(path, after)
  }
  return changed
}

async function main(): Promise<number> {
  const args = process.argv.slice(2)
  const check = args[0] === '--check'
  if (args.length > (check ? 1 : 0)) {
    console.error(`usage: ${usage}`)
    return badUsage
  }
  const edition = openEdition(await readStarterDiagnosis())
  const { bits, weights, tooRare } = fittedBits(edition)
  const changed =
    (await rewrite('rules', check, (text) => withBits(text, bits, edition.causeIds))) +
    (await rewrite('tests', check, (text) => withWeights(text, weights)))
  console.log(`${bits.size} rules computed, ${changed} files ${check ? 'differ' : 'changed'}`)
  if (tooRare.length > 0) console.log(`too rare in the model, left as written: ${tooRare.join(', ')}`)
  return check && changed > 0 ? 1 : 0
}

process.exitCode = await main()
