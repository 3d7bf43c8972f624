import { useQuery } from '@tanstack/react-query'
import { NoNetwork } from '../api.ts'
import { Empty } from '../ui/empty.tsx'
import { Failed } from '../ui/failed.tsx'
import { OfflineBar } from '../ui/offline-bar.tsx'
import { Rail } from '../ui/rail.tsx'
import { Stamp } from '../ui/stamp.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { editionsQuery } from './editions-query.ts'
import { dayOf } from './moment.ts'

function List() {
  const { data, error, refetch } = useQuery(editionsQuery)
  if (data === undefined) {
    if (error instanceof NoNetwork)
      return <OfflineBar>No network. The list of former editions lies on the server.</OfflineBar>
    if (error !== null)
      return (
        <Failed title="Couldn’t fetch the former editions." onRetry={() => void refetch()}>
          {error.message}
        </Failed>
      )
    return <Waiting what="the former editions" />
  }
  const former = data.editions.filter((one) => !one.inForce)
  if (former.length === 0)
    return <Empty title="No former editions.">The one in force is the first, or the only one made.</Empty>
  return (
    <ul className="former">
      {former.map((one) => (
        <li key={one.hash}>
          <Stamp
            hash={one.hash}
            number={one.number}
            state="withdrawn"
            line={
              one.since === null
                ? 'never in force'
                : `from ${dayOf(one.since)}${one.until === null ? '' : ` to ${dayOf(one.until)}`}`
            }
          />
          <p className="mt-1 text-small text-ink-2">{one.note}</p>
        </li>
      ))}
    </ul>
  )
}

/** Editions that are no longer in force. Whatever was diagnosed with one of them still names it. */
export function FormerEditions() {
  return (
    <Rail title="Former editions">
      <div className="mt-3">
        <List />
      </div>
    </Rail>
  )
}
