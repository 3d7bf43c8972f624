import { compare, hash } from 'bcryptjs'

/** Each step doubles the work. 11 takes some tenths of a second here, for whoever guesses as well. */
const cost = 11

/** Of no password: what an unknown account is checked against, so that it takes as long as a known one. */
const nobodys = `$2b$${cost}$${'.'.repeat(53)}`

// The same password may reach us composed or not, depending on the keyboard.
const typed = (password: string) => password.normalize('NFC')

let last: Promise<unknown> = Promise.resolve()
/**
 * One password at a time. The work gives way to others ten times a second, but thirty of them at once would take
 * turns with each other, and nobody else would be answered meanwhile.
 */
function inTurn<T>(work: () => Promise<T>): Promise<T> {
  const mine = last.then(work)
  last = mine.catch(() => undefined)
  return mine
}

/** What is kept of a password. */
export const hashPassword = (password: string): Promise<string> => inTurn(() => hash(typed(password), cost))

/** Whether this is the password. Where there is none to check against, the answer takes as long and is no. */
export async function isPassword(password: string, kept: string | null | undefined): Promise<boolean> {
  const same = await inTurn(() => compare(typed(password), kept ?? nobodys))
  return same && kept !== null && kept !== undefined
}
