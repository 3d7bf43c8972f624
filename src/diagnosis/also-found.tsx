import { Button } from '../ui/button.tsx'
import { Rail } from '../ui/rail.tsx'
import { AskObservation } from './ask-observation.tsx'
import { useDesk } from './desk.ts'
import { FindFinding } from './find-finding.tsx'
import { inView } from './sheet-content.ts'
import { modeLabel } from './words.ts'

type AlsoFoundProps = { finding: boolean; onFinding: (finding: boolean) => void }

/** What was seen, heard and told: one row a finding, in every mode, with who says so. */
export function AlsoFound({ finding, onFinding }: AlsoFoundProps) {
  const desk = useDesk()
  const { edition, typed, asking, ask } = desk
  const rows = Object.entries(inView(typed)).flatMap(([mode, here]) =>
    Object.entries(here).flatMap(([id, entry]) => {
      const observation = edition.observations.get(id)
      if (entry.kind !== 'observation' || observation === undefined) return []
      const value = observation.values.find((one) => one.id === entry.value)?.label ?? entry.value
      const mine = mode === typed.mode
      return [{ key: `${mode} ${id}`, id, mode, mine, label: observation.label, value, by: entry.by }]
    }),
  )
  const asked = asking.flatMap((id) => edition.observations.get(id) ?? [])
  return (
    <Rail
      title="Also found"
      className="also-found"
      action={
        <Button
          size="small"
          icon="plus"
          expanded={finding}
          onPress={() => {
            ask([])
            onFinding(!finding)
          }}
        >
          Add
        </Button>
      }
    >
      {finding && <FindFinding onChosen={() => onFinding(false)} />}
      {asked.length > 0 && (
        <div className="asked">
          {asked.map((observation, index) => (
            <AskObservation key={observation.id} observation={observation} first={index === 0} />
          ))}
          <div className="mt-3 flex justify-end">
            <Button size="small" onPress={() => ask([])}>
              Done
            </Button>
          </div>
        </div>
      )}
      {rows.length === 0 && asked.length === 0 && !finding && (
        <p className="mt-2 text-small text-ink-2">
          Nothing yet: lights, GFCI, breaker, tester lamps, what the owner says.
        </p>
      )}
      {rows.length > 0 && (
        <table className="found-rows">
          <caption className="sr-only">Also found</caption>
          <thead className="sr-only">
            <tr>
              <th scope="col">Finding</th>
              <th scope="col">Answer</th>
              <th scope="col">Who says</th>
            </tr>
          </thead>
          <tbody>
            {rows.map((row) => (
              <tr key={row.key}>
                <td>{row.label}</td>
                <td>
                  <button
                    type="button"
                    className="link-alone font-bold"
                    aria-label={`${row.label}: ${row.value}. Change`}
                    onClick={() => desk.go([row.id], row.mode)}
                  >
                    {row.value}
                  </button>
                </td>
                <td className="text-ink-3">
                  {row.by === 'owner' ? 'owner says' : 'seen here'}
                  {!row.mine && `, ${modeLabel(edition, row.mode).toLowerCase()}`}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </Rail>
  )
}
