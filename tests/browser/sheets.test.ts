/** Sheets are kept on the device first, go to the server when it answers, and come back as they were. */
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { putInForce } from '../../server/editions/put-in-force.ts'
import { rankingOtherwise, starterBytes } from '../server/some-edition.ts'
import { openBrowser, openSite, visit } from './browser.ts'
import type { Site } from './browser.ts'
import { answerAllNo } from './check-steps.ts'
import { beginSheet, field, openDiagnosis, ranking, read, readThree } from './diagnosis-steps.ts'
import { onServer, sayOnline } from './sheet-steps.ts'
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

/** The last value of each finding of a sheet, as the server has it. */
const valuesOf = async (title: string) =>
  Object.fromEntries(
    (await onServer(site)).filter((entry) => entry.title === title).map((e) => [e.finding, e.value]),
  )
const allSent = (page: Page) => page.getByRole('banner').getByText('All sent').waitFor()
const onlyHere = (page: Page, count: number) => page.getByText(`On this device only: ${count}`).waitFor()

describe('the way to the server', () => {
  test('the server stops in the middle of a sheet, and nothing is lost', async () => {
    const { page, end } = await visit(browser, site)
    await openDiagnosis(page)
    await beginSheet(page, { title: 'In the middle' })
    await read(page, 'hot–neutral', '119.6')
    await allSent(page)
    expect(await valuesOf('In the middle')).toEqual({ 'receptacle.hn.volts': 119.6 })

    await site.stop()
    await read(page, 'neutral–ground', '57.2')
    await read(page, 'hot–ground', '56.8')
    await onlyHere(page, 1)
    // Long enough for a sending that fails.
    await page.waitForTimeout(2500)
    await onlyHere(page, 1)

    await site.start()
    await sayOnline(page)
    await allSent(page)
    expect(await valuesOf('In the middle')).toEqual({
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
    await onlyHere(page, 1)
    expect(await valuesOf('In a hotel')).toEqual({})
    await page.unroute(/\/api\/sheets\//)
    await sayOnline(page)
    await allSent(page)
    expect(await valuesOf('In a hotel')).toMatchObject({ 'receptacle.hn.volts': 118 })
    await end()
  })

  test('what is refused says so and why, and goes out once it is sent again', async () => {
    const { page, end } = await visit(browser, site)
    await openDiagnosis(page)
    await page.route(/\/entries$/, (route) =>
      route.fulfill({
        status: 400,
        contentType: 'application/problem+json',
        body: JSON.stringify({ title: 'Mend what is marked.', errors: { 'entries.0': 'is not wanted' } }),
      }),
    )
    await beginSheet(page, { title: 'Refused' })
    await read(page, 'hot–neutral', '117')
    await page.getByRole('link', { name: 'Refused: see why' }).click()
    await page.getByRole('heading', { level: 1, name: 'On this device only' }).waitFor()
    await page.getByText('Mend what is marked. entries.0: is not wanted').waitFor()
    await page.unroute(/\/entries$/)
    await page.getByRole('button', { name: 'Send again: Refused' }).click()
    await allSent(page)
    expect(await valuesOf('Refused')).toEqual({ 'receptacle.hn.volts': 117 })
    await end()
  })
})

describe('my sheets', () => {
  test('are found by title on another device, and rank there as they did, also when a newer edition is in force', async () => {
    const first = await visit(browser, site)
    await openDiagnosis(first.page)
    await beginSheet(first.page, { title: 'Barn, north wall' })
    await readThree(first.page, '120', '119.8', '0.3')
    const before = await ranking(first.page)
    await allSent(first.page)
    await first.end()
    await putInForce(site.database.db, rankingOtherwise, { note: 'ranks otherwise', reason: 'test' })

    const { page, end } = await visit(browser, site)
    await signInAs(page, 'tech')
    await page.goto('/diagnosis')
    await page.getByRole('list', { name: 'My sheets' }).getByText('In the middle').waitFor()
    await page.getByRole('searchbox', { name: 'Search my sheets by title' }).fill('nothing of that')
    await page.getByText('None of that title.').waitFor()
    await page.getByRole('searchbox', { name: 'Search my sheets by title' }).fill('north')
    await page.getByText('None of that title.').waitFor({ state: 'detached' })
    await page.getByRole('button', { name: 'Open Barn, north wall' }).click()
    await page.getByRole('heading', { name: 'Likely causes' }).waitFor()
    expect(await field(page, 'neutral–ground').inputValue()).toBe('119.8')
    expect(await ranking(page)).toEqual(before)

    // As another sheet, on the edition in force, it ranks as that one does.
    await page.getByText(/stays on edition 1.*Edition 2 is in force/).waitFor()
    const kept = page.url()
    await page.getByRole('button', { name: 'Go on with the edition in force' }).click()
    await page.getByRole('heading', { level: 1, name: 'Barn, north wall, edition 2' }).waitFor()
    expect(await field(page, 'neutral–ground').inputValue()).toBe('119.8')
    expect(await ranking(page)).not.toEqual(before)
    await page.goto(kept)
    await page.getByRole('heading', { name: 'Likely causes' }).waitFor()
    expect(await ranking(page)).toEqual(before)
    await putInForce(site.database.db, starterBytes, { note: 'starter edition', reason: 'test' })
    await end()
  })

  test('sent ones leave the device at sign-out; what was not sent is said, and kept for that person alone', async () => {
    const { page, end } = await visit(browser, site)
    await openDiagnosis(page)
    await beginSheet(page, { title: 'Sent before' })
    await read(page, 'hot–neutral', '121')
    await allSent(page)
    await page.route(/\/api\/sheets\//, (route) => route.abort())
    await page.goto('/diagnosis')
    await beginSheet(page, { title: 'Not sent' })
    await read(page, 'hot–neutral', '122')
    await onlyHere(page, 1)

    await page.goto('/account')
    await page.getByText('2 entries are on this device only.').waitFor()
    await page.getByRole('button', { name: 'Sign out on this device' }).click()
    await page.getByRole('banner').getByRole('link', { name: 'Sign in' }).waitFor()
    await page.unroute(/\/api\/sheets\//)

    // Somebody else on the same device sees nothing of it, and sends nothing of it.
    await signInAs(page, 'senior')
    await page.goto('/diagnosis')
    await page.getByText('No findings sheets on this device yet.').waitFor()
    expect(await page.getByText(/On this device only/).count()).toBe(0)
    await page.goto('/account')
    await page.getByRole('heading', { name: 'Sign out' }).waitFor()
    await page.waitForTimeout(2500)
    expect(await page.getByText(/on this device only/i).count()).toBe(0)
    expect(await valuesOf('Not sent')).toEqual({})
    await page.getByRole('button', { name: 'Sign out on this device' }).click()
    await page.getByRole('banner').getByRole('link', { name: 'Sign in' }).waitFor()

    await openDiagnosis(page)
    await page.getByRole('link', { name: 'Not sent', exact: true }).waitFor()
    expect(await page.getByRole('link', { name: 'Sent before', exact: true }).count()).toBe(0)
    await allSent(page)
    expect(await valuesOf('Not sent')).toEqual({ 'receptacle.hn.volts': 122 })
    await end()
  })
})

describe('a check made while nobody was signed in', () => {
  test('stays on the device, and is whose account is made there next', async () => {
    const { page, end } = await visit(browser, site)
    await answerAllNo(page)
    await onlyHere(page, 1)
    await page.waitForTimeout(2000)
    expect(await valuesOf('Check my power')).toEqual({})
    await page.goto('/sign-up')
    await page.getByLabel('Name').fill('Robin')
    await page.getByLabel('E-mail address').fill('robin@example.test')
    await page.getByLabel('Password', { exact: true }).fill('porch light is out')
    await page.getByRole('button', { name: 'Make my account' }).click()
    await page.getByRole('link', { name: 'Account: Robin' }).waitFor()
    await allSent(page)
    expect(await valuesOf('Check my power')).toMatchObject({ shock: 'no' })
    await end()
  })

  test('is not taken by whoever signs in, until they say that it is theirs', async () => {
    const { page, end } = await visit(browser, site)
    await answerAllNo(page)
    await onlyHere(page, 1)
    const before = (await onServer(site)).length
    await signInAs(page, 'helper')
    await page.goto('/account')
    await page.getByText('A check was made here while nobody was signed in.').waitFor()
    await page.waitForTimeout(2000)
    expect(await onServer(site)).toHaveLength(before)
    await page.getByRole('button', { name: 'Keep it in my account' }).click()
    await allSent(page)
    expect((await onServer(site)).length).toBeGreaterThan(before)
    await end()
  })
})
