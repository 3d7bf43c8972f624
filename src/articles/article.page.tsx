import { useParams } from 'react-router-dom'
import { Button } from '../ui/button.tsx'
import { ArticleKind, ArticleText } from './article-text.tsx'
import { dayInWords } from './day.ts'
import { useFetchAhead } from './fetch-ahead.ts'
import { EditLink } from './edit-link.tsx'
import { Helped } from './helped.tsx'
import type { Knowledge } from './knowledge.ts'
import { KnowledgePage } from './knowledge-page.tsx'
import type { Shown } from './knowledge-page.tsx'
import { Side } from './side.tsx'
import { usesOfArticle } from './used-in.ts'
import { Withdrawn } from './withdrawn.tsx'

function showArticle(knowledge: Knowledge, slug: string): Shown | undefined {
  const article = knowledge.articles.get(slug) ?? knowledge.withdrawn.get(slug)
  if (article === undefined) return undefined
  return {
    title: article.title,
    content: (
      <>
        <header>
          <ArticleKind article={article} />
          <h1>{article.title}</h1>
        </header>
        {article.withdrawn !== undefined && <Withdrawn knowledge={knowledge} article={article} />}
        <ArticleText article={article} />
        <div className="screen-only mt-5 flex flex-wrap gap-3">
          <Button size="small" icon="print" onPress={() => window.print()}>
            Print
          </Button>
          <EditLink slug={slug} />
        </div>
        <Helped key={slug} slug={slug} edition={knowledge.info.number} />
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
