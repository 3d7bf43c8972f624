import pg from 'pg'
import type { Db } from '../database.ts'
import type { Log } from '../log.ts'
import type { EditionFeed } from './edition-feed.ts'
import { editionInForce } from './editions.queries.ts'

const firstWaitMs = 100
const longestWaitMs = 5_000

/**
 * Keeps a feed up to date from the database's notifications, over a connection of its own. What was notified while
 * that connection was down is lost, so the edition in force is read anew after every (re)connection.
 * @returns a function that ends it
 */
export function followEditions(
  databaseUrl: string,
  db: Db,
  feed: EditionFeed,
  log: Log,
): () => Promise<void> {
  let stopped = false
  let client: pg.Client | undefined
  let timer: NodeJS.Timeout | undefined
  let waitMs = firstWaitMs

  const readInForce = async () => {
    const inForce = await editionInForce(db)
    if (inForce !== undefined) feed.announce(inForce)
  }

  const again = (broken: pg.Client, error?: Error) => {
    if (stopped || client !== broken) return
    client = undefined
    log.warn({ reason: error?.message, waitMs }, 'not listening for editions; connecting again')
    void broken.end().catch(() => undefined)
    timer = setTimeout(() => void connect(), waitMs)
    waitMs = Math.min(waitMs * 2, longestWaitMs)
  }

  const connect = async () => {
    const mine = new pg.Client({
      connectionString: databaseUrl,
      connectionTimeoutMillis: 5_000,
      keepAlive: true,
      keepAliveInitialDelayMillis: 10_000,
    })
    client = mine
    mine.on('error', (error) => again(mine, error))
    mine.on('end', () => again(mine))
    mine.on('notification', () => void readInForce().catch((error: Error) => again(mine, error)))
    try {
      await mine.connect()
      await mine.query('listen edition_in_force')
      await readInForce()
      waitMs = firstWaitMs
    } catch (error) {
      again(mine, error instanceof Error ? error : undefined)
    }
  }

  void connect()
  return async () => {
    stopped = true
    clearTimeout(timer)
    await client?.end().catch(() => undefined)
  }
}
