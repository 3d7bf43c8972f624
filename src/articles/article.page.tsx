import { useParams } from 'react-router-dom'
import type { Article } from '../../rules/edition/schema.ts'
import { Button } from '../ui/button.tsx'
import { typicalOf } from './cause-glyph.ts'
import { dayInWords } from './day.ts'
import { useFetchAhead } from './fetch-ahead.ts'
import { GuideLine } from './guide-line.tsx'
import type { Knowledge } from './knowledge.ts'
import { KnowledgePage } from './knowledge-page.tsx'
import type { Shown } from './knowledge-page.tsx'
import { Prose } from './prose.tsx'
import { Side } from './side.tsx'
import { TypicalFigure } from './typical-figure.tsx'
import { usesOfArticle } from './used-in.ts'

const audiences = { everyone: 'For everyone', qualified: 'For qualified people' } as const

// Writers close with their sources and with who decides; where one is missing, the page adds it.
const namesSources = (body: string) => /^#{2,3}\s+.*(?:sources|references)/im.test(body)
const saysWhoDecides = (body: string) => /authority having jurisdiction[^.]*decides?\.\*?\s*$/i.test(body)

function Text({ article }: { article: Article }) {
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
      <div className="screen-only mt-5">
        <Button size="small" icon="print" onPress={() => window.print()}>
          Print
        </Button>
      </div>
    </>
  )
}

function showArticle(knowledge: Knowledge, slug: string): Shown | undefined {
  const article = knowledge.articles.get(slug)
  if (article === undefined) return undefined
  return {
    title: article.title,
    content: (
      <>
        <header>
          <p className="knowledge-kind">
            <span>{audiences[article.audience]}</span>
            <span>Reviewed {dayInWords(article.reviewed)}</span>
          </p>
          <h1>{article.title}</h1>
        </header>
        <Text article={article} />
      </>
    ),
    side: (
      <Side
        knowledge={knowledge}
        facts={[
          ['Written for', article.audience === 'everyone' ? 'everyone' : 'qualified people'],
          ['Reviewed', dayInWords(article.reviewed)],
        ]}
        usedIn={usesOfArticle(knowledge, slug)}
      />
    ),
  }
}

const bringPages = () => Promise.all([import('./cause.page.tsx'), import('./test.page.tsx')])

/** One article, with the search beside it and what links to it. */
export function Component() {
  const { slug = '' } = useParams()
  useFetchAhead(bringPages)
  return <KnowledgePage kind="article" id={slug} show={(knowledge) => showArticle(knowledge, slug)} />
}
