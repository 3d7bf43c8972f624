import { database, strict } from './database.ts'

/** An edition's file by its hash, or undefined when this device has not kept it. */
export async function getFile(hash: string): Promise<Uint8Array | undefined> {
  return (await (await database()).get('files', hash))?.bytes
}

/**
 * Keeps an edition's file. The name is its hash, so a second keeping changes nothing. One for qualified people is kept
 * only while somebody is signed in here: it may have been asked for before they signed out, and come after.
 */
export async function putFile(
  hash: string,
  bytes: Uint8Array,
  audience: 'everyone' | 'qualified',
): Promise<void> {
  const tx = (await database()).transaction(['files', 'settings'], 'readwrite', strict)
  const wanted = audience === 'everyone' || (await tx.objectStore('settings').get('person')) !== undefined
  await Promise.all([wanted && tx.objectStore('files').put({ hash, bytes, audience }), tx.done])
}
