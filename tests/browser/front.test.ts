import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { editionBytes } from '../../server/editions/edition-bytes.ts'
import { putInForce } from '../../server/editions/put-in-force.ts'
import { readStarter } from '../../server/editions/read-starter.ts'
import { axeFindings } from './axe.ts'
import { desk, openBrowser, openSite, phone, settled, visit } from './browser.ts'
import type { Site } from './browser.ts'

let site: Site
let browser: Browser
beforeAll(async () => {
  ;[site, browser] = await Promise.all([openSite(), openBrowser()])
})
afterAll(async () => {
  await browser.close()
  await site.close()
})

describe.each(['light', 'dark'] as const)('the front page, %s', (theme) => {
  test.each([
    ['phone', phone],
    ['desk', desk],
  ] as const)(
    'on a %s: axe finds nothing, the console is clean, nothing leaves the origin',
    async (_, size) => {
      const { page, complaints, strays, end } = await visit(browser, site, {
        theme,
        size,
        touch: size === phone,
      })
      await page.goto('/')
      await settled(page)
      expect(await page.title()).toBe('Something is wrong with the power · Tracelamp')
      expect(await axeFindings(page)).toEqual([])
      expect(complaints).toEqual([])
      expect(strays).toEqual([])
      expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(size.width)
      await end()
    },
  )
})

test('every target is 44 px or more, on a phone', async () => {
  const { page, end } = await visit(browser, site, { size: phone, touch: true })
  await page.goto('/')
  await settled(page)
  await page.getByRole('button', { name: 'Menu' }).click()
  for (const target of await page.locator('a:visible, button:visible, input:visible').all()) {
    const box = await target.boundingBox()
    const name = await target.evaluate((one) => one.outerHTML.slice(0, 80))
    // The skip link stands off the page until it has the focus.
    if (box !== null && box.y >= 0) expect({ name, high: box.height >= 44 }).toEqual({ name, high: true })
  }
  await end()
})

test('what is looked up goes to the articles', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto('/')
  await page.getByRole('searchbox').fill('60 V to ground')
  await page.keyboard.press('Enter')
  await page.waitForURL('**/articles?q=60%20V%20to%20ground')
  await end()
})

test('the menu opens with its word, leads on, and closes with Escape', async () => {
  const { page, end } = await visit(browser, site, { size: phone, touch: true })
  await page.goto('/check/1')
  const menu = page.getByRole('button', { name: 'Menu' })
  const articles = page.getByRole('navigation', { name: 'Main' }).getByRole('link', { name: 'Articles' })
  expect(await articles.isVisible()).toBe(false)
  await menu.click()
  await articles.waitFor()
  await page.keyboard.press('Escape')
  expect(await articles.isVisible()).toBe(false)
  await menu.click()
  await articles.click()
  await page.waitForURL('**/articles')
  await expect.poll(() => menu.getAttribute('aria-expanded')).toBe('false')
  await end()
})

test('a chosen theme is drawn before the first paint, and remembered', async () => {
  const { page, end } = await visit(browser, site, { theme: 'light' })
  await page.goto('/')
  const button = page.getByRole('button', { name: /^Theme/ })
  expect(await button.innerText()).toBe('Theme: system')
  await button.click()
  await button.click()
  expect(await button.innerText()).toBe('Theme: dark')
  // The application itself is kept away: only the small script before it may set the theme.
  await page.route('**/assets/*.js', (route) => route.abort())
  await page.reload({ waitUntil: 'domcontentloaded' })
  expect(await page.evaluate(() => document.documentElement.dataset['theme'])).toBe('dark')
  await end()
})

test('an address that leads nowhere says so, and a page that failed keeps the masthead', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto('/no-such-page')
  await page.getByRole('heading', { level: 1, name: 'There is no such page' }).waitFor()
  await page.route('**/assets/**', (route) => route.abort())
  await page.getByRole('link', { name: 'Articles' }).first().click()
  await page.getByRole('heading', { level: 1, name: 'This page isn’t on this device yet' }).waitFor()
  expect(await page.getByRole('banner').isVisible()).toBe(true)
  await end()
})

test('after a navigation the focus stands on the new page’s heading', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto('/no-such-page')
  await page.getByRole('main').getByRole('link', { name: 'Check my power' }).click()
  await page.waitForURL('**/check/1')
  await expect
    .poll(() => page.evaluate(() => document.activeElement?.textContent))
    .toBe('Before you touch anything')
  await end()
})

test('an edition put in force meanwhile is offered, and changes nothing until its button is pressed', async () => {
  const own = await openSite()
  const { page, end } = await visit(browser, own)
  await page.goto('/')
  await page.getByText(/Answers from edition 1,/).waitFor()
  const next = await readStarter()
  next.diagnosis.causes[0]!.title += ' (revised)'
  await putInForce(own.database.db, editionBytes(next), { note: 'second', reason: 'for this test' })
  await page.getByText('Edition 2 is in force.').waitFor()
  await page.getByText('Your sheet stays on 1.').waitFor()
  expect(await page.getByText(/Answers from edition 1,/).isVisible()).toBe(true)
  await page.getByRole('button', { name: 'Load edition 2' }).click()
  await page.getByText(/Answers from edition 2,/).waitFor()
  expect(await page.getByText('Edition 2 is in force.').count()).toBe(0)
  await end()
  await own.close()
})
