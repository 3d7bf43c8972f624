import { Link } from 'react-router-dom'
import type { Edition } from '../../rules/edition/open.ts'
import type { CauseProcedure } from '../../rules/edition/schema.ts'
import type { CauseRow } from '../../rules/ranking/diagnosis-types.ts'
import { Help } from '../ui/help.tsx'
import { inHomeownerWords } from './homeowner-words.ts'

type CauseWordsProps = {
  row: CauseRow
  edition: Edition
  procedures: ReadonlyMap<string, CauseProcedure>
}

/** So many causes of one row are named at once; the rest are a press away. */
const atOnce = 4

function Names({
  causes,
  edition,
  procedures,
}: Omit<CauseWordsProps, 'row'> & { causes: CauseRow['causes'] }) {
  return (
    <ul>
      {causes.map(({ cause }) => {
        const words = procedures.get(cause)?.homeowner?.fits
        return (
          <li key={cause} className="border-b border-rule py-3">
            <Link to={`/causes/${cause}`} className="font-bold text-ink decoration-1">
              {inHomeownerWords(edition.causes.get(cause)?.title ?? cause)}
            </Link>
            {words !== undefined && <p className="mt-1 text-small text-ink-2">{words}</p>}
          </li>
        )
      })}
    </ul>
  )
}

/** One row in plain words: a cause, or several that nothing found so far parts, the more dangerous first. */
export function CauseWords({ row, ...rest }: CauseWordsProps) {
  const [some, more] = [row.causes.slice(0, atOnce), row.causes.slice(atOnce)]
  const many = row.causes.length
  return (
    <div>
      {many > 1 && (
        <p className="mt-2 text-note font-semibold text-ink-2">
          {many === 2
            ? 'Either of these. What you found can’t part them.'
            : 'One of these. What you found can’t part them.'}
        </p>
      )}
      <Names causes={some} {...rest} />
      {more.length > 0 && (
        <Help summary={`${more.length} more that look the same`}>
          <Names causes={more} {...rest} />
        </Help>
      )}
    </div>
  )
}
