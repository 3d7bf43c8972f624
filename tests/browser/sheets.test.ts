import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { answerAllNo } from './check-steps.ts'
import { openBrowser, openSite, visit } from './browser.ts'
import type { Site } from './browser.ts'
import { beginSheet, field, openDiagnosis, read, readThree } from './diagnosis-steps.ts'
import { signInAs } from './sign-in-as.ts'

let site: Site
let browser: Browser
beforeAll(async () => {
  site = await openSite()
  browser = await openBrowser()
})
afterAll(async () => {
  await browser.close()
  await site.close()
})

/** What the server has of all sheets, the last entry of each finding. */
async function onServer(): Promise<Record<string, unknown>> {
  const rows = await site.database.db
    .selectFrom('sheet_entry')
    .select(['finding', 'value'])
    .orderBy('seq')
    .execute()
  return Object.fromEntries(rows.map((row) => [row.finding, row.value]))
}

test('the server stops in the middle of a sheet, and nothing is lost', async () => {
  const { page, end } = await visit(browser, site)
  await openDiagnosis(page)
  await beginSheet(page, { title: 'In the middle' })
  await read(page, 'hot–neutral', '119.6')
  await page.getByText('All sent').waitFor()
  expect(await onServer()).toMatchObject({ 'receptacle.hn.volts': 119.6 })

  await site.stop()
  await read(page, 'neutral–ground', '57.2')
  await read(page, 'hot–ground', '56.8')
  await page.getByText('On this device only: 1').waitFor()
  await page.waitForTimeout(2500)
  await page.getByText('On this device only: 1').waitFor()

  await site.start()
  await page.evaluate(() => window.dispatchEvent(new Event('online')))
  await page.getByText('All sent').waitFor()
  expect(await onServer()).toMatchObject({
    'receptacle.hn.volts': 119.6,
    'receptacle.ng.volts': 57.2,
    'receptacle.hg.volts': 56.8,
  })
  await end()
})

test('an answer of somebody else’s, a 200 too, takes nothing out of the outbox', async () => {
  const { page, end } = await visit(browser, site)
  await openDiagnosis(page)
  await page.route(/\/api\/sheets\//, (route) => route.fulfill({ status: 200, body: '<h1>Welcome</h1>' }))
  await beginSheet(page, { title: 'In a hotel' })
  await readThree(page, '118', '59', '59.5')
  await page.waitForTimeout(2500)
  await page.getByText('On this device only: 1').waitFor()
  await page.unroute(/\/api\/sheets\//)
  await page.evaluate(() => window.dispatchEvent(new Event('online')))
  await page.getByText('All sent').waitFor()
  expect(await onServer()).toMatchObject({ 'receptacle.hn.volts': 118 })
  await end()
})

test('a homeowner’s link opens for a tech, each sees the other’s findings within seconds, and it can be taken back', async () => {
  const home = await visit(browser, site)
  await answerAllNo(home.page)
  await home.page.goto('/check/result')
  await home.page.getByRole('button', { name: 'Make a link for your professional' }).click()
  const address = await home.page.locator('code').filter({ hasText: '/sheets/' }).innerText()

  const tech = await visit(browser, site)
  await signInAs(tech.page, 'tech')
  await tech.page.goto(address)
  await tech.page.getByText('This sheet came by a link').waitFor()
  await read(tech.page, 'hot–neutral', '121.4')
  const since = Date.now()
  await home.page.getByText(/121\.4 V/).waitFor()
  expect(Date.now() - since).toBeLessThan(5000)
  await home.page.getByText('(Demo tech)').first().waitFor()

  await home.page.getByRole('button', { name: 'Take the link back' }).click()
  await tech.page.getByText('The link was taken back').waitFor()
  expect(await field(tech.page, 'hot–neutral').inputValue()).toBe('121.4')
  await home.end()
  await tech.end()
})
