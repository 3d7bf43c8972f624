import { useDesk } from './desk.ts'
import { readingsAt } from './places.ts'
import { inView, isTaken } from './sheet-content.ts'

/** The run of wire from the source on: one place chosen, with how many readings lie at each. */
export function PlaceRun() {
  const { typed, places, place, lookAt } = useDesk()
  const here = inView(typed)[typed.mode] ?? {}
  return (
    <div className="run" role="group" aria-label="Place">
      {places.map((one) => {
        const count = readingsAt(one).filter((reading) => {
          const entry = here[reading.id]
          return entry !== undefined && isTaken(entry)
        }).length
        return (
          <button
            key={one.id}
            type="button"
            aria-pressed={one.id === place?.id}
            className="run-place"
            onClick={() => lookAt(one.id)}
          >
            <span className="run-node" aria-hidden="true">
              {count > 0 ? count : ''}
            </span>
            <span>{one.label}</span>
            <span className="sr-only">
              , {count === 0 ? 'no readings' : count === 1 ? '1 reading' : `${count} readings`}
            </span>
          </button>
        )
      })}
    </div>
  )
}
