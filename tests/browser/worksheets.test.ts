import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { worksheetAddress } from '../../rules/worksheets/address.ts'
import { axeFindings } from './axe.ts'
import { desk, openBrowser, openSite, phone, visit } from './browser.ts'
import type { Site } from './browser.ts'
import { signInAs } from './sign-in-as.ts'

let site: Site
let browser: Browser
beforeAll(async () => {
  ;[site, browser] = await Promise.all([openSite(), openBrowser()])
})
afterAll(async () => {
  await browser.close()
  await site.close()
})

const sheets = [
  ['fault-clearing', 'What clears a fault'],
  ['trip-time', 'GFCI and RCD trip time'],
  ['lost-neutral', 'Lost neutral'],
  ['ghost-or-firm', 'Ghost or firm'],
  ['voltage-drop', 'Voltage drop'],
  ['ground-rod', 'Ground rod'],
  ['grounding-sizes', 'Grounding conductor sizes'],
] as const

const title = (page: Page, name: string) =>
  page.getByRole('heading', { level: 1, name, exact: true }).waitFor()
const verdict = (page: Page) => page.locator('.ws-verdict').innerText()
const says = (page: Page, words: string | RegExp) =>
  page.locator('.ws-verdict').filter({ hasText: words }).waitFor()
const type = (page: Page, label: string, text: string) =>
  page.getByLabel(label, { exact: true }).first().fill(text)
const sideways = (page: Page) =>
  page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth)
const asked = (page: Page) => Object.fromEntries(new URL(page.url()).searchParams)

describe.each(['light', 'dark'] as const)('%s', (theme) => {
  test.each([
    ['phone', phone],
    ['desk', desk],
  ] as const)(
    'on a %s every worksheet opens from the list, axe finds nothing, nothing scrolls sideways',
    async (_, size) => {
      const { page, complaints, strays, end } = await visit(browser, site, {
        theme,
        size,
        touch: size === phone,
      })
      await page.goto('/worksheets')
      await title(page, 'Worksheets')
      expect(await axeFindings(page)).toEqual([])
      for (const [name, heading] of sheets) {
        await page.getByRole('link', { name: new RegExp(`^${heading}`) }).click()
        await title(page, heading)
        await page.locator('.ws-verdict').waitFor()
        await expect.poll(() => new URL(page.url()).search).not.toBe('')
        // At the end of the page the dock of a phone stands below it all, not over a field that is scrolling by.
        await page.evaluate(() => window.scrollTo(0, document.body.scrollHeight))
        await expect
          .poll(() => page.evaluate(() => innerHeight + scrollY - document.documentElement.scrollHeight))
          .toBeGreaterThan(-2)
        expect({ name, found: await axeFindings(page), sideways: await sideways(page) }).toEqual({
          name,
          found: [],
          sideways: 0,
        })
        await page.getByRole('link', { name: 'Worksheets' }).last().click()
        await title(page, 'Worksheets')
      }
      expect(complaints).toEqual([])
      expect(strays).toEqual([])
      await end()
    },
  )
})

test('what is typed stands in the address; its link gives somebody else the same answer', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto('/worksheets/voltage-drop')
  await page.getByText('An example stands here.').waitFor()
  await type(page, 'Length, one way, feet', '200')
  await type(page, 'Current, amps', '16')
  await says(page, '12.4 V lost')
  await expect.poll(() => asked(page)['runs.0.length']).toBe('200')
  expect(await page.getByText('An example stands here.').count()).toBe(0)
  const other = await visit(browser, site)
  await other.page.goto(page.url())
  await says(other.page, '12.4 V lost')
  expect(await verdict(other.page)).toBe(await verdict(page))
  await other.end()
  await end()
})

test('an address made for a service call opens the sheet filled in', async () => {
  const { page, end } = await visit(browser, site)
  const loads = [
    { leg: '1', watts: 100 },
    { leg: '2', watts: 200 },
  ] as const
  await page.goto(worksheetAddress('lost-neutral', { volts: 120, neutral: 'open', loads: [...loads] }))
  await says(page, 'Leg 1 gets 160 V: what runs there burns out.')
  expect(await page.getByRole('note', { name: 'Danger' }).innerText()).toContain('switch off at the main')
  await end()
})

