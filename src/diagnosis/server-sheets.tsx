import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { useNavigate } from 'react-router-dom'
import type { Edition } from '../../rules/edition/open.ts'
import { listSheets } from '../offline/sheets-here.ts'
import { getSending } from '../offline/unsent.ts'
import { mySheetsQuery, openOwn } from '../sheets/sheets.api.ts'
import { Button } from '../ui/button.tsx'
import { Failed } from '../ui/failed.tsx'
import { Rail } from '../ui/rail.tsx'
import { SearchBox } from '../ui/search-box.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { bringSheet } from './bring-sheet.ts'

const day = (moment: string) =>
  new Intl.DateTimeFormat('en-US', { dateStyle: 'medium' }).format(new Date(moment))

/** The sheet's id on this device, if it is here. */
async function idHere(remote: string): Promise<string | undefined> {
  for (const { id } of await listSheets('diagnosis')) {
    const sending = await getSending(id)
    if (sending?.remote === remote && sending.link === undefined) return id
  }
  return undefined
}

/** One's own sheets on the server, from whichever device: searched by name, and opened here. */
export function ServerSheets({ edition, hash }: { edition: Edition | undefined; hash: string | undefined }) {
  const [words, setWords] = useState('')
  const [pages, setPages] = useState(1)
  const [failed, setFailed] = useState<string>()
  const navigate = useNavigate()
  const found = useQuery(mySheetsQuery('diagnosis', words.trim(), pages))
  const sheets = found.data?.sheets ?? []
  const open = async (id: string, title: string, of: string) => {
    setFailed(undefined)
    const here = await idHere(id)
    if (here !== undefined) return navigate(`/diagnosis?sheet=${here}`)
    if (edition === undefined || of !== hash)
      return setFailed(`“${title}” was begun with an edition that is not open here.`)
    await navigate(`/diagnosis?sheet=${await bringSheet(edition, await openOwn(id), undefined)}`)
  }
  const start = (id: string, title: string, of: string) =>
    void Promise.resolve(open(id, title, of)).catch(() => setFailed(`“${title}” can’t be opened now.`))
  return (
    <Rail title="My sheets, from every device" className="mt-6">
      <div className="mt-3 max-w-[480px]">
        <SearchBox
          label="Search my sheets by title"
          placeholder="Title"
          value={words}
          onText={setWords}
          controls="my-sheets"
        />
      </div>
      {failed !== undefined && <Failed title="Couldn’t open the sheet.">{failed}</Failed>}
      {found.isPending ? (
        <Waiting what="my sheets" />
      ) : found.isError ? (
        <Failed title="Couldn’t fetch my sheets." onRetry={() => void found.refetch()}>
          {found.error.message} Those on this device are above.
        </Failed>
      ) : sheets.length === 0 ? (
        <p className="mt-3 text-small text-ink-2">
          {words.trim() === '' ? 'None sent yet.' : 'None of that title.'}
        </p>
      ) : (
        <ul id="my-sheets" aria-label="My sheets">
          {sheets.map(({ id, title, changedAt, findings, edition: of, stops }) => (
            <li key={id} className="sheet-row">
              <div className="min-w-0 flex-1">
                <b>{title}</b>
                <p className="text-note text-ink-2">
                  {findings === 1 ? '1 finding' : `${findings} findings`}, changed {day(changedAt)}
                  {stops && ', stopped'}
                </p>
              </div>
              <Button size="small" label={`Open ${title}`} onPress={() => start(id, title, of)}>
                Open
              </Button>
            </li>
          ))}
        </ul>
      )}
      {typeof found.data?.next === 'string' && (
        <Button size="small" className="mt-3" onPress={() => setPages(pages + 1)}>
          More
        </Button>
      )}
    </Rail>
  )
}
