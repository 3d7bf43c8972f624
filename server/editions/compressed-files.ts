import { promisify } from 'node:util'
import { brotliCompress, constants, gzip } from 'node:zlib'
import type { Db } from '../database.ts'
import { findFile } from './editions.queries.ts'

export type Encoding = 'br' | 'gzip' | 'identity'
export type CompressedFile = {
  name: string
  forEveryone: boolean
  bytes: Readonly<Record<Encoding, Buffer>>
}

const brotli = promisify(brotliCompress)
const gzipped = promisify(gzip)
const mostKept = 24

async function load(db: Db, hash: string): Promise<CompressedFile | undefined> {
  const file = await findFile(db, hash)
  if (file === undefined) return undefined
  const [br, gz] = await Promise.all([
    brotli(file.bytes, { params: { [constants.BROTLI_PARAM_QUALITY]: 9 } }),
    gzipped(file.bytes, { level: 9 }),
  ])
  return {
    name: file.name,
    forEveryone: file.audience === 'everyone',
    bytes: { br, gzip: gz, identity: file.bytes },
  }
}

/** Edition files, each compressed once and kept; those asked for last stay. Undefined for an unknown hash. */
export function compressedFiles(db: Db): (hash: string) => Promise<CompressedFile | undefined> {
  const kept = new Map<string, Promise<CompressedFile | undefined>>()
  return async (hash) => {
    const loading = kept.get(hash) ?? load(db, hash)
    kept.delete(hash)
    kept.set(hash, loading)
    const oldest = kept.keys().next().value
    if (kept.size > mostKept && oldest !== undefined) kept.delete(oldest)
    // What failed or wasn't there is asked for again the next time.
    const file = await loading.catch((error: unknown) => {
      kept.delete(hash)
      throw error
    })
    if (file === undefined) kept.delete(hash)
    return file
  }
}
