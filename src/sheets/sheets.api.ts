import { keepPreviousData, queryOptions } from '@tanstack/react-query'
import { SheetLinkMade, SheetNamed, SheetOpened, SheetsPage } from '../../server/sheets/sheets.contract.ts'
import type { SheetHead } from '../../server/sheets/sheet-requests.contract.ts'
import { get, send } from '../api.ts'
import { alterSending, getSending } from '../offline/unsent.ts'
import { loadSheet, saveSheet, sayChanged } from '../offline/sheets.ts'
import { along } from './post.ts'
import { sendNow } from './send-sheets.ts'

/** Sends what waits, now. Resolves when that was tried. */
export const sendWaiting = sendNow

/** The server did not take the sheet, so that there is nothing to hand out a link to. */
export class NotSentYet extends Error {
  override name = 'NotSentYet'
}

type Kind = SheetHead['kind']

/**
 * The sheets on the server of whoever is signed in, whichever device they came from.
 * @param pages how many pages of them
 */
export const mySheetsQuery = (kind: Kind, words: string, pages: number) =>
  queryOptions<SheetsPage, Error, SheetsPage>({
    queryKey: ['sheets', kind, words, pages] as const,
    queryFn: async ({ signal }) => {
      const all: SheetsPage = { sheets: [], next: '' }
      for (let page = 0; page < pages && all.next !== null; page++) {
        const query = new URLSearchParams({ q: words, kind, ...(all.next !== '' && { after: all.next }) })
        const { sheets, next } = await get(`/sheets?${query}`, SheetsPage, signal)
        all.sheets.push(...sheets)
        all.next = next
      }
      return all
    },
    // What is there stays while it is searched, and while more comes.
    placeholderData: keepPreviousData,
    staleTime: 0,
  })

/** A sheet by the link that somebody gave, or one’s own by its id. */
export const openShared = (link: string, signal?: AbortSignal) =>
  get(`/shared/${encodeURIComponent(link)}`, SheetOpened, signal)
export const openOwn = (id: string, signal?: AbortSignal) => get(`/sheets/${id}`, SheetOpened, signal)

/**
 * Sends a sheet of this device, and makes a link that opens it. A link made before ends.
 * @param by who is signed in; null for nobody
 * @throws NotSentYet when the server has not taken the sheet
 */
export async function makeSheetLink(sheet: string, by: string | null): Promise<string> {
  const doc = await loadSheet(sheet)
  if (doc === undefined) throw new NotSentYet()
  // From now on this sheet goes to the server, whoever writes on it.
  if ((await getSending(sheet)) === undefined) await alterSending(sheet, {})
  await saveSheet(doc)
  await sendNow()
  const sending = await getSending(sheet)
  if (sending?.there !== true) throw new NotSentYet()
  const { token } = await send(
    'POST',
    `/sheets/${sending.remote}/link`,
    {},
    SheetLinkMade,
    along(sending, by),
  )
  await alterSending(sheet, { given: token })
  sayChanged()
  return token
}

/** Takes the link of a sheet back: whoever has it finds nothing there any more. */
export async function takeBackSheetLink(sheet: string, by: string | null): Promise<void> {
  const sending = await getSending(sheet)
  if (sending === undefined) return
  await send('DELETE', `/sheets/${sending.remote}/link`, {}, SheetNamed, along(sending, by))
  await alterSending(sheet, { given: undefined })
  sayChanged()
}
