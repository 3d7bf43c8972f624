import { createHmac, randomBytes, timingSafeEqual } from 'node:crypto'
import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible'
import { poolOf } from '../database.ts'
import type { Db } from '../database.ts'
import { Problem } from '../problem.ts'
import { networkOf } from './network-of.ts'
import { forgetTries } from './people.queries.ts'

const minute = 60
const hour = 60 * minute

/**
 * How many tries that fail are let through, and in how long. Whoever guesses at an account from everywhere uses up the
 * account's tries, but never those of a device its owner has signed in with: that one has tries of its own.
 */
const limits = {
  address: { points: 30, duration: 15 * minute },
  account: { points: 10, duration: hour },
  device: { points: 10, duration: hour },
  password: { points: 10, duration: hour },
  signUp: { points: 20, duration: hour },
  feedback: { points: 20, duration: hour },
  // Findings sheets begun without an account: a household, or a campground behind one address.
  sheet: { points: 60, duration: hour },
  sheetLink: { points: 60, duration: hour },
} as const
type Kind = keyof typeof limits

export type Throttle = ReturnType<typeof openThrottle>
/** What a sign-in took of each kind; given back when it turns out right. */
type Taken = readonly (readonly [Kind, string])[]

/** Counts tries in PostgreSQL, for all server processes together. Keys are hashed with the server's secret. */
export function openThrottle(db: Db, secret: string) {
  const sign = (text: string) => createHmac('sha256', secret).update(text).digest('hex')
  const limiter = (kind: Kind) =>
    new RateLimiterPostgres({
      ...limits[kind],
      storeClient: poolOf(db),
      storeType: 'pool',
      tableName: 'sign_in_try',
      keyPrefix: kind,
      tableCreated: true,
      clearExpiredByTimeout: false,
    })
  const limiters = Object.fromEntries(
    (Object.keys(limits) as Kind[]).map((kind) => [kind, limiter(kind)]),
  ) as Record<Kind, RateLimiterPostgres>

  /** @throws Problem 429 when too many tries failed */
  const take = async (taken: Taken): Promise<void> => {
    for (const [kind, key] of taken)
      await limiters[kind].consume(sign(key)).catch((refused: unknown) => {
        if (!(refused instanceof RateLimiterRes)) throw refused
        const seconds = Math.max(1, Math.ceil(refused.msBeforeNext / 1000))
        throw new Problem('too-many', undefined, undefined, seconds)
      })
  }

  const markOf = (account: string, nonce: string) => sign(`device ${account} ${nonce}`)
  /** Whether this device holds the mark of an earlier sign-in of this account. Returns what names the device. */
  const deviceOf = (account: string, mark: string | undefined): string | undefined => {
    const [nonce, signature] = /^([0-9a-f]{32})\.([0-9a-f]{64})$/.exec(mark ?? '')?.slice(1) ?? []
    if (nonce === undefined || signature === undefined) return undefined
    return timingSafeEqual(Buffer.from(signature), Buffer.from(markOf(account, nonce))) ? nonce : undefined
  }

  return {
    /**
     * Counts a sign-in before its password is looked at, so that many at once count as well.
     * @param mark what `markDevice` once gave to this device
     * @returns gives the tries back once the password was right
     */
    async signIn(email: string, address: string | undefined, mark: string | undefined) {
      const account = email.toLowerCase()
      const device = deviceOf(account, mark)
      const taken: Taken =
        device !== undefined
          ? [['device', `${account} ${device}`]]
          : [
              ['address', networkOf(address)],
              ['account', account],
            ]
      await take(taken)
      return async () => {
        for (const [kind, key] of taken) await limiters[kind].reward(sign(key), 1)
        await forgetTries(db)
      }
    },
    /** What a device keeps to be known again as one its owner has used. */
    markDevice(email: string): string {
      const nonce = randomBytes(16).toString('hex')
      return `${nonce}.${markOf(email.toLowerCase(), nonce)}`
    },
    /** Counts a look at a signed-in person's password. Returns what gives the try back. */
    async password(personId: string) {
      await take([['password', personId]])
      return async () => void (await limiters.password.reward(sign(personId), 1))
    },
    signUp: (address: string | undefined) => take([['signUp', networkOf(address)]]),
    feedback: (address: string | undefined) => take([['feedback', networkOf(address)]]),
    sheet: (address: string | undefined) => take([['sheet', networkOf(address)]]),
    sheetLink: (address: string | undefined) => take([['sheetLink', networkOf(address)]]),
  }
}
