import type { Article } from '../../rules/edition/schema.ts'
import { typicalOf } from './cause-glyph.ts'
import { dayInWords } from './day.ts'
import { GuideLine } from './guide-line.tsx'
import { Prose } from './prose.tsx'
import { TypicalFigure } from './typical-figure.tsx'

const audiences = { everyone: 'For everyone', qualified: 'For qualified people' } as const

// Writers close with their sources and with who decides; where one is missing, the page adds it.
const namesSources = (body: string) => /^#{2,3}\s+.*(?:sources|references)/im.test(body)
// It stands at the very end; looking there alone keeps a long text from holding up the page.
const saysWhoDecides = (body: string) =>
  /authority having jurisdiction[^.]*decides?\.\*?\s*$/i.test(body.slice(-1000))

/** For whom an article is written, and when it was looked at last. */
export function ArticleKind({ article }: { article: Pick<Article, 'audience' | 'reviewed'> }) {
  return (
    <p className="knowledge-kind">
      <span>{audiences[article.audience]}</span>
      {article.reviewed !== '' && <span>Reviewed {dayInWords(article.reviewed)}</span>}
    </p>
  )
}

/** An article from its text to who decides: the same where it is read and where it is written. */
export function ArticleText({ article }: { article: Pick<Article, 'slug' | 'causes' | 'sources' | 'body'> }) {
  const readings = article.causes.includes(article.slug) ? typicalOf(article.slug) : undefined
  return (
    <>
      <Prose
        markdown={article.body}
        after={readings !== undefined && <TypicalFigure readings={readings} />}
      />
      {!namesSources(article.body) && (
        <div className="prose">
          <h2>Sources</h2>
          <ul>
            {article.sources.map((source) => (
              <li key={source}>{source}</li>
            ))}
          </ul>
        </div>
      )}
      {!saysWhoDecides(article.body) && <GuideLine />}
    </>
  )
}
