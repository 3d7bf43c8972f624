import { useQuery } from '@tanstack/react-query'
import { Failed } from '../ui/failed.tsx'
import { Rail } from '../ui/rail.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { dayInWords } from './day.ts'
import { feedbackQuery } from './drafts.api.ts'

/** What readers said of an article. */
export function ReaderWords({ slug }: { slug: string }) {
  const feedback = useQuery(feedbackQuery(slug))
  return (
    <Rail title="What readers said" className="mt-7">
      {feedback.isPending ? (
        <Waiting what="what readers said" />
      ) : feedback.isError ? (
        <Failed title="Couldn’t fetch what readers said." onRetry={() => void feedback.refetch()} />
      ) : (
        <>
          <p className="mt-3">
            It helped {feedback.data.helped} and did not help {feedback.data.not}.
          </p>
          <ul className="rows">
            {feedback.data.said.map((one) => (
              <li key={`${one.at} ${one.why}`} className="text-small">
                <span className="block whitespace-pre-wrap">{one.why}</span>
                <small>
                  {one.by ?? 'Not signed in'}, {dayInWords(one.at.slice(0, 10))}, edition {one.edition}
                </small>
              </li>
            ))}
          </ul>
        </>
      )}
    </Rail>
  )
}
