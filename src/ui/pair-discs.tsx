/** Two points of a reading: hot, neutral, ground, a leg, or earth. */
export type PairId = 'hn' | 'ng' | 'hg' | 'l1n' | 'l2n' | 'l1l2' | 'l1g' | 'l2g' | 'ge'

type Point = 'h' | 'n' | 'g' | 'l1' | 'l2' | 'e'
const points: Record<PairId, readonly [Point, Point]> = {
  hn: ['h', 'n'],
  ng: ['n', 'g'],
  hg: ['h', 'g'],
  l1n: ['l1', 'n'],
  l2n: ['l2', 'n'],
  l1l2: ['l1', 'l2'],
  l1g: ['l1', 'g'],
  l2g: ['l2', 'g'],
  ge: ['g', 'e'],
}
const looks: Record<Point, string> = {
  h: 'disc-hot',
  l1: 'disc-hot',
  l2: 'disc-leg2',
  n: 'disc-neutral',
  g: 'disc-ground',
  e: 'disc-earth',
}
const letters: Record<Point, string> = { h: 'H', n: 'N', g: 'G', l1: 'L1', l2: 'L2', e: 'E' }
const names: Record<Point, string> = {
  h: 'hot',
  n: 'neutral',
  g: 'ground',
  l1: 'leg 1',
  l2: 'leg 2',
  e: 'earth',
}

/** Whether a text names a pair that can be drawn. */
export const isPair = (pair: string | undefined): pair is PairId => pair !== undefined && pair in points

/** "hot–neutral", in the order the trade says it. */
export const pairWords = (pair: PairId): string => points[pair].map((point) => names[point]).join('–')

/** The pair as two lettered discs on a wire. Drawn beside its words, so hidden from readers. */
export function PairDiscs({ pair }: { pair: PairId }) {
  return (
    <span className="pair" aria-hidden="true">
      {points[pair].map((point) => (
        <i key={point} className={looks[point]}>
          {letters[point]}
        </i>
      ))}
    </span>
  )
}
