import { createHash } from 'node:crypto'
import type { Audience } from '../../rules/edition/audience.ts'
import type { FileName } from './editions.contract.ts'
import type { Starter } from './read-starter.ts'

export type EditionFile = { name: FileName; audience: Audience; hash: string; bytes: Buffer }
/** An edition as it is kept and sent: files of bytes, each named by its hash, and the hash of their manifest. */
export type EditionBytes = { hash: string; files: readonly EditionFile[] }

const sha256 = (bytes: Buffer | string) => createHash('sha256').update(bytes).digest('hex')

/** One file of an edition from what it says. */
export const fileOf = (name: FileName, audience: Audience, content: unknown): EditionFile => {
  const bytes = Buffer.from(JSON.stringify(content), 'utf8')
  return { name, audience, hash: sha256(bytes), bytes }
}

/** SHA-256 of the sorted lines "audience name hash". The database computes the same (see its migration). */
export const editionHash = (files: readonly Omit<EditionFile, 'bytes'>[]): string =>
  sha256(
    files
      .map(({ audience, name, hash }) => `${audience} ${name} ${hash}`)
      .sort()
      .join('\n'),
  )

/** Turns an edition's parts into its files. The same parts give the same bytes, and so the same hash. */
export function editionBytes(parts: Starter): EditionBytes {
  const files = [
    fileOf('diagnosis', 'everyone', parts.diagnosis),
    fileOf('procedures-everyone', 'everyone', parts.procedures.everyone),
    fileOf('procedures-qualified', 'qualified', parts.procedures.qualified),
    fileOf('articles-everyone', 'everyone', parts.articles.everyone),
    fileOf('articles-qualified', 'qualified', parts.articles.qualified),
  ]
  return { hash: editionHash(files), files }
}
