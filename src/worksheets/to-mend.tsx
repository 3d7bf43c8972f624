import { Rail } from '../ui/rail.tsx'
import type { Form } from './forms/parts.ts'
import { labelsOf } from './read-typed.ts'
import type { Worksheet } from './use-worksheet.ts'

/** In place of an answer: what must be typed first. */
export function ToMend({
  form,
  sheet,
  errors,
}: {
  form: Form
  sheet: Worksheet
  errors: Readonly<Record<string, string>>
}) {
  const labels = labelsOf(form, sheet.values, sheet.units)
  return (
    <div className="ws-result">
      <Rail title="What comes out" id="answer">
        <div className="plate-dashed mt-3" role="status">
          <p className="font-bold">No answer yet: these entries are missing or can’t be.</p>
          <ul className="ws-lines">
            {Object.entries(errors).map(([name, message]) => (
              <li key={name}>
                <b>{labels.get(name) ?? name}.</b> {message}
              </li>
            ))}
          </ul>
        </div>
      </Rail>
    </div>
  )
}
