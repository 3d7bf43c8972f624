/** What browser tests share: the whole application on a database of its own, and Debian's Chromium. */
import { chromium } from 'playwright-core'
import type { Browser, BrowserContext, Page } from 'playwright-core'
import { seedStarter } from '../../server/editions/seed-starter.ts'
import { seedDemoPeople } from '../../server/people/demo-people.ts'
import { testDatabase } from '../server/database.ts'
import type { TestDatabase } from '../server/database.ts'
import { runApp } from '../server/running-app.ts'
import type { RunningApp } from '../server/running-app.ts'

/** What is served: the checkout's build and its worker unless said. */
type Served = { pages?: string; worker?: boolean }

export type Site = {
  url: string
  database: TestDatabase
  /** Stops answering, as when the network is gone. The database stays. */
  stop: () => Promise<void>
  /** Answers again at the same address, with other pages or with workers switched off where that is said. */
  start: (served?: Served) => Promise<void>
  close: () => Promise<void>
}

/** Serves the built pages with the starter edition in force. */
export async function openSite(served: Served = {}): Promise<Site> {
  const database = await testDatabase()
  await seedStarter(database.db)
  await seedDemoPeople(database.db)
  let running: RunningApp | undefined = await runApp(database.url, served)
  const { url } = running
  const port = Number(new URL(url).port)
  const stop = async () => {
    const app = running
    running = undefined
    await app?.close()
  }
  return {
    url,
    database,
    stop,
    start: async (again = {}) => {
      await stop()
      running = await runApp(database.url, { ...again, port })
    },
    close: async () => {
      await stop()
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

/**
 * Debian's Chromium. Close it after the file.
 * @param more flags beside the usual ones
 */
export const openBrowser = (more: readonly string[] = []): Promise<Browser> =>
  chromium.launch({ executablePath: '/usr/bin/chromium', args: [...flags, ...more] })

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
type VisitOptions = {
  theme?: Theme
  size?: { width: number; height: number }
  touch?: boolean
  /** Lets the page have its service worker. Without it a test can answer and refuse the page's requests itself. */
  worker?: boolean
}

/** A person with an empty device. */
export async function visit(browser: Browser, site: Site, options: VisitOptions = {}): Promise<Visit> {
  const { theme = 'light', size = desk, touch = false, worker = false } = options
  const context = await browser.newContext({
    baseURL: site.url,
    viewport: size,
    colorScheme: theme,
    hasTouch: touch,
    isMobile: touch,
    reducedMotion: 'reduce',
    serviceWorkers: worker ? 'allow' : 'block',
  })
  const page = await context.newPage()
  const complaints: string[] = []
  const strays: string[] = []
  page.on('console', (message) => {
    if (message.type() !== 'error' && message.type() !== 'warning') return
    // Not the page's words: the browser's driver says so where this file keeps the worker away.
    if (!message.text().startsWith('Service Worker registration blocked')) complaints.push(message.text())
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
