import { privateSecret } from './session-secret.mjs'

const loopback = /^(127(\.\d{1,3}){3}|localhost|::1)$/i

/** Where the pages are served. */
export const host = process.env.HOST || '127.0.0.1'
export const port = Number(process.env.PORT || 3000)

/**
 * Whether all of it is for this machine alone: the private database, an address on loopback, no proxy before it. Only
 * there are there demo people, and a secret that nobody had to set.
 */
export const isPrivate =
  !process.env.DATABASE_URL && loopback.test(host) && Number(process.env.TRUST_PROXY || 0) === 0

/** What the server needs besides its database's URL. */
export const sessionEnv = () => ({
  DEMO: isPrivate ? 'yes' : 'no',
  ...(isPrivate && !process.env.SESSION_SECRET && { SESSION_SECRET: privateSecret() }),
})

/** As `sessionEnv`, for looking at the variables before anything is written. */
export const sessionEnvToCheck = () => ({
  DEMO: 'no',
  ...(isPrivate && !process.env.SESSION_SECRET && { SESSION_SECRET: '.'.repeat(32) }),
})
