import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import type { Role } from '../../server/people/roles.contract.ts'
import { demoPerson } from '../server/asker.ts'
import { axeFindings } from './axe.ts'
import { desk, openBrowser, openSite, phone, settled, visit } from './browser.ts'
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

const heading = (page: Page, name: string | RegExp) => page.getByRole('heading', { level: 1, name }).waitFor()
const button = (page: Page, name: string | RegExp) => page.getByRole('main').getByRole('button', { name })
const field = (page: Page, name: string) => page.getByRole('main').getByLabel(name, { exact: true })
const nav = (page: Page) => page.getByRole('navigation', { name: 'Main' }).getByRole('link').allInnerTexts()

async function typeSignIn(page: Page, { email, password }: { email: string; password: string }) {
  await field(page, 'E-mail address').fill(email)
  await field(page, 'Password').fill(password)
  await button(page, 'Sign in').click()
}

/** What lies on the device, once a page has stood: who is known, and how many files for whom. */
const onDevice = (page: Page) =>
  page.evaluate(
    () =>
      new Promise<{ person: string | undefined; qualified: number; everyone: number }>((resolve, reject) => {
        const asked = indexedDB.open('tracelamp')
        asked.onerror = () => reject(asked.error)
        asked.onsuccess = () => {
          const tx = asked.result.transaction(['settings', 'files'])
          const person = tx.objectStore('settings').get('person') as IDBRequest<
            { value: { email: string } } | undefined
          >
          const files = tx.objectStore('files').getAll() as IDBRequest<{ audience: string }[]>
          tx.oncomplete = () => {
            asked.result.close()
            resolve({
              person: person.result?.value.email,
              qualified: files.result.filter((file) => file.audience === 'qualified').length,
              everyone: files.result.filter((file) => file.audience === 'everyone').length,
            })
          }
        }
      }),
  )

describe('signing in', () => {
  test('leads back to where one came from, and out again; the masthead follows', async () => {
    const { page, complaints, end } = await visit(browser, site)
    await page.goto('/diagnosis')
    await heading(page, 'Diagnosis is for qualified people')
    expect(await nav(page)).toEqual(['Check my power', 'Articles'])
    await page.getByRole('main').getByRole('link', { name: 'Sign in' }).click()
    await heading(page, 'Sign in')
    await typeSignIn(page, demoPerson('tech'))
    await page.waitForURL('**/diagnosis')
    await page.getByRole('heading', { name: 'Findings sheets on this device' }).waitFor()
    expect(await nav(page)).toEqual(['Diagnosis', 'Articles', 'Worksheets', 'Editions'])
    await page.getByRole('link', { name: 'Account: Demo tech' }).click()
    await heading(page, 'Account')
    await page.getByText('Signed in as tech.').waitFor()
    await button(page, 'Sign out on this device').click()
    await page.getByRole('banner').getByRole('link', { name: 'Sign in' }).waitFor()
    await page.goto('/diagnosis')
    await heading(page, 'Diagnosis is for qualified people')
    expect(complaints).toEqual([])
    await end()
  })

  test('never leads to another site', async () => {
    const { page, end } = await visit(browser, site)
    for (const next of [
      'https://elsewhere.example.test/',
      '//elsewhere.example.test',
      '/\\elsewhere.example.test',
      'javascript:alert(1)',
    ]) {
      await page.goto(`/sign-in?next=${encodeURIComponent(next)}`)
      await typeSignIn(page, demoPerson('helper'))
      await page.getByRole('link', { name: 'Account: Demo homeowner' }).waitFor()
      expect([next, new URL(page.url()).origin]).toEqual([next, site.url])
      await page.context().clearCookies({ name: 'tracelamp' })
    }
    await end()
  })

  test('names what is wrong, keeps what was typed, and says when it is too often', async () => {
    const { page, end } = await visit(browser, site)
    await page.goto('/sign-in')
    await typeSignIn(page, { email: 'nobody', password: '' })
    await page.getByText('Type an e-mail address, for example name@example.test.').waitFor()
    await page.getByText('Type the password.').waitFor()
    expect(await field(page, 'E-mail address').getAttribute('aria-invalid')).toBe('true')
    await typeSignIn(page, { email: 'nobody@example.test', password: 'a wrong one' })
    await page.getByRole('alert').getByText('The e-mail address or the password is wrong.').waitFor()
    expect(await field(page, 'E-mail address').inputValue()).toBe('nobody@example.test')
    await page.route('**/api/sign-in', (route) => route.abort())
    await button(page, 'Sign in').click()
    await page.getByRole('alert').getByText('No network.').waitFor()
    await page.unroute('**/api/sign-in')
    for (let n = 0; n < 10; n++) {
      await button(page, 'Sign in').click()
      await page.getByRole('alert').waitFor()
    }
    await page.getByRole('alert').getByText('Too many tries. Wait, then try again.').waitFor()
    await end()
  })

  test('as a homeowner keeps Diagnosis closed and says why', async () => {
    const { page, end } = await visit(browser, site)
    await page.goto('/sign-up?next=/diagnosis')
    await field(page, 'Name').fill('Wren')
    await field(page, 'E-mail address').fill('wren@example.test')
    await field(page, 'Password').fill('short')
    await button(page, 'Make my account').click()
    await page.getByText('A password has 10 characters or more.').waitFor()
    await field(page, 'Password').fill('porch light is out')
    await button(page, 'Make my account').click()
    await page.waitForURL('**/diagnosis')
    await page.getByText('You are signed in as Wren, with a homeowner’s account.').waitFor()
    expect(await nav(page)).toEqual(['Check my power', 'Articles'])
    expect((await onDevice(page)).qualified).toBe(0)
    await end()
  })
})

