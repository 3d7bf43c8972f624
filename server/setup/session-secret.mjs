import { randomBytes } from 'node:crypto'
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { dataFolder } from './places.mjs'

const path = join(dataFolder, 'session-secret')

/** The secret that signs cookies on the private database: made once, and kept beside that. */
export function privateSecret() {
  mkdirSync(dataFolder, { recursive: true })
  try {
    writeFileSync(path, randomBytes(32).toString('hex'), { flag: 'wx', mode: 0o600 })
  } catch (error) {
    if (error.code !== 'EEXIST') throw error
  }
  return readFileSync(path, 'utf8').trim()
}
