/** What tests of writing articles do over and over. */
import type { Page } from 'playwright-core'

export const heading = (page: Page, name: string | RegExp) =>
  page.getByRole('heading', { level: 1, name }).waitFor()
export const text = (page: Page) => page.getByRole('textbox', { name: 'Text, in Markdown' })
export const button = (page: Page, name: string | RegExp) => page.getByRole('button', { name })
export const preview = (page: Page) => page.getByRole('region', { name: 'As readers will see it' })
export const saved = (page: Page) => page.getByText('Draft saved').waitFor()

export async function openEditor(page: Page, slug: string) {
  await page.goto(`/articles/${slug}/edit`)
  await heading(page, 'Change an article')
  await text(page).waitFor()
}
/** Types a paragraph at the end of the text. */
export async function typeIn(page: Page, line: string) {
  await text(page).press('Control+End')
  await page.keyboard.insertText(`\n\n${line}`)
}
export async function add(page: Page, line: string) {
  await typeIn(page, line)
  await page.getByText('Saving').waitFor()
  await saved(page)
}
/** The text as the server keeps it. The editor draws only what is in sight. */
export async function keptText(page: Page, slug: string): Promise<string> {
  const answer = await page.request.get(`/api/article-drafts/${slug}`)
  return ((await answer.json()) as { text: { body: string } }).text.body
}
