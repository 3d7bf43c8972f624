/** Everything that shows a sheet's way to others, as axe, the console and the edge of the screen see it. */
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { putInForce } from '../../server/editions/put-in-force.ts'
import { rankingOtherwise, starterBytes } from '../server/some-edition.ts'
import { axeFindings } from './axe.ts'
import { desk, openBrowser, openSite, phone, settled, visit } from './browser.ts'
import type { Site, Theme } from './browser.ts'
import { beginSheet, openDiagnosis, read } from './diagnosis-steps.ts'
import { makeLink, openLink, sayOnline } from './sheet-steps.ts'
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

/** @param quiet waits until the page asks for nothing more; one that holds a line open never falls silent */
async function isInOrder(page: Page, what: string, width: number, quiet = true): Promise<void> {
  if (quiet) await settled(page)
  // At the end of the page the dock of a phone stands below it all, not over a field that is scrolling by.
  await page.evaluate(() => window.scrollTo(0, document.body.scrollHeight))
  expect([what, await axeFindings(page)]).toEqual([what, []])
  const wide = await page.evaluate(() => document.documentElement.scrollWidth)
  expect([what, wide <= width]).toEqual([what, true])
}

describe.each([
  ['phone', 'light', phone],
  ['phone', 'dark', phone],
  ['desk', 'light', desk],
  ['desk', 'dark', desk],
] as const)('on a %s, %s', (name, theme: Theme, size) => {
  const options = { theme, size, touch: size === phone }
  const inOrder = (page: Page, what: string, quiet = true) =>
    isInOrder(page, `${what}-${name}-${theme}`, size.width, quiet)

  test('a link given, what the professional finds, two readings that contradict, a link taken back', async () => {
    const home = await visit(browser, site, options)
    const address = await makeLink(home.page)
    await inOrder(home.page, 'link-given')
    const tech = await openLink(browser, site, address, options)
    const senior = await openLink(browser, site, address, { ...options, role: 'senior' })
    await tech.context.setOffline(true)
    await senior.context.setOffline(true)
    await read(tech.page, 'hot–neutral', '121.4')
    await read(senior.page, 'hot–neutral', '117.5')
    for (const { page, context } of [tech, senior]) {
      await page.getByText('On this device only: 1').waitFor()
      await context.setOffline(false)
      await sayOnline(page)
    }
    await tech.page.getByText('Two people entered different readings.').waitFor()
    await inOrder(tech.page, 'contradict', false)
    await home.page.getByText(/117\.5 V/).waitFor()
    await inOrder(home.page, 'found', false)
    await home.page.getByRole('button', { name: 'Take the link back' }).click()
    await tech.page.getByText('The link was taken back').waitFor()
    await inOrder(tech.page, 'taken-back', false)
    const visitor = await visit(browser, site, options)
    await visitor.page.goto(address)
    await visitor.page.getByText('This link is for the professional').waitFor()
    await inOrder(visitor.page, 'link-visitor')
    await signInAs(visitor.page, 'tech')
    await visitor.page.goto(address)
    await visitor.page.getByText('There is no such link any more.').waitFor()
    await inOrder(visitor.page, 'link-gone')
    expect(home.strays).toEqual([])
    for (const { end } of [home, tech, senior, visitor]) await end()
  })

  test('my sheets, an earlier edition, what is on this device only, the account', async () => {
    const { page, end } = await visit(browser, site, options)
    await openDiagnosis(page)
    await beginSheet(page, { title: `Earlier, ${name} ${theme}` })
    await read(page, 'hot–neutral', '120')
    await page.getByRole('banner').getByText('All sent').waitFor()
    const address = page.url()
    await putInForce(site.database.db, rankingOtherwise, { note: 'ranks otherwise', reason: 'test' })
    await page.goto('/diagnosis')
    await page.getByRole('list', { name: 'My sheets' }).getByText(`Earlier, ${name} ${theme}`).waitFor()
    await inOrder(page, 'my-sheets')
    await page.goto(address)
    await page.getByRole('button', { name: 'Go on with the edition in force' }).waitFor()
    await inOrder(page, 'earlier-edition', false)
    await putInForce(site.database.db, starterBytes, { note: 'starter edition', reason: 'test' })
    await page.route(/\/api\/sheets\//, (route) => route.abort())
    await read(page, 'neutral–ground', '0.2')
    await page.getByText('On this device only: 1').waitFor()
    await page.goto('/not-sent')
    await page.getByText('1 to send.').waitFor()
    await inOrder(page, 'not-sent')
    await page.goto('/account')
    await page.getByText('1 entry is on this device only.').waitFor()
    await inOrder(page, 'account')
    await end()
  })
})
