/** The editor itself: its keys, the page's policy, hostile text, and what the device keeps of what was not sent. */
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { axeFindings } from './axe.ts'
import { openBrowser, openSite, settled, visit } from './browser.ts'
import type { Site } from './browser.ts'
import { add, button, keptText, openEditor, preview, saved, text, typeIn } from './editor-steps.ts'
import { expectHarmless } from './harmless.ts'
import { hostileMarkdown } from './hostile-markdown.ts'
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

/** What the page's policy refused. Ask before the page is opened. */
async function watchPolicy(page: Page): Promise<() => Promise<string[]>> {
  await page.addInitScript(() => {
    const refused: string[] = []
    Object.assign(window, { refused })
    document.addEventListener('securitypolicyviolation', (event) =>
      refused.push(`${event.violatedDirective} ${event.blockedURI} ${event.sample}`),
    )
  })
  return () => page.evaluate(() => (window as unknown as { refused: string[] }).refused)
}
const fill = async (page: Page, markdown: string) => {
  await text(page).press('ControlOrMeta+a')
  await page.keyboard.insertText(markdown)
}

test('the editor has a name, wraps, checks spelling, lets Tab leave, and breaks no policy', async () => {
  const { page, complaints, strays, end } = await visit(browser, site)
  const refused = await watchPolicy(page)
  await signInAs(page, 'senior')
  await openEditor(page, 'open-ground')
  expect(await text(page).getAttribute('spellcheck')).toBe('true')
  expect(await text(page).getAttribute('role')).toBe('textbox')
  const focused = () => page.evaluate(() => document.activeElement?.className ?? '')

  await page.getByLabel('Written for').focus()
  await page.keyboard.press('Tab')
  expect(await focused()).toContain('markdown-editor')
  const frame = page.locator('.markdown-editor')
  expect(await frame.evaluate((node) => getComputedStyle(node).outlineStyle)).toBe('solid')
  const before = await preview(page).innerText()
  await page.keyboard.press('Tab')
  expect(
    await page.getByLabel('Link to an article').evaluate((node) => node === document.activeElement),
  ).toBe(true)
  await page.keyboard.press('Shift+Tab')
  expect(await focused()).toContain('markdown-editor')
  await page.keyboard.press('Shift+Tab')
  expect(await page.getByLabel('Written for').evaluate((node) => node === document.activeElement)).toBe(true)
  expect(await preview(page).innerText()).toBe(before)

  // Its own looks came through: an editor without them shows no bold heading and does not wrap.
  const line = text(page).locator('.cm-line').filter({ hasText: '## When it matters' })
  await line.waitFor()
  expect(
    await line
      .locator('span')
      .last()
      .evaluate((node) => getComputedStyle(node).fontWeight),
  ).toBe('800')
  expect(await frame.evaluate((node) => node.scrollWidth <= node.clientWidth)).toBe(true)
  // A list goes on by itself, and what was typed can be taken back.
  await fill(page, '1. One')
  await page.keyboard.press('Enter')
  await page.keyboard.type('Two')
  await preview(page).getByRole('listitem').nth(1).getByText('Two').waitFor()
  await saved(page)
  await text(page).press('ControlOrMeta+z')
  await preview(page).getByText('Two').waitFor({ state: 'detached' })
  expect(await refused()).toEqual([])
  expect(complaints).toEqual([])
  expect(strays).toEqual([])
  await end()
})

