import { createHash } from 'node:crypto'
import { readFile, readdir, stat, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { root } from './places.mjs'
import { step } from './progress.mjs'
import { run } from './run.mjs'

/** What the built pages are made of. */
const sources = [
  'src',
  'rules',
  'server', // its contracts are part of the pages
  'public',
  'index.html',
  'vite.config.ts',
  'tailwind.config.ts',
  'package-lock.json',
]
const inPages = (path) => !path.startsWith('server/') || path.endsWith('.contract.ts')
const stamp = join(root, 'dist', '.made-of')

async function filesUnder(path) {
  const found = await stat(join(root, path)).catch(() => undefined)
  if (found === undefined) return []
  if (!found.isDirectory()) return [path]
  const inside = await readdir(join(root, path))
  return (await Promise.all(inside.map((name) => filesUnder(`${path}/${name}`)))).flat()
}

async function hashOfSources() {
  const hash = createHash('sha256')
  const files = (await Promise.all(sources.map(filesUnder))).flat().filter(inPages).sort()
  for (const file of files) hash.update(`${file}\0`).update(await readFile(join(root, file)))
  return hash.digest('hex')
}

/** Builds the pages into dist, unless they are there and made of these very files. */
export async function needClient() {
  const hash = await hashOfSources()
  const made = await readFile(stamp, 'utf8').catch(() => '')
  if (made === hash) return
  await step('Building the pages', async () => {
    await run(process.execPath, [join(root, 'node_modules/vite/bin/vite.js'), 'build'])
    await writeFile(stamp, hash)
  })
}
