import type { Edition } from '../../rules/edition/open.ts'
import type { SheetOpened } from '../../server/sheets/sheets.contract.ts'
import { newId } from '../offline/new-id.ts'
import { alterSending } from '../offline/unsent.ts'
import { saveSheet } from '../offline/sheets.ts'
import { isTakenHere } from '../offline/sheets-here.ts'
import { contentFrom, sentSheet, whatStands } from './sent-sheet.ts'

/**
 * Keeps a sheet of the server's on this device, as it is there.
 * @param link by which it came; one's own needs none
 * @returns its id here
 */
export async function bringSheet(
  edition: Edition,
  opened: SheetOpened,
  link: string | undefined,
): Promise<string> {
  // A homeowner's own check may lie on this very device under the id it has there.
  const id = (await isTakenHere(opened.id)) ? newId() : opened.id
  const came = whatStands(opened.entries)
  const content = contentFrom(edition, opened, came)
  await alterSending(id, { remote: opened.id, there: true, ...(link !== undefined && { link }) })
  const { title, edition: hash, changedAt } = opened
  const doc = { id, kind: 'diagnosis', title, edition: hash, changedAt } as const
  await saveSheet({ ...doc, content, sends: sentSheet(content) }, came)
  return id
}
