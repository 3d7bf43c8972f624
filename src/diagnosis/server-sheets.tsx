import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { useNavigate } from 'react-router-dom'
import type { SheetsPage } from '../../server/sheets/sheets.contract.ts'
import { listSheets } from '../offline/sheets-here.ts'
import { getSending } from '../offline/unsent.ts'
import { mySheetsQuery } from '../sheets/sheets.api.ts'
import { Button } from '../ui/button.tsx'
import { Failed } from '../ui/failed.tsx'
import { Rail } from '../ui/rail.tsx'
import { SearchBox } from '../ui/search-box.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { Bringing } from './bringing.tsx'

type Listed = SheetsPage['sheets'][number]

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

function Row({ sheet, onOpen }: { sheet: Listed; onOpen: () => void }) {
  const { title, findings, changedAt, stops, link } = sheet
  return (
    <li className="sheet-row">
      <div className="min-w-0 flex-1">
        <b>{title}</b>
        <p className="text-note text-ink-2">
          {findings === 1 ? '1 finding' : `${findings} findings`}, changed {day(changedAt)}
          {stops && ', stopped'}
          {link && ', has a link'}
        </p>
      </div>
      <Button size="small" label={`Open ${title}`} onPress={onOpen}>
        Open
      </Button>
    </li>
  )
}

/** One's own sheets on the server, from whichever device: searched by name, and opened here. */
export function ServerSheets() {
  const [words, setWords] = useState('')
  const [pages, setPages] = useState(1)
  const [failed, setFailed] = useState<string>()
  const [bringing, setBringing] = useState<Listed>()
  const navigate = useNavigate()
  const found = useQuery(mySheetsQuery('diagnosis', words.trim(), pages))
  const sheets = found.data?.sheets ?? []
  const open = async (sheet: Listed) => {
    setFailed(undefined)
    const here = await idHere(sheet.id)
    if (here === undefined) setBringing(sheet)
    else await navigate(`/diagnosis?sheet=${here}`)
  }
  const fail = (why: string) => {
    setBringing(undefined)
    setFailed(why)
  }
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
      {bringing !== undefined && (
        <Bringing
          key={bringing.id}
          id={bringing.id}
          title={bringing.title}
          edition={bringing.edition}
          onFailed={fail}
        />
      )}
      <div id="my-sheets" className="mt-3">
        {found.isPending ? (
          <Waiting what="my sheets" />
        ) : found.isError ? (
          <Failed title="Couldn’t fetch my sheets." onRetry={() => void found.refetch()}>
            {found.error.message} Those on this device are above.
          </Failed>
        ) : sheets.length === 0 ? (
          <p className="text-small text-ink-2">
            {words.trim() === '' ? 'None sent yet.' : 'None of that title.'}
          </p>
        ) : (
          <ul aria-label="My sheets">
            {sheets.map((sheet) => (
              <Row
                key={sheet.id}
                sheet={sheet}
                onOpen={() => void open(sheet).catch(() => fail('This device keeps nothing for this page.'))}
              />
            ))}
          </ul>
        )}
        {typeof found.data?.next === 'string' && (
          <Button size="small" className="mt-3" onPress={() => setPages(pages + 1)}>
            More
          </Button>
        )}
      </div>
    </Rail>
  )
}
