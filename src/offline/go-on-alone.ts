import { database, strict } from './database.ts'
import { newId } from './new-id.ts'
import { putInOutbox } from './outbox.ts'
import { newSending } from './unsent.ts'

/**
 * Makes a sheet that came by a link its holder's own, once that link was taken back: a new one on the server, with all
 * that stands on it here. Nothing that was said on it, a stop least of all, may vanish from under the tech's hands.
 */
export async function goOnAlone(sheet: string): Promise<void> {
  const tx = (await database()).transaction(['sheets', 'outbox', 'sendings', 'settings'], 'readwrite', strict)
  const [doc, sending] = await Promise.all([
    tx.objectStore('sheets').get(sheet),
    tx.objectStore('sendings').get(sheet),
  ])
  if (sending?.link !== undefined) {
    const outbox = tx.objectStore('outbox')
    for (const { n, sheet: of } of await outbox.getAll())
      if (of === sheet && n !== undefined) await outbox.delete(n)
    await tx.objectStore('sendings').put({ ...newSending(sheet), remote: newId(), ended: true })
    if (doc !== undefined) await putInOutbox(tx, doc, doc.of ?? null, [])
  }
  await tx.done
}
