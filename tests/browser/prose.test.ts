import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { editionBytes } from '../../server/editions/edition-bytes.ts'
import { putInForce } from '../../server/editions/put-in-force.ts'
import { readStarter } from '../../server/editions/read-starter.ts'
import { openBrowser, openSite, settled, visit } from './browser.ts'
import type { Site } from './browser.ts'
import { expectHarmless } from './harmless.ts'
import { hostileMarkdown } from './hostile-markdown.ts'

let site: Site
let browser: Browser
beforeAll(async () => {
  ;[site, browser] = await Promise.all([openSite(), openBrowser()])
  const starter = await readStarter()
  const [first, ...others] = starter.articles.everyone.articles
  const body = hostileMarkdown.map(([tries, markdown]) => `## ${tries}\n\n${markdown}\n\n`).join('\n')
  const hostile = {
    ...first!,
    slug: 'hostile',
    title: 'Hostile <img src=x onerror=harm()>',
    body: `Lead.\n\n${body}`,
  }
  await putInForce(
    site.database.db,
    editionBytes({
      ...starter,
      articles: {
        ...starter.articles,
        everyone: { ...starter.articles.everyone, articles: [hostile, ...others] },
      },
    }),
    { note: 'hostile', reason: 'test' },
  )
})
afterAll(async () => {
  await browser.close()
  await site.close()
})

test('a hostile article does no harm: nothing runs, nothing leaves, nothing covers the page', async () => {
  const { page, complaints, strays, end } = await visit(browser, site)
  await page.goto('/articles/hostile')
  await page.getByRole('heading', { level: 2, name: 'a template' }).waitFor()
  await settled(page)
  const article = page.getByRole('article')
  // Everything a person could touch is touched.
  for (const link of await article.getByRole('link').all()) await link.hover()
  await expectHarmless(article)
  expect(strays).toEqual([])
  expect(complaints).toEqual([])
  expect(await page.getByRole('heading', { level: 1 }).innerText()).toBe('Hostile <img src=x onerror=harm()>')
  await end()
})
