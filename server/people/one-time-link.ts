import { createHash, randomBytes } from 'node:crypto'
import type { Tx } from '../database.ts'
import { endLinks, keepLink } from './people.queries.ts'

const days = 3

/** What is kept of a link's token: whoever reads the database can't use the link. */
export const tokenHash = (token: string): string => createHash('sha256').update(token).digest('hex')

/**
 * Makes a link with which a person sets a password, once. Earlier links of that person end.
 * @param madeBy the admin; null for the command line
 */
export async function makeLink(tx: Tx, personId: string, madeBy: string | null) {
  const token = randomBytes(32).toString('base64url')
  await endLinks(tx, personId)
  const expiresAt = await keepLink(tx, tokenHash(token), personId, madeBy, days)
  return { token, expiresAt: expiresAt.toISOString() }
}