test('what was typed is kept on the device, and the units for every sheet; changing back is exact', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto('/worksheets/voltage-drop')
  await type(page, 'Length, one way, feet', '123.4')
  await page.getByRole('radio', { name: 'Meters, mm²' }).click()
  await page.getByLabel('Length, one way, meters', { exact: true }).waitFor()
  expect(await page.getByLabel('Length, one way, meters', { exact: true }).inputValue()).toBe('37.6')
  expect(await page.getByLabel('Size', { exact: true }).inputValue()).toBe('4')
  await page.getByRole('radio', { name: 'Feet, AWG' }).click()
  expect(await page.getByLabel('Length, one way, feet', { exact: true }).inputValue()).toBe('123.4')
  expect(await page.getByLabel('Size', { exact: true }).inputValue()).toBe('12')
  await page.getByRole('radio', { name: 'Meters, mm²' }).click()
  await page.goto('/worksheets/ground-rod')
  await page.getByLabel('Length in the earth, meters', { exact: true }).waitFor()
  await page.goto('/worksheets/voltage-drop')
  await page.getByLabel('Length, one way, meters', { exact: true }).waitFor()
  expect(await page.getByLabel('Length, one way, meters', { exact: true }).inputValue()).toBe('37.6')
  await end()
})

test('an entry that can’t be is named beside its field, stays, and gives no answer', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto('/worksheets/fault-clearing')
  await says(page, 'Don’t count on the breaker')
  const rating = page.getByLabel('Rating, amps', { exact: true })
  await rating.fill('2o')
  await rating.blur()
  const words = 'Type the breaker’s rating in amps: a number from 1 to 400.'
  expect(await rating.getAttribute('aria-invalid')).toBe('true')
  const described = (await rating.getAttribute('aria-describedby'))!.split(' ').at(-1)!
  expect(await page.locator(`[id="${described}"]`).innerText()).toBe(words)
  expect(await rating.inputValue()).toBe('2o')
  expect(await page.locator('.ws-verdict').count()).toBe(0)
  await page.getByText('No answer yet: these entries').waitFor()
  expect(await axeFindings(page)).toEqual([])
  await expect.poll(() => asked(page)['device.amps']).toBe('2o')
  await page.reload()
  await page.getByText('No answer yet: these entries').waitFor()
  expect(await rating.inputValue()).toBe('2o')
  await rating.fill('15')
  await says(page, /./)
  // Aluminum comes no thinner than 12 AWG in the table: said at once, since two fields make it so.
  await page
    .getByRole('radiogroup', { name: 'Metal' })
    .last()
    .getByRole('radio', { name: 'Aluminum' })
    .click()
  await page.getByLabel('Hot', { exact: true }).last().selectOption('14')
  await page
    .locator('.field-error', { hasText: 'The table has no aluminum cable of 14 AWG.' })
    .first()
    .waitFor()
  await end()
})

test('an address from elsewhere harms nothing: what it can’t be is said', async () => {
  const { page, complaints, end } = await visit(browser, site)
  await page.goto(
    '/worksheets/trip-time?device=<script>&__proto__.x=1&milliamps=%3Cimg%20src=x%20onerror=alert(1)%3E',
  )
  await page.getByText('No answer yet: these entries').waitFor()
  await page.goto('/worksheets/voltage-drop?runs.999999999.length=1&current=ac')
  await page.getByText('No answer yet: these entries').waitFor()
  await page.goto('/worksheets/no-such-sheet')
  await title(page, 'There is no such worksheet')
  expect(complaints).toEqual([])
  await end()
})

test('the keyboard alone: a choice, a row more, a row less', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto('/worksheets/lost-neutral')
  await says(page, 'Leg 2 gets 222 V')
  const tabTo = async (name: RegExp) => {
    for (let i = 0; i < 60; i += 1) {
      await page.keyboard.press('Tab')
      const at = await page.evaluate(
        () => document.activeElement?.getAttribute('aria-label') ?? document.activeElement?.textContent ?? '',
      )
      if (name.test(at)) return
    }
    throw new Error(`Tab never came to ${name}`)
  }
  await tabTo(/^Open$/)
  await page.keyboard.press('ArrowRight')
  await page.keyboard.press('Space')
  await page.getByLabel('Resistance of the neutral, ohms', { exact: true }).waitFor()
  await says(page, 'Both legs stay near their voltage')
  await tabTo(/^Load$/)
  await page.keyboard.press('Enter')
  expect(await page.getByRole('group', { name: 'Load 3' }).count()).toBe(1)
  await tabTo(/./)
  await page.getByRole('button', { name: 'Remove load 1' }).focus()
  await page.keyboard.press('Enter')
  expect(await page.getByRole('group', { name: 'Load 3' }).count()).toBe(0)
  await expect.poll(() => asked(page)['loads.0.watts']).toBe('100')
  expect(asked(page)['loads.2.watts']).toBeUndefined()
  await end()
})

