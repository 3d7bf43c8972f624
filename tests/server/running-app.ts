import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { createApp } from '../../server/app.ts'
import { openDatabase } from '../../server/database.ts'
import type { Db } from '../../server/database.ts'
import { EditionFeed } from '../../server/editions/edition-feed.ts'
import { followEditions } from '../../server/editions/follow-editions.ts'
import { listen } from '../../server/listen.ts'
import { openLog } from '../../server/log.ts'
import type { Log } from '../../server/log.ts'
import { SheetFeed } from '../../server/sheets/sheet-feed.ts'

export type RunningApp = { url: string; db: Db; feed: EditionFeed; close: () => Promise<void> }

export type RunningOptions = {
  log?: Log
  /** The built pages; the checkout's `dist` unless said. */
  pages?: string
  /** Whether devices may keep the pages; they may unless said. */
  worker?: boolean
  /** 0 unless said: any free one. */
  port?: number
  trustProxy?: number
}

/** Signs the cookies of every server that a test runs. */
export const testSecret = 'a secret that only the tests use'

/** The whole server on a port of loopback, with a pool and a listener of its own, as one process of several would be. */
export async function runApp(
  databaseUrl: string,
  { log = openLog('silent'), pages, worker = true, port = 0, trustProxy = 0 }: RunningOptions = {},
): Promise<RunningApp> {
  const db = openDatabase(databaseUrl, log)
  const feed = new EditionFeed()
  const unfollow = followEditions(databaseUrl, db, feed, log)
  const sheetFeed = new SheetFeed()
  const deafen = listen(databaseUrl, 'look_again', (id) => sheetFeed.announce(id), log)
  const config = { trustProxy, worker, sessionSecret: testSecret }
  const { app, close } = createApp({ db, feed, sheetFeed, log, config, ...(pages && { pages }) })
  const server = createServer(app)
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject)
    server.listen(port, '127.0.0.1', resolve)
  })
  return {
    url: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
    db,
    feed,
    close: async () => {
      const closed = new Promise((resolve) => server.close(resolve))
      close()
      server.closeAllConnections()
      await closed
      await Promise.all([unfollow(), deafen()])
      await db.destroy()
    },
  }
}
