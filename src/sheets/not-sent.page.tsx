import { useEffect, useState } from 'react'
import { alterUnsent, listUnsent } from '../offline/unsent.ts'
import type { Unsent } from '../offline/unsent.ts'
import { onSheetsChanged, sayChanged } from '../offline/sheets.ts'
import { listSheets } from '../offline/sheets-here.ts'
import { Button } from '../ui/button.tsx'
import { Page } from '../ui/page.tsx'
import { useToast } from '../ui/toast.tsx'
import { sendNow } from './send-sheets.ts'

type Row = { sheet: string; title: string; letters: Unsent[] }

async function readRows(): Promise<Row[]> {
  const [letters, sheets] = await Promise.all([listUnsent(), listSheets()])
  const titles = new Map(sheets.map((doc) => [doc.id, doc.title]))
  const ids = [...new Set(letters.map((letter) => letter.sheet))]
  return ids.map((sheet) => ({
    sheet,
    title: titles.get(sheet) ?? 'A sheet removed from this device',
    letters: letters.filter((letter) => letter.sheet === sheet),
  }))
}

const about = (letter: Unsent) =>
  letter.what === 'head' ? 'What feeds it, and the title' : letter.entry.finding

function why(row: Row): string {
  const refused = row.letters.find((letter) => letter.refused !== undefined)
  if (refused !== undefined) return `${about(refused)}: ${refused.refused ?? ''}`
  const failures = Math.max(...row.letters.map((letter) => letter.failures))
  return failures > 0 ? `The server failed ${failures} times.` : 'Waits for the server to answer.'
}

/** What the server has yet to take, why, and what can be done about it. */
export function Component() {
  const [rows, setRows] = useState<Row[]>()
  const say = useToast()
  useEffect(() => {
    let wanted = true
    const read = () => void readRows().then((found) => wanted && setRows(found))
    read()
    const stop = onSheetsChanged(read)
    return () => {
      wanted = false
      stop()
    }
  }, [])
  const again = async (row: Row) => {
    await alterUnsent(
      row.letters.flatMap(({ n }) => n ?? []),
      ({ refused: _, ...letter }) => ({ ...letter, failures: 0 }),
    )
    await sendNow()
  }
  const leave = async (row: Row) => {
    const refused = row.letters.filter((letter) => letter.refused !== undefined)
    await alterUnsent(
      refused.flatMap(({ n }) => n ?? []),
      () => undefined,
    )
    sayChanged()
    say({ text: 'Left on this device. The rest of the sheet goes on.' })
    await sendNow()
  }
  return (
    <Page title="Not sent" width="text">
      <h1>On this device only</h1>
      <p className="mt-3">
        Nothing here is lost: it lies on this device until the server has it. What is refused holds back the
        rest of its sheet.
      </p>
      {rows?.length === 0 && <p className="mt-4">All sent.</p>}
      <ul className="mt-4">
        {rows?.map((row) => (
          <li key={row.sheet} className="border-b border-rule py-3">
            <b>{row.title}</b>
            <p className="text-small">
              {row.letters.length} to send. {why(row)}
            </p>
            <div className="mt-2 flex flex-wrap gap-3">
              <Button size="small" label={`Send again: ${row.title}`} onPress={() => void again(row)}>
                Send again
              </Button>
              {row.letters.some((letter) => letter.refused !== undefined) && (
                <Button
                  size="small"
                  look="plain"
                  label={`Leave it on this device: ${row.title}`}
                  onPress={() => void leave(row)}
                >
                  Leave it on this device
                </Button>
              )}
            </div>
          </li>
        ))}
      </ul>
    </Page>
  )
}
