import { bitsInWords } from './evidence-words.ts'
import type { Speaks } from './evidence-words.ts'

const shown = 5

function Rules({ rules }: { rules: readonly Speaks[] }) {
  return (
    <ul className="rows">
      {rules.map((one) => (
        <li key={one.rule} className="speaks">
          <b className="text-small">{bitsInWords(one.bits)}</b>
          <span>
            {one.because}
            <small className="block text-note text-ink-2">
              {one.group}. Reference: {one.source}
            </small>
          </span>
        </li>
      ))}
    </ul>
  )
}

/** The rules that speak for a cause or against it, the strongest first, the rest folded away. */
export function SpeaksList({ rules }: { rules: readonly Speaks[] }) {
  return (
    <>
      <Rules rules={rules.slice(0, shown)} />
      {rules.length > shown && (
        <details className="more screen-only">
          <summary>{rules.length - shown} more</summary>
          <Rules rules={rules.slice(shown)} />
        </details>
      )}
    </>
  )
}
