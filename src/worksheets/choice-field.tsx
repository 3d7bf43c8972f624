import { useId } from 'react'
import { Field, FieldError } from '../ui/field.tsx'
import { OptionList, Ways } from '../ui/ways.tsx'
import type { ChoicePart } from './forms/parts.ts'

type ChoiceFieldProps = {
  part: ChoicePart
  value: string | undefined
  error: string | undefined
  onChoose: (value: string) => void
}

/** One of many, in the browser's own list. What an address says and the list does not know stands in it too. */
function Select({ part, value, error, onChoose }: ChoiceFieldProps) {
  const known = part.ways.some((way) => way.value === value)
  return (
    <Field label={part.label} {...(part.help !== undefined && { help: part.help })} error={error}>
      {(wiring) => (
        <select
          className="input"
          {...wiring}
          value={value ?? ''}
          onChange={(event) => onChoose(event.target.value)}
        >
          {!known && <option value={value ?? ''}>{value === undefined ? 'Choose' : `${value}?`}</option>}
          {part.ways.map((way) => (
            <option key={way.value} value={way.value}>
              {way.label}
            </option>
          ))}
        </select>
      )}
    </Field>
  )
}

/** A choice among a few or many. */
export function ChoiceField(props: ChoiceFieldProps) {
  const { part, value, error, onChoose } = props
  const id = useId()
  if (part.look === 'select') return <Select {...props} />
  const Group = part.look === 'ways' ? Ways : OptionList
  return (
    <div>
      <p className="field-label" id={id}>
        {part.label}
      </p>
      <Group
        labelledBy={id}
        {...(error !== undefined && { describedBy: `${id}-error` })}
        ways={part.ways}
        value={part.ways.find((way) => way.value === value)?.value}
        onChoose={onChoose}
      />
      {part.help !== undefined && <p className="field-help">{part.help}</p>}
      {error !== undefined && <FieldError id={`${id}-error`}>{error}</FieldError>}
    </div>
  )
}
