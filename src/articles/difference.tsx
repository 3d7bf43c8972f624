import { useMemo, useState } from 'react'
import { wordDifference } from './word-difference.ts'

const shownAround = 160

/** What stayed: of a long run, what lies beside the changes. */
function Same({ text, first, last }: { text: string; first: boolean; last: boolean }) {
  const [open, setOpen] = useState(false)
  if (open || text.length < 3 * shownAround) return <span>{text}</span>
  // Cut between words.
  const before = first ? '' : text.slice(0, shownAround).replace(/\S+$/, '')
  const after = last ? '' : text.slice(-shownAround).replace(/^\S+\s/, '')
  return (
    <span>
      {before}
      <button type="button" className="difference-same" onClick={() => setOpen(true)}>
        {(text.length - before.length - after.length).toLocaleString('en-US')} characters the same: show
      </button>
      {after}
    </span>
  )
}

/** Two texts in one: words that are gone struck through, new ones underlined. */
export function Difference({ former, now, label }: { former: string; now: string; label: string }) {
  const changes = useMemo(() => wordDifference(former, now), [former, now])
  if (changes.every((one) => one.kind === 'same')) return <p className="text-small">No word differs.</p>
  return (
    <div className="difference" role="region" aria-label={label} tabIndex={0}>
      {changes.map(({ kind, text }, index) =>
        kind === 'same' ? (
          <Same key={index} text={text} first={index === 0} last={index === changes.length - 1} />
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
