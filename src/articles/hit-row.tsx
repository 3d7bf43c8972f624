import { Link } from 'react-router-dom'
import type { Hit } from '../../rules/search/search.ts'
import type { Piece } from '../../rules/search/marks.ts'
import { GroundGlyph } from '../ui/where-ground-sits/ground-glyph.tsx'
import { typicalOf } from './cause-glyph.ts'

const pages = { article: 'articles', cause: 'causes', test: 'tests' } as const
const kinds = { article: 'Article', cause: 'Cause', test: 'Test' } as const

/** Address of an article, a cause or a test; the query goes along, so that its list stays beside what was opened. */
export const addressOf = (kind: Hit['kind'], id: string, query = ''): string =>
  `/${pages[kind]}/${id}${query === '' ? '' : `?q=${encodeURIComponent(query)}`}`

/** A text with what was searched for marked. */
function Marked({ pieces }: { pieces: readonly Piece[] }) {
  return pieces.map((piece, index) =>
    piece.marked ? <mark key={index}>{piece.text}</mark> : <span key={index}>{piece.text}</span>,
  )
}

type HitRowProps = {
  hit: Hit
  query: string
  /** The one that is open beside the list. */
  current: boolean
  /** The one that Enter opens. */
  first: boolean
}

/** One thing found: how it reads, its name, where it was found, and for whom it is. */
export function HitRow({ hit, query, current, first }: HitRowProps) {
  const readings = hit.kind === 'test' ? undefined : typicalOf(hit.id)
  return (
    <Link
      to={addressOf(hit.kind, hit.id, query)}
      className={`hit ${first ? 'hit-first' : ''}`}
      aria-current={current ? 'page' : undefined}
    >
      <span className="hit-glyph">{readings !== undefined && <GroundGlyph readings={readings} />}</span>
      <span>
        <b>
          <Marked pieces={hit.title} />
        </b>
        <small>
          <Marked pieces={hit.snippet} />
        </small>
        <small className="hit-kind">
          {kinds[hit.kind]}
          {hit.audience === 'qualified' && ', qualified people'}
        </small>
      </span>
    </Link>
  )
}
