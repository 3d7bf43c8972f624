import { createHash } from 'node:crypto'
import { readFile, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { root } from './places.mjs'
import { step } from './progress.mjs'
import { run } from './run.mjs'

const stamp = join(root, 'node_modules', '.installed-lock')

const readJson = async (path) => JSON.parse(await readFile(path, 'utf8'))

/** Whether npm's own record says that what lies in node_modules is what the lock file asks for. */
async function isInstalled() {
  try {
    const wanted = (await readJson(join(root, 'package-lock.json'))).packages
    const there = (await readJson(join(root, 'node_modules', '.package-lock.json'))).packages
    const inPlace = (path) => there[path]?.version === wanted[path]?.version
    // What is optional may be missing: it is for other machines.
    return (
      Object.keys(there).every(inPlace) &&
      Object.keys(wanted).every(
        (path) => path === '' || wanted[path].optional || wanted[path].peer || inPlace(path),
      )
    )
  } catch {
    return false
  }
}

/** Installs the packages of the lock file unless they are installed. The lock file's hash decides, not a time. */
export async function needPackages() {
  const hash = createHash('sha256')
    .update(await readFile(join(root, 'package-lock.json')))
    .digest('hex')
  const installed = await readFile(stamp, 'utf8').catch(() => '')
  if (installed === hash) return
  if (!(await isInstalled()))
    await step('Installing the packages of the lock file', () => {
      const npm = process.env.npm_execpath
      const args = ['ci', '--include=dev', '--no-audit', '--no-fund']
      return npm ? run(process.execPath, [npm, ...args]) : run('npm', args)
    })
  await writeFile(stamp, hash)
}
