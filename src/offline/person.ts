import type { Person } from '../../server/people/me.contract.ts'
import { database, strict } from './database.ts'
import { idOf } from './whose.ts'

/** Who was last signed in on this device, and when the server last said so; device time, ISO 8601. */
export type KeptPerson = Person & { seenAt: string }

const key = 'person'

/** The last known person, still to be parsed: an older build may have written it. Undefined when nobody is known. */
export async function keptPerson(): Promise<unknown> {
  return (await (await database()).get('settings', key))?.value
}

/**
 * Remembers who is signed in, or with `undefined` forgets it. In the same step leaves the device: with anyone who may
 * not read them, the edition's files for qualified people; with anyone else than who was here, the sheets of theirs
 * that the server has whole. What it does not have stays, for them alone.
 */
export async function keepPerson(person: KeptPerson | undefined, qualified: boolean): Promise<void> {
  const tx = (await database()).transaction(
    ['settings', 'files', 'sheets', 'outbox', 'sendings'],
    'readwrite',
    strict,
  )
  const settings = tx.objectStore('settings')
  const before = idOf((await settings.get(key))?.value)
  const writes: Promise<unknown>[] = [
    person === undefined ? settings.delete(key) : settings.put({ key, value: person }),
  ]
  if (!qualified)
    for await (const cursor of tx.objectStore('files'))
      if (cursor.value.audience !== 'everyone') writes.push(cursor.delete())
  if (before !== (person?.id ?? null)) {
    const waiting = new Set((await tx.objectStore('outbox').getAll()).map((letter) => letter.sheet))
    const sendings = tx.objectStore('sendings')
    for (const { id, of = null, unnoted } of await tx.objectStore('sheets').getAll())
      if (of !== null && of !== person?.id && unnoted === undefined && !waiting.has(id))
        if ((await sendings.get(id))?.there === true)
          writes.push(tx.objectStore('sheets').delete(id), sendings.delete(id))
  }
  await Promise.all([...writes, tx.done])
}
