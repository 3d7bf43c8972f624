import type { Form } from './forms/parts.ts'
import { fieldsNow } from './forms/parts.ts'
import type { Worksheet } from './use-worksheet.ts'

/** What was put in, as a list, in place of the form: on paper alone. */
export function InputsInPrint({ form, sheet }: { form: Form; sheet: Worksheet }) {
  return (
    <section className="ws-paper" aria-label="Inputs">
      {form.groups(sheet.values, sheet.units).map((group) => (
        <div key={group.title}>
          <h2>{group.title}</h2>
          <dl>
            {fieldsNow([group], sheet.values)
              .filter((field) => field.hidden !== true)
              .map((field) => {
                const value = sheet.values[field.name] ?? ''
                const row = /^\w+\.(\d+)\./.exec(field.name)?.[1]
                return (
                  <div key={field.name}>
                    <dt>
                      {row !== undefined && `${Number(row) + 1}. `}
                      {field.label}
                    </dt>
                    <dd>
                      {field.kind === 'number'
                        ? `${value} ${field.unit}`
                        : (field.ways.find((way) => way.value === value)?.label ?? value)}
                    </dd>
                  </div>
                )
              })}
          </dl>
        </div>
      ))}
    </section>
  )
}
