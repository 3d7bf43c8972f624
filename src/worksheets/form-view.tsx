import { useState } from 'react'
import type { Flat } from '../../rules/worksheets/address.ts'
import { Rail } from '../ui/rail.tsx'
import { ChoiceField } from './choice-field.tsx'
import type { FieldPart, Form } from './forms/parts.ts'
import { NumberField } from './number-field.tsx'
import { Rows } from './rows.tsx'
import type { Worksheet } from './use-worksheet.ts'

/** The fields of a worksheet. An error shows once its field was left, or at once where the inputs came with the address. */
export function FormView({ form, sheet }: { form: Form; sheet: Worksheet }) {
  const [left, setLeft] = useState<ReadonlySet<string>>(new Set())
  const errors = 'errors' in sheet.answer ? sheet.answer.errors : {}
  const { values, change } = sheet
  const leave = (name: string) => setLeft((before) => new Set(before).add(name))

  const field = (part: FieldPart) => {
    if (part.kind === 'pair')
      return part.parts.every((one) => one.hidden === true) ? null : (
        <div className="ws-pair" key={part.parts[0].name}>
          {part.parts.map(field)}
        </div>
      )
    const { name } = part
    if (part.hidden === true) return null
    const error = left.has(name) || sheet.from === 'address' ? errors[name] : undefined
    if (part.kind === 'number')
      return (
        <NumberField
          key={name}
          part={part}
          value={values[name] ?? ''}
          error={error}
          onText={(text) => change({ [name]: text })}
          onLeave={() => leave(name)}
        />
      )
    const choose = (value: string) => {
      leave(name)
      // What a choice brings is an example of its own kind; what was typed for that kind before stays.
      const brought: Flat = value === values[name] ? {} : (part.brings?.[value] ?? {})
      change({ ...brought, [name]: value })
    }
    return <ChoiceField key={name} part={part} value={values[name]} error={errors[name]} onChoose={choose} />
  }

  return (
    <form className="ws-form screen-only" aria-label="Inputs" onSubmit={(event) => event.preventDefault()}>
      {form.groups(values, sheet.units).map(({ title, help, parts }) => (
        <Rail key={title} title={title}>
          {help !== undefined && <p className="field-help">{help}</p>}
          <div className="ws-fields">
            {parts.map((part) =>
              part.kind === 'rows' ? (
                <Rows key={part.name} part={part} values={values} onReplace={sheet.replace}>
                  {(at) => part.row(at).map(field)}
                </Rows>
              ) : (
                field(part)
              ),
            )}
          </div>
        </Rail>
      ))}
    </form>
  )
}
