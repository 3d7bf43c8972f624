import { useState } from 'react'
import type { ReactNode } from 'react'
import { Field, TextField } from '../ui/field.tsx'

type ChoiceProps<Value extends string> = {
  label: string
  value: Value
  of: readonly (readonly [Value, string])[]
  onChoose: (value: Value) => void
  help?: ReactNode
  error?: string | undefined
}

/** One of a list, as the device's own picker. */
export function Choice<Value extends string>({
  label,
  value,
  of,
  onChoose,
  help,
  error,
}: ChoiceProps<Value>) {
  return (
    <Field label={label} help={help} error={error}>
      {(wiring) => (
        <select
          className="input"
          {...wiring}
          value={value}
          onChange={(event) => {
            const chosen = of.find(([one]) => one === event.target.value)
            if (chosen !== undefined) onChoose(chosen[0])
          }}
        >
          {!of.some(([one]) => one === value) && <option value={value}>Not chosen yet</option>}
          {of.map(([one, words]) => (
            <option key={one} value={one}>
              {words}
            </option>
          ))}
        </select>
      )}
    </Field>
  )
}

type NumberFieldProps = {
  label: string
  unit: string
  value: number
  least: number
  most: number
  onValue: (value: number) => void
}

/** A number with its unit. What was typed stays; what can't be is said beside it and not taken. */
export function NumberField({ label, unit, value, least, most, onValue }: NumberFieldProps) {
  const [text, setText] = useState(String(value))
  const read = (typed: string) => (typed.trim() === '' ? NaN : Number(typed.trim().replace(',', '.')))
  const fits = (one: number) => Number.isFinite(one) && one >= least && one <= most
  // Undo and another address change the value from outside.
  const shown = fits(read(text)) && read(text) !== value ? String(value) : text
  return (
    <TextField
      label={`${label}, ${unit}`}
      inputMode="decimal"
      value={shown}
      error={fits(read(shown)) ? undefined : `A number from ${least} to ${most.toLocaleString('en-US')}.`}
      onText={(typed) => {
        setText(typed)
        if (fits(read(typed))) onValue(read(typed))
      }}
    />
  )
}

type NameFieldProps = {
  label: string
  value: string
  most: number
  /** Whether it may be left empty. */
  open?: boolean
  error?: string | undefined
  help?: ReactNode
  onName: (name: string) => void
}

/** A name. One that can't be stays in the field, with why. */
export function NameField({ label, value, most, open = false, error, help, onName }: NameFieldProps) {
  const [typed, setTyped] = useState<string>()
  const text = typed !== undefined && typed.trim() !== value ? typed : (typed ?? value)
  const wrong =
    text.trim() === '' && !open
      ? 'Give it a name.'
      : text.trim().length > most
        ? `Up to ${most} letters.`
        : undefined
  return (
    <TextField
      label={label}
      help={help}
      value={text}
      autoComplete="off"
      error={wrong ?? error}
      onText={(next) => {
        setTyped(next)
        const name = next.trim()
        if ((name !== '' || open) && name.length <= most) onName(name)
      }}
      onBlur={() => {
        if (wrong === undefined) setTyped(undefined)
      }}
    />
  )
}
