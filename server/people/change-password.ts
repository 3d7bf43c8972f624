import type { Db } from '../database.ts'
import { Problem } from '../problem.ts'
import { hashPassword, isPassword } from './passwords.ts'
import { hashOf, setPassword } from './people.queries.ts'
import type { Throttle } from './throttle.ts'

/**
 * Changes a person's own password, which ends their sessions everywhere.
 * @throws Problem 400 when the current password is wrong; 429 after too many tries
 */
export async function changePassword(
  db: Db,
  throttle: Throttle,
  personId: string,
  { current, password }: { current: string; password: string },
): Promise<void> {
  const giveBack = await throttle.password(personId)
  if (!(await isPassword(current, await hashOf(db, personId))))
    throw new Problem('bad-request', 'Mend what is marked.', { current: 'That is not the current password.' })
  await giveBack()
  const hash = await hashPassword(password)
  await db.transaction().execute((tx) => setPassword(tx, personId, hash))
}
