/** An update while devices hold the pages before it: who moves when, and what still opens meanwhile. */
import { cp, mkdtemp, readFile, readdir, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, beforeEach, afterEach, expect, test } from 'vitest'
import { axeFindings } from './axe.ts'
import { openBrowser, openSite, visit } from './browser.ts'
import type { Site, Visit } from './browser.ts'
import { choose } from './check-steps.ts'
import { untilServed, workersTraces } from './devices.ts'

const dist = fileURLToPath(new URL('../../dist', import.meta.url))
const setup = (name: string) => import(new URL(`../../server/setup/${name}`, import.meta.url).href)
const { buildWorker } = (await setup('worker.mjs')) as { buildWorker: (folder: string) => Promise<void> }
const { takeOverBuilds } = (await setup('former-builds.mjs')) as {
  takeOverBuilds: (from: string, to: string) => Promise<void>
}

/** The next build: the same pages with a mark in them, and a worker of their own. */
async function makeNext(): Promise<string> {
  const folder = await mkdtemp(join(tmpdir(), 'tracelamp-next-'))
  await cp(dist, folder, { recursive: true })
  const page = join(folder, 'index.html')
  await writeFile(page, (await readFile(page, 'utf8')).replace('<html ', '<html data-build="next" '))
  await buildWorker(folder)
  return folder
}

let browser: Browser
let next: string
let site: Site
let device: Visit
beforeAll(async () => {
  ;[browser, next] = await Promise.all([openBrowser(), makeNext()])
})
afterAll(async () => {
  await browser.close()
  await rm(next, { recursive: true })
})
beforeEach(async () => {
  site = await openSite()
  device = await visit(browser, site, { worker: true })
})
afterEach(async () => {
  await device.end()
  await site.close()
})

const patience = { timeout: 15_000 }
const buildOf = (page: Page) => page.evaluate(() => document.documentElement.dataset['build'] ?? 'first')
const update = async () => {
  await site.stop()
  await site.start({ pages: next })
}
const bar = (page: Page) => page.getByText('A newer version of these pages is here.')
/** Another tab in front: this one is out of sight until it comes back. */
async function setHidden(page: Page, hidden: boolean): Promise<void> {
  await page.evaluate((value) => {
    Object.defineProperty(document, 'visibilityState', {
      configurable: true,
      get: () => (value ? 'hidden' : 'visible'),
    })
    document.dispatchEvent(new Event('visibilitychange'))
  }, hidden)
}

test('newer pages wait until the button is pressed; then this tab has them', async () => {
  const { page } = device
  await page.goto('/')
  await untilServed(page)
  await update()
  await page.goto('/articles')
  await bar(page).waitFor()
  expect(await buildOf(page)).toBe('first')
  expect(await axeFindings(page)).toEqual([])
  await page.getByRole('button', { name: 'Load it' }).click()
  await expect.poll(() => buildOf(page).catch(() => ''), patience).toBe('next')
  await page.getByRole('heading', { level: 1 }).waitFor()
  expect(await bar(page).count()).toBe(0)
})

test('out of sight they take over, but never while a sheet is open in any tab', async () => {
  const { page, context } = device
  await page.goto('/')
  await untilServed(page)
  const sheet = await context.newPage()
  await sheet.goto('/check/1')
  await choose(sheet, /Shock|tingle/i, 'No')
  await sheet.waitForLoadState('networkidle')
  await update()
  await page.goto('/articles')
  await bar(page).waitFor()
  // Nothing stands above what to do in danger.
  expect(await bar(sheet).count()).toBe(0)

  await setHidden(page, true)
  await page.waitForTimeout(1500)
  expect(await buildOf(page)).toBe('first')
  expect(await buildOf(sheet)).toBe('first')
  await setHidden(page, false)
  await sheet.getByRole('link', { name: 'Tracelamp' }).click()
  await sheet.getByRole('heading', { level: 1, name: /Something is wrong/ }).waitFor()
  await expect
    .poll(() => sheet.evaluate(async () => (await navigator.locks.query()).held), patience)
    .toEqual([])
  await setHidden(page, true)
  await expect.poll(() => buildOf(page).catch(() => ''), patience).toBe('next')
  // The tab that is being looked at is not pulled away under anyone's eyes; what was answered is on the device.
  expect(await buildOf(sheet)).toBe('first')
  await sheet.goto('/check/1')
  expect(await buildOf(sheet)).toBe('next')
  await sheet.getByRole('radio', { name: 'No', exact: true, checked: true }).first().waitFor()
})

