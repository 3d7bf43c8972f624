import { Link } from 'react-router-dom'
import type { Article } from '../../rules/edition/schema.ts'
import { dayInWords } from './day.ts'
import { addressOf } from './hit-row.tsx'
import type { Knowledge } from './knowledge.ts'

/** Says that an article holds no more, and what to read instead. */
export function Withdrawn({ knowledge, article }: { knowledge: Knowledge; article: Article }) {
  const instead = article.replacedBy === undefined ? undefined : knowledge.articles.get(article.replacedBy)
  return (
    <div className="plate-dashed my-5" role="note">
      <p className="font-bold">Withdrawn on {dayInWords(article.withdrawn ?? article.reviewed)}</p>
      <p className="mt-2 text-small">
        This article holds no more. Do not work from it.
        {instead !== undefined && (
          <>
            {' '}
            Read instead: <Link to={addressOf('article', instead.slug)}>{instead.title}</Link>
          </>
        )}
      </p>
    </div>
  )
}
