import { Button } from '../ui/button.tsx'
import { Rail } from '../ui/rail.tsx'
import { ContextFields, TitleField } from './context-fields.tsx'
import { useDesk } from './desk.ts'

/** Title, source, system, wiring and meter of the open sheet, changed in place; Undo takes it back. */
export function ChangeContext({ onClose }: { onClose: () => void }) {
  const { edition, typed, dispatch, errors } = useDesk()
  const meterError = errors['context.meterOhms']
  return (
    <Rail title="What feeds it, and your meter" className="mt-4">
      <div className="mt-3 grid max-w-[720px] gap-5">
        <TitleField value={typed.title} onText={(title) => dispatch({ do: 'title', title })} />
        <ContextFields
          edition={edition}
          draft={typed.context}
          errors={meterError === undefined ? {} : { meter: 'Type ohms above 0, for example 3000.' }}
          onChange={(draft) =>
            dispatch({ do: 'context', ...draft, modes: edition.sources.get(draft.source)?.modes ?? [] })
          }
        />
        <div>
          <Button onPress={onClose}>Done</Button>
        </div>
      </div>
    </Rail>
  )
}
