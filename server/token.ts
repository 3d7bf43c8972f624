import { createHash, randomBytes } from 'node:crypto'

/** What lets in whoever holds it: 256 random bits, fit for an address. */
export const newToken = (): string => randomBytes(32).toString('base64url')

/** What is kept of a token: whoever reads the database can't use the link. */
export const tokenHash = (token: string): string => createHash('sha256').update(token).digest('hex')
