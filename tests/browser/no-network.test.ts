/** The server really stops: what a device still opens, and what it says. */
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { axeFindings } from './axe.ts'
import { openBrowser, openSite, phone, visit } from './browser.ts'
import type { Site, Visit } from './browser.ts'
import { answerAllNo } from './check-steps.ts'
import { untilFilesKept, untilServed } from './devices.ts'
import { beginSheet, openDiagnosis, ranking, read, readThree } from './diagnosis-steps.ts'

let browser: Browser
beforeAll(async () => {
  browser = await openBrowser()
})
afterAll(() => browser.close())

/** A new tab, as after the device was switched off and on. */
async function cold(device: Visit, path: string): Promise<Page> {
  const page = await device.context.newPage()
  await page.goto(path)
  return page
}
const heading = (page: Page, name: string | RegExp) =>
  page.getByRole('heading', { level: 1, name }).waitFor({ timeout: 15_000 })

describe('one visit to the front page, then the server stops', () => {
  let site: Site
  let device: Visit
  beforeAll(async () => {
    site = await openSite()
    device = await visit(browser, site, { worker: true })
    await device.page.goto('/')
    await untilServed(device.page)
    await untilFilesKept(device.page, 3)
    await device.page.close()
    await site.stop()
    await expect(fetch(site.url)).rejects.toThrow()
  })
  afterAll(async () => {
    await device.end()
    await site.close()
  })

  test.each([
    ['/', /Something is wrong with the power/],
    ['/check', 'Before you touch anything'],
    ['/check/stop', /./],
    ['/diagnosis', 'Diagnosis'],
    ['/articles', 'Articles'],
    ['/articles/open-ground', /ground/i],
    ['/causes/open-ground', 'Ground wire open to this receptacle'],
    ['/tests/tester-lamps', /tester/i],
    ['/worksheets/bond-audit', 'Bond audit'],
    ['/editions', 'Edition 1'],
    ['/worksheets', 'Worksheets'],
    ['/worksheets/fault-clearing', 'What clears a fault'],
    ['/no-such-page', 'There is no such page'],
  ])('%s opens cold', async (path, title) => {
    const page = await cold(device, path)
    await heading(page, title)
    expect(await page.getByRole('main').innerText()).not.toMatch(/Couldn’t|isn’t on this device yet/)
    await page.close()
  })

  test('articles are searched', async () => {
    const page = await cold(device, '/articles?q=lost neutral')
    await page
      .getByRole('link', { name: /neutral/i })
      .first()
      .waitFor()
    await page.close()
  })

  test('the check goes through to its result', async () => {
    const page = await cold(device, '/check/1')
    await answerAllNo(page)
    await page.getByRole('button', { name: 'Next: what feeds it' }).click()
    await page.getByRole('radio', { name: /A hard-wired inverter/ }).click()
    await page.getByRole('button', { name: 'Next: what you notice' }).click()
    await page.getByRole('radio', { name: 'Everything' }).click()
    await page.getByRole('button', { name: 'Next: tester lamps' }).click()
    for (const [pair, state] of [
      ['hot and neutral', 'Lit'],
      ['neutral and ground', 'Dim'],
      ['hot and ground', 'Dim'],
    ] as const)
      await page.getByRole('radiogroup', { name: pair }).getByRole('radio', { name: state }).click()
    await page.getByRole('button', { name: 'Next: used a meter before?' }).click()
    await page.getByRole('radio', { name: 'No. Skip' }).click()
    await page.getByRole('heading', { name: /What fits|It may be/ }).waitFor()
    await page.close()
    // And once more, from the device alone.
    const again = await cold(device, '/check/result')
    await again.getByRole('heading', { name: /What fits|It may be/ }).waitFor()
    await again.getByText('On this device only: 1').first().waitFor()
    expect(await axeFindings(again)).toEqual([])
    await again.close()
  })
})

