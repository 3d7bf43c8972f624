import type { Db } from '../database.ts'
import { editionBytes } from './edition-bytes.ts'
import { putInForce } from './put-in-force.ts'
import { readStarter } from './read-starter.ts'

const starterNote = 'starter'

/** Puts this checkout's starter edition in force, unless people have put one of their own in force. */
export async function seedStarter(db: Db) {
  return putInForce(db, editionBytes(await readStarter()), {
    note: `${starterNote} edition`,
    reason: 'came with the program',
    unless: (inForce) => !inForce.note.startsWith(starterNote),
  })
}
