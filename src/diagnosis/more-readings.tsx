import { useState } from 'react'
import { useDesk } from './desk.ts'
import { EntryField } from './entry-field.tsx'
import type { Place } from './places.ts'
import { inView } from './sheet-content.ts'

/** The other readings of a place, by kind; shut until one of them was taken or is asked for. */
export function MoreReadings({ place }: { place: Place }) {
  const { typed, chosen } = useDesk()
  const [turned, setTurned] = useState<{ place: string; open: boolean }>()
  const readings = place.groups.flatMap((group) => group.readings)
  if (readings.length === 0) return null
  const here = inView(typed)[typed.mode] ?? {}
  const taken = readings.filter((reading) => here[reading.id] !== undefined).length
  const called = readings.some((reading) => reading.id === chosen?.id)
  const open = called || (turned?.place === place.id ? turned.open : taken > 0 || place.seats === undefined)
  return (
    <details
      className="help more"
      open={open}
      onToggle={(event) => setTurned({ place: place.id, open: event.currentTarget.open })}
    >
      <summary>
        {place.seats === undefined ? 'Readings' : 'More readings'} at the {place.label.toLowerCase()},{' '}
        {readings.length}
        {taken > 0 && `, ${taken} taken`}
      </summary>
      {place.groups.map((group) => (
        <fieldset key={group.id} className="more-group">
          <legend className="text-small font-bold">{group.title}</legend>
          {group.caution !== undefined && <p className="mt-1 text-small text-ink-2">{group.caution}</p>}
          <div className="more-fields">
            {group.readings.map((reading) => (
              <EntryField key={reading.id} reading={reading} />
            ))}
          </div>
        </fieldset>
      ))}
    </details>
  )
}
