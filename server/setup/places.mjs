import { resolve } from 'node:path'
import { fileURLToPath } from 'node:url'

/** The checkout. */
export const root = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '')

/** Where the private database, its log and the lock lie. `DATA_DIR` puts them elsewhere. */
export const dataFolder = resolve(root, process.env.DATA_DIR || '.data')
