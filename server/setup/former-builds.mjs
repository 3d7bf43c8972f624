/**
 * A tab that was opened before an update asks, days later, for parts of the build it came from. Their names hold their
 * hashes, so the files of the last builds lie beside those of the newest.
 */
import { copyFile, mkdir, readFile, readdir, writeFile } from 'node:fs/promises'
import { join } from 'node:path'

const formerBuilds = 2
const list = '.builds.json'

const filesIn = (folder) => readdir(join(folder, 'assets')).catch(() => [])

/** The files of each build that lies in a folder, the newest first. */
async function buildsIn(folder) {
  const read = await readFile(join(folder, list), 'utf8').then(JSON.parse, () => undefined)
  if (read !== undefined) return read
  const files = await filesIn(folder)
  return files.length === 0 ? [] : [files]
}

/**
 * Takes over the files of the last builds.
 * @param from where the build before and those that it had taken over lie, if there are any
 * @param to where the newest build lies
 */
export async function takeOverBuilds(from, to) {
  const own = await filesIn(to)
  const former = (await buildsIn(from)).slice(0, formerBuilds)
  const there = new Set(own)
  const old = new Set(await filesIn(from))
  await mkdir(join(to, 'assets'), { recursive: true })
  for (const file of new Set(former.flat()))
    if (!there.has(file) && old.has(file))
      await copyFile(join(from, 'assets', file), join(to, 'assets', file))
  await writeFile(join(to, list), JSON.stringify([own, ...former]))
}
