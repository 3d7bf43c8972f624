import type { Edition } from '../../rules/edition/open.ts'
import type { SheetOpened } from '../../server/sheets/sheets.contract.ts'
import { newId } from '../offline/new-id.ts'
import { alterSending } from '../offline/unsent.ts'
import { saveSheet } from '../offline/sheets.ts'
import type { SheetDoc } from '../offline/sheets.ts'
import { headSays } from '../offline/outbox.ts'
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
  const { title, edition: hash, changedAt } = opened
  const doc: SheetDoc = {
    id,
    kind: 'diagnosis',
    title,
    edition: hash,
    changedAt,
    content,
    sends: sentSheet(content),
  }
  // As it stands there: it need not be told.
  const stands = { remote: opened.id, there: true, head: headSays(doc), last: {}, ended: false }
  await alterSending(id, { ...stands, link })
  await saveSheet(doc, came)
  return id
}
