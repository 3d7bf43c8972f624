import type { ReactNode } from 'react'
import type { Role } from '../../server/people/roles.contract.ts'
import { Field } from '../ui/field.tsx'
import { roleWords } from './role-words.ts'

type RoleFieldProps<Some extends Role> = {
  value: Some
  roles: readonly Some[]
  onChoose: (role: Some) => void
  help?: ReactNode
}

/** One of the roles. */
export function RoleField<Some extends Role>({ value, roles, onChoose, help }: RoleFieldProps<Some>) {
  return (
    <Field label="Role" help={help}>
      {(wiring) => (
        <select
          className="input"
          {...wiring}
          value={value}
          onChange={(event) => {
            const chosen = roles.find((role) => role === event.target.value)
            if (chosen !== undefined) onChoose(chosen)
          }}
        >
          {roles.map((role) => (
            <option key={role} value={role}>
              {roleWords[role]}
            </option>
          ))}
        </select>
      )}
    </Field>
  )
}
