import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { Fault } from './fault.mjs'
import { dataFolder, root } from './places.mjs'

const path = join(dataFolder, 'start.lock')

/** The start that holds the lock. Undefined when there is none, or only one that crashed. */
export function holder() {
  try {
    const { pid, address } = JSON.parse(readFileSync(path, 'utf8'))
    // A number alone proves nothing: after a restart of the machine it belongs to somebody else.
    const command = readFileSync(`/proc/${pid}/cmdline`, 'utf8')
    return pid !== process.pid && command.includes('server/setup/start.mjs') ? { pid, address } : undefined
  } catch {
    return undefined
  }
}

/**
 * One start a checkout: takes the lock, or says where the other one is.
 * @returns a function that gives it back
 */
export function takeLock(address) {
  try {
    mkdirSync(dataFolder, { recursive: true })
  } catch (error) {
    throw new Fault(`${dataFolder} can't be made (${error.code}). Is ${root} another person's checkout?`)
  }
  for (let attempt = 0; attempt < 2; attempt++) {
    try {
      writeFileSync(path, JSON.stringify({ pid: process.pid, address }), { flag: 'wx' })
      return () => rmSync(path, { force: true })
    } catch (error) {
      if (error.code !== 'EEXIST') throw new Fault(`${path} can't be written (${error.code}).`)
      const other = holder()
      if (other !== undefined) throw new Fault(`already running at ${other.address} (process ${other.pid})`)
      rmSync(path, { force: true })
    }
  }
  throw new Fault(`${path} is being taken by another start.`)
}
