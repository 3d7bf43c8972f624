import { useEffect, useId, useRef } from 'react'
import type { Observation } from '../../rules/edition/schema.ts'
import { OptionList, Ways } from '../ui/ways.tsx'
import { TesterLamp } from '../ui/tester-lamp.tsx'
import type { LampState } from '../ui/tester-lamp.tsx'
import { useDesk } from './desk.ts'
import { entryOf } from './sheet-content.ts'
import type { ObservationEntry } from './sheet-content.ts'

const lamps: Readonly<Record<string, LampState>> = { lit: 'lit', bright: 'lit', dim: 'dim', dark: 'dark' }
const saidBy = [
  { value: 'tech', label: 'Seen here' },
  { value: 'owner', label: 'Owner says' },
] as const

/** One observation: its values, and who says so. The first of those asked takes the cursor. */
export function AskObservation({ observation, first }: { observation: Observation; first: boolean }) {
  const { typed, dispatch } = useDesk()
  const heading = useId()
  const group = useRef<HTMLDivElement>(null)
  const { id, label, help, values } = observation
  const { mode } = typed
  const entry = entryOf(typed, mode, id)
  const taken: ObservationEntry | undefined = entry?.kind === 'observation' ? entry : undefined
  const isLamp = values.every((value) => lamps[value.id] !== undefined)
  useEffect(() => {
    if (!first) return
    const radio = group.current?.querySelector<HTMLElement>('[role=radio][tabindex="0"]')
    radio?.focus()
    radio?.scrollIntoView({ block: 'nearest' })
  }, [first, id])
  const answer = (value: string) => {
    if (taken?.value === value) dispatch({ do: 'remove', mode, id, of: label })
    else dispatch({ do: 'observe', mode, id, value, by: taken?.by ?? 'tech', of: label })
  }
  const answers = {
    labelledBy: heading,
    ways: values.map((value) => {
      const lamp = isLamp ? lamps[value.id] : undefined
      return { value: value.id, label: value.label, ...(lamp ? { mark: <TesterLamp state={lamp} /> } : {}) }
    }),
    value: taken?.value,
    onChoose: answer,
  }
  return (
    <div ref={group} className="mt-3">
      <p id={heading} className="font-bold">
        {label}
      </p>
      {help !== '' && <p className="text-small text-ink-2">{help}</p>}
      {isLamp || values.length <= 3 ? (
        <Ways {...answers} size={isLamp ? 'lamps' : 'touch'} className="mt-2" />
      ) : (
        <OptionList {...answers} />
      )}
      {taken && (
        <Ways
          label={`Who says so: ${label}`}
          ways={saidBy}
          value={taken.by}
          onChoose={(by) => dispatch({ do: 'observe', mode, id, value: taken.value, by, of: label })}
          className="mt-2"
        />
      )}
    </div>
  )
}
