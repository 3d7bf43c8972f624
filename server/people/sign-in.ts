import type { Db } from '../database.ts'
import { Problem } from '../problem.ts'
import { isPassword } from './passwords.ts'
import { findByEmail } from './people.queries.ts'
import type { Known } from './people.queries.ts'
import type { Throttle } from './throttle.ts'

type Try = {
  email: string
  password: string
  address: string | undefined
  /** The mark this device got at an earlier sign-in. */
  mark: string | undefined
}

/**
 * Who signs in. An unknown account, one without a password and a wrong password get one answer, in the same time.
 * @throws Problem 401 when that is nobody; 429 after too many tries
 */
export async function whoSignsIn(db: Db, throttle: Throttle, tried: Try): Promise<Known> {
  const giveBack = await throttle.signIn(tried.email, tried.address, tried.mark)
  const found = await findByEmail(db, tried.email)
  const right = await isPassword(tried.password, found?.hash)
  if (!right || found === undefined)
    throw new Problem('unauthorized', 'The e-mail address or the password is wrong.')
  await giveBack()
  const { hash: _, ...person } = found
  return person
}
