import { Link } from 'react-router-dom'
import type { CauseRow as Row, RankedCause } from '../../rules/ranking/diagnosis-types.ts'
import type { Article } from '../../rules/edition/schema.ts'
import { useDesk } from './desk.ts'
import { useSelected } from './expected.ts'
import { BriefEvidence, Ledger } from './ledger.tsx'
import { actingAsFor, causeLabel, inSentence, percent, strengthOf } from './words.ts'

/** Share as a bar with a knot, and a dotted tick where it stood before any finding. */
function Share({ share, before, rest }: { share: number; before: number; rest: boolean }) {
  return (
    <span
      className={`share ${rest ? 'share-rest' : ''}`}
      role="img"
      aria-label={`${percent(share)} percent; ${percent(before)} percent before any finding`}
    >
      <i style={{ width: `${(share * 100).toFixed(2)}%` }} />
      <em style={{ left: `${(before * 100).toFixed(2)}%` }} />
    </span>
  )
}

export type CauseRowProps = {
  row: Row
  rank: number
  open: boolean
  onToggle: () => void
  /** Share of the same causes in the ranking before this one. */
  was: number | undefined
  articleOf: (cause: string) => Article | undefined
  /** Tests that would part the causes of this row. */
  parting: readonly string[]
}

function Links({ cause, article }: { cause: RankedCause; article: Article | undefined }) {
  const { edition } = useDesk()
  const { cause: selected, select } = useSelected()
  const label = inSentence(causeLabel(edition, cause.cause))
  return (
    <p className="mt-1 flex flex-wrap gap-x-5 text-small">
      <Link className="link-alone" to={`/causes/${cause.cause}`}>
        Cause: {label}
      </Link>
      {article && (
        <Link className="link-alone" to={`/articles/${article.slug}`}>
          Article: {article.title}
        </Link>
      )}
      <button
        type="button"
        className="link-alone text-glow underline"
        aria-label={`Expected readings and loop: ${label}`}
        aria-pressed={selected === cause.cause}
        onClick={() => {
          select(cause.cause)
          document.getElementById('loop')?.scrollIntoView({ block: 'start' })
        }}
      >
        Expected readings and loop
      </button>
    </p>
  )
}

function Moved({ by }: { by: number }) {
  const points = Math.round(by * 100)
  if (Math.abs(points) < 5) return null
  return (
    <p className="mt-2 text-note text-ink-2">
      <b>
        Moved {points > 0 ? 'up' : 'down'} {Math.abs(points)}
      </b>{' '}
      with the last finding
    </p>
  )
}

/** One cause, or several that the findings can't part: share, and on request the evidence. */
export function CauseRow({ row, rank, open, onToggle, was, articleOf, parting }: CauseRowProps) {
  const { edition } = useDesk()
  const { causes, share } = row
  const [first] = causes
  if (first === undefined) return null
  const several = causes.length > 1
  const struck = !several && first.ruledOut
  const id = causes.map((one) => one.cause).join('-')
  const why = first.evidence.find((one) => one.bits < 0)
  return (
    <li className="cause">
      {several && <p className="text-small text-ink-2">either of these</p>}
      <h3>
        <button
          type="button"
          className="cause-head"
          data-cause={id}
          aria-expanded={open}
          aria-controls={`ledger-${id}`}
          onClick={onToggle}
        >
          <span className={struck ? 'line-through' : ''}>
            {causes.map((one, index) => (
              <span key={one.cause}>
                {index > 0 && (
                  <span className="font-normal">{index === causes.length - 1 ? ' or ' : ', '}</span>
                )}
                {causeLabel(edition, one.cause)}
              </span>
            ))}
          </span>
          <span className="cause-share">
            {struck && <span className="mr-3 text-small font-normal text-ink-2">ruled out</span>}
            {percent(share)}
            <small> %</small>
          </span>
        </button>
      </h3>
      <Share share={share} before={causes.reduce((sum, one) => sum + one.before, 0)} rest={rank > 1} />
      {several && (
        <p className="mt-2 text-small">
          These findings can’t part them. <b>Act as for the worse:</b> {actingAsFor(edition, row)}
          {parting.length > 0 && ` ${parting.join(' or ')} parts them.`}
        </p>
      )}
      {struck && why && (
        <p className="mt-2 text-note text-ink-2">
          <b>{strengthOf(why.bits)}:</b> {why.because}
        </p>
      )}
      {was !== undefined && rank > 0 && <Moved by={share - was} />}
      <div id={`ledger-${id}`} hidden={!open}>
        {open && (
          <>
            {several && <h4 className="mt-3 text-small font-bold">{causeLabel(edition, first.cause)}</h4>}
            <Ledger evidence={first.evidence} of={causeLabel(edition, first.cause)} />
            <Links cause={first} article={articleOf(first.cause)} />
            {causes.slice(1).map((one) => (
              <details key={one.cause} className="help">
                <summary>Evidence: {inSentence(causeLabel(edition, one.cause))}</summary>
                <Ledger evidence={one.evidence} of={causeLabel(edition, one.cause)} />
                <Links cause={one} article={articleOf(one.cause)} />
              </details>
            ))}
          </>
        )}
      </div>
      {!open && rank === 1 && <BriefEvidence evidence={first.evidence} />}
    </li>
  )
}
