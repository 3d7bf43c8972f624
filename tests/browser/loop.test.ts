import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { axeFindings } from './axe.ts'
import { desk, openBrowser, openSite, phone, visit } from './browser.ts'
import type { Site } from './browser.ts'
import { beginSheet, field, openDiagnosis, ranking, read, readThree } from './diagnosis-steps.ts'

let site: Site
let browser: Browser
beforeAll(async () => {
  ;[site, browser] = await Promise.all([openSite(), openBrowser()])
})
afterAll(async () => {
  await browser.close()
  await site.close()
})

const picture = (page: Page) => page.locator('svg.loop:visible')
const verdict = (page: Page) => page.locator('.loop-verdict').first()
const says = (page: Page, words: RegExp | string) => verdict(page).filter({ hasText: words }).waitFor()
const sideways = (page: Page) =>
  page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth)

describe.each(['light', 'dark'] as const)('%s', (theme) => {
  test.each([
    ['phone', phone, 'standing'],
    ['desk', desk, 'lying'],
  ] as const)('on a %s axe finds nothing, and the picture is the one for it', async (_, size, lie) => {
    const { page, complaints, end } = await visit(browser, site, { theme, size, touch: size === phone })
    const sound = async (where: string) => {
      const found = { where, found: await axeFindings(page), sideways: await sideways(page) }
      expect(found).toEqual({ where, found: [], sideways: 0 })
    }
    await page.goto('/causes/rod-only-return')
    await says(page, '2.2 A is too little')
    await sound('a cause')
    await page.goto('/articles/one-bond-only')
    await verdict(page).waitFor()
    await sound('an article')
    await openDiagnosis(page)
    await beginSheet(page)
    await readThree(page, '119.6', '119.2', '0.4')
    await ranking(page)
    await verdict(page).waitFor()
    expect(await picture(page).getAttribute('class')).toContain(`loop-${lie}`)
    await page.locator('.band').first().waitFor()
    await sound('a sheet with its loop and bands')
    expect(complaints).toEqual([])
    await end()
  })
})

test('by keyboard: state and bond are turned, and picture and words follow', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto('/causes/floating-neutral')
  await says(page, 'no way back for the current')
  await page.locator('.loop-danger').filter({ hasText: '120 V' }).waitFor()
  await page.getByRole('radio', { name: 'Hot touches metal' }).focus()
  await page.keyboard.press('Tab')
  await page.keyboard.press('Space')
  expect(await page.getByRole('checkbox', { name: 'Bond', exact: true }).getAttribute('aria-checked')).toBe(
    'true',
  )
  await says(page, 'The breaker likely trips, or the source shuts down')
  expect(await page.locator('.loop-danger').count()).toBe(0)
  await page.getByText('Not as this cause leaves it.').waitFor()
  await page.keyboard.press('Tab')
  await page.keyboard.press('Tab')
  await page.keyboard.press('Space')
  expect(await page.getByRole('checkbox', { name: 'Ground rod' }).getAttribute('aria-checked')).toBe('false')
  await page.getByRole('button', { name: 'As this cause leaves it' }).press('Enter')
  await says(page, 'no way back for the current')
  await page.getByRole('radio', { name: 'Hot touches metal' }).focus()
  await page.keyboard.press('ArrowLeft')
  await page.keyboard.press('Space')
  await says(page, 'Out on hot, back on neutral')
  await end()
})

test('the picture says in words what it shows', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto('/causes/double-bond')
  await page.getByRole('radio', { name: 'Load running' }).click()
  await says(page, 'Part of the current comes back on the ground wire')
  const name = await picture(page).getAttribute('aria-label')
  for (const line of await page.locator('.loop-words li').allTextContents()) expect(name).toContain(line)
  expect(name).toMatch(/A second bond joins neutral and ground at the panel/)
  await end()
})

