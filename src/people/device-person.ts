import * as z from 'zod/mini'
import { Person } from '../../server/people/people.contract.ts'
import { isQualified } from '../../server/people/roles.contract.ts'
import { keepPerson, keptPerson } from '../offline/person.ts'

const Kept = z.extend(Person, { seenAt: z.iso.datetime() })
type Kept = z.infer<typeof Kept>

// A session lasts 30 days from the last day the server saw it.
const sessionMs = 28 * 24 * 60 * 60 * 1000

const channel = 'BroadcastChannel' in globalThis ? new BroadcastChannel('tracelamp-person') : undefined

/** Calls back when somebody signs in or out in another tab. Returns the way to stop it. */
export function onPersonChanged(listener: () => void): () => void {
  channel?.addEventListener('message', listener)
  return () => channel?.removeEventListener('message', listener)
}

/** Who was last signed in here. A device that keeps nothing knows nobody. */
export async function readPerson(): Promise<Kept | undefined> {
  return Kept.safeParse(await keptPerson().catch(() => undefined)).data
}

const keep = (person: Person | undefined) =>
  // A private window may keep nothing; then there is nothing to leave it either.
  keepPerson(person && { ...person, seenAt: new Date().toISOString() }, isQualified(person?.role)).catch(
    () => undefined,
  )

/** Remembers who has signed in, and tells the other tabs. */
export async function rememberPerson(person: Person): Promise<void> {
  await keep(person)
  channel?.postMessage('changed')
}

/** Forgets who was signed in; what is for qualified people leaves the device. */
export async function forgetPerson(): Promise<void> {
  await keep(undefined)
  channel?.postMessage('changed')
}

/**
 * Brings the device in line with what the server says. A session that only ran out leaves the person known, so that
 * work on the device goes on; one that was ended (elsewhere, by an admin, with a new password) does not.
 */
export async function settlePerson(
  said: Person | null,
): Promise<{ person: Person | undefined; expired: boolean }> {
  const kept = await readPerson()
  if (said !== null) {
    await keep(said)
    return { person: said, expired: false }
  }
  if (kept !== undefined && Date.now() - Date.parse(kept.seenAt) > sessionMs)
    return { person: kept, expired: true }
  if (kept !== undefined) await keep(undefined)
  return { person: undefined, expired: false }
}
