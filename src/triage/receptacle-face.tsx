import { LampShape, lampWords } from '../ui/tester-lamp.tsx'
import type { LampState } from '../ui/tester-lamp.tsx'
import type { LampPair } from './triage-state.ts'

type Lamps = Partial<Record<LampPair, LampState | undefined>>

/** Middle of each lamp in the picture, and the pair in words. */
const seats: readonly { pair: LampPair; x: number; y: number; words: string }[] = [
  { pair: 'hn', x: 179, y: 62, words: 'hot and neutral' },
  { pair: 'ng', x: 141, y: 122, words: 'neutral and ground' },
  { pair: 'hg', x: 217, y: 122, words: 'hot and ground' },
]
const stepOn: Record<LampState, LampState> = { lit: 'dim', dim: 'dark', dark: 'lit' }
const [width, height] = [358, 236]

/**
 * The face of an outlet, neutral top left, hot top right, ground below, with a lamp on each side of its triangle.
 * Tapping a lamp goes through lit, dim, dark.
 */
export function ReceptacleFace({
  lamps,
  onLamp,
}: {
  lamps: Lamps
  onLamp: (pair: LampPair, state: LampState) => void
}) {
  return (
    <div className="face">
      <svg viewBox={`0 0 ${width} ${height}`} aria-hidden="true" focusable="false">
        <rect className="face-plate" x="49" y="2" width="260" height="232" rx="36" />
        <path className="face-sides" d="M112 62H246M112 62L179 186M246 62L179 186" />
        <g className="face-slots">
          <rect x="100" y="34" width="14" height="56" rx="2" />
          <rect x="246" y="40" width="12" height="44" rx="2" />
          <path d="M164 176h30v16a15 15 0 0 1-30 0z" />
        </g>
        <g className="face-letters">
          <text x="78" y="68">
            N
          </text>
          <text x="280" y="68">
            H
          </text>
          <text x="179" y="229">
            G
          </text>
        </g>
        {seats.map(({ pair, x, y }) => (
          <g key={pair} transform={`translate(${x - 22} ${y - 22})`}>
            <circle className="face-gap" cx="22" cy="22" r="20" />
            <g className="tester-lamp">
              <LampShape state={lamps[pair]} />
            </g>
          </g>
        ))}
      </svg>
      {seats.map(({ pair, x, y, words }) => {
        const state = lamps[pair]
        return (
          <button
            key={pair}
            type="button"
            className="face-lamp"
            style={{ left: `${(x / width) * 100}%`, top: `${(y / height) * 100}%` }}
            aria-label={`Tester lamp across ${words}: ${state === undefined ? 'not answered' : lampWords[state].toLowerCase()}. Press to change.`}
            onClick={() => onLamp(pair, state === undefined ? 'lit' : stepOn[state])}
          />
        )
      })}
    </div>
  )
}