describe('what is for qualified people', () => {
  test('comes with a tech, works with no network, and leaves the device at sign-out', async () => {
    const { page, end } = await visit(browser, site)
    await signInAs(page, 'tech')
    await page.goto('/articles/double-bond')
    await page.locator('.prose h2').first().waitFor()
    await expect
      .poll(() => onDevice(page))
      .toEqual({ person: demoPerson('tech').email, qualified: 2, everyone: 3 })

    await page.route('**/api/**', (route) => route.abort())
    await page.reload()
    await page.locator('.prose h2').first().waitFor()
    await page.goto('/diagnosis')
    await page.getByRole('heading', { name: 'Findings sheets on this device' }).waitFor()
    await page.goto('/account')
    await button(page, 'Sign out on this device').click()
    await page.getByRole('alert').getByText('No network.').waitFor()
    await page.unroute('**/api/**')

    await button(page, 'Sign out on this device').click()
    await page.getByRole('banner').getByRole('link', { name: 'Sign in' }).waitFor()
    expect(await onDevice(page)).toMatchObject({ person: undefined, qualified: 0, everyone: 3 })
    expect(await page.evaluate(() => caches.keys())).toEqual([])
    // Back leads to where the article stood; it must not stand there any more.
    await page.goBack()
    await heading(page, 'Account')
    await page.getByText('Nobody is signed in on this device.').waitFor()
    await page.route('**/api/**', (route) => route.abort())
    await page.goto('/articles/double-bond')
    await heading(page, 'No article of that name')
    await end()
  })

  test('leaves the other tab and the other device as well, when signed out everywhere', async () => {
    const one = await visit(browser, site)
    const two = await visit(browser, site)
    await signInAs(one.page, 'senior')
    await signInAs(two.page, 'senior')
    const tab = await one.context.newPage()
    for (const page of [one.page, two.page, tab]) {
      await page.goto('/articles/double-bond')
      await page.locator('.prose h2').first().waitFor()
    }
    await expect.poll(async () => (await onDevice(two.page)).qualified).toBe(2)
    await one.page.goto('/account')
    await button(one.page, 'Sign out everywhere').click()
    await one.page.getByRole('banner').getByRole('link', { name: 'Sign in' }).waitFor()
    await heading(tab, 'No article of that name')
    await two.page.reload()
    await heading(two.page, 'No article of that name')
    await expect.poll(() => onDevice(two.page)).toMatchObject({ person: undefined, qualified: 0 })
    await one.end()
    await two.end()
  })

  test('stays where the session only ran out, and the masthead leads back in', async () => {
    const { page, end } = await visit(browser, site)
    await signInAs(page, 'tech')
    await page.goto('/articles/double-bond')
    await page.locator('.prose h2').first().waitFor()
    await expect.poll(async () => (await onDevice(page)).qualified).toBe(2)
    await page.context().clearCookies({ name: 'tracelamp' })
    await page.evaluate(
      () =>
        new Promise<void>((resolve) => {
          const asked = indexedDB.open('tracelamp')
          asked.onsuccess = () => {
            const store = asked.result.transaction('settings', 'readwrite').objectStore('settings')
            const read = store.get('person') as IDBRequest<{ key: string; value: object }>
            read.onsuccess = () => {
              const seenAt = new Date(Date.now() - 31 * 86_400_000).toISOString()
              const put = store.put({ key: 'person', value: { ...read.result.value, seenAt } })
              put.onsuccess = () => {
                asked.result.close()
                resolve()
              }
            }
          }
        }),
    )
    await page.goto('/diagnosis')
    await page.getByRole('banner').getByRole('link', { name: 'Sign in again' }).waitFor()
    await page.getByRole('heading', { name: 'Findings sheets on this device' }).waitFor()
    expect((await onDevice(page)).qualified).toBe(2)
    await page.getByRole('banner').getByRole('link', { name: 'Sign in again' }).click()
    await page.getByText('Your session has ended with time, Demo tech.').waitFor()
    await typeSignIn(page, demoPerson('tech'))
    await page.getByRole('link', { name: 'Account: Demo tech' }).waitFor()
    await end()
  })
})

