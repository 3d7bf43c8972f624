import { useEffect, useId, useRef, useState } from 'react'
import { SearchBox } from '../ui/search-box.tsx'
import { useDesk } from './desk.ts'
import { findFindings } from './find-findings.ts'

const shownAtMost = 8

/** Finds anything that can be typed or answered, by any word of it; choosing it goes there. */
export function FindFinding({ onChosen }: { onChosen: () => void }) {
  const { edition, typed, go, ask } = useDesk()
  const [query, setQuery] = useState('')
  const list = useId()
  const box = useRef<HTMLInputElement>(null)
  useEffect(() => box.current?.focus(), [])
  const found = findFindings(edition, typed.context, query)
  const shown = found.slice(0, shownAtMost)
  const take = (id: string, kind: 'reading' | 'observation') => {
    if (kind === 'reading') go([id])
    else ask([id])
    onChosen()
  }
  return (
    <div className="mt-3">
      <SearchBox
        label="Find a finding"
        placeholder="GFCI, lights, leg 1, ohms …"
        value={query}
        onText={setQuery}
        onSubmit={() => shown[0] && take(shown[0].id, shown[0].kind)}
        onKeyDown={(event) => event.key === 'Escape' && onChosen()}
        controls={list}
        ref={box}
      />
      <p role="status" className="mt-1 text-note text-ink-2">
        {found.length === 0
          ? 'Nothing of that name.'
          : `${found.length} found${found.length > shownAtMost ? `, ${shownAtMost} shown` : ''}.`}
      </p>
      <ul id={list} aria-label="Findings" className="mt-1">
        {shown.map(({ id, label, help, kind }) => (
          <li key={id} className="border-t border-rule">
            <button type="button" className="found" onClick={() => take(id, kind)}>
              <b>{label}</b>
              <span className="text-note text-ink-2">{help}</span>
            </button>
          </li>
        ))}
      </ul>
    </div>
  )
}
