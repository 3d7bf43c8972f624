import { useState } from 'react'
import type { Edition } from '../../rules/edition/open.ts'
import { newId } from '../offline/new-id.ts'
import { saveSheet } from '../offline/sheets.ts'
import { Button } from '../ui/button.tsx'
import { Failed } from '../ui/failed.tsx'
import { Rail } from '../ui/rail.tsx'
import { ContextFields, TitleField } from './context-fields.tsx'
import type { Draft } from './context-fields.tsx'
import { meterOhmsOf } from './raw-sheet.ts'
import { sentSheet } from './sent-sheet.ts'
import { newSheet } from './sheet-content.ts'

const untitled = 'Untitled sheet'

type NewSheetProps = {
  edition: Edition
  editionHash: string
  onMade: (id: string) => void
  onClose: () => void
}

/** Begins a findings sheet: what feeds the wires decides which readings there are. */
export function NewSheet({ edition, editionHash, onMade, onClose }: NewSheetProps) {
  const { file } = edition
  const [title, setTitle] = useState('')
  const [draft, setDraft] = useState<Draft>({
    source: file.sources[0]?.id ?? '',
    system: file.systems[0]?.id ?? '',
    wiring: file.wirings[0]?.id ?? '',
    meter: { kind: '10M' },
  })
  const [errors, setErrors] = useState<Readonly<Record<string, string>>>({})
  const [failed, setFailed] = useState(false)
  const begin = async () => {
    if (!(meterOhmsOf(draft.meter) > 0)) return setErrors({ meter: 'Type ohms above 0, for example 3000.' })
    const mode = edition.sources.get(draft.source)?.modes[0] ?? file.modes[0]?.id ?? ''
    const content = newSheet(title.trim() === '' ? untitled : title.trim(), draft, mode)
    const id = newId()
    const changedAt = new Date().toISOString()
    try {
      await saveSheet({
        id,
        kind: 'diagnosis',
        title: content.title,
        edition: editionHash,
        changedAt,
        content,
        sends: sentSheet(content),
      })
      onMade(id)
    } catch {
      setFailed(true)
    }
  }
  return (
    <Rail title="New sheet" className="mt-6">
      <form
        className="mt-3 grid max-w-[720px] gap-5"
        onSubmit={(event) => {
          event.preventDefault()
          void begin()
        }}
      >
        <TitleField value={title} onText={setTitle} />
        <ContextFields edition={edition} draft={draft} onChange={setDraft} errors={errors} />
        {failed && (
          <Failed title="Couldn’t begin the sheet.">
            This device keeps nothing for this page: it is full, or the window is private.
          </Failed>
        )}
        <div className="flex flex-wrap gap-3">
          <Button look="main" size="glove" type="submit">
            Begin the sheet
          </Button>
          <Button look="plain" onPress={onClose}>
            Cancel
          </Button>
        </div>
      </form>
    </Rail>
  )
}
