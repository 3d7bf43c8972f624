import { database, strict } from './database.ts'

/**
 * An article's text that the server has not answered with yet. It belongs to who typed it: sign-out leaves it, because
 * it lies nowhere else, and nobody else is shown it.
 */
export type UnsentText = {
  slug: string
  personId: string
  /** Of the draft it was begun from. */
  version: string
  /** Device time, ISO 8601. */
  typedAt: string
  /** Parse it again: an older build may have written it. */
  text: unknown
}

const keyOf = (personId: string, slug: string) => `unsent-text ${personId} ${slug}`

/**
 * Keeps a text in place of the one before. Resolves once it lies on the disk.
 * @throws DOMException QuotaExceededError when the device is full, or another when it keeps nothing at all
 */
export async function keepUnsent(unsent: UnsentText): Promise<void> {
  const tx = (await database()).transaction('settings', 'readwrite', strict)
  const key = keyOf(unsent.personId, unsent.slug)
  await Promise.all([tx.store.put({ key, value: unsent }), tx.done])
}

/** What this person typed and the server has not, or undefined. */
export async function readUnsent(personId: string, slug: string): Promise<UnsentText | undefined> {
  return (await (await database()).get('settings', keyOf(personId, slug)))?.value as UnsentText | undefined
}

/** Takes it off the device: the server has answered with it, or its writer has let it go. */
export async function dropUnsent(personId: string, slug: string): Promise<void> {
  const tx = (await database()).transaction('settings', 'readwrite', strict)
  await Promise.all([tx.store.delete(keyOf(personId, slug)), tx.done])
}
