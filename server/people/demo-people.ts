import type { Db } from '../database.ts'
import demoPeople from './demo-people.json' with { type: 'json' }
import { clearPassword, endLinks, endSessions, keepDemoPerson, listDemoPeople } from './people.queries.ts'
import { Role } from './roles.contract.ts'

/** Makes the demo people, one a role, with the passwords that `npm start` prints. */
export async function seedDemoPeople(db: Db): Promise<void> {
  for (const { email, name, role, hash } of demoPeople)
    await keepDemoPerson(db, { email, name, role: Role.parse(role), password_hash: hash })
}

/** Where others reach the server nobody may come in with a password that everyone knows. */
export function shutOutDemoPeople(db: Db): Promise<void> {
  return db.transaction().execute(async (tx) => {
    for (const id of await listDemoPeople(tx)) {
      await clearPassword(tx, id)
      await endLinks(tx, id)
      await endSessions(tx, id)
    }
  })
}
