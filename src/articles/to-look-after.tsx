import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import type { DraftList } from '../../server/articles/drafts.contract.ts'
import { LinkButton } from '../ui/button.tsx'
import { Failed } from '../ui/failed.tsx'
import { Rail } from '../ui/rail.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { dayInWords } from './day.ts'
import { draftListQuery } from './drafts.api.ts'
import { useWriter } from './edit-link.tsx'
import { refusalOf } from './refusal.ts'

type Row = DraftList['articles'][number]

/** What is to be done about an article, in words; undefined for one that stands as it is. */
function stateOf(row: Row, today: string): string | undefined {
  const due = row.dueForReview !== null && row.dueForReview <= today && row.withdrawn === null
  const said = [
    row.pending && `draft by ${row.edited?.by ?? 'somebody'}${row.inForce ? '' : ', not in force yet'}`,
    due && `due for review since ${dayInWords(row.dueForReview!)}`,
    row.withdrawn !== null && `withdrawn on ${dayInWords(row.withdrawn)}`,
  ].filter((one) => one !== false)
  return said.length === 0 ? undefined : said.join('; ')
}

function Rows({ rows }: { rows: readonly Row[] }) {
  const today = new Date().toISOString().slice(0, 10)
  const shown = rows.flatMap((row) => {
    const state = stateOf(row, today)
    return state === undefined ? [] : [{ row, state }]
  })
  if (shown.length === 0) return <p className="mt-3 text-small">No drafts, and none due for review.</p>
  return (
    <ul className="rows">
      {shown.map(({ row, state }) => (
        <li key={row.slug}>
          <Link className="link-alone" to={`/articles/${row.slug}/edit`}>
            {row.title === '' ? row.slug : row.title}
          </Link>
          <span className="block text-small">{state}</span>
        </li>
      ))}
    </ul>
  )
}

function List() {
  const drafts = useQuery(draftListQuery)
  return (
    <Rail
      title="To look after"
      className="screen-only"
      action={
        <LinkButton to="/articles/new" size="small">
          New article
        </LinkButton>
      }
    >
      {drafts.isPending ? (
        <Waiting what="the drafts" />
      ) : drafts.isError ? (
        <Failed title="Couldn’t fetch the drafts." onRetry={() => void drafts.refetch()}>
          {refusalOf(drafts.error).title}
        </Failed>
      ) : (
        <Rows rows={drafts.data.articles} />
      )}
    </Rail>
  )
}

/** Drafts, articles due for review and withdrawn ones: for who writes articles. */
export function ToLookAfter() {
  return useWriter() === true ? <List /> : null
}
