/** Two people with one link see each other's findings; both of two that contradict each other stay. */
import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { openBrowser, openSite, visit } from './browser.ts'
import type { Site } from './browser.ts'
import { choose } from './check-steps.ts'
import { field, observe, ranking, read } from './diagnosis-steps.ts'
import { makeLink, onServer, openLink, sayOnline } from './sheet-steps.ts'
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

const withinMs = 5000

test('sign-up, a check, its link, a tech: each sees the other’s findings within seconds, until it is taken back', async () => {
  const home = await visit(browser, site)
  await home.page.goto('/sign-up')
  await home.page.getByLabel('Name').fill('Linnet')
  await home.page.getByLabel('E-mail address').fill('linnet@example.test')
  await home.page.getByLabel('Password', { exact: true }).fill('porch light is out')
  await home.page.getByRole('button', { name: 'Make my account' }).click()
  await home.page.getByRole('link', { name: 'Account: Linnet' }).waitFor()
  const address = await makeLink(home.page)
  const tech = await openLink(browser, site, address)
  await read(tech.page, 'hot–neutral', '121.4')
  let since = Date.now()
  await home.page.getByText(/121\.4 V/).waitFor()
  expect(Date.now() - since).toBeLessThan(withinMs)
  await home.page.getByText(/^Demo tech, \w+ \d+, \d{4}/).waitFor()

  // On the phone the homeowner looks once more, and the tech's page takes it over.
  const second = await home.context.newPage()
  await second.goto('/check/3')
  await choose(second, 'How much is affected?', 'Everything')
  since = Date.now()
  await tech.page
    .getByRole('row', { name: /Everything/ })
    .first()
    .waitFor()
  expect(Date.now() - since).toBeLessThan(withinMs)
  await second.close()

  await home.page.getByRole('button', { name: 'Take the link back' }).click()
  since = Date.now()
  await tech.page.getByText('The link was taken back').waitFor()
  expect(Date.now() - since).toBeLessThan(withinMs)
  expect(await field(tech.page, 'hot–neutral').inputValue()).toBe('121.4')

  // What the tech has goes on as a sheet of the tech's own; nothing of it reaches the homeowner any more.
  await read(tech.page, 'neutral–ground', '0.4')
  await tech.page.getByText('All sent').waitFor()
  const entries = await onServer(site)
  const owners = await site.database.db
    .selectFrom('sheet as s')
    .innerJoin('person as p', 'p.id', 's.owner_id')
    .select(['p.name', 's.kind'])
    .execute()
  expect(owners).toContainEqual({ name: 'Linnet', kind: 'triage' })
  expect(owners).toContainEqual({ name: 'Demo tech', kind: 'diagnosis' })
  expect(entries.filter((entry) => entry.finding === 'receptacle.ng.volts')).toHaveLength(1)
  expect(entries.filter((entry) => entry.value === 121.4)).toHaveLength(2)
  await home.end()

  const late = await visit(browser, site)
  await signInAs(late.page, 'senior')
  await late.page.goto(address)
  await late.page.getByText('There is no such link any more.').waitFor()
  await late.end()
  await tech.end()
})

test('two who enter different readings without a network: both stay, with who and when, until one is kept', async () => {
  const home = await visit(browser, site)
  const address = await makeLink(home.page)
  const tech = await openLink(browser, site, address)
  const senior = await openLink(browser, site, address, { role: 'senior' })
  await senior.context.setOffline(true)
  await tech.context.setOffline(true)
  await read(tech.page, 'hot–neutral', '121.4')
  await read(senior.page, 'hot–neutral', '117.5')
  await tech.page.getByText('On this device only: 1').waitFor()
  await senior.page.getByText('On this device only: 1').waitFor()
  for (const { page, context } of [tech, senior]) {
    await context.setOffline(false)
    await sayOnline(page)
    await page.getByText('All sent').waitFor()
  }
  for (const { page } of [tech, senior]) {
    const panel = page.getByRole('region', { name: 'Readings that contradict each other' })
    await panel.getByText('Two people entered different readings.').waitFor()
    await panel.getByText(/121\.4 V: Demo tech, .*\d{4}.*\d:\d\d:\d\d/).waitFor()
    await panel.getByText(/117\.5 V: Demo senior tech, .*\d{4}.*\d:\d\d:\d\d/).waitFor()
    // The last entered is ranked on both pages alike.
    expect(await field(page, 'hot–neutral').inputValue()).toBe('117.5')
  }
  expect(await ranking(tech.page)).toEqual(await ranking(senior.page))

  await tech.page.getByRole('button', { name: /^Keep this one: 121\.4 V/ }).focus()
  await tech.page.keyboard.press('Enter')
  for (const { page } of [tech, senior]) {
    await page.getByText('Two people entered different readings.').waitFor({ state: 'detached' })
    expect(await field(page, 'hot–neutral').inputValue()).toBe('121.4')
  }
  await home.end()
  await tech.end()
  await senior.end()
})

test('the server restarts: both pages take the line up again, and what was missed comes', async () => {
  const home = await visit(browser, site)
  const address = await makeLink(home.page)
  const tech = await openLink(browser, site, address)
  await home.page.getByText('What your professional finds shows here.').waitFor()
  const since = Date.now()
  await site.stop()
  // The open lines do not keep it.
  expect(Date.now() - since).toBeLessThan(3000)
  await read(tech.page, 'hot–neutral', '119.1')
  await tech.page.getByText('On this device only: 1').waitFor()
  await site.start()
  await home.page.getByText(/119\.1 V/).waitFor()

  // What stops the tech's page stops the homeowner's: in place of what it may be, not below it.
  await observe(tech.page, 'tingle', 'Tingle', 'Yes')
  await home.page.getByRole('heading', { name: 'Why we say so' }).waitFor()
  expect(await home.page.getByRole('heading', { name: 'What it may be' }).count()).toBe(0)
  await home.page.getByText('Tingle: Yes').waitFor()
  await home.end()
  await tech.end()
})

test('a stream ends when whoever opened it signs out, wherever that was', async () => {
  const home = await visit(browser, site)
  const address = await makeLink(home.page)
  const token = address.split('/').at(-1) ?? ''
  const tech = await openLink(browser, site, address)
  const ended = tech.page.evaluate(
    (path) =>
      new Promise<string>((resolve) => {
        const line = new EventSource(path)
        line.addEventListener('ended', () => {
          line.close()
          resolve('ended')
        })
        line.addEventListener('changed', () => document.body.setAttribute('data-line', 'open'))
      }),
    `/api/shared/${token}/events`,
  )
  await tech.page.locator('body[data-line=open]').waitFor()
  const out = await tech.context.request.post('/api/sign-out', { data: {}, headers: { origin: site.url } })
  expect(out.status()).toBe(200)
  expect(await ended).toBe('ended')
  await home.end()
  await tech.end()
})
