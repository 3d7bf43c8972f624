import type { Ref } from 'react'
import type { ReactNode } from 'react'
import { Field } from '../ui/field.tsx'

type TextAreaProps = {
  label: ReactNode
  help?: ReactNode
  error?: string | undefined
  rows: number
  /** Characters at most. */
  most?: number
  value: string
  onText: (text: string) => void
  ref?: Ref<HTMLTextAreaElement>
}

/** Several lines of text. */
export function TextArea({ label, help, error, rows, most, value, onText, ref }: TextAreaProps) {
  return (
    <Field label={label} help={help} error={error}>
      {(wiring) => (
        <textarea
          className="input"
          {...wiring}
          {...(ref === undefined ? {} : { ref })}
          rows={rows}
          maxLength={most}
          value={value}
          onChange={(event) => onText(event.target.value)}
        />
      )}
    </Field>
  )
}
