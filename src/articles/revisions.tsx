import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import type { RevisionList } from '../../server/articles/drafts.contract.ts'
import { Button } from '../ui/button.tsx'
import { Empty } from '../ui/empty.tsx'
import { Failed } from '../ui/failed.tsx'
import { Rail } from '../ui/rail.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { momentInWords } from './day.ts'
import { Difference } from './difference.tsx'
import { textOf, wholeOf } from './draft-form.ts'
import { revisionQuery, revisionsQuery } from './drafts.api.ts'
import type { DraftDesk } from './use-draft.ts'

function Opened({ slug, number, desk }: { slug: string; number: number; desk: DraftDesk }) {
  const revision = useQuery(revisionQuery(slug, number))
  if (revision.isPending) return <Waiting what="the revision" />
  if (revision.isError)
    return <Failed title="Couldn’t fetch the revision." onRetry={() => void revision.refetch()} />
  const { number: _, ...text } = revision.data
  return (
    <div className="mt-3">
      <Difference
        former={wholeOf(text)}
        now={wholeOf(textOf(desk.form))}
        label={`Difference from revision ${number} to the draft`}
      />
      <div className="mt-3">
        <Button size="small" icon="undo" onPress={() => void desk.replaceWith(text, { restores: number })}>
          Bring revision {number} back
        </Button>
      </div>
    </div>
  )
}

function Row({ slug, row, desk }: { slug: string; row: RevisionList['revisions'][number]; desk: DraftDesk }) {
  const [open, setOpen] = useState(false)
  return (
    <li>
      <div className="flex flex-wrap items-center justify-between gap-3">
        <p className="text-small">
          <b>Revision {row.number}</b>, {row.author ?? 'came with the program'}, {momentInWords(row.at)}
          {row.edition !== null && <>, in force with edition {row.edition}</>}
          {row.reason !== '' && <span className="block">{row.reason}</span>}
        </p>
        <Button
          size="small"
          expanded={open}
          label={`${open ? 'Hide' : 'Show'} the difference from revision ${row.number}`}
          onPress={() => setOpen(!open)}
        >
          {open ? 'Hide' : 'Show the difference'}
        </Button>
      </div>
      {open && <Opened slug={slug} number={row.number} desk={desk} />}
    </li>
  )
}

/** What the article said before, who wrote it and why; each can be compared and brought back. */
export function Revisions({ slug, desk }: { slug: string; desk: DraftDesk }) {
  const revisions = useQuery(revisionsQuery(slug))
  return (
    <Rail title="Revisions" className="mt-7">
      {revisions.isPending ? (
        <Waiting what="the revisions" />
      ) : revisions.isError ? (
        <Failed title="Couldn’t fetch the revisions." onRetry={() => void revisions.refetch()} />
      ) : revisions.data.revisions.length === 0 ? (
        <div className="mt-3">
          <Empty title="No revisions yet.">
            Each sitting of one writer is one, and so is each text put in force.
          </Empty>
        </div>
      ) : (
        <ul className="rows">
          {revisions.data.revisions.map((row) => (
            <Row key={row.number} slug={slug} row={row} desk={desk} />
          ))}
        </ul>
      )}
    </Rail>
  )
}
