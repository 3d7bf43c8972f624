import { Button } from '../ui/button.tsx'
import { Tick } from '../ui/tick.tsx'
import { offIsNotProved } from './first-words.ts'
import { useTriage } from './triage-store.tsx'
import { leave } from './said-stops.ts'
import type { Here } from './said-stops.ts'

/** "It's off now", or that everyone is out. What follows implies nothing more. */
export function MadeOff({ stops }: { stops: readonly Here[] }) {
  const { triage, change } = useTriage()
  const out = leave(stops)
  const said = triage.madeOff === true
  return (
    <div role="status">
      {said ? (
        <p className="flex min-h-glove items-center gap-3 border-y border-rule font-bold">
          <Tick state="yes" />
          <span className="mr-auto">{out ? 'You said: everyone is out.' : 'You said: it’s off.'}</span>
          <Button
            look="plain"
            size="small"
            onPress={() => void change((from) => ({ ...from, madeOff: false }))}
          >
            Take back
          </Button>
        </p>
      ) : (
        <Button
          look="main"
          size="glove"
          wide
          iconAfter="next"
          onPress={() => void change((from) => ({ ...from, madeOff: true }))}
        >
          {out ? 'Everyone is out now' : 'It’s off now'}
        </Button>
      )}
      <p className="mt-2 text-note text-ink-2">
        <b>{out ? offIsNotProved.out : offIsNotProved.off}</b>
      </p>
    </div>
  )
}
