import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { axeFindings } from './axe.ts'
import { desk, openBrowser, openSite, phone, visit } from './browser.ts'
import type { Site } from './browser.ts'
import { beginSheet, observe, openDiagnosis, ranking, read, readThree } from './diagnosis-steps.ts'

let site: Site
let browser: Browser
beforeAll(async () => {
  ;[site, browser] = await Promise.all([openSite(), openBrowser()])
})
afterAll(async () => {
  await browser.close()
  await site.close()
})

const tablet = { width: 834, height: 1112 }
const sizes = [
  ['phone', phone],
  ['tablet', tablet],
  ['desk', desk],
] as const

const sideways = (page: Page) =>
  page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth)

describe.each(['light', 'dark'] as const)('Diagnosis, %s', (theme) => {
  test.each(sizes)('on a %s axe finds nothing in any of its states', async (_, size) => {
    const { page, complaints, end } = await visit(browser, site, { theme, size, touch: size === phone })
    const sound = async (where: string) => {
      expect({ where, found: await axeFindings(page), sideways: await sideways(page) }).toEqual({
        where,
        found: [],
        sideways: 0,
      })
    }
    await page.goto('/diagnosis')
    await page.getByRole('heading', { level: 1, name: 'Diagnosis is for qualified people' }).waitFor()
    await sound('closed to who is not signed in')
    await openDiagnosis(page)
    await sound('no sheets yet')
    await page.getByRole('button', { name: 'New sheet' }).click()
    await page.getByRole('radio', { name: /^Low/ }).click()
    await page.getByRole('button', { name: 'Begin the sheet' }).click()
    await page.getByText('Type ohms above 0, for example 3000.').waitFor()
    await sound('a new sheet with an error')
    await page.getByRole('button', { name: 'Cancel' }).click()

    await beginSheet(page, {
      title: 'A cabin with a long name up the valley',
      source: /Engine generator/,
      system: /120\/240/,
    })
    await sound('an empty sheet')
    await readThree(page, '119.6', '56.8', '57.2')
    await observe(page, 'plug-in', 'Plug-in GFCI test', 'Does not trip')
    await ranking(page)
    await sound('a ranked sheet')
    await page.getByRole('button', { name: /^Other tests/ }).click()
    await page.getByRole('button', { name: 'Why this one' }).click()
    await page.getByText('More on hot–ground').click()
    await page.getByRole('button', { name: 'Other meter' }).click()
    await page.getByText(/^More readings at the receptacle/).click()
    await page.getByRole('button', { name: 'Add', exact: true }).click()
    await page.getByRole('button', { name: 'What if' }).click()
    await page.getByRole('button', { name: 'Add a mode' }).click()
    await page.getByRole('button', { name: 'Change', exact: true }).click()
    await page.getByRole('button', { name: 'Show all', exact: true }).click()
    await sound('with everything open')
    await page.getByRole('button', { name: 'Change', exact: true }).click()
    await read(page, 'hot–ground', 'abc')
    await page.getByText('Hot–ground must be a number.').waitFor()
    await sound('an entry to mend')
    await read(page, 'hot–ground', '572')
    await page.getByRole('heading', { name: 'As computed, no verdict' }).waitFor()
    await sound('no verdict')
    await page.getByRole('searchbox').fill('tingle')
    await page
      .getByRole('list', { name: 'Findings' })
      .getByRole('button', { name: /^Tingle/ })
      .click()
    await page
      .getByRole('radiogroup', { name: 'Tingle', exact: true })
      .getByRole('radio', { name: 'Yes' })
      .click()
    await page.getByRole('alert', { name: 'Danger: stop' }).waitFor()
    await sound('a stop')
    await page.getByRole('link', { name: 'All sheets on this device' }).click()
    await page.getByRole('list', { name: 'Sheets on this device' }).waitFor()
    await sound('the list of sheets')
    expect(complaints).toEqual([])
    await end()
  })
})

test('on a phone every target is 44 px high or more, and the pad’s keys 64', async () => {
  const { page, end } = await visit(browser, site, { size: phone, touch: true })
  await openDiagnosis(page)
  await beginSheet(page)
  await readThree(page, '119.6', '56.8', '57.2')
  await ranking(page)
  const low = () =>
    page
      .locator('main :is(a, button, summary):visible, .pad :is(button):visible')
      .evaluateAll((targets) =>
        targets
          .filter((target) => target.getBoundingClientRect().height < 44)
          .map((target) => `${target.textContent} ${target.getBoundingClientRect().height}`),
      )
  expect(await low()).toEqual([])
  await page
    .getByRole('textbox', { name: /^hot–neutral/ })
    .first()
    .tap()
  const keys = page.locator('.pad-key')
  for (const key of await keys.all()) expect((await key.boundingBox())?.height).toBeGreaterThanOrEqual(64)
  expect(await low()).toEqual([])
  await end()
})

test('at 320 px and with text twice as large nothing scrolls sideways', async () => {
  const { page, end } = await visit(browser, site, { size: { width: 320, height: 700 } })
  await openDiagnosis(page)
  await beginSheet(page)
  await readThree(page, '119.6', '56.8', '57.2')
  await ranking(page)
  expect(await sideways(page)).toBe(0)
  await page.setViewportSize({ width: 640, height: 900 })
  await page.evaluate(() => {
    document.documentElement.style.fontSize = '200%'
  })
  expect(await sideways(page)).toBe(0)
  await end()
})
