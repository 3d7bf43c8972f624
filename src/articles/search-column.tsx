import { useRef } from 'react'
import type { KeyboardEvent, ReactNode } from 'react'
import { Link, useNavigate } from 'react-router-dom'
import { search } from '../../rules/search/search.ts'
import { Empty } from '../ui/empty.tsx'
import { SearchBox } from '../ui/search-box.tsx'
import { addressOf, HitRow } from './hit-row.tsx'
import type { Knowledge } from './knowledge.ts'
import { indexOf, useFound, useQuery } from './use-search.ts'

type SearchColumnProps = {
  knowledge: Knowledge
  /** Kind and id of what is open beside it. */
  current?: { kind: 'article' | 'cause' | 'test'; id: string }
  /** How many to show at most; a link leads to all of them. */
  most?: number
  /** Shown while nothing is typed. */
  children?: ReactNode
}

/** On a phone the list beside an article ends here. */
const fewest = 3

/** Search as you type, on this device. Enter opens the first, the arrow keys move through the list. */
export function SearchColumn({ knowledge, current, most, children }: SearchColumnProps) {
  const [text, setText] = useQuery()
  const query = text.trim()
  const found = useFound(knowledge, query)
  const navigate = useNavigate()
  const column = useRef<HTMLDivElement>(null)

  const openFirst = () => {
    // The list may lag behind the last key; Enter means what was typed.
    const [first] = search(indexOf(knowledge), query, 1).hits
    if (first !== undefined) void navigate(addressOf(first.kind, first.id, query))
  }
  const move = (event: KeyboardEvent) => {
    if (event.key !== 'ArrowDown' && event.key !== 'ArrowUp') return
    const stops = [...(column.current?.querySelectorAll<HTMLElement>('input, a.hit') ?? [])]
    const next = stops[stops.indexOf(event.target as HTMLElement) + (event.key === 'ArrowDown' ? 1 : -1)]
    if (next === undefined || !stops.includes(event.target as HTMLElement)) return
    event.preventDefault()
    next.focus()
  }

  return (
    <div ref={column} className="seek-column" onKeyDown={move}>
      <SearchBox
        label="Search articles, causes and tests"
        placeholder="breaker trips at once, 60 V to ground …"
        value={text}
        onText={setText}
        onSubmit={openFirst}
      />
      <p className="seek-count" role="status">
        {query !== '' && (
          <>
            {found.total} found.{' '}
            {found.readAs !== undefined && (
              <>
                Read as <b>{found.readAs}</b>
              </>
            )}
          </>
        )}
      </p>
      {query === '' ? (
        children
      ) : found.total === 0 ? (
        <Empty title={`Nothing found for “${query}”.`}>
          Fewer words find more. Or look through <Link to="/articles">all articles</Link>.
        </Empty>
      ) : (
        <>
          <ul>
            {found.hits.slice(0, most).map((hit, index) => (
              <li key={`${hit.kind} ${hit.id}`}>
                <HitRow
                  hit={hit}
                  query={query}
                  first={index === 0}
                  current={current?.kind === hit.kind && current.id === hit.id}
                />
              </li>
            ))}
          </ul>
          {most !== undefined && found.total > fewest && (
            <p className="text-small">
              <Link className="seek-all" to={`/articles?q=${encodeURIComponent(query)}`}>
                All {found.total} found
              </Link>
            </p>
          )}
          <p className="seek-note">
            Searched on this device: no network needed. <span className="seek-keys">↵ opens, ↑ ↓ moves.</span>
          </p>
        </>
      )}
    </div>
  )
}
