import { Button } from '../ui/button.tsx'
import { Field } from '../ui/field.tsx'

type ChooseSomeProps = {
  label: string
  /** What one of them is called: "cause". */
  one: string
  all: readonly { id: string; title: string }[]
  chosen: readonly string[]
  error?: string | undefined
  onChoose: (ids: string[]) => void
}

/** Several of a list, each with a way to take it out again. */
export function ChooseSome({ label, one, all, chosen, error, onChoose }: ChooseSomeProps) {
  const titleOf = (id: string) => all.find((some) => some.id === id)?.title ?? id
  return (
    <div>
      <Field label={label} error={error}>
        {(wiring) => (
          <select
            className="input"
            {...wiring}
            value=""
            onChange={(event) => onChoose([...chosen, event.target.value])}
          >
            <option value="">Add a {one} …</option>
            {all
              .filter((some) => !chosen.includes(some.id))
              .map((some) => (
                <option key={some.id} value={some.id}>
                  {some.title}
                </option>
              ))}
          </select>
        )}
      </Field>
      {chosen.length > 0 && (
        <ul className="rows">
          {chosen.map((id) => (
            <li key={id} className="flex items-center justify-between gap-3 text-small">
              <span>{titleOf(id)}</span>
              <Button
                size="small"
                look="plain"
                label={`Take out ${one} ${titleOf(id)}`}
                onPress={() => onChoose(chosen.filter((other) => other !== id))}
              >
                Take out
              </Button>
            </li>
          ))}
        </ul>
      )}
    </div>
  )
}