describe('hostile Markdown', () => {
  test('does no harm in the preview, nor to readers once it is in force', async () => {
    const { page, strays, end } = await visit(browser, site)
    await signInAs(page, 'senior')
    await openEditor(page, 'aluminum-wire')
    const body = hostileMarkdown.map(([tries, markdown]) => `## ${tries}\n\n${markdown}\n`).join('\n')
    // One link of them leads to a page that is not there, which alone would keep it from being put in force.
    await fill(
      page,
      `Lead.\n\n> **Warning:** Words.\n\n${body}`.replaceAll('/tests/x', '/tests/tester-lamps'),
    )
    await page.getByLabel('Title').fill('Hostile <img src=x onerror=harm()>')
    await preview(page).getByRole('heading', { name: 'a template' }).waitFor()
    for (const link of await preview(page).getByRole('link').all()) await link.hover()
    await expectHarmless(preview(page))
    await saved(page)
    await expectHarmless(page.getByRole('main').locator('.draft-preview'))
    await page.getByLabel('Why it is changed').fill('A test of <script>harm()</script>')
    await button(page, 'Put in force').click()
    await page.getByText(/^Put in force with edition \d+\.$/).waitFor()

    const reader = await visit(browser, site)
    const refused = await watchPolicy(reader.page)
    await reader.page.goto('/articles/aluminum-wire')
    await reader.page.getByRole('heading', { level: 2, name: 'a template' }).waitFor()
    await settled(reader.page)
    await expectHarmless(reader.page.getByRole('article'))
    expect(await reader.page.getByRole('heading', { level: 1 }).innerText()).toBe(
      'Hostile <img src=x onerror=harm()>',
    )
    await reader.page.goto('/editions')
    await reader.page.getByRole('heading', { level: 1 }).waitFor()
    await settled(reader.page)
    await expectHarmless(reader.page.getByRole('main'))
    expect(await refused()).toEqual([])
    expect([...strays, ...reader.strays]).toEqual([])
    await reader.end()
    await end()
  })

  test.each([
    ['huge nesting', `${'> '.repeat(9_000)}deep`, /lie more than 100 deep/],
    ['lists in lists', `${'- '.repeat(9_000)}deep`, /lie more than 100 deep/],
    ['one endless paragraph', '_a*b'.repeat(20_000), /longer than 20,000 characters/],
    ['5 MB', 'Five megabytes of it. '.repeat(240_000), /longer than 200 kB/],
  ])('%s is refused beside the field, and the page goes on', async (_, markdown, says) => {
    const { page, complaints, end } = await visit(browser, site)
    await signInAs(page, 'senior')
    await openEditor(page, 'isolated-output')
    // As from the clipboard: typing five megabytes takes the driver longer than the page.
    await text(page).press('ControlOrMeta+a')
    await text(page).evaluate((node, pasted) => {
      const clipboardData = new DataTransfer()
      clipboardData.setData('text/plain', pasted)
      node.dispatchEvent(new ClipboardEvent('paste', { clipboardData, bubbles: true, cancelable: true }))
    }, markdown)
    await page.locator('.field-error').filter({ hasText: says }).waitFor()
    await preview(page).getByText('This text can’t be drawn.').waitFor()
    await page.getByText('Mend what is marked first.').waitFor()
    await page.getByLabel('Title').fill('Still answers')
    await preview(page).getByText('Still answers').waitFor()
    await fill(page, 'Short again.\n\n> **Caution:** Hot.')
    await preview(page).getByText('Short again.').waitFor()
    await saved(page)
    expect(await keptText(page, 'isolated-output')).toBe('Short again.\n\n> **Caution:** Hot.')
    expect(complaints).toEqual([])
    await end()
  })
})

