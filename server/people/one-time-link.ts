import type { Tx } from '../database.ts'
import { newToken, tokenHash } from '../token.ts'
import { endLinks, keepLink } from './people.queries.ts'

const days = 3

/**
 * Makes a link with which a person sets a password, once. Earlier links of that person end.
 * @param madeBy the admin; null for the command line
 */
export async function makeLink(tx: Tx, personId: string, madeBy: string | null) {
  const token = newToken()
  await endLinks(tx, personId)
  const expiresAt = await keepLink(tx, tokenHash(token), personId, madeBy, days)
  return { token, expiresAt: expiresAt.toISOString() }
}
