/** What browser tests share: the whole application on a database of its own, and Debian's Chromium. */
import { chromium } from 'playwright-core'
import type { Browser, BrowserContext, Page } from 'playwright-core'
import { seedStarter } from '../../server/editions/seed-starter.ts'
import { seedDemoPeople } from '../../server/people/demo-people.ts'
import { testDatabase } from '../server/database.ts'
import type { TestDatabase } from '../server/database.ts'
import { runApp } from '../server/running-app.ts'
import type { RunningApp } from '../server/running-app.ts'

export type Site = {
  url: string
  database: TestDatabase
  /** Stops answering, as when the network is gone. The database stays. */
  stop: () => Promise<void>
  /** Answers again at the same address. */
  startAgain: () => Promise<void>
  close: () => Promise<void>
}

/** Serves the built pages with the starter edition in force. */
export async function openSite(): Promise<Site> {
  const database = await testDatabase()
  await seedStarter(database.db)
  await seedDemoPeople(database.db)
  const first = await runApp(database.url)
  const port = Number(new URL(first.url).port)
  let running: RunningApp | undefined = first
  const stop = async () => {
    const app = running
    running = undefined
    await app?.close()
  }
  return {
    url: first.url,
    database,
    stop,
    startAgain: async () => {
      running ??= await runApp(database.url, { port })
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