test('typing far down the page leaves it where it is', async () => {
  const { page, end } = await visit(browser, site, { size: phone, touch: true })
  await page.goto('/worksheets')
  await page.getByRole('link', { name: /^What clears a fault/ }).click()
  await says(page, /./)
  const rod = page.getByLabel('Rod at the panel, ohms', { exact: true })
  await rod.fill('40')
  await expect.poll(() => asked(page)['rods.panelOhms']).toBe('40')
  const top = () => rod.evaluate((field) => Math.round(field.getBoundingClientRect().top))
  await rod.scrollIntoViewIfNeeded()
  const before = await top()
  await rod.fill('41')
  await expect.poll(() => asked(page)['rods.panelOhms']).toBe('41')
  await page.waitForTimeout(300)
  expect(Math.abs((await top()) - before)).toBeLessThan(3)
  await end()
})

test('Begin anew brings the example, and Undo what was typed', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto('/worksheets/trip-time')
  await type(page, 'Current, milliamps', '6')
  await says(page, 'within 5.6 s')
  await page.getByRole('button', { name: 'Begin anew' }).click()
  await says(page, 'within 0.56 s')
  await page.getByRole('button', { name: 'Undo' }).click()
  await says(page, 'within 5.6 s')
  await end()
})

test('the plot says in words what it draws, and the picture of the bond follows the choice', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto('/worksheets/fault-clearing')
  await page.getByRole('img', { name: /20 A breaker \(UL 489\)/ }).waitFor()
  await page.getByRole('radio', { name: /^Nowhere/ }).click()
  await says(page, 'The breaker does not trip: there is no way back for the current.')
  expect(await page.getByRole('note', { name: 'Danger' }).count()).toBe(1)
  expect(await page.locator('.ws-plot').count()).toBe(0)
  await page.getByRole('radio', { name: 'Utility' }).click()
  await page.getByRole('radio', { name: /^In the panel/ }).click()
  await page.getByText('Type the short-circuit current in amps').first().waitFor()
  await type(page, 'Short-circuit current, line to neutral, amps', '2400')
  await says(page, 'The breaker trips.')
  await end()
})

test('on paper the inputs stand as a list, black on white from a dark screen too, and nothing of the screen', async () => {
  const { page, end } = await visit(browser, site, { theme: 'dark' })
  await page.goto('/worksheets/fault-clearing')
  await says(page, /./)
  await page.emulateMedia({ media: 'print' })
  expect(await page.locator('.ws-form').isVisible()).toBe(false)
  expect(await page.getByRole('button', { name: 'Print' }).isVisible()).toBe(false)
  expect(await page.evaluate(() => getComputedStyle(document.documentElement).backgroundColor)).toBe(
    'rgb(255, 255, 255)',
  )
  const paper = await page.locator('section.ws-paper').innerText()
  expect(paper).toContain('3000 W')
  expect(paper).toContain('In the panel')
  expect(await page.locator('.ws-kind').innerText()).toContain('Tavenmere Valley Small Power')
  await end()
})

test('the masthead leads staff there, and homeowners reach a sheet by its link', async () => {
  const staff = await visit(browser, site)
  await signInAs(staff.page, 'tech')
  await staff.page.goto('/diagnosis')
  await staff.page.getByRole('navigation', { name: 'Main' }).getByRole('link', { name: 'Worksheets' }).click()
  await title(staff.page, 'Worksheets')
  await staff.page.getByRole('link', { name: /^Ground rod/ }).click()
  await says(staff.page, 'One rod')
  expect(await staff.page.getByText('For people who work on wiring.').count()).toBe(0)
  await staff.end()
  const guest = await visit(browser, site)
  await guest.page.goto('/worksheets/ground-rod')
  await guest.page.getByText('For people who work on wiring.').waitFor()
  await guest.end()
})

test('at 320 px and with text twice as large nothing scrolls sideways; on a phone no target is under 44 px', async () => {
  const { page, end } = await visit(browser, site, { size: { width: 320, height: 700 } })
  for (const [name] of sheets) {
    await page.setViewportSize({ width: 320, height: 700 })
    await page.goto(`/worksheets/${name}`)
    await says(page, /./)
    expect([name, await sideways(page)]).toEqual([name, 0])
    const low = await page
      .locator('main :is(a, button, input, select):visible, .dock a:visible')
      .evaluateAll((targets) =>
        targets
          .filter((target) => target.getBoundingClientRect().height < 44)
          .map((target) => `${target.textContent} ${target.getBoundingClientRect().height}`),
      )
    expect([name, low]).toEqual([name, []])
    await page.setViewportSize({ width: 640, height: 900 })
    await page.evaluate(() => {
      document.documentElement.style.fontSize = '200%'
    })
    expect([name, await sideways(page)]).toEqual([name, 0])
  }
  await end()
})