/** The next build as a tab of this one meets it: one of its parts has another name now. */
async function makeWithout(part: string): Promise<string> {
  const folder = await mkdtemp(join(tmpdir(), 'tracelamp-gone-'))
  await cp(dist, folder, { recursive: true })
  const gone = (await readdir(join(folder, 'assets'))).filter((file) => file.startsWith(part))
  for (const file of gone) await rm(join(folder, 'assets', file))
  expect(gone.length).toBeGreaterThan(0)
  return folder
}

/** Goes on in the page that is open, as a link would. */
const goOn = (page: Page, path: string) =>
  page.evaluate((to) => {
    window.history.pushState({}, '', to)
    window.dispatchEvent(new PopStateEvent('popstate', { state: {} }))
  }, path)

test('a tab from before an update still opens its parts, taken over from that build', async () => {
  const bare = await visit(browser, site)
  await bare.page.goto('/')
  await bare.page.waitForLoadState('networkidle')
  const pages = await makeWithout('editions.page')
  await takeOverBuilds(dist, pages)
  await site.stop()
  await site.start({ pages })
  await goOn(bare.page, '/editions')
  await bare.page.getByRole('heading', { level: 1, name: 'Edition 1' }).waitFor()
  await bare.end()
  await rm(pages, { recursive: true })
})

test('a part that is gone for good says so and offers to load; what was typed is still there', async () => {
  const bare = await visit(browser, site)
  const { page } = bare
  await page.goto('/check/1')
  await choose(page, /Shock|tingle/i, 'No')
  await page.waitForLoadState('networkidle')
  const pages = await makeWithout('editions.page')
  await site.stop()
  await goOn(page, '/editions')
  await page.getByText('It must be opened once with a network.').waitFor()
  // With nobody there to bring it, loading would only lose the page that is open.
  await page.getByRole('button', { name: 'Try again' }).click()
  await page.getByText('Still no network.').waitFor()
  await page.getByRole('heading', { level: 1, name: 'This page isn’t on this device yet' }).waitFor()

  await site.start({ pages })
  await goOn(page, '/check/1')
  await page.getByRole('heading', { level: 1, name: 'Before you touch anything' }).waitFor()
  await goOn(page, '/editions')
  await page.getByText('A newer version of these pages has come.').waitFor()
  expect(await axeFindings(page)).toEqual([])
  await site.stop()
  await site.start()
  await page.getByRole('button', { name: 'Load it' }).click()
  await page.getByRole('heading', { level: 1, name: 'Edition 1' }).waitFor()
  await page.goto('/check/1')
  await page.getByRole('radio', { name: 'No', exact: true, checked: true }).first().waitFor()
  await bare.end()
  await rm(pages, { recursive: true })
})

test('with WORKER=off the worker and all it kept are gone after the next visit; the sheets stay', async () => {
  const { page } = device
  await page.goto('/check/1')
  await choose(page, /Shock|tingle/i, 'No')
  await untilServed(page)
  expect((await workersTraces(page)).registered).toBe(true)
  await site.stop()
  await site.start({ worker: false })
  await page.goto('/')
  await expect.poll(() => workersTraces(page), patience).toEqual({ registered: false, caches: [] })
  await page.getByRole('banner').getByText('Works only with a network.').waitFor()
  await page.goto('/check/1')
  await page.getByRole('radio', { name: 'No', exact: true, checked: true }).first().waitFor()
  expect(await page.evaluate(() => navigator.serviceWorker.controller === null)).toBe(true)
  // Each visit brings the worker that leaves at once, and no page goes round in circles.
  let loads = 0
  page.on('load', () => (loads += 1))
  await page.waitForTimeout(1500)
  expect(loads).toBe(0)
  // Switched on again, it is back.
  await site.stop()
  await site.start()
  await page.goto('/')
  await untilServed(page)
})
