import type { Db } from '../database.ts'
import { listen } from '../listen.ts'
import type { Log } from '../log.ts'
import type { EditionFeed } from './edition-feed.ts'
import { editionInForce } from './editions.queries.ts'

/**
 * Keeps a feed up to date with the edition in force, whichever process put it there.
 * @returns a function that ends it
 */
export function followEditions(
  databaseUrl: string,
  db: Db,
  feed: EditionFeed,
  log: Log,
): () => Promise<void> {
  const readInForce = async () => {
    const inForce = await editionInForce(db)
    if (inForce !== undefined) feed.announce(inForce)
  }
  return listen(databaseUrl, 'edition_in_force', readInForce, log)
}