describe('an admin', () => {
  test('adds a tech, who sets a password by the link; then changes the role, and closes the account', async () => {
    const admin = await visit(browser, site)
    const tech = await visit(browser, site, { size: phone, touch: true })
    await signInAs(admin.page, 'admin')
    await admin.page.goto('/articles')
    await admin.page.getByRole('link', { name: 'Our shop' }).click()
    await heading(admin.page, 'People')
    await field(admin.page, 'Name').fill('Ash')
    await field(admin.page, 'E-mail address').fill('tech@example.test')
    await button(admin.page, 'Add and make a link').click()
    await admin.page.getByText('This e-mail address has an account.').waitFor()
    await field(admin.page, 'E-mail address').fill('ash@example.test')
    await button(admin.page, 'Add and make a link').click()
    const link = await admin.page.locator('.one-time-link').innerText()
    expect(link).toMatch(new RegExp(`^${site.url}/set-password#[\\w-]{43}$`))

    const asked: string[] = []
    tech.page.on('request', (request) => asked.push(request.url()))
    await tech.page.goto(link)
    await tech.page.getByText('For Ash, ash@example.test.').waitFor()
    await field(tech.page, 'Password').fill('meter, clamp and bulb')
    await button(tech.page, 'Set it and sign in').click()
    await tech.page.getByRole('heading', { name: 'Findings sheets on this device' }).waitFor()
    await tech.page.goto(link)
    await tech.page.reload()
    await tech.page.getByText('This link does not hold any more').waitFor()

    const { page } = admin
    await page.reload()
    await page.getByRole('button', { name: 'Change Ash' }).click()
    const row = page.locator('.people-list > li', { hasText: 'ash@example.test' })
    await row.getByLabel('Role').selectOption({ label: 'senior tech' })
    await row.getByRole('button', { name: 'Change the role' }).click()
    await row.getByText('senior tech', { exact: true }).first().waitFor()
    await tech.page.goto('/account')
    await tech.page.getByText('Nobody is signed in on this device.').waitFor()
    await row.getByRole('button', { name: 'Close the account' }).click()
    await row.getByText('account closed').waitFor()
    const own = page.locator('.people-list > li', { hasText: demoPerson('admin').email })
    expect(await own.getByRole('button').count()).toBe(0)
    await admin.end()
    await tech.end()
  })

  test('is who the page is for: others are told so', async () => {
    const { page, end } = await visit(browser, site)
    await signInAs(page, 'senior')
    await page.goto('/shop/people')
    await page.getByText('This page is for admins of the shop.').waitFor()
    expect(await page.getByRole('link', { name: 'Our shop' }).count()).toBe(0)
    await end()
  })
})

