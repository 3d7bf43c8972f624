import type { Page } from 'playwright-core'
import type { Role } from '../../server/people/roles.contract.ts'
import { demoPerson } from '../server/asker.ts'

/** Signs a demo person in through the API; pages opened from now on know who is here. */
export async function signInAs(page: Page, role: Role): Promise<void> {
  const answer = await page.context().request.post('/api/sign-in', {
    data: demoPerson(role),
    headers: { 'sec-fetch-site': 'same-origin' },
  })
  if (answer.status() !== 200) throw new Error(`${role} was not let in: ${await answer.text()}`)
}
