import type { Article } from '../../rules/edition/schema.ts'
import type { Db, Tx } from '../database.ts'
import { editionInForce, openShelf } from '../editions/editions.queries.ts'
import { Problem } from '../problem.ts'
import { hashOf, textOf } from './draft-text.ts'
import { Draft } from './drafts.contract.ts'
import { findDraft } from './drafts.queries.ts'
import type { DraftRow } from './drafts.queries.ts'

/** An article as it is in force and as it is being changed. */
export type DraftState = {
  slug: string
  row: DraftRow | undefined
  article: Article | undefined
  edition: number
  /** Hash of the text in force; null where there is none. */
  hash: string | null
  /** Another one as soon as anybody saves, or puts another text in force. */
  version: string
}

/** Reads both. Within a transaction that changes either, lock the article before. */
export async function readState(db: Db | Tx, slug: string): Promise<DraftState> {
  const inForce = await editionInForce(db)
  if (inForce === undefined) throw new Problem('unavailable', 'No edition is in force yet.')
  const row = await findDraft(db, slug)
  const article = (await openShelf(db, inForce.number)).find((one) => one.slug === slug)
  const hash = article === undefined ? null : hashOf(textOf(article))
  // A draft goes on from its own base, whatever comes into force meanwhile: that is looked at before it is put in force.
  const base = row?.pending === true ? row.base : hash
  return {
    slug,
    row,
    article,
    edition: inForce.number,
    hash,
    version: `${row?.version ?? 0}-${base ?? 'new'}`,
  }
}

/** What the editor is given of it. */
export function draftOf({ slug, row, article, edition, hash, version }: DraftState): Draft {
  const own = row?.pending === true
  const text = own ? row.text : article === undefined ? null : textOf(article)
  return Draft.parse({
    slug,
    version,
    pending: own,
    text,
    edited: row === undefined ? null : { by: row.editor, at: row.editedAt.toISOString() },
    inForce:
      article === undefined
        ? null
        : { hash, text: textOf(article), withdrawn: article.withdrawn ?? null, edition },
    overtaken: own && row.base !== hash,
  })
}

/**
 * @throws Problem 409 with the text as it is now, unless the asker began from that
 */
export function mustBeAt(state: DraftState, version: string): void {
  if (state.version === version) return
  const who = state.row?.pending === true ? state.row.editor : 'Somebody'
  throw conflict(state, `${who} changed this article meanwhile.`)
}

/** A refusal that brings the other text along. */
export const conflict = (state: DraftState, title: string) =>
  new Problem('conflict', title, undefined, undefined, { theirs: draftOf(state) })