describe('a sheet begun with a network', () => {
  test('opens cold without one, ranks what is typed then, and keeps it; a new one is begun too', async () => {
    const site = await openSite()
    const device = await visit(browser, site, { worker: true })
    await openDiagnosis(device.page)
    await beginSheet(device.page, { title: 'Cabin' })
    await read(device.page, 'hot–neutral', '120')
    await untilServed(device.page)
    // Both shelves, since a tech is signed in.
    await untilFilesKept(device.page, 5)
    await device.page.close()
    await site.stop()

    const page = await cold(device, '/diagnosis')
    await page.getByRole('link', { name: 'Cabin', exact: true }).click()
    await page.getByRole('heading', { name: 'Likely causes' }).waitFor()
    await readThree(page, '120', '119.8', '0.3')
    const before = await ranking(page)
    expect(before[0]).toMatch(/swapped/i)
    await page.getByText('On this device only: 1').first().waitFor()
    const address = page.url()
    await page.close()

    const again = await cold(device, address)
    await again.getByRole('heading', { name: 'Likely causes' }).waitFor()
    expect(await ranking(again)).toEqual(before)
    await again.goto('/diagnosis')
    await beginSheet(again, { title: 'Begun in the cellar' })
    await readThree(again, '120', '0.2', '119.9')
    expect((await ranking(again)).length).toBeGreaterThan(0)
    await again.goto('/diagnosis')
    await again.getByRole('link', { name: 'Begun in the cellar', exact: true }).waitFor()
    await again.getByText(/This browser (may clear|agreed)|agreed to clear nothing/).waitFor()
    expect(await axeFindings(again)).toEqual([])

    // What is for qualified people opens as well.
    const article = await cold(device, '/articles/double-bond')
    await article.locator('.prose h2').first().waitFor()
    await device.end()
    await site.close()
  })

  test('the browser is asked to keep it when it is begun, and a full device is said beside the field', async () => {
    const site = await openSite()
    const device = await visit(browser, site)
    const { page } = device
    await page.addInitScript(() => {
      const asked = StorageManager.prototype.persist
      StorageManager.prototype.persist = function () {
        sessionStorage.setItem('asked', String(Number(sessionStorage.getItem('asked') ?? 0) + 1))
        return asked.call(this)
      }
    })
    const timesAsked = () => page.evaluate(() => sessionStorage.getItem('asked'))
    await openDiagnosis(page)
    expect(await timesAsked()).toBeNull()
    await beginSheet(page)
    await read(page, 'hot–neutral', '120')
    expect(await timesAsked()).toBe('1')

    // No driver can fill the disk; what the browser then throws is this.
    const setFull = (full: boolean) =>
      page.evaluate((value) => {
        const store = IDBObjectStore.prototype as IDBObjectStore & { whole?: IDBObjectStore['put'] }
        store.whole ??= store.put
        store.put = value
          ? () => {
              throw new DOMException('full', 'QuotaExceededError')
            }
          : store.whole
      }, full)
    await setFull(true)
    const hg = page.getByRole('textbox', { name: /^hot–ground/ }).first()
    await hg.fill('119')
    await page.getByText('Not kept on this device.').first().waitFor()
    await page.getByText('This device is full.').first().waitFor()
    // The field itself points at the sentence beneath it.
    const sentence = await hg.evaluate((input) =>
      (input.getAttribute('aria-describedby') ?? '')
        .split(' ')
        .map((id) => document.getElementById(id)?.textContent ?? '')
        .join(' '),
    )
    expect(sentence).toContain('Not kept')
    expect(await hg.inputValue()).toBe('119')
    await setFull(false)
    await page.getByRole('button', { name: 'Try again' }).click()
    await page.getByText('Not kept on this device.').first().waitFor({ state: 'detached' })
    await page.reload()
    await page.getByRole('heading', { name: 'Likely causes' }).waitFor()
    expect(await hg.inputValue()).toBe('119')
    await device.end()
    await site.close()
  })
})

test('whoever saves data is brought what ranks, and nothing beyond what was opened', async () => {
  const site = await openSite()
  const device = await visit(browser, site)
  await device.page.addInitScript(() =>
    Object.defineProperty(Navigator.prototype, 'connection', { get: () => ({ saveData: true }) }),
  )
  const asked: string[] = []
  device.page.on('request', (request) => asked.push(request.url()))
  await device.page.goto('/')
  await untilFilesKept(device.page, 1)
  await device.page.waitForLoadState('networkidle')
  expect(asked.filter((url) => url.includes('/api/edition-files/'))).toHaveLength(1)
  expect(asked.filter((url) => /article|diagnosis\.page/.test(url))).toEqual([])
  await device.end()
  await site.close()
})

test('the program can be installed: name, pictures and colors are in order', async () => {
  const site = await openSite()
  const device = await visit(browser, site, { worker: true })
  await device.page.goto('/')
  await untilServed(device.page)
  const devtools = await device.context.newCDPSession(device.page)
  const { errors, manifest } = await devtools.send('Page.getAppManifest')
  expect(errors).toEqual([])
  expect(manifest).toMatchObject({ name: 'Tracelamp', startUrl: `${site.url}/`, display: 'kStandalone' })
  const { installabilityErrors } = await devtools.send('Page.getInstallabilityErrors')
  // The browser installs nothing from a private window, and that is all it finds.
  expect(installabilityErrors.map((one) => one.errorId).filter((id) => id !== 'in-incognito')).toEqual([])
  for (const icon of ['/icon-192.png', '/icon-512.png', '/icon-maskable-512.png']) {
    const size = await device.page.evaluate(async (src) => {
      const image = new Image()
      image.src = src
      await image.decode()
      return `${image.naturalWidth} ${image.naturalHeight}`
    }, icon)
    expect(icon).toContain(size.split(' ')[0])
    expect(size.split(' ')[0]).toBe(size.split(' ')[1])
  }
  await device.end()
  await site.close()
})

describe('plain HTTP, elsewhere than on the machine itself', () => {
  let remote: Browser
  beforeAll(async () => {
    remote = await openBrowser(['--host-resolver-rules=MAP shop.example.test 127.0.0.1'])
  })
  afterAll(() => remote.close())

  test('the masthead says that nothing works without a network, and what to do when it goes', async () => {
    const site = await openSite()
    const far = { ...site, url: site.url.replace('127.0.0.1', 'shop.example.test') }
    const device = await visit(remote, far, { worker: true, size: phone, touch: true })
    const { page, context } = device
    await page.goto('/')
    const said = page.getByRole('banner').getByRole('status')
    await said.getByText('Works only with a network.').waitFor()
    expect(await page.getByText('Works with no network once opened').count()).toBe(0)
    expect(await axeFindings(page)).toEqual([])
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(phone.width)
    await page.waitForLoadState('networkidle')
    await context.setOffline(true)
    await site.stop()
    await said.getByText('No network. Keep this page open.').waitFor()
    // The tab that is open goes on: its parts were brought ahead.
    await page
      .getByRole('link', { name: /Diagnosis/ })
      .first()
      .click()
    await page.waitForURL(/\/diagnosis$/)
    await heading(page, 'Diagnosis is for qualified people')
    await device.end()
    await site.close()
  })
})
