import { useState } from 'react'
import type { Reading } from '../../rules/edition/schema.ts'
import { ohmsInWords } from '../../rules/triangle/weight.ts'
import { Button } from '../ui/button.tsx'
import { TextField } from '../ui/field.tsx'
import { useDesk } from './desk.ts'
import { isOverLimit, numberIn } from './raw-sheet.ts'
import { readingOf } from './sheet-content.ts'
import { readingsAt } from './places.ts'

type Open = 'meter' | 'note' | undefined

function OtherMeter({ reading, onDone }: { reading: Reading; onDone: () => void }) {
  const { typed, dispatch, meterOhms, go } = useDesk()
  const [text, setText] = useState('')
  const [error, setError] = useState<string>()
  const take = (ohms: number | undefined) => {
    if (ohms === undefined || ohms <= 0) return setError('Type ohms above 0, for example 3000.')
    const { id } = reading
    dispatch({ do: 'again', mode: typed.mode, id, meterOhms: ohms, was: meterOhms, of: reading.label })
    onDone()
    go([id])
  }
  return (
    <div className="mt-3">
      <p className="text-small text-ink-2">
        Take {reading.label} again with another meter. The number before stays, paler, behind the picture.
      </p>
      <div className="mt-2 flex flex-wrap items-end gap-2">
        <Button size="small" onPress={() => take(10_000_000)}>
          10 MΩ
        </Button>
        <Button size="small" onPress={() => take(1_000_000)}>
          1 MΩ
        </Button>
        <TextField
          className="w-[150px]"
          label="Low resistance, ohms"
          inputMode="decimal"
          value={text}
          onText={setText}
          error={error}
        />
        <Button size="small" onPress={() => take(numberIn(text))}>
          Use these ohms
        </Button>
      </div>
    </div>
  )
}

function Note({ reading }: { reading: Reading }) {
  const { typed, dispatch } = useDesk()
  const { mode } = typed
  const { id, label } = reading
  return (
    <TextField
      className="mt-3"
      label={`Note on ${label}`}
      value={readingOf(typed, mode, id)?.note ?? ''}
      onText={(note) => dispatch({ do: 'set', mode, id, part: { note }, of: `${label}, note` })}
    />
  )
}

/** What can be said of the chosen reading beyond its number: unsteady, over limit, other meter, note, removed. */
export function FieldStrip() {
  const desk = useDesk()
  const { typed, dispatch, chosen, place } = desk
  const [open, setOpen] = useState<{ id: string; what: Open }>()
  const reading = place && readingsAt(place).find((one) => one.id === chosen?.id)
  if (reading === undefined) return null
  const { id, label, unit } = reading
  const { mode } = typed
  const entry = readingOf(typed, mode, id)
  const unsteady = entry?.upper !== undefined
  const ohms = unit === 'Ω' || unit === 'MΩ'
  const over = isOverLimit(entry?.text ?? '')
  const what = open?.id === id ? open.what : undefined
  const toggle = (next: Open) => setOpen({ id, what: what === next ? undefined : next })
  const twin = desk.edition.readings.get(`${id}.loaded`)
  const volts = unit === 'V'
  return (
    <details className="help strip">
      <summary>More on {label.charAt(0).toLowerCase() + label.slice(1)}</summary>
      <div className="mt-1 flex flex-wrap gap-2">
        <Button
          size="small"
          pressed={unsteady}
          onPress={() => {
            const part = { upper: unsteady ? undefined : '' }
            dispatch({ do: 'set', mode, id, part, of: `${label}, unsteady` })
            desk.focus({ id, which: unsteady || (entry?.text ?? '') === '' ? 'lower' : 'upper' })
          }}
        >
          Unsteady
        </Button>
        {ohms && (
          <Button
            size="small"
            pressed={over}
            onPress={() => dispatch({ do: 'set', mode, id, part: { text: over ? '' : 'OL' }, of: label })}
          >
            Over limit (OL)
          </Button>
        )}
        {twin && (
          <Button size="small" onPress={() => desk.go([twin.id])}>
            Load on
          </Button>
        )}
        {volts && (
          <Button size="small" expanded={what === 'meter'} onPress={() => toggle('meter')}>
            Other meter
          </Button>
        )}
        <Button size="small" expanded={what === 'note'} onPress={() => toggle('note')}>
          Note
        </Button>
        <Button
          size="small"
          pressed={entry?.unreachable === true}
          onPress={() =>
            dispatch({
              do: 'set',
              mode,
              id,
              part: { unreachable: entry?.unreachable !== true },
              of: `${label}, can’t be reached`,
            })
          }
        >
          Can’t reach
        </Button>
        {entry !== undefined && (
          <Button size="small" look="plain" onPress={() => dispatch({ do: 'remove', mode, id, of: label })}>
            Remove
          </Button>
        )}
      </div>
      {entry?.earlier && (
        <p className="mt-2 text-small text-ink-2">
          Before: {entry.earlier.text} {unit} with {ohmsInWords(entry.earlier.meterOhms)}.
        </p>
      )}
      {what === 'meter' && <OtherMeter reading={reading} onDone={() => setOpen(undefined)} />}
      {what === 'note' && <Note reading={reading} />}
    </details>
  )
}
