import { Rail } from '../ui/rail.tsx'
import { OptionList } from '../ui/ways.tsx'
import { useTriage } from './triage-store.tsx'
import { dangersSaid } from './said-stops.ts'

/** Where a question joined several dangers: which one was it? Only that one is recorded. */
export function WhichWasIt() {
  const { triage, change } = useTriage()
  const joined = dangersSaid(triage).filter((danger) => danger.parts.length > 1)
  return joined.map((danger) => (
    <Rail key={danger.id} title="Which was it?">
      <p className="mb-2 mt-1 text-small text-ink-2" id={`which-${danger.id}`}>
        You said yes to: {danger.question}
      </p>
      <OptionList
        labelledBy={`which-${danger.id}`}
        ways={danger.parts.map((part) => ({ value: part.id, label: part.label }))}
        value={triage.which[danger.id]}
        onChoose={(part) =>
          void change((from) => ({ ...from, which: { ...from.which, [danger.id]: part }, madeOff: false }))
        }
      />
    </Rail>
  ))
}
