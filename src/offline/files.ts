import { database, strict } from './database.ts'

/** An edition's file by its hash, or undefined when this device has not kept it. */
export async function getFile(hash: string): Promise<Uint8Array | undefined> {
  return (await (await database()).get('files', hash))?.bytes
}

/** Keeps an edition's file. The name is its hash, so a second keeping changes nothing. */
export async function putFile(hash: string, bytes: Uint8Array): Promise<void> {
  const tx = (await database()).transaction('files', 'readwrite', strict)
  await Promise.all([tx.store.put({ hash, bytes }), tx.done])
}
