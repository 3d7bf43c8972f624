import type { Locator } from 'playwright-core'
import { expect } from 'vitest'

/** Nothing of `hostile-markdown.ts` ran, and nothing of it stands in this part of the page. */
export async function expectHarmless(part: Locator): Promise<void> {
  const found = await part.evaluate((node) => ({
    harmed: 'harmed' in window,
    tags: [
      ...node.querySelectorAll(
        'script, img, svg:not([focusable]), math, style, iframe, form, input, base, template, noscript',
      ),
    ].map((one) => one.outerHTML),
    handlers: [...node.querySelectorAll('*')].flatMap((one) =>
      [...one.attributes].filter((a) => a.name.startsWith('on') || a.name === 'srcdoc').map((a) => a.name),
    ),
    links: [...node.querySelectorAll('a')].map((one) => one.protocol),
  }))
  expect(found.harmed).toBe(false)
  expect(found.tags).toEqual([])
  expect(found.handlers).toEqual([])
  for (const protocol of found.links) expect(['http:', 'https:', 'mailto:']).toContain(protocol)
}
