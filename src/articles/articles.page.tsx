import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import type { Cause } from '../../rules/edition/schema.ts'
import { Empty } from '../ui/empty.tsx'
import { HazardMark } from '../ui/hazard-mark.tsx'
import { Page } from '../ui/page.tsx'
import { Rail } from '../ui/rail.tsx'
import { GroundGlyph } from '../ui/where-ground-sits/ground-glyph.tsx'
import { typicalOf } from './cause-glyph.ts'
import { useFetchAhead } from './fetch-ahead.ts'
import { GuideLine } from './guide-line.tsx'
import { addressOf } from './hit-row.tsx'
import { useKnowledge } from './knowledge.ts'
import type { Knowledge } from './knowledge.ts'
import { NotYet } from './knowledge-page.tsx'
import { SearchColumn } from './search-column.tsx'
import { ToLookAfter } from './to-look-after.tsx'
import './articles.css'

function Row({ to, glyph, children }: { to: string; glyph?: string; children: ReactNode }) {
  const readings = glyph === undefined ? undefined : typicalOf(glyph)
  return (
    <li>
      <Link className="shelf-row" to={to}>
        {glyph !== undefined && (
          <span className="hit-glyph">{readings !== undefined && <GroundGlyph readings={readings} />}</span>
        )}
        <span>{children}</span>
      </Link>
    </li>
  )
}

function Articles({ knowledge }: { knowledge: Knowledge }) {
  const articles = [...knowledge.articles.values()].sort((a, b) => a.title.localeCompare(b.title, 'en'))
  return (
    <Rail
      id="articles"
      title="Articles"
      action={<span className="text-note text-ink-2">{articles.length} in this edition</span>}
    >
      {articles.length === 0 ? (
        <div className="mt-3">
          <Empty title="No articles in this edition.">Causes and tests stand below.</Empty>
        </div>
      ) : (
        <ul className="shelf">
          {articles.map((one) => (
            <Row key={one.slug} to={addressOf('article', one.slug)} glyph={one.causes[0] ?? one.slug}>
              <b>{one.title}</b>
              {one.audience === 'qualified' && <small>For qualified people</small>}
            </Row>
          ))}
        </ul>
      )}
    </Rail>
  )
}

function Causes({ causes }: { causes: readonly Cause[] }) {
  return (
    <Rail
      id="causes"
      title="Causes"
      action={<span className="text-note text-ink-2">{causes.length} in this edition</span>}
    >
      <ul className="shelf">
        {causes.map((one) => (
          <Row key={one.id} to={addressOf('cause', one.id)} glyph={one.id}>
            {one.title}
          </Row>
        ))}
      </ul>
    </Rail>
  )
}

function Tests({ knowledge }: { knowledge: Knowledge }) {
  const { tests } = knowledge.edition.file
  return (
    <Rail
      id="tests"
      title="Tests"
      action={<span className="text-note text-ink-2">{tests.length} in this edition</span>}
    >
      <ul className="shelf">
        {tests.map((one) => (
          <Row key={one.id} to={addressOf('test', one.id)}>
            {one.title}
            <small>
              <HazardMark hazard={one.hazard} />
            </small>
          </Row>
        ))}
      </ul>
    </Rail>
  )
}

const bringPages = () =>
  Promise.all([import('./article.page.tsx'), import('./cause.page.tsx'), import('./test.page.tsx')])

/** Search, and everything in the edition while nothing is typed. */
export function Component() {
  const state = useKnowledge()
  useFetchAhead(bringPages)
  return (
    <Page title="Articles">
      <h1>Articles</h1>
      {state.status !== 'success' ? (
        <div className="mt-5">
          <NotYet state={state} />
        </div>
      ) : (
        <div className="mt-4">
          <SearchColumn knowledge={state.knowledge}>
            <nav className="jumps screen-only" aria-label="On this page">
              <a href="#articles">Articles</a>
              <a href="#causes">Causes</a>
              <a href="#tests">Tests</a>
            </nav>
            <div className="shelves">
              <ToLookAfter />
              <Articles knowledge={state.knowledge} />
              <Causes causes={state.knowledge.edition.file.causes} />
              <Tests knowledge={state.knowledge} />
            </div>
          </SearchColumn>
          <GuideLine />
        </div>
      )}
    </Page>
  )
}
