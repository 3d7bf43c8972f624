import type { ReactNode } from 'react'
import { Failed } from '../ui/failed.tsx'
import { TextField } from '../ui/field.tsx'
import type { Refusal } from './use-sending.ts'
import './people.css'

type FormProps = {
  label: string
  refusal: Refusal | undefined
  onSubmit: () => void
  children: ReactNode
}

/** A form whose refusal stands above its fields and is said aloud. */
export function Form({ label, refusal, onSubmit, children }: FormProps) {
  return (
    <form
      className="people-form"
      aria-label={label}
      noValidate
      onSubmit={(event) => {
        event.preventDefault()
        onSubmit()
      }}
    >
      {refusal !== undefined && <Failed title={refusal.title} />}
      {children}
    </form>
  )
}

type OneProps = { value: string; onText: (text: string) => void; error?: string | undefined }

/** An e-mail address. */
export function EmailField({
  autoComplete = 'username',
  ...field
}: OneProps & { autoComplete?: 'username' | 'off' }) {
  return (
    <TextField label="E-mail address" type="email" inputMode="email" autoComplete={autoComplete} {...field} />
  )
}

/** A name as others are to read it. */
export function NameField({ autoComplete = 'name', ...field }: OneProps & { autoComplete?: 'name' | 'off' }) {
  return <TextField label="Name" type="text" autoComplete={autoComplete} {...field} />
}

/** A password that exists already. */
export function PasswordField({ label = 'Password', ...field }: OneProps & { label?: string }) {
  return <TextField label={label} type="password" autoComplete="current-password" {...field} />
}

/** A password to be. */
export function NewPasswordField({ label = 'Password', ...field }: OneProps & { label?: string }) {
  return (
    <TextField
      label={label}
      type="password"
      autoComplete="new-password"
      help="10 characters or more. A few words that nobody would guess are best."
      {...field}
    />
  )
}
