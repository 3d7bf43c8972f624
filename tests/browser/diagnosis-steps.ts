import type { Page } from 'playwright-core'
import { signInAs } from './sign-in-as.ts'

type Begin = { title?: string; source?: RegExp; system?: RegExp; wiring?: RegExp }

/** Signs a tech in, and opens Diagnosis. */
export async function openDiagnosis(page: Page): Promise<void> {
  await signInAs(page, 'tech')
  await page.goto('/diagnosis')
  await page.getByRole('heading', { level: 1, name: 'Diagnosis', exact: true }).waitFor()
  await page.getByRole('button', { name: 'New sheet' }).waitFor()
}

/** Begins a sheet and waits until it is ranked: a hard-wired inverter, 120 V, through a panel, unless told. */
export async function beginSheet(page: Page, options: Begin = {}): Promise<void> {
  const {
    title = 'Cabin',
    source = /Hard-wired/,
    system = /^120 V, two-wire/,
    wiring = /breaker panel/,
  } = options
  await page.getByRole('button', { name: 'New sheet' }).click()
  await page.getByLabel('Title').fill(title)
  for (const name of [source, system, wiring]) await page.getByRole('radio', { name }).click()
  await page.getByRole('button', { name: 'Begin the sheet' }).click()
  await page.getByRole('heading', { name: 'Likely causes' }).waitFor()
}

/** The field of a reading by its label: "hot–neutral", "Source bulb N–G". */
export const field = (page: Page, label: string) =>
  page.getByRole('textbox', { name: new RegExp(`^${label}`) }).first()

/** Types a reading into its field, and leaves it. */
export async function read(page: Page, label: string, value: string): Promise<void> {
  await field(page, label).fill(value)
  await field(page, label).blur()
}

/** The three readings of the place in view. */
export async function readThree(page: Page, hn: string, ng: string, hg: string): Promise<void> {
  await read(page, 'hot–neutral', hn)
  await read(page, 'neutral–ground', ng)
  await read(page, 'hot–ground', hg)
}

/** Answers an observation found by a word of it. */
export async function observe(page: Page, word: string, name: string, value: string): Promise<void> {
  await page.getByRole('button', { name: 'Add', exact: true }).click()
  await page.getByRole('searchbox').fill(word)
  await page.getByRole('list', { name: 'Findings' }).getByRole('button', { name }).click()
  await page
    .getByRole('radiogroup', { name, exact: true })
    .getByRole('radio', { name: value, exact: true })
    .click()
  await page.getByRole('button', { name: 'Done', exact: true }).click()
}

/** The ranking, first first ("Floating neutral61 %"), once it has stood still for a while. */
export async function ranking(page: Page): Promise<string[]> {
  const read = () =>
    page
      .locator('[data-cause]')
      .evaluateAll((heads) => heads.map((head) => (head.textContent ?? '').replace(/\s+/g, ' ')))
  for (let before = await read(); ;) {
    await page.waitForTimeout(300)
    const now = await read()
    if (now.length > 0 && now.join() === before.join()) return now
    before = now
  }
}
