import type { Db } from '../database.ts'
import { Problem } from '../problem.ts'
import { changePerson, endLinks, endSessions, findRow, lockAdmins } from './people.queries.ts'
import type { PersonColumns } from './people.queries.ts'
import type { Role } from './roles.contract.ts'

/**
 * Changes someone's role, or whether they are still with the shop. Their sessions end everywhere, and with "left"
 * their links too. Nobody changes their own, so that there is always an admin.
 * @throws Problem 403 for one's own account, and for who has stopped being an admin meanwhile
 */
export function alterPerson(
  db: Db,
  adminId: string,
  id: string,
  change: { role?: Role | undefined; left?: boolean | undefined },
): Promise<PersonColumns | undefined> {
  if (id === adminId) throw new Problem('forbidden', 'Another admin must change your account.')
  return db.transaction().execute(async (tx) => {
    const admins = await lockAdmins(tx)
    if (!admins.has(adminId)) throw new Problem('forbidden')
    const before = await findRow(tx, id)
    if (before === undefined) return undefined
    await changePerson(tx, id, change)
    await endSessions(tx, id)
    if (change.left === true) await endLinks(tx, id)
    return findRow(tx, id)
  })
}
