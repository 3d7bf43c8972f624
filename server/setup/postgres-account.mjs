import { createHash } from 'node:crypto'
import { execFileSync } from 'node:child_process'
import { chownSync, mkdirSync, readFileSync, statSync } from 'node:fs'
import { basename, dirname, join } from 'node:path'
import { Fault } from './fault.mjs'

// Linux capabilities, by their bit.
const readSearch = { bit: 2n, name: 'dac_read_search' }
const override = { bit: 1n, name: 'dac_override' }

const isRoot = () => process.getuid?.() === 0

/** Whether some folder above this one lets nobody but its owner pass. */
function isClosed(path) {
  for (let above = dirname(path); ; above = dirname(above)) {
    if ((statSync(above).mode & 0o001) === 0) return true
    if (above === dirname(above)) return false
  }
}

/** A capability that lets postgres through closed folders and that this process may hand on. Undefined: there is none. */
function passThrough() {
  const status = readFileSync('/proc/self/status', 'utf8')
  const set = (name) => BigInt(`0x${new RegExp(`^${name}:\\s*([0-9a-f]+)`, 'm').exec(status)?.[1] ?? '0'}`)
  const usable = set('CapBnd') & set('CapPrm')
  return [readSearch, override].find(({ bit }) => (usable >> bit) & 1n)?.name
}

function postgresIds() {
  try {
    const id = (flag) =>
      Number(
        execFileSync('id', [flag, 'postgres'], { encoding: 'utf8', stdio: ['ignore', 'pipe', 'ignore'] }),
      )
    return { uid: id('-u'), gid: id('-g') }
  } catch {
    throw new Fault('There is no account "postgres", and PostgreSQL refuses to run as root.')
  }
}

/**
 * Who runs PostgreSQL, and where its cluster then lies: an ordinary person runs it directly; for root, the account
 * "postgres" does, with one capability more where a folder above the checkout is closed to it.
 * @param wanted the cluster's folder
 */
export function clusterAccount(wanted) {
  if (!isRoot()) return { folder: wanted, command: (program, args) => [program, args], give: () => undefined }
  const { uid, gid } = postgresIds()
  let folder = wanted
  let more = []
  mkdirSync(dirname(wanted), { recursive: true })
  if (isClosed(wanted)) {
    const name = passThrough()
    if (name !== undefined) more = [`--inh-caps=+${name}`, `--ambient-caps=+${name}`]
    else {
      const hash = createHash('sha256').update(wanted).digest('hex').slice(0, 16)
      folder = join('/var/lib/tracelamp', hash, basename(wanted))
    }
  }
  const become = ['--reuid=postgres', '--regid=postgres', '--init-groups', ...more]
  return {
    folder,
    command: (program, args) => ['setpriv', [...become, program, ...args]],
    give: (path) => chownSync(path, uid, gid),
  }
}
