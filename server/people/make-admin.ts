import type { Db } from '../database.ts'
import { makeLink } from './one-time-link.ts'
import type { NewPerson } from './people.contract.ts'
import { addPerson, changePerson, endSessions, findByEmail } from './people.queries.ts'

/**
 * Makes an admin from outside the pages: the first one, or the way back when the last one lost the password. Whoever
 * has an account with this e-mail address becomes an admin; their sessions end.
 */
export function makeAdmin(db: Db, { email, name }: Pick<NewPerson, 'email' | 'name'>) {
  return db.transaction().execute(async (tx) => {
    const made = await addPerson(tx, { email, name, role: 'admin', password_hash: null, made_by: null })
    const id = made ?? (await findByEmail(tx, email))?.id
    if (id === undefined) throw new Error('The account with this e-mail address was closed by an admin.')
    if (made === undefined) {
      await changePerson(tx, id, { role: 'admin' })
      await endSessions(tx, id)
    }
    return makeLink(tx, id, null)
  })
}
