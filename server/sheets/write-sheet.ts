import type { Edition } from '../../rules/edition/open.ts'
import type { Db, Tx } from '../database.ts'
import { Problem, notFound } from '../problem.ts'
import { openedEditions, resultOf } from './compute-result.ts'
import type { NewEntry, SheetHead } from './sheet-requests.contract.ts'
import { SheetOpened } from './sheets.contract.ts'
import {
  addEntries,
  addSheet,
  adoptSheet,
  changeSheet,
  dropResult,
  entriesElsewhere,
  findSheet,
  isEdition,
  keepResult,
  listEntries,
  lockSheet,
  sayChanged,
  touchSheet,
} from './sheets.queries.ts'
import type { SheetRow } from './sheets.queries.ts'

/** More than anybody enters by hand. Who has no account must not fill the disk either. */
const mostEntries = { account: 5000, none: 500 }

const Kept = SheetOpened.shape

type Asker = {
  isOwn: (sheet: SheetRow) => boolean
  /** Whose a new sheet is. */
  owner: { ownerId: string | null; keyHash: string | null }
  /** Counts a new sheet against its maker's limit. */
  count: () => Promise<void>
}

/** What is written on sheets: each time in one step with what the edition then says of it. */
export function sheetWriting(db: Db) {
  const editionOf = openedEditions(db)

  const computeAnew = async (tx: Tx, id: string, opened: { hash: string; edition: Edition }) => {
    const sheet = await lockSheet(tx, id)
    if (sheet === undefined) return
    const edition = sheet.edition === opened.hash ? opened.edition : await editionOf(sheet.edition)
    const entries = await listEntries(tx, id)
    const result = await resultOf(
      edition,
      sheet.edition,
      Kept.context.parse(sheet.context),
      entries.map(({ deviceAt, value, ...entry }) => ({
        ...entry,
        value: Kept.entries.def.element.shape.value.parse(value),
        deviceAt: deviceAt.toISOString(),
      })),
    )
    if (result === undefined) await dropResult(tx, id)
    else await keepResult(tx, id, result)
    await sayChanged(tx, id)
  }

  return {
    /**
     * Makes a sheet, or names it anew. Sent twice it is there once.
     * @throws Problem 404 when it is somebody else's; 409 when it would change what it is
     */
    async putHead(id: string, head: SheetHead, { isOwn, owner, count }: Asker): Promise<void> {
      if (!(await isEdition(db, head.edition)))
        throw new Problem('bad-request', 'Mend what is marked.', {
          edition: 'This edition is not on this server.',
        })
      // What asks for a connection of its own comes first: a transaction that waits for one could wait for ever.
      const opened = { hash: head.edition, edition: await editionOf(head.edition) }
      if ((await findSheet(db, id)) === undefined) await count()
      await db.transaction().execute(async (tx) => {
        const before = await lockSheet(tx, id)
        if (before === undefined) {
          // Another request may have been quicker, with the same id.
          if (!(await addSheet(tx, id, head, owner))) throw new Problem('unavailable')
        } else {
          if (!isOwn(before)) throw notFound('sheet')
          if (before.kind !== head.kind) throw new Problem('conflict', 'A sheet stays of its kind.')
          if (before.kind === 'diagnosis' && before.edition !== head.edition)
            throw new Problem('conflict', 'A sheet stays on the edition it was begun with.')
          if (before.ownerId === null && owner.ownerId !== null) await adoptSheet(tx, id, owner.ownerId)
          await changeSheet(tx, id, head)
        }
        await computeAnew(tx, id, opened)
      })
    },

    /** Adds entries. Those sent before change nothing. */
    async add(
      { id: sheetId, edition: hash, ownerId }: Pick<SheetRow, 'id' | 'edition' | 'ownerId'>,
      entries: readonly NewEntry[],
      by: { id: string | null; name: string | null },
    ): Promise<void> {
      const opened = { hash, edition: await editionOf(hash) }
      await db.transaction().execute(async (tx) => {
        await lockSheet(tx, sheetId)
        const ids = entries.map((entry) => entry.id)
        if ((await entriesElsewhere(tx, sheetId, ids)).length > 0)
          throw new Problem('conflict', 'An entry of that id stands on another sheet.')
        const there = await listEntries(tx, sheetId)
        if (there.length + entries.length > mostEntries[ownerId === null ? 'none' : 'account'])
          throw new Problem('conflict', 'This sheet is full. Begin another.')
        if ((await addEntries(tx, sheetId, entries, by)) === 0) return
        const last = entries.map((entry) => entry.deviceAt).reduce((a, b) => (a > b ? a : b))
        await touchSheet(tx, sheetId, new Date(last))
        await computeAnew(tx, sheetId, opened)
      })
    },
  }
}

export type SheetWriting = ReturnType<typeof sheetWriting>
