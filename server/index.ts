/** The server process: migrates, puts the starter edition in force where that is due, serves until told to stop. */
import { createServer } from 'node:http'
import { setTimeout as sleep } from 'node:timers/promises'
import { migrateToLatest } from '../migrations/migrate.ts'
import { createApp } from './app.ts'
import { readConfig } from './config.ts'
import { isDatabaseDown, openDatabase } from './database.ts'
import { EditionFeed } from './editions/edition-feed.ts'
import { followEditions } from './editions/follow-editions.ts'
import { seedStarter } from './editions/seed-starter.ts'
import { listen } from './listen.ts'
import { openLog } from './log.ts'
import { seedDemoPeople, shutOutDemoPeople } from './people/demo-people.ts'
import { seedDemoSheets, shutDemoLinks } from './sheets/demo-sheets.ts'
import { SheetFeed } from './sheets/sheet-feed.ts'

const patienceMs = 30_000

async function main(): Promise<void> {
  const config = readConfig()
  const log = openLog(config.logLevel)
  const db = openDatabase(config.databaseUrl, log)

  const ran = await whenDatabaseIsUp(() => migrateToLatest(db))
  if (ran.length > 0) log.info({ migrations: ran }, 'the database was migrated')
  const { inForce, changed } = await whenDatabaseIsUp(() => seedStarter(db))
  log.info(
    { edition: inForce.number, hash: inForce.hash },
    changed ? 'an edition was put in force' : 'edition in force',
  )

  await whenDatabaseIsUp(() => (config.demo ? seedDemoPeople(db) : shutOutDemoPeople(db)))
  await whenDatabaseIsUp(() => (config.demo ? seedDemoSheets(db) : shutDemoLinks(db)))

  const feed = new EditionFeed()
  const unfollow = followEditions(config.databaseUrl, db, feed, log)
  const sheetFeed = new SheetFeed()
  const deafen = listen(config.databaseUrl, 'look_again', (id) => sheetFeed.announce(id), log)
  const { app, close } = createApp({ db, feed, sheetFeed, log, config })
  const server = createServer(app)
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject)
    server.listen(config.port, config.host, resolve)
  })
  log.info({ host: config.host, port: config.port }, 'serving')

  let stopping = false
  const stop = async () => {
    if (stopping) return
    stopping = true
    const closed = new Promise((resolve) => server.close(resolve))
    close()
    server.closeIdleConnections()
    // Who hasn't finished by then is cut off.
    const cut = setTimeout(() => server.closeAllConnections(), 5_000)
    await closed
    clearTimeout(cut)
    await Promise.all([unfollow(), deafen()])
    await db.destroy()
    log.info('stopped')
    // An open channel to the parent would keep this process alive.
    if (process.connected) process.disconnect()
  }
  for (const signal of ['SIGINT', 'SIGTERM'] as const) process.on(signal, () => void stop())
  // Whoever started this process is gone: a server left behind would hold the port.
  process.on('disconnect', () => void stop())
  if (process.send !== undefined && !process.connected) void stop()
}

/** A database that is only just starting, or restarting, is waited for. */
async function whenDatabaseIsUp<T>(ask: () => Promise<T>): Promise<T> {
  const until = Date.now() + patienceMs
  for (;;) {
    try {
      return await ask()
    } catch (error) {
      if (!isDatabaseDown(error) || Date.now() > until) throw error
      await sleep(250)
    }
  }
}

main().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`)
  process.exit(1)
})