test('a cause that one loop can’t show says why', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto('/causes/backfeed')
  await page.getByText('No loop picture of this cause. Two sources').waitFor()
  expect(await page.locator('.loop').count()).toBe(0)
  await end()
})

test('marks travel only where nobody asked for stillness, and stop when told', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto('/causes/sound')
  await verdict(page).waitFor()
  const dots = page.locator('svg.loop:visible .loop-dots').first()
  expect(await dots.isVisible()).toBe(false)
  expect(await page.getByRole('button', { name: 'Hold still' }).isVisible()).toBe(false)
  await page.emulateMedia({ reducedMotion: 'no-preference' })
  expect(await dots.evaluate((path) => getComputedStyle(path).animationName)).toBe('loop-travel')
  expect(await dots.evaluate((path) => getComputedStyle(path).display)).not.toBe('none')
  await page.getByRole('button', { name: 'Hold still' }).click()
  expect(await dots.evaluate((path) => getComputedStyle(path).display)).toBe('none')
  expect(await page.locator('svg.loop:visible .loop-arrow').count()).toBeGreaterThan(1)
  await end()
})

test('on paper there are picture and words, on white and without toggles', async () => {
  const { page, end } = await visit(browser, site, { theme: 'dark' })
  await page.goto('/causes/rod-only-return')
  await verdict(page).waitFor()
  await page.emulateMedia({ media: 'print' })
  expect(await page.getByRole('checkbox', { name: 'Ground rod' }).isVisible()).toBe(false)
  expect(await picture(page).isVisible()).toBe(true)
  const hot = page.locator('svg.loop:visible .loop-wire.loop-hot .loop-core').first()
  // The dark theme's hot is near white: it would be lost on paper.
  expect(await hot.evaluate((path) => getComputedStyle(path).stroke)).toBe('rgb(16, 23, 26)')
  await end()
})

describe('in Diagnosis', () => {
  test('bands and loop are the leader’s; a reading outside is said in words', async () => {
    const { page, complaints, end } = await visit(browser, site)
    await openDiagnosis(page)
    await beginSheet(page)
    await page.getByText('drawn for the leading cause once a finding speaks for one').waitFor()
    expect(await page.locator('.band, .band-words').count()).toBe(0)
    await readThree(page, '119.6', '0.3', '119.2')
    const [first = ''] = await ranking(page)
    await page
      .getByRole('heading', { name: new RegExp(`^The loop with ${first.slice(0, 5)}`, 'i') })
      .waitFor()
    await page.locator('.band').nth(2).waitFor()
    await page.getByText('read: H–N 119.6 V · N–G 0.3 V · H–G 119.2 V').first().waitFor()
    expect(await page.locator('.band-missed').count()).toBe(0)

    await page.getByRole('button', { name: 'Show all', exact: true }).click()
    await page.locator('[data-cause="floating-neutral"]').click()
    await page.getByRole('button', { name: 'Expected readings and loop: floating neutral' }).click()
    await page.getByRole('heading', { name: 'The loop with floating neutral' }).waitFor()
    await page.getByText(/^0\.3 V: .* expected with floating neutral$/).waitFor()
    const described = await field(page, 'neutral–ground').getAttribute('aria-describedby')
    expect(await page.locator(`[id="${described}"]`).textContent()).toContain(
      'expected with floating neutral',
    )
    await page.getByRole('button', { name: 'Back to the leading cause' }).click()
    await page.getByText('drawn for the leading cause', { exact: true }).waitFor()
    expect(complaints).toEqual([])
    await end()
  })

  test('a field that is still empty says what the cause lets one expect', async () => {
    const { page, end } = await visit(browser, site)
    await openDiagnosis(page)
    await beginSheet(page)
    await read(page, 'hot–neutral', '119.6')
    await read(page, 'neutral–ground', '0.3')
    await ranking(page)
    await page
      .getByText(/^expected \d+ to \d+ V$/)
      .first()
      .waitFor()
    await end()
  })
})