describe('what was typed and not sent', () => {
  const offer = (page: Page) => page.getByRole('region', { name: 'Text from this device' })

  test('outlives a dead server and a closed tab, and is offered on coming back', async () => {
    const { page, context, end } = await visit(browser, site)
    await signInAs(page, 'senior')
    await openEditor(page, 'backfeed')
    await context.route('**/api/**', (route) => route.abort())
    await typeIn(page, 'Typed in a crawl space.')
    await page.getByText('No network: on this device only. It is sent again.').waitFor()
    await page.close({ runBeforeUnload: false })

    const again = await context.newPage()
    await context.unroute('**/api/**')
    await again.goto('/articles/backfeed/edit')
    await offer(again)
      .getByText(/^Text from this device, not sent yet: /)
      .waitFor()
    await offer(again).locator('ins', { hasText: 'Typed in a crawl space.' }).waitFor()
    expect(await axeFindings(again)).toEqual([])
    await button(again, 'Go on with this text').click()
    await preview(again).getByText('Typed in a crawl space.').waitFor()
    await saved(again)
    expect(await keptText(again, 'backfeed')).toMatch(/Typed in a crawl space\.$/)
    await again.reload()
    await text(again).waitFor()
    expect(await offer(again).count()).toBe(0)
    await end()
  })

  test('outlives a session that was ended, and is offered to its writer alone', async () => {
    const { page, context, end } = await visit(browser, site)
    await signInAs(page, 'senior')
    await openEditor(page, 'long-run')
    await context.clearCookies()
    await typeIn(page, 'Typed when nobody was signed in.')
    await page.getByText(/^Refused, on this device only: /).waitFor()
    await page.getByRole('main').getByRole('link', { name: 'Sign in' }).waitFor()
    await page.reload()
    await page.getByText('Articles are written by senior techs of the shop.').waitFor()

    await signInAs(page, 'admin')
    await page.reload()
    await text(page).waitFor()
    expect(await offer(page).count()).toBe(0)
    await typeIn(page, 'By the admin meanwhile.')
    await page.getByText('Saving').waitFor()
    await saved(page)
    await context.clearCookies()
    await signInAs(page, 'senior')
    await page.reload()
    await offer(page).locator('ins', { hasText: 'nobody' }).waitFor()
    await button(page, 'Go on with this text').click()
    // Begun from what is no longer kept: both texts stand there.
    const both = page.getByRole('alert', { name: 'Two texts' })
    await both.locator('del', { hasText: 'meanwhile' }).waitFor()
    await both.getByRole('button', { name: 'Go on with mine' }).click()
    await saved(page)
    expect(await keptText(page, 'long-run')).toMatch(/Typed when nobody was signed in\.$/)
    const revisions = page.getByRole('region', { name: 'Revisions' })
    await revisions.getByText('Demo admin').waitFor()
    await end()
  })

  test('is not overwritten by a revision that is brought back meanwhile', async () => {
    const { page, end } = await visit(browser, site)
    await signInAs(page, 'senior')
    await openEditor(page, 'open-neutral')
    await typeIn(page, 'First of all.')
    await page.getByText('Saving').waitFor()
    await saved(page)
    await page.getByLabel('Why it is changed').fill('For a revision')
    await button(page, 'Put in force').click()
    const row = page.getByRole('listitem').filter({ hasText: 'came with the program' })
    await row.getByRole('button', { name: /Show the difference/ }).click()
    let letGo = () => {}
    const held = new Promise<void>((resolve) => (letGo = resolve))
    await page.route('**/api/article-drafts/open-neutral', async (route) => {
      if (route.request().method() === 'PUT') await held
      await route.continue()
    })
    await button(page, 'Bring revision 1 back').click()
    await typeIn(page, 'Typed while it was on its way.')
    letGo()
    const both = page.getByRole('alert', { name: 'Two texts' })
    await both.getByText('Another text of yours came in while you were writing.').waitFor()
    await preview(page).getByText('Typed while it was on its way.').waitFor()
    await both.getByRole('button', { name: 'Go on with mine' }).click()
    await saved(page)
    expect(await keptText(page, 'open-neutral')).toMatch(/First of all\.\n\nTyped while it was on its way\.$/)
    await end()
  })

  test('is not overwritten by the other text that one goes on with', async () => {
    const [mine, other] = [await visit(browser, site), await visit(browser, site)]
    const { page } = mine
    await signInAs(page, 'senior')
    await signInAs(other.page, 'admin')
    await openEditor(page, 'balanced-output')
    await openEditor(other.page, 'balanced-output')
    await add(other.page, 'By the admin.')
    await typeIn(page, 'By the senior.')
    const both = page.getByRole('alert', { name: 'Two texts' })
    await both.getByText('Demo admin changed this article while you were writing.').waitFor()
    let letGo = () => {}
    const held = new Promise<void>((resolve) => (letGo = resolve))
    await page.route('**/api/article-drafts/balanced-output', async (route) => {
      if (route.request().method() === 'PUT') await held
      await route.continue()
    })
    await both.getByRole('button', { name: 'Go on with theirs' }).click()
    await typeIn(page, 'Typed meanwhile.')
    letGo()
    await both.getByText('Another text of yours came in while you were writing.').waitFor()
    await both.getByRole('button', { name: 'Go on with mine' }).click()
    await saved(page)
    expect(await keptText(page, 'balanced-output')).toMatch(/By the senior\.\n\nTyped meanwhile\.$/)
    await mine.end()
    await other.end()
  })

  test('is said to lie on the page alone where the device keeps nothing', async () => {
    const { page, end } = await visit(browser, site)
    await page.addInitScript(() => {
      IDBObjectStore.prototype.put = () => {
        throw new DOMException('full', 'QuotaExceededError')
      }
    })
    await signInAs(page, 'senior')
    await openEditor(page, 'isolated-output')
    await page.route('**/api/**', (route) => route.abort())
    await typeIn(page, 'Typed on a full device.')
    await page.getByText('No network: only on this page (keep it open). It is sent again.').waitFor()
    await page.unroute('**/api/**')
    await saved(page)
    expect(await keptText(page, 'isolated-output')).toMatch(/Typed on a full device\.$/)
    await end()
  })
})
