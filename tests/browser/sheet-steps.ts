import type { Browser, Page } from 'playwright-core'
import type { Role } from '../../server/people/roles.contract.ts'
import { visit } from './browser.ts'
import type { Site, Visit } from './browser.ts'
import { answerAllNo } from './check-steps.ts'
import { signInAs } from './sign-in-as.ts'

/** A homeowner who has seen no danger makes a link for their professional. Returns its address. */
export async function makeLink(page: Page): Promise<string> {
  await answerAllNo(page)
  await page.goto('/check/result')
  await page.getByRole('button', { name: 'Make a link for your professional' }).click()
  return page.locator('code').filter({ hasText: '/sheets/' }).innerText()
}

/** Somebody qualified opens a homeowner's link on a device of their own. */
export async function openLink(
  browser: Browser,
  site: Site,
  address: string,
  { role = 'tech', ...options }: { role?: Role } & Parameters<typeof visit>[2] = {},
): Promise<Visit> {
  const there = await visit(browser, site, options)
  await signInAs(there.page, role)
  await there.page.goto(address)
  await there.page.getByText('This sheet came by a link').waitFor()
  return there
}

/** The network comes back, as far as the page can tell. */
export const sayOnline = (page: Page): Promise<void> =>
  page.evaluate(() => void window.dispatchEvent(new Event('online')))

type OnServer = { finding: string; value: unknown; title: string; by: string | null }

/** Every entry the server has, in the order it came. */
export const onServer = (site: Site): Promise<OnServer[]> =>
  site.database.db
    .selectFrom('sheet_entry as e')
    .innerJoin('sheet as s', 's.id', 'e.sheet_id')
    .select(['e.finding', 'e.value', 's.title', 'e.by_name as by'])
    .orderBy('e.seq')
    .execute()