test('a changed password signs the other device out and this one not', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto('/sign-up')
  await field(page, 'Name').fill('Lark')
  await field(page, 'E-mail address').fill('lark@example.test')
  await field(page, 'Password').fill('porch light is out')
  await button(page, 'Make my account').click()
  await page.getByRole('link', { name: 'Account: Lark' }).click()
  await field(page, 'Current password').fill('not that one')
  await field(page, 'New password').fill('three wires, one bond')
  await button(page, 'Change the password').click()
  await page.getByText('That is not the current password.').waitFor()
  await field(page, 'Current password').fill('porch light is out')
  await button(page, 'Change the password').click()
  await page.getByText('Password changed. Other devices are signed out.').waitFor()
  await page.reload()
  await page.getByRole('link', { name: 'Account: Lark' }).waitFor()
  await end()
})

describe('axe finds nothing, the console is clean and nothing stands over the edge', () => {
  const pages: [string, Role | undefined, string | RegExp][] = [
    ['/sign-in', undefined, 'Sign in'],
    ['/sign-up', undefined, 'Make an account'],
    ['/set-password', undefined, 'Set your password'],
    ['/set-password#made-up', undefined, 'Set your password'],
    ['/account', undefined, 'Account'],
    ['/diagnosis', undefined, 'Diagnosis is for qualified people'],
    ['/account', 'tech', 'Account'],
    ['/diagnosis', 'tech', 'Diagnosis'],
    ['/shop/people', 'admin', 'People'],
  ]
  test.each([
    ['phone', 'light', phone],
    ['phone', 'dark', phone],
    ['desk', 'light', desk],
    ['desk', 'dark', desk],
  ] as const)('on a %s, %s', async (_, theme, size) => {
    const { page, complaints, strays, end } = await visit(browser, site, {
      theme,
      size,
      touch: size === phone,
    })
    let signedInAs: Role | undefined
    for (const [path, role, title] of pages) {
      if (role !== undefined && role !== signedInAs) await signInAs(page, role)
      signedInAs = role
      await page.goto('about:blank')
      await page.goto(path)
      await heading(page, title)
      await settled(page)
      if (path === '/sign-in') {
        await button(page, 'Sign in').click()
        await page.getByRole('alert').waitFor()
      }
      if (path === '/shop/people') {
        await page.getByRole('button', { name: 'Change Demo tech' }).click()
        await button(page, 'Make a one-time link').click()
        await page.locator('.one-time-link').waitFor()
      }
      expect([path, await axeFindings(page)]).toEqual([path, []])
      const wide = await page.evaluate(() => document.documentElement.scrollWidth)
      expect([path, wide <= size.width]).toEqual([path, true])
      for (const target of await page
        .locator('main a:visible, main button:visible, main input:visible')
        .all()) {
        const box = await target.boundingBox()
        const inText = await target.evaluate(
          (one) => one.tagName === 'A' && getComputedStyle(one).display === 'inline',
        )
        const name = await target.evaluate((one) => one.outerHTML.slice(0, 80))
        if (box !== null && !inText) expect({ name, high: box.height >= 44 }).toEqual({ name, high: true })
      }
    }
    // A refused form and a link that does not hold are answers, which the browser writes to the console.
    expect(complaints.filter((words) => !/status of 40[04]/.test(words))).toEqual([])
    expect(strays).toEqual([])
    await end()
  })
})
