/** What browser tests share: the whole application on a database of its own, and Debian's Chromium. */
import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { chromium } from 'playwright-core'
import type { Browser, BrowserContext, Page } from 'playwright-core'
import { createApp } from '../../server/app.ts'
import { EditionFeed } from '../../server/editions/edition-feed.ts'
import { followEditions } from '../../server/editions/follow-editions.ts'
import { seedStarter } from '../../server/editions/seed-starter.ts'
import { openLog } from '../../server/log.ts'
import { seedDemoPeople } from '../../server/people/demo-people.ts'
import { testDatabase } from '../server/database.ts'
import type { TestDatabase } from '../server/database.ts'
import { testSecret } from '../server/running-app.ts'

export type Site = {
  url: string
  database: TestDatabase
  /** Stops answering, as when the network is gone. The database stays. */
  stop: () => Promise<void>
  close: () => Promise<void>
}

/** Serves the built pages with the starter edition in force. */
export async function openSite(): Promise<Site> {
  const log = openLog('silent')
  const database = await testDatabase()
  await seedStarter(database.db)
  await seedDemoPeople(database.db)
  const feed = new EditionFeed()
  const unfollow = followEditions(database.url, database.db, feed, log)
  const config = { trustProxy: 0, sessionSecret: testSecret }
  const { app, close: closeStreams } = createApp({ db: database.db, feed, log, config })
  const server = createServer(app)
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  let stopped: Promise<void> | undefined
  const stop = () =>
    (stopped ??= new Promise((resolve) => {
      server.close(() => resolve())
      closeStreams()
      server.closeAllConnections()
    }))
  return {
    url: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
    database,
    stop,
    close: async () => {
      await stop()
      await unfollow()
      await database.close()
    },
  }
}

const flags = [
  '--headless',
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
]

/** Debian's Chromium. Close it after the file. */
export const openBrowser = (): Promise<Browser> =>
  chromium.launch({ executablePath: '/usr/bin/chromium', args: flags })

export const phone = { width: 390, height: 844 }
export const desk = { width: 1280, height: 900 }
export type Theme = 'light' | 'dark'

export type Visit = {
  page: Page
  context: BrowserContext
  /** Whatever the console complained of, and every error nobody caught. */
  complaints: string[]
  /** Addresses asked for that lie elsewhere. */
  strays: string[]
  end: () => Promise<void>
}
type VisitOptions = { theme?: Theme; size?: { width: number; height: number }; touch?: boolean }

/** A person with an empty device. */
export async function visit(browser: Browser, site: Site, options: VisitOptions = {}): Promise<Visit> {
  const { theme = 'light', size = desk, touch = false } = options
  const context = await browser.newContext({
    baseURL: site.url,
    viewport: size,
    colorScheme: theme,
    hasTouch: touch,
    isMobile: touch,
    reducedMotion: 'reduce',
  })
  const page = await context.newPage()
  const complaints: string[] = []
  const strays: string[] = []
  page.on('console', (message) => {
    if (message.type() === 'error' || message.type() === 'warning') complaints.push(message.text())
  })
  page.on('pageerror', (problem) => complaints.push(problem.message))
  page.on('request', (request) => {
    if (!request.url().startsWith(site.url) && !/^(data|blob):/.test(request.url()))
      strays.push(request.url())
  })
  return { page, context, complaints, strays, end: () => context.close() }
}

/** Waits until everything the page wanted came: the edition's files, and the parts fetched ahead. */
export const settled = (page: Page): Promise<void> => page.waitForLoadState('networkidle')
