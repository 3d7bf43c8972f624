import { ArticlesFile } from '../../rules/edition/schema.ts'
import type { Db } from '../database.ts'
import { editionInForce, listFiles, openFile } from './editions.queries.ts'

const articlesIn = (file: unknown) => ArticlesFile.parse(file).articles

/** Slugs of the articles that everyone may read and that hold. */
async function openSlugs(db: Db, number: number): Promise<ReadonlySet<string>> {
  const articles = articlesIn(await openFile(db, number, 'articles-everyone'))
  return new Set(articles.filter((one) => one.withdrawn === undefined).map((one) => one.slug))
}

type Asked = { name: string; hash: string; bytes: Buffer }

/**
 * Whether a file written for everyone may still go to everyone. A former edition's articles may not when one of them
 * is for qualified people by now, was withdrawn or is gone: in that file it stands open, and without a mark.
 */
export function stillOpen(db: Db): (file: Asked) => Promise<boolean> {
  let now: { number: number; slugs: ReadonlySet<string>; said: Map<string, boolean> } | undefined
  return async ({ name, hash, bytes }) => {
    if (name !== 'articles-everyone') return true
    const inForce = await editionInForce(db)
    if (inForce === undefined) return false
    if (now?.number !== inForce.number)
      now = { number: inForce.number, slugs: await openSlugs(db, inForce.number), said: new Map() }
    const { slugs, said } = now
    const known = said.get(hash)
    if (known !== undefined) return known
    const open =
      (await listFiles(db, inForce.number, false)).some((file) => file.hash === hash) ||
      articlesIn(JSON.parse(bytes.toString('utf8'))).every((one) => slugs.has(one.slug))
    said.set(hash, open)
    return open
  }
}
