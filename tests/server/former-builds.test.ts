import { mkdir, mkdtemp, readFile, readdir, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, expect, test } from 'vitest'

const { takeOverBuilds } = (await import(
  new URL('../../server/setup/former-builds.mjs', import.meta.url).href
)) as { takeOverBuilds: (from: string, to: string) => Promise<void> }

let home: string
beforeAll(async () => {
  home = await mkdtemp(join(tmpdir(), 'tracelamp-builds-'))
})
afterAll(() => rm(home, { recursive: true }))

/** A build of one part of its own and one that no build changes, on top of the one before. */
async function build(number: number): Promise<string> {
  const folder = join(home, `build-${number}`)
  await mkdir(join(folder, 'assets'), { recursive: true })
  await writeFile(join(folder, 'assets', `page-${number}.js`), `made by ${number}`)
  await writeFile(join(folder, 'assets', 'font.woff2'), `kept by ${number}`)
  await takeOverBuilds(join(home, `build-${number - 1}`), folder)
  return folder
}
const parts = async (folder: string) => (await readdir(join(folder, 'assets'))).sort()

test('the parts of the last two builds stay beside the newest, those before them go', async () => {
  expect(await parts(await build(1))).toEqual(['font.woff2', 'page-1.js'])
  expect(await parts(await build(2))).toEqual(['font.woff2', 'page-1.js', 'page-2.js'])
  expect(await parts(await build(3))).toEqual(['font.woff2', 'page-1.js', 'page-2.js', 'page-3.js'])
  const fourth = await build(4)
  expect(await parts(fourth)).toEqual(['font.woff2', 'page-2.js', 'page-3.js', 'page-4.js'])
  expect(await readFile(join(fourth, 'assets', 'page-2.js'), 'utf8')).toBe('made by 2')
  expect(await readFile(join(fourth, 'assets', 'font.woff2'), 'utf8')).toBe('kept by 4')
})

test('a build made before builds were listed counts as one', async () => {
  const [plain, next] = [join(home, 'plain'), join(home, 'next')]
  for (const folder of [plain, next]) await mkdir(join(folder, 'assets'), { recursive: true })
  await writeFile(join(plain, 'assets', 'old.js'), 'old')
  await writeFile(join(next, 'assets', 'new.js'), 'new')
  await takeOverBuilds(plain, next)
  expect(await parts(next)).toEqual(['new.js', 'old.js'])
})
