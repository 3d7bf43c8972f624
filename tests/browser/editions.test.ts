import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { putInForce } from '../../server/editions/put-in-force.ts'
import { changedEdition, starterBytes } from '../server/some-edition.ts'
import { openBrowser, openSite, settled, visit } from './browser.ts'
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

test('a file that came damaged is refused, and asked for again', async () => {
  const { page, end } = await visit(browser, site)
  await page.route('**/api/edition-files/*', async (route) => {
    const answer = await route.fetch()
    await route.fulfill({ response: answer, body: `${await answer.text()} ` })
  })
  await page.goto('/articles')
  const failed = page.getByRole('alert')
  await failed.getByText('The file came damaged.').waitFor({ timeout: 20_000 })
  await page.unroute('**/api/edition-files/*')
  await failed.getByRole('button', { name: 'Try again' }).click()
  await page.getByRole('heading', { level: 2, name: 'Causes' }).waitFor()
  await end()
})

test('what was brought once opens without the server’s answers, from this device alone', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto('/articles')
  await page.getByRole('heading', { level: 2, name: 'Causes' }).waitFor()
  await settled(page)
  await page.waitForTimeout(500)
  await page.route('**/api/**', (route) => route.abort())
  await page.goto('/causes/open-ground')
  await page.getByRole('heading', { level: 1, name: 'Ground wire open to this receptacle' }).waitFor()
  await page.goto('/articles/open-ground')
  await page.locator('.prose h2').first().waitFor()
  await page.goto('/editions')
  await page.getByText('No network. The list of former editions lies on the server.').waitFor()
  await page.getByRole('heading', { level: 1, name: 'Edition 1' }).waitFor()
  await end()
})

test('a device that kept nothing says so when there is no network', async () => {
  const { page, end } = await visit(browser, site)
  await page.route('**/api/**', (route) => route.abort())
  await page.goto('/articles')
  await page.getByText(/this device has not kept an edition yet/).waitFor()
  await end()
})

test('an edition put in force meanwhile is offered, not slipped in; then the former one is listed', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto('/causes/sound')
  await page.getByRole('heading', { level: 1, name: 'Wiring and bond sound' }).waitFor()
  await settled(page)
  const next = changedEdition('Nothing wrong anywhere')
  await putInForce(site.database.db, next, { note: 'second', reason: 'test' })
  await page.getByText('Edition 2 is in force.').waitFor()
  expect(await page.getByRole('heading', { level: 1 }).innerText()).toBe('Wiring and bond sound')
  await page.getByRole('button', { name: 'Load edition 2' }).click()
  await page.getByRole('heading', { level: 1, name: 'Nothing wrong anywhere' }).waitFor()

  await page.goto('/editions')
  await page.getByRole('heading', { level: 1, name: 'Edition 2' }).waitFor()
  const words = await page.getByRole('main').innerText()
  expect(words).toContain(next.hash)
  for (const file of next.files)
    expect([file.name, words.includes(file.hash)]).toEqual([file.name, file.audience === 'everyone'])
  const former = page.locator('.former')
  await former.waitFor()
  expect(await former.innerText()).toContain(`Edition 1`)
  expect(await former.innerText()).toContain(starterBytes.hash.slice(0, 4))
  await end()
})
