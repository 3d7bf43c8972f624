import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
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

const searchbox = (page: Page) => page.getByRole('searchbox')
const heading = (page: Page, name: string | RegExp) => page.getByRole('heading', { level: 1, name }).waitFor()

describe('search', () => {
  test('reads slips, says so, and marks what it found', async () => {
    const { page, complaints, end } = await visit(browser, site)
    await page.goto('/articles')
    await searchbox(page).fill('flotaing nuetral')
    await page.getByText('Read as floating neutral').waitFor()
    expect(await page.locator('mark', { hasText: /^floating$/i }).count()).toBeGreaterThan(0)
    expect(await page.locator('a[href^="/articles/floating-neutral"]').count()).toBe(1)
    await page.waitForURL('**/articles?q=flotaing+nuetral')
    expect(complaints).toEqual([])
    await end()
  })

  test('by keyboard: Enter opens the first, arrows move, and the list stays beside what was opened', async () => {
    const { page, end } = await visit(browser, site)
    await page.goto('/articles')
    await searchbox(page).focus()
    await page.keyboard.type('60 volts on ground')
    const hits = page.locator('a.hit')
    await hits.first().waitFor()
    await page.keyboard.press('Enter')
    await heading(page, /^60 volts from ground/)
    expect(await searchbox(page).inputValue()).toBe('60 volts on ground')
    expect(await page.locator('a.hit[aria-current="page"]').getAttribute('href')).toContain(
      'floating-neutral',
    )

    await searchbox(page).focus()
    await page.keyboard.press('ArrowDown')
    await page.keyboard.press('ArrowDown')
    const second = await hits.nth(1).getAttribute('href')
    expect(await page.evaluate(() => document.activeElement?.getAttribute('href'))).toBe(second)
    await page.keyboard.press('ArrowUp')
    await page.keyboard.press('ArrowUp')
    expect(await searchbox(page).evaluate((box) => box === document.activeElement)).toBe(true)
    await page.keyboard.press('ArrowDown')
    await page.keyboard.press('ArrowDown')
    await page.keyboard.press('Enter')
    await page.waitForURL(`**${second}`)
    await end()
  })

  test('what finds nothing says so and leads on; a link brings a search', async () => {
    const { page, end } = await visit(browser, site)
    await page.goto('/articles?q=zzzzqqqq')
    await page.getByText('Nothing found for “zzzzqqqq”.').waitFor()
    await page.getByRole('main').getByRole('link', { name: 'all articles' }).click()
    await page.getByRole('heading', { level: 2, name: 'Causes' }).waitFor()
    expect(await searchbox(page).inputValue()).toBe('')
    await end()
  })
})

describe('links', () => {
  test('lead from an article to its cause and a test, and back', async () => {
    const { page, end } = await visit(browser, site)
    await page.goto('/articles/open-ground')
    await page.locator('.used-in a[href="/causes/open-ground"]').click()
    await heading(page, 'Ground wire open to this receptacle')
    await page.locator('.used-in a[href="/articles/open-ground"]').click()
    await page.locator('.used-in a[href="/tests/receptacle-volts"]').click()
    await heading(page, 'Three readings at one receptacle')
    await page.locator('.knowledge-side summary').click()
    await page.locator('.used-in a[href="/articles/open-ground"]').click()
    await page.waitForURL('**/articles/open-ground')
    await page.goto('/tests/receptacle-volts')
    await page.locator('.outcome a[href="/causes/open-ground"]').first().click()
    await heading(page, 'Ground wire open to this receptacle')
    await end()
  })

  test('in every article’s text lead to something that is there', async () => {
    const { page, end } = await visit(browser, site)
    await page.goto('/articles')
    await page.getByRole('heading', { level: 2, name: 'Tests' }).waitFor()
    await signInAs(page, 'tech')
    await page.reload()
    const hrefs = (selector: string) =>
      page.locator(selector).evaluateAll((all) => all.map((one) => one.getAttribute('href')!))
    await page.getByRole('heading', { level: 2, name: 'Tests' }).waitFor()
    const known = new Set(await hrefs('.shelf a'))
    const articles = [...known].filter((href) => href.startsWith('/articles/'))
    expect(articles.length).toBeGreaterThan(30)
    for (const article of articles) {
      await page.locator(`a[href="${article}"]`).first().click()
      await page.locator('.prose h2').first().waitFor()
      for (const href of await hrefs('.prose a[href^="/"]'))
        expect([article, href, known.has(href)]).toEqual([article, href, true])
      await page.getByRole('link', { name: 'All articles' }).click()
      await page.locator('.shelf').first().waitFor()
    }
    await end()
  })

  test('to what is not there say so', async () => {
    const { page, end } = await visit(browser, site)
    for (const path of ['/articles/none', '/causes/none', '/tests/none']) {
      await page.goto(path)
      await heading(page, /^No (article|cause|test) of that name$/)
    }
    await end()
  })
})

