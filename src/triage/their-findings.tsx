import { useQuery, useQueryClient } from '@tanstack/react-query'
import { useEffect } from 'react'
import { standing } from '../../rules/findings/standing.ts'
import type { Edition } from '../../rules/edition/open.ts'
import type { SheetEntry } from '../../server/sheets/sheets.contract.ts'
import { followSheet } from '../sheets/follow.api.ts'
import { openShared } from '../sheets/sheets.api.ts'
import { inHomeownerWords } from './homeowner-words.ts'
import type { ShareProps } from './share.tsx'

const when = (moment: string) =>
  new Intl.DateTimeFormat('en-US', { dateStyle: 'medium', timeStyle: 'short' }).format(new Date(moment))

function saidIn(edition: Edition, entry: SheetEntry): string {
  const reading = edition.readings.get(entry.finding)
  const observation = edition.observations.get(entry.finding)
  const { value } = entry
  const label = inHomeownerWords(reading?.label ?? observation?.label ?? entry.finding)
  if (value === null) return `${label}: nothing now`
  if (typeof value === 'string')
    return `${label}: ${inHomeownerWords(observation?.values.find((one) => one.id === value)?.label ?? value)}`
  if (typeof value === 'object' && 'overLimit' in value) return `${label}: over the meter’s limit`
  return `${label}: ${typeof value === 'number' ? value : value.value} ${reading?.unit ?? ''}`
}

type TheirFindingsProps = {
  given: string
  edition: Edition
  /** Id of whoever is signed in here. */
  me: string | undefined
} & Pick<ShareProps, 'onStops'>

/** What the professional has entered on the same sheet, as they enter it. */
export function TheirFindings({ given, edition, me, onStops }: TheirFindingsProps) {
  const client = useQueryClient()
  const shared = useQuery({
    queryKey: ['shared', given] as const,
    queryFn: ({ signal }) => openShared(given, signal),
    staleTime: 0,
  })
  useEffect(() => {
    const news = () => void client.invalidateQueries({ queryKey: ['shared', given] })
    return followSheet(`/shared/${given}`, news, news)
  }, [client, given])
  const stops = shared.data?.result?.stops
  useEffect(() => {
    if (stops !== undefined) onStops(stops)
  }, [stops, onStops])
  const theirs = standing(shared.data?.entries ?? [])
    .flatMap(({ entry, against }) => [entry, ...against])
    .filter(({ by }) => by !== null && by.id !== me)
  return (
    <div role="status" className="mt-4">
      {theirs.length === 0 ? (
        <p className="text-small text-ink-2">What your professional finds shows here.</p>
      ) : (
        <>
          <b>Your professional found</b>
          <ul>
            {theirs.map((entry) => (
              <li key={entry.id} className="border-b border-rule py-2">
                {saidIn(edition, entry)}
                <span className="block text-small text-ink-2">
                  {entry.by?.name}, {when(entry.deviceAt)}
                </span>
              </li>
            ))}
          </ul>
        </>
      )}
    </div>
  )
}
