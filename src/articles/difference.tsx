import { useMemo } from 'react'
import { wordDifference } from './word-difference.ts'

/** Two texts in one: words that are gone struck through, new ones underlined. */
export function Difference({ former, now, label }: { former: string; now: string; label: string }) {
  const changes = useMemo(() => wordDifference(former, now), [former, now])
  if (changes.every((one) => one.kind === 'same')) return <p className="text-small">No word differs.</p>
  return (
    <div className="difference" role="region" aria-label={label} tabIndex={0}>
      {changes.map(({ kind, text }, index) =>
        kind === 'same' ? (
          <span key={index}>{text}</span>
        ) : kind === 'gone' ? (
          <del key={index}>
            <span className="sr-only"> gone: </span>
            {text}
          </del>
        ) : (
          <ins key={index}>
            <span className="sr-only"> new: </span>
            {text}
          </ins>
        ),
      )}
    </div>
  )
}
