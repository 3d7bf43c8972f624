import type { Db } from '../database.ts'
import { Problem, notFound } from '../problem.ts'
import { conflict, draftOf, mustBeAt, readState } from './draft-state.ts'
import type { Draft, SaveDraft } from './drafts.contract.ts'
import { findRevision, keepDraft, keepRevision, lockArticle } from './drafts.queries.ts'

/** What one person saves within this time is one revision; their next sitting, or anybody else's, begins another. */
const sittingMs = 10 * 60 * 1000

/**
 * Keeps what somebody wrote, if they began from what is kept now. What it replaces stays as a revision.
 * @throws Problem 409 with the other text, when it is another by now
 */
export function saveDraft(db: Db, slug: string, save: SaveDraft, personId: string): Promise<Draft> {
  const { version, apart, restores, onto, ...text } = save
  return db.transaction().execute(async (tx) => {
    await lockArticle(tx, slug)
    const state = await readState(tx, slug)
    mustBeAt(state, version)
    if (restores !== undefined && (await findRevision(tx, slug, restores)) === undefined)
      throw notFound('revision')
    const { row, hash } = state
    const now = new Date()
    const ownBase = row?.pending === true ? row.base : hash
    if (onto !== undefined && onto !== hash)
      throw conflict(state, 'The article in force was changed once more.')
    const begun = row?.pending === true ? row : undefined
    const sameSitting =
      begun !== undefined &&
      begun.editorId === personId &&
      apart !== true &&
      restores === undefined &&
      onto === undefined &&
      now.getTime() - begun.sittingSince.getTime() < sittingMs
    if (begun !== undefined && !sameSitting)
      await keepRevision(tx, {
        slug,
        text: begun.text,
        author: begun.editorId,
        at: begun.editedAt,
        reason: restores === undefined ? '' : `Before revision ${restores} was brought back`,
        edition: null,
      })
    await keepDraft(tx, {
      slug,
      pending: true,
      text,
      base: onto ?? ownBase,
      personId,
      sittingSince: sameSitting ? begun.sittingSince : now,
    })
    return draftOf(await readState(tx, slug))
  })
}

/**
 * Lets a draft go: what is in force holds on. Its text stays as a revision.
 * @throws Problem 409 when it is another by now
 */
export function dropDraft(db: Db, slug: string, version: string, personId: string): Promise<Draft> {
  return db.transaction().execute(async (tx) => {
    await lockArticle(tx, slug)
    const state = await readState(tx, slug)
    mustBeAt(state, version)
    if (state.row?.pending !== true) throw new Problem('conflict', 'There is no draft.')
    const { text, editorId, editedAt } = state.row
    await keepRevision(tx, {
      slug,
      text,
      author: editorId,
      at: editedAt,
      reason: 'Draft let go',
      edition: null,
    })
    await keepDraft(tx, { slug, pending: false, text, base: null, personId, sittingSince: new Date() })
    return draftOf(await readState(tx, slug))
  })
}
