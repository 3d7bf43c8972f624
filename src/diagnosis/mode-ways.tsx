import { useState } from 'react'
import { Button } from '../ui/button.tsx'
import { Ways } from '../ui/ways.tsx'
import { useDesk } from './desk.ts'
import { inView, isTaken } from './sheet-content.ts'
import { modeLabel } from './words.ts'

/** The operating modes of the source, one chosen; others can be added where a transfer switch brings them. */
export function ModeWays() {
  const { edition, typed, dispatch } = useDesk()
  const [adding, setAdding] = useState(false)
  const own = edition.sources.get(typed.context.source)?.modes ?? []
  const shown = [...new Set([...own, ...typed.moreModes, typed.mode])]
  const others = edition.file.modes.filter((mode) => !shown.includes(mode.id))
  const entries = inView(typed)
  const noteOf = (mode: string) => {
    const count = Object.values(entries[mode] ?? {}).filter(isTaken).length
    return count === 0 ? 'nothing yet' : count === 1 ? '1 finding' : `${count} findings`
  }
  return (
    <div id="modes">
      <Ways
        label="Operating mode"
        ways={shown.map((mode) => ({ value: mode, label: modeLabel(edition, mode), note: noteOf(mode) }))}
        value={typed.mode}
        onChoose={(mode) => dispatch({ do: 'look', mode })}
        className="modes"
      />
      {others.length > 0 && (
        <button
          type="button"
          className="link-alone text-small text-glow underline"
          aria-expanded={adding}
          onClick={() => setAdding(!adding)}
        >
          Add a mode
        </button>
      )}
      {adding && (
        <div className="mb-2 flex flex-wrap gap-2">
          {others.map((mode) => (
            <Button
              key={mode.id}
              size="small"
              onPress={() => {
                dispatch({ do: 'add-mode', mode: mode.id, of: `${modeLabel(edition, mode.id)} added` })
                setAdding(false)
              }}
            >
              {modeLabel(edition, mode.id)}
            </Button>
          ))}
        </div>
      )}
    </div>
  )
}
