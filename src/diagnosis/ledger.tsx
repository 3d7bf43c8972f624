import type { Evidence } from '../../rules/ranking/diagnosis-types.ts'
import { useDesk } from './desk.ts'
import { modeLabel, strengthOf } from './words.ts'

const boxes = [1, 2, 3, 4, 5] as const

/** A post with five boxes each side: against left, hatched; for right, solid. Words stand beneath. */
function Post({ bits }: { bits: number }) {
  return (
    <span className="post" aria-hidden="true">
      {[...boxes].reverse().map((box) => (
        <i key={-box} className={-bits >= box ? 'post-against' : ''} />
      ))}
      <b />
      {boxes.map((box) => (
        <i key={box} className={bits >= box ? 'post-for' : ''} />
      ))}
    </span>
  )
}

/** What speaks for a cause and against it, each with its strength and the numbers behind it. */
export function Ledger({ evidence, of }: { evidence: readonly Evidence[]; of: string }) {
  const { edition, typed } = useDesk()
  if (evidence.length === 0)
    return <p className="mt-3 text-small text-ink-2">Nothing taken speaks for it or against it.</p>
  return (
    <table className="ledger">
      <caption className="sr-only">Evidence for and against {of}</caption>
      <thead className="sr-only">
        <tr>
          <th scope="col">Strength</th>
          <th scope="col">Because</th>
        </tr>
      </thead>
      <tbody>
        {evidence.map((one) => (
          <tr key={`${one.rule} ${one.bits} ${one.mode}`}>
            <td className="ledger-strength">
              <Post bits={one.bits} />
              <span className="text-note font-bold text-ink-2">{strengthOf(one.bits)}</span>
            </td>
            <td>
              {one.because}
              <span className="block text-note text-ink-2">
                {one.numbers}
                {one.mode !== typed.mode &&
                  `${one.numbers === '' ? '' : ', '}${modeLabel(edition, one.mode).toLowerCase()}`}
              </span>
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  )
}

/** The two strongest in one line, for the second cause. */
export function BriefEvidence({ evidence }: { evidence: readonly Evidence[] }) {
  if (evidence.length === 0) return null
  return (
    <p className="mt-2 text-note text-ink-2">
      {evidence.slice(0, 2).map((one) => (
        <span key={`${one.rule} ${one.bits}`}>
          <b>{strengthOf(one.bits)}:</b> {one.because}{' '}
        </span>
      ))}
    </p>
  )
}