describe('for qualified people only', () => {
  test('is not even named until a tech is signed in', async () => {
    const { page, end } = await visit(browser, site)
    await page.goto('/articles/double-bond')
    await heading(page, 'No article of that name')
    await page.getByText('An article for qualified people opens once you have signed in.').waitFor()
    expect(await page.locator('.prose').count()).toBe(0)
    await page.goto('/articles')
    await page.getByRole('heading', { level: 2, name: 'Tests' }).waitFor()
    expect(await page.locator('a[href^="/articles/double-bond"]').count()).toBe(0)
    await page.goto('/tests/panel-volts')
    await heading(page, 'Three readings at the panel’s buses')
    expect(await page.getByRole('heading', { name: 'Steps' }).count()).toBe(0)
    await page.goto('/causes/floating-neutral')
    await heading(page, /^Neutral floating/)
    expect(await page.getByRole('heading', { name: 'Proving the repair' }).count()).toBe(0)

    await signInAs(page, 'tech')
    await page.goto('/articles/double-bond')
    await page.locator('.prose h2').first().waitFor()
    await page.goto('/tests/panel-volts')
    await page.getByRole('heading', { name: 'Steps' }).waitFor()
    await page.goto('/causes/floating-neutral')
    await page.getByRole('heading', { name: 'Proving the repair' }).waitFor()
    await end()
  })

  test('and the steps of a repair that installs a bond are shown to nobody here', async () => {
    const { page, end } = await visit(browser, site)
    await page.goto('/articles')
    await page.getByRole('heading', { level: 2, name: 'Tests' }).waitFor()
    await signInAs(page, 'tech')
    await page.goto('/causes/floating-neutral')
    await page.getByText('Installing a bond: held back').first().waitFor()
    const shown = await page.getByRole('main').innerText()
    const steps = await page.evaluate(async () => {
      const edition = (await (await fetch('/api/edition')).json()) as {
        files: { name: string; hash: string }[]
      }
      const hash = edition.files.find((file) => file.name === 'procedures-qualified')!.hash
      const file = (await (await fetch(`/api/edition-files/${hash}`)).json()) as {
        causes: { cause: string; remedies: { installsBond?: boolean; steps: string[] }[] }[]
      }
      const remedies = file.causes
        .filter((one) => one.cause === 'floating-neutral')
        .flatMap((one) => one.remedies)
      const told = remedies.filter((one) => one.installsBond !== true).flatMap((one) => one.steps)
      return remedies
        .filter((one) => one.installsBond === true)
        .flatMap((one) => one.steps)
        .filter((s) => !told.includes(s))
    })
    expect(steps.length).toBeGreaterThan(0)
    for (const step of steps) expect(shown).not.toContain(step)
    await end()
  })
})

test('with the server gone everything that was brought still opens, by link and by search', async () => {
  const alone = await openSite()
  const { page, complaints, end } = await visit(browser, alone)
  await page.goto('/articles')
  await page.getByRole('heading', { level: 2, name: 'Tests' }).waitFor()
  await settled(page)
  await page.waitForTimeout(500)
  await alone.stop()
  complaints.length = 0
  await searchbox(page).fill('lights bright and dim')
  await page.locator('a.hit').first().click()
  await heading(page, /^Some lights bright/)
  await page.locator('.used-in a[href^="/causes/"]').first().click()
  await heading(page, /Neutral of a split-phase/)
  await searchbox(page).fill('tester lamps')
  await page.locator('a.hit[href^="/tests/tester-lamps"]').click()
  await heading(page, 'Three lamps of a plug-in tester')
  expect(await page.getByRole('alert').count()).toBe(0)
  await end()
  await alone.close()
})

describe('axe finds nothing and nothing stands over the edge', () => {
  test.each([
    ['phone', 'dark', phone],
    ['desk', 'light', desk],
  ] as const)('on a %s, %s', async (_, theme, size) => {
    const { page, complaints, strays, end } = await visit(browser, site, {
      theme,
      size,
      touch: size === phone,
    })
    const look = async (paths: readonly string[]) => {
      for (const path of paths) {
        await page.goto(path)
        await settled(page)
        expect([path, await axeFindings(page)]).toEqual([path, []])
        const wide = await page.evaluate(() => document.documentElement.scrollWidth)
        expect([path, wide <= size.width]).toEqual([path, true])
      }
    }
    await look([
      '/articles',
      '/articles?q=breaker',
      '/articles/floating-neutral?q=60+volts',
      '/articles/double-bond',
      '/causes/balanced-output',
      '/tests/receptacle-volts',
      '/editions',
    ])
    await signInAs(page, 'tech')
    await look(['/articles', '/articles/double-bond', '/causes/floating-neutral', '/tests/source-bulb'])
    expect(complaints).toEqual([])
    expect(strays).toEqual([])
    await end()
  })
})
