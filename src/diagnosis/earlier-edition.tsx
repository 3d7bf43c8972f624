import { useState } from 'react'
import { useNavigate } from 'react-router-dom'
import type { EditionInForce } from '../../server/editions/editions.contract.ts'
import { useEdition } from '../editions/edition.api.ts'
import { newId } from '../offline/new-id.ts'
import { saveSheet } from '../offline/sheets.ts'
import { Button } from '../ui/button.tsx'
import { sentSheet } from './sent-sheet.ts'
import type { SheetContent } from './sheet-content.ts'

/** Where a sheet stays on an earlier edition: says so, and offers its findings on the one in force, as another sheet. */
export function EarlierEdition({ content, own }: { content: SheetContent; own: EditionInForce }) {
  const { info, edition } = useEdition()
  const navigate = useNavigate()
  const [failed, setFailed] = useState(false)
  if (info === undefined || edition === undefined || info.hash === own.hash) return null
  const goOn = async () => {
    const title = `${content.title}, edition ${info.number}`
    const next: SheetContent = { ...content, title, past: [], whatIf: null }
    const id = newId()
    const changedAt = new Date().toISOString()
    const doc = { id, kind: 'diagnosis', title, edition: info.hash, changedAt } as const
    await saveSheet({ ...doc, content: next, sends: sentSheet(next) })
    await navigate(`/diagnosis?sheet=${id}`)
  }
  return (
    <div className="desk-wide flex flex-wrap items-center gap-x-4 gap-y-2">
      <p className="text-small">
        This sheet stays on edition {own.number}, with which it was begun. Edition {info.number} is in force
        and may rank otherwise.
      </p>
      <Button size="small" onPress={() => void goOn().catch(() => setFailed(true))}>
        Go on with the edition in force
      </Button>
      {failed && <p role="alert">This device keeps nothing for this page: the new sheet was not begun.</p>}
    </div>
  )
}
