import { createHash } from 'node:crypto'
import { readFile, readdir, rename, rm, stat, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { takeOverBuilds } from './former-builds.mjs'
import { root } from './places.mjs'
import { step } from './progress.mjs'
import { run } from './run.mjs'
import { buildWorker } from './worker.mjs'

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
const madeBy = ['server/setup/worker.mjs']
const inPages = (path) =>
  !path.startsWith('server/') || path.endsWith('.contract.ts') || madeBy.includes(path)
const dist = join(root, 'dist')
const next = join(root, 'dist.next')
const former = join(root, 'dist.former')
const stamp = '.made-of'

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

/**
 * Builds the pages into dist, unless they are there and made of these very files. The new ones take the place of the
 * old ones once they are whole: a running server never serves half of them, and a build that fails changes nothing.
 */
export async function needClient() {
  const hash = await hashOfSources()
  const made = await readFile(join(dist, stamp), 'utf8').catch(() => '')
  if (made === hash) return
  await step('Building the pages', async () => {
    const vite = join(root, 'node_modules/vite/bin/vite.js')
    await run(process.execPath, [vite, 'build', '--outDir', next, '--emptyOutDir'])
    await buildWorker(next)
    await takeOverBuilds(dist, next)
    await writeFile(join(next, stamp), hash)
    await rm(former, { recursive: true, force: true })
    await rename(dist, former).catch((error) => {
      if (error.code !== 'ENOENT') throw error
    })
    await rename(next, dist)
    await rm(former, { recursive: true, force: true })
  })
}
