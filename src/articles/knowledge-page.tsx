import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { NoNetwork } from '../api.ts'
import { Empty } from '../ui/empty.tsx'
import { Failed } from '../ui/failed.tsx'
import { Page } from '../ui/page.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { SignInHere } from './for-qualified.tsx'
import { useKnowledge } from './knowledge.ts'
import type { Knowledge, KnowledgeState } from './knowledge.ts'
import { SearchColumn } from './search-column.tsx'
import './articles.css'

/** What stands in place of the content while it is on its way, or when it could not be brought. */
export function NotYet({ state }: { state: Exclude<KnowledgeState, { status: 'success' }> }) {
  if (state.status === 'pending') return <Waiting what="the articles" />
  return (
    <Failed title="Couldn’t fetch the edition." onRetry={state.retry}>
      {state.error instanceof NoNetwork
        ? 'No network, and this device has not kept an edition yet. Once it was open with a network, it opens without one.'
        : state.error?.message}
    </Failed>
  )
}

/** What one article, cause or test shows: its parts, given the knowledge. */
export type Shown = { title: string; content: ReactNode; side: ReactNode }

type KnowledgePageProps = {
  kind: 'article' | 'cause' | 'test'
  id: string
  /** Undefined when the edition has nothing of that name. */
  show: (knowledge: Knowledge) => Shown | undefined
}

/** One article, cause or test between the search and what links to it. */
export function KnowledgePage({ kind, id, show }: KnowledgePageProps) {
  const state = useKnowledge()
  const shown = state.status === 'success' ? show(state.knowledge) : undefined
  return (
    <Page
      title={shown?.title ?? `${kind[0]!.toUpperCase()}${kind.slice(1)}`}
      width="none"
      className="knowledge"
    >
      {state.status !== 'success' ? (
        <div className="knowledge-text">
          <h1 className="sr-only">Loading</h1>
          <NotYet state={state} />
        </div>
      ) : (
        <>
          <div className="knowledge-seek screen-only">
            <SearchColumn knowledge={state.knowledge} current={{ kind, id }} most={8}>
              <p className="text-small">
                <Link className="seek-all" to="/articles">
                  All articles
                </Link>
              </p>
            </SearchColumn>
          </div>
          {shown === undefined ? (
            <div className="knowledge-text">
              <h1 className="mb-4">No {kind} of that name</h1>
              <Empty title={`Edition ${state.knowledge.info.number} has no ${kind} “${id}”.`}>
                It may have another name now. <Link to="/articles">All articles</Link>
                {kind === 'article' && !state.knowledge.qualified && (
                  <div className="mt-3">
                    <p className="mb-3">An article for qualified people opens once you have signed in.</p>
                    <SignInHere />
                  </div>
                )}
              </Empty>
            </div>
          ) : (
            <>
              <article className="knowledge-text">{shown.content}</article>
              {shown.side}
            </>
          )}
        </>
      )}
    </Page>
  )
}
