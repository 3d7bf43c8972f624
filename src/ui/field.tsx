import { useId } from 'react'
import type { ComponentProps, ReactNode } from 'react'
import { Icon } from './icon.tsx'

/** What is wrong with an entry, in rust with a cross, beneath it. */
export function FieldError({ id, children }: { id?: string; children: ReactNode }) {
  return (
    <p className="field-error" id={id}>
      <Icon name="close" />
      <span>{children}</span>
    </p>
  )
}

type Wiring = { id: string; 'aria-invalid': boolean | undefined; 'aria-describedby': string | undefined }
type FieldProps = {
  label: ReactNode
  help?: ReactNode
  /** One sentence; typed text stays. */
  error?: string | undefined
  className?: string
  /** Gets what ties the control to its label, help and error. */
  children: (wiring: Wiring) => ReactNode
}

/** Label above, help below, error below that. */
export function Field({ label, help, error, className = '', children }: FieldProps) {
  const id = useId()
  const described = [help !== undefined && `${id}-help`, error !== undefined && `${id}-error`].filter(Boolean)
  return (
    <div className={className}>
      <label className="field-label" htmlFor={id}>
        {label}
      </label>
      {children({
        id,
        'aria-invalid': error !== undefined || undefined,
        'aria-describedby': described.length > 0 ? described.join(' ') : undefined,
      })}
      {help !== undefined && (
        <p className="field-help" id={`${id}-help`}>
          {help}
        </p>
      )}
      {error !== undefined && <FieldError id={`${id}-error`}>{error}</FieldError>}
    </div>
  )
}

type TextFieldProps = Omit<FieldProps, 'children'> & {
  value: string
  onText: (text: string) => void
} & Pick<
    ComponentProps<'input'>,
    'type' | 'inputMode' | 'autoComplete' | 'placeholder' | 'onBlur' | 'onKeyDown' | 'ref'
  >

/** One line of text. */
export function TextField({ label, help, error, className, value, onText, ...input }: TextFieldProps) {
  return (
    <Field label={label} help={help} error={error} {...(className === undefined ? {} : { className })}>
      {(wiring) => (
        <input
          className="input"
          {...input}
          {...wiring}
          value={value}
          onChange={(event) => onText(event.target.value)}
        />
      )}
    </Field>
  )
}
