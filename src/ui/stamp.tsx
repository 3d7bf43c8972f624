import type { ReactNode } from 'react'

const knots = 12

/** Each digit of the hash is a knot: 0 a bead, 1–15 a height above or below the cord. */
function cord(hash: string) {
  return [...hash.slice(0, knots)].map((digit, index) => {
    const value = Number.parseInt(digit, 16) || 0
    const x = 5 + index * 6.7
    if (value === 0) return <circle key={index} cx={x} cy="11" r="1.5" />
    const height = (((value + 1) >> 1) / 8) * 8.2 + 2
    return (
      <path
        key={index}
        d={`M${x.toFixed(1)} 11v${(value % 2 === 1 ? -height : height).toFixed(1)}`}
        strokeWidth="3"
      />
    )
  })
}

/** "9f3c 71ab 04de": the first twelve digits, as people read them to each other. */
export const hashInWords = (hash: string): string => (hash.slice(0, knots).match(/.{1,4}/g) ?? []).join(' ')

type StampProps = {
  hash: string
  number: number
  /** After the number: "in force since 3 Nov". */
  line: ReactNode
  state?: 'in-force' | 'withdrawn' | 'draft'
  large?: boolean
}

/** An edition's mark: a knotted cord drawn from its hash, so that two that differ look different at a glance. */
export function Stamp({ hash, number, line, state = 'in-force', large = false }: StampProps) {
  return (
    <span className={`stamp ${state === 'withdrawn' ? 'stamp-withdrawn' : ''} ${large ? 'stamp-large' : ''}`}>
      <svg viewBox="0 0 84 22" aria-hidden="true" focusable="false" fill="none">
        <path
          d={state === 'draft' ? 'M2 11H74' : 'M2 11H82'}
          strokeWidth="1.5"
          strokeDasharray={state === 'draft' ? '0' : undefined}
        />
        {cord(hash)}
      </svg>
      <span>
        <b className="font-extrabold">Edition {number}</b> {line}
        <br />
        <span className="text-ink-3">{hashInWords(hash)}</span>
      </span>
    </span>
  )
}
