import type { Person } from '../../server/people/people.contract.ts'
import { database, strict } from './database.ts'

/** Who was last signed in on this device, and when the server last said so; device time, ISO 8601. */
export type KeptPerson = Person & { seenAt: string }

const key = 'person'

/** The last known person, still to be parsed: an older build may have written it. Undefined when nobody is known. */
export async function keptPerson(): Promise<unknown> {
  return (await (await database()).get('settings', key))?.value
}

/**
 * Remembers who is signed in, or with `undefined` forgets it. With anyone who may not read them, the edition's files
 * for qualified people leave the device in the same step.
 */
export async function keepPerson(person: KeptPerson | undefined, qualified: boolean): Promise<void> {
  const tx = (await database()).transaction(['settings', 'files'], 'readwrite', strict)
  const settings = tx.objectStore('settings')
  const writes: Promise<unknown>[] = [
    person === undefined ? settings.delete(key) : settings.put({ key, value: person }),
  ]
  if (!qualified)
    for await (const cursor of tx.objectStore('files'))
      if (cursor.value.audience !== 'everyone') writes.push(cursor.delete())
  await Promise.all([...writes, tx.done])
}
