import type { Db } from '../database.ts'
import { hashPassword } from './passwords.ts'
import { findLink, setPassword, useUpLink } from './people.queries.ts'

/**
 * Sets a password by a one-time link, which is used up by that.
 * @returns whose it was; undefined when the link does not hold any more
 */
export async function setPasswordByLink(
  db: Db,
  linkHash: string,
  password: string,
): Promise<string | undefined> {
  // Looked at first: hashing is work that nobody may ask for with a made-up link.
  if ((await findLink(db, linkHash)) === undefined) return undefined
  const hash = await hashPassword(password)
  return db.transaction().execute(async (tx) => {
    const link = await useUpLink(tx, linkHash)
    if (link === undefined) return undefined
    await setPassword(tx, link.personId, hash)
    return link.personId
  })
}
