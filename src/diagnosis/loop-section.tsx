import { useMemo } from 'react'
import { knownContext } from '../../rules/loop/known-context.ts'
import { Button } from '../ui/button.tsx'
import { LateLoop } from '../ui/loop/late-loop.tsx'
import { Rail } from '../ui/rail.tsx'
import { useDesk } from './desk.ts'
import { useSelected } from './expected.ts'
import { readAtPlaces } from './read-at.ts'
import { useSettled } from './use-settled.ts'
import { causeLabel, inSentence } from './words.ts'

/** The loop of the selected cause, with what was read at each place. */
export function LoopSection() {
  const { edition, stored } = useDesk()
  const { cause, chosen, select } = useSelected()
  const { source, system, wiring } = stored.context
  const context = useMemo(() => knownContext({ source, system, wiring }), [source, system, wiring])
  const now = useMemo(() => readAtPlaces(edition, stored), [edition, stored])
  const read = useSettled(now, `${stored.mode} ${cause ?? ''}`)
  return (
    <Rail
      title={cause === undefined ? 'The loop' : `The loop with ${inSentence(causeLabel(edition, cause))}`}
      className="desk-loop"
      id="loop"
      action={
        chosen ? (
          <Button look="plain" size="small" onPress={() => select(undefined)}>
            Back to the leading cause
          </Button>
        ) : (
          cause !== undefined && <span className="text-note text-ink-2">drawn for the leading cause</span>
        )
      }
    >
      {cause === undefined ? (
        <p className="mt-2 text-small text-ink-2">
          Where current goes, and what the breaker sees: drawn for the leading cause once a finding speaks for
          one, or for the cause you choose.
        </p>
      ) : context === undefined ? (
        <p className="mt-2 text-small text-ink-2">
          No loop picture: the circuit model does not know this source and system.
        </p>
      ) : (
        <LateLoop key={cause} context={context} cause={cause} read={read} />
      )}
    </Rail>
  )
}
