import { database, strict } from './database.ts'
import { putInOutbox } from './outbox.ts'
import { newSending } from './unsent.ts'

/** How many sheets of this device were begun while nobody was signed in. */
export async function countUnclaimed(): Promise<number> {
  return (await (await database()).getAll('sheets')).filter(({ of = null }) => of === null).length
}

/** Makes the sheets of this device that are nobody's a person's own: from now on they go to the server in their name. */
export async function claimSheets(who: string): Promise<void> {
  const tx = (await database()).transaction(['sheets', 'outbox', 'sendings', 'settings'], 'readwrite', strict)
  const sheets = tx.objectStore('sheets')
  const sendings = tx.objectStore('sendings')
  const outbox = tx.objectStore('outbox')
  for (const { unnoted: _, ...doc } of await sheets.getAll())
    if ((doc.of ?? null) === null) {
      const mine = { ...doc, of: who }
      for (const letter of await outbox.getAll())
        if (letter.sheet === doc.id && letter.by === null) await outbox.put({ ...letter, by: who })
      // Said anew though nothing of it changed: with it the server learns whose the sheet is.
      await sendings.put({ ...((await sendings.get(doc.id)) ?? newSending(doc.id)), head: '' })
      await putInOutbox(tx, mine, who, [])
      await sheets.put(mine)
    }
  await tx.done
}
