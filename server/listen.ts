import pg from 'pg'
import type { Log } from './log.ts'

const firstWaitMs = 100
const longestWaitMs = 5_000

/**
 * Hears a channel of the database's notifications, over a connection of its own. What was notified while that
 * connection was down is lost, so `heard` is called after every (re)connection too.
 * @param heard is given what was said; undefined after a connection: anything may have been
 * @returns a function that ends it
 */
export function listen(
  databaseUrl: string,
  channel: string,
  heard: (said: string | undefined) => void | Promise<void>,
  log: Log,
): () => Promise<void> {
  let stopped = false
  let client: pg.Client | undefined
  let timer: NodeJS.Timeout | undefined
  let waitMs = firstWaitMs

  const again = (broken: pg.Client, error?: Error) => {
    if (stopped || client !== broken) return
    client = undefined
    log.warn({ channel, reason: error?.message, waitMs }, 'not listening; connecting again')
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
    const hear = async (said: string | undefined) => heard(said)
    mine.on('error', (error) => again(mine, error))
    mine.on('end', () => again(mine))
    mine.on('notification', ({ payload }) => void hear(payload).catch((error: Error) => again(mine, error)))
    try {
      await mine.connect()
      await mine.query(`listen ${pg.escapeIdentifier(channel)}`)
      await hear(undefined)
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
