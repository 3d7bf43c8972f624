import type { PointerEvent } from 'react'
import { Icon } from './icon.tsx'
import type { PadKey } from './pad-text.ts'

type KeypadProps = {
  /** Which field it types into, for readers: "hot–neutral". */
  label: string
  onKey: (key: PadKey) => void
  /** Adds the key that asks for two numbers. */
  unsteady?: { on: boolean; onPress: () => void }
  /** Adds the key that leaves this one out and goes on. */
  onCantReach?: () => void
  /** The black key: "Next side", or "Done" on the last. Never barred. */
  doneWord: string
  onDone: () => void
  /** Side of the action column. */
  side?: 'right' | 'left'
  /** Adds a line to put the action column on the other side. */
  onSide?: (side: 'right' | 'left') => void
}

const rows = [
  ['7', '8', '9'],
  ['4', '5', '6'],
  ['1', '2', '3'],
] as const

/** Our own number pad: 64 px keys for gloves, in place of the system's. Focus stays in the field it types into. */
export function Keypad(props: KeypadProps) {
  const { side = 'right', unsteady, onCantReach, onSide } = props
  const keepFocus = (event: PointerEvent) => event.preventDefault()
  const digit = (key: PadKey) => (
    <button key={key} type="button" className="pad-key" onClick={() => props.onKey(key)}>
      {key}
    </button>
  )
  const actions = [
    <button
      key="clear"
      type="button"
      className="pad-key pad-word pad-action"
      onClick={() => props.onKey('clear')}
    >
      Clear
    </button>,
    unsteady ? (
      <button
        key="unsteady"
        type="button"
        className="pad-key pad-word pad-action"
        aria-pressed={unsteady.on}
        onClick={unsteady.onPress}
      >
        Unsteady
      </button>
    ) : (
      <span key="gap-1" className="pad-action" />
    ),
    onCantReach ? (
      <button key="reach" type="button" className="pad-key pad-word pad-action" onClick={onCantReach}>
        Can’t reach
      </button>
    ) : (
      <span key="gap-2" className="pad-action" />
    ),
    <button key="done" type="button" className="pad-key pad-done pad-action" onClick={props.onDone}>
      {props.doneWord}
    </button>,
  ]
  const last = [
    digit('0'),
    digit('.'),
    <button key="erase" type="button" className="pad-key pad-word" onClick={() => props.onKey('erase')}>
      <Icon name="erase" />
      Erase
    </button>,
  ]
  return (
    <div
      className="pad"
      role="group"
      aria-label={`Number pad for ${props.label}`}
      onPointerDown={keepFocus}
      onMouseDown={(e) => e.preventDefault()}
    >
      <div className={`pad-keys ${side === 'left' ? 'pad-left' : ''}`}>
        {[...rows.map((row) => row.map(digit)), last].flatMap((keys, row) =>
          side === 'left' ? [actions[row], ...keys] : [...keys, actions[row]],
        )}
      </div>
      {onSide && (
        <button
          type="button"
          className="mx-auto mt-1 flex min-h-floor items-center px-3 text-note font-semibold text-glow underline"
          onClick={() => onSide(side === 'right' ? 'left' : 'right')}
        >
          {side === 'right' ? 'Put Done and Clear at the left' : 'Put Done and Clear at the right'}
        </button>
      )}
    </div>
  )
}
