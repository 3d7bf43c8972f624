import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
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

/** What has the focus: its role or tag, and its name. */
const focused = (page: Page) =>
  page.evaluate(() => {
    const at = document.activeElement
    const name = at?.getAttribute('aria-label') ?? (at as HTMLElement | null)?.innerText ?? ''
    return `${at?.getAttribute('role') ?? at?.tagName.toLowerCase()} ${name.trim().split('\n')[0]}`
  })

/** Presses Tab until what has the focus fits, and fails when it never does. */
async function tabTo(page: Page, wanted: RegExp): Promise<void> {
  for (let i = 0; i < 60; i += 1) {
    await page.keyboard.press('Tab')
    if (wanted.test(await focused(page))) return
  }
  throw new Error(`Tab never came to ${wanted}; it stands on: ${await focused(page)}`)
}

test('from the front page to the result by keyboard alone', async () => {
  const { page, complaints, end } = await visit(browser, site)
  await page.goto('/')
  await settled(page)
  await page.keyboard.press('Tab')
  expect(await focused(page)).toBe('a Skip to the content')
  await tabTo(page, /^a What to do now|^a DANGER/)
  await tabTo(page, /^a Check my power/)
  await tabTo(page, /^a Check my power/)
  await page.keyboard.press('Enter')
  await page.waitForURL('**/check/1')
  await expect.poll(() => focused(page)).toBe('h1 Before you touch anything')

  // A group is one stop of the Tab key; an arrow moves without choosing, space chooses.
  for (let i = 0; i < 8; i += 1) {
    await tabTo(page, /^radio Yes/)
    await page.keyboard.press('ArrowRight')
    expect(await focused(page)).toBe('radio No')
    expect(await page.evaluate(() => document.activeElement?.getAttribute('aria-checked'))).toBe('false')
    await page.keyboard.press('Space')
    await expect
      .poll(() => page.evaluate(() => document.activeElement?.getAttribute('aria-checked')))
      .toBe('true')
  }
  await tabTo(page, /^button Next: what feeds it/)
  await page.keyboard.press('Enter')
  await expect.poll(() => focused(page)).toBe('h1 What feeds it?')
  await tabTo(page, /^radio A hard-wired inverter/)
  await page.keyboard.press('ArrowDown')
  await page.keyboard.press('ArrowDown')
  await page.keyboard.press('ArrowDown')
  await page.keyboard.press('Space')
  await page.getByRole('radio', { name: /An engine generator/, checked: true }).waitFor()
  await tabTo(page, /^button Next: what you notice/)
  await page.keyboard.press('Enter')
  await expect.poll(() => focused(page)).toBe('h1 What do you notice?')
  await tabTo(page, /^input/)
  await page.keyboard.type('shed, by the door')
  await tabTo(page, /^radio This outlet only/)
  await page.keyboard.press('End')
  await page.keyboard.press('Space')
  await page.getByRole('radio', { name: 'Everything', checked: true }).waitFor()
  await tabTo(page, /^button Next: tester lamps/)
  await page.keyboard.press('Enter')
  await expect.poll(() => focused(page)).toBe('h1 Which tester lamps are lit?')
  for (const moves of [0, 2, 0]) {
    await tabTo(page, /^radio Lit/)
    for (let i = 0; i < moves; i += 1) await page.keyboard.press('ArrowRight')
    await page.keyboard.press('Space')
    await expect
      .poll(() => page.evaluate(() => document.activeElement?.getAttribute('aria-checked')))
      .toBe('true')
  }
  await tabTo(page, /^button Next: used a meter before/)
  await page.keyboard.press('Enter')
  await expect.poll(() => focused(page)).toBe('h1 Volts, only if you have used a meter before')
  await tabTo(page, /^radio Yes, I have/)
  await page.keyboard.press('Space')
  for (let i = 0; i < 5; i += 1) {
    await tabTo(page, /^checkbox/)
    await page.keyboard.press('Space')
    await expect
      .poll(() => page.evaluate(() => document.activeElement?.getAttribute('aria-checked')))
      .toBe('true')
  }
  await tabTo(page, /^input/)
  await page.keyboard.type('119.8')
  await page.keyboard.press('Enter')
  await page.keyboard.type('0.3')
  await page.keyboard.press('Enter')
  await page.keyboard.type('119.5')
  await page.keyboard.press('Enter')
  await tabTo(page, /^button Next: what it may be/)
  await page.keyboard.press('Enter')
  await expect.poll(() => focused(page)).toBe('h1 What it may be')
  await page
    .getByRole('heading', { name: /What fits|It may be/ })
    .first()
    .waitFor()
  const said = await page.getByRole('blockquote').innerText()
  expect(said).toContain(
    'Tester at shed, by the door: hot to neutral lit, neutral to ground dark, hot to ground lit.',
  )
  expect(said).toContain(
    'hot to neutral 119.8 volts, neutral to ground 0.3 volts, hot to ground 119.5 volts.',
  )
  expect(said).toContain('An engine generator feeds it.')
  expect(complaints).toEqual([])
  await end()
})
