import { existsSync } from 'node:fs'
import { Fault } from './fault.mjs'
import { step } from './progress.mjs'
import { run } from './run.mjs'

const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' }

/** Installs a Debian package, as root; anyone else is told in one line what is missing. */
export async function installPackage(name, what) {
  const byHand = `${what} is missing. Install it first: apt-get install ${name} (as root), then try again.`
  if (process.getuid?.() !== 0 || !existsSync('/usr/bin/apt-get')) throw new Fault(byHand)
  await step(`Installing ${what} from Debian's packages`, async () => {
    await run('apt-get', ['update', '-q'], { env })
    const keepOurs = ['-o', 'Dpkg::Options::=--force-confold']
    await run('apt-get', ['install', '-y', '-q', '--no-install-recommends', ...keepOurs, name], { env })
  })
}
