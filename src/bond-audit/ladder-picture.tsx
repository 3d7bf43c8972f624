import { groundBetween, neutralBetween } from '../../rules/bond-audit/ladder.ts'
import type { LadderPost } from '../../rules/bond-audit/ladder.ts'
import { nameLines } from '../../rules/bond-audit/one-line.ts'

const pitch = { lying: 88, standing: 40 }

/** The stretch of a rail after a post. */
const neutralLook = (posts: readonly LadderPost[], i: number) =>
  neutralBetween(posts, i) ? 'lad-n' : 'lad-n lad-cut'
const groundLook = (posts: readonly LadderPost[], i: number) =>
  groundBetween(posts, i) ? 'lad-g' : 'lad-g lad-cut'

const rungLook = { in: 'lad-rung', excepted: 'lad-rung lad-excepted', cut: 'lad-rung lad-off', none: '' }

/** The ladder across: neutral above, ground below, a rung for each bond. For up to six posts. */
export function LyingLadder({ posts, amps }: { posts: readonly LadderPost[]; amps: string | undefined }) {
  const x = (i: number) => 52 + i * pitch.lying
  const [n, g] = [60, 108]
  const width = x(posts.length - 1) + 46
  return (
    <svg
      className="lad lad-lying"
      viewBox={`0 0 ${width} 136`}
      style={{ maxWidth: width }}
      aria-hidden="true"
      focusable="false"
    >
      <text className="lad-rail" x="8" y={n + 6}>
        N
      </text>
      <text className="lad-rail" x="8" y={g + 6}>
        G
      </text>
      {posts.slice(1).map((post, i) => (
        <g key={post.id}>
          <path className={neutralLook(posts, i)} d={`M${x(i)} ${n}H${x(i + 1)}`} />
          <path className={groundLook(posts, i)} d={`M${x(i)} ${g}H${x(i + 1)}`} />
        </g>
      ))}
      {posts.map((post, i) => (
        <g key={post.id}>
          {post.rung !== 'none' && <path className={rungLook[post.rung]} d={`M${x(i)} ${n}V${g}`} />}
          <circle className={post.inCircuit ? 'lad-pn' : 'lad-pn lad-away'} cx={x(i)} cy={n} r="7" />
          <circle className={post.grounded ? 'lad-pg' : 'lad-pg lad-away'} cx={x(i)} cy={g} r="6" />
          {nameLines(post.name, 12).map((line, k, lines) => (
            <text key={k} className="lad-name" x={x(i)} y={40 - (lines.length - 1 - k) * 16}>
              {line}
            </text>
          ))}
          {post.marked && post.rung !== 'cut' && <Cross x={x(i) + 20} y={(n + g) / 2} />}
        </g>
      ))}
      {amps !== undefined && posts.length > 1 && (
        <text className="lad-amps" x={(x(0) + x(posts.length - 1)) / 2} y={g + 24}>
          {amps}
        </text>
      )}
    </svg>
  )
}

/** The ladder upright: rails at the left, names at the right. For a phone, and for many posts. */
export function StandingLadder({ posts }: { posts: readonly LadderPost[] }) {
  const y = (i: number) => 44 + i * pitch.standing
  const [n, g] = [20, 72]
  const height = y(posts.length - 1) + 20
  return (
    <svg
      className="lad lad-standing"
      viewBox={`0 0 340 ${height}`}
      style={{ maxWidth: 340 }}
      aria-hidden="true"
      focusable="false"
    >
      <text className="lad-rail" x={n} y="20">
        N
      </text>
      <text className="lad-rail" x={g} y="20">
        G
      </text>
      {posts.slice(1).map((post, i) => (
        <g key={post.id}>
          <path className={neutralLook(posts, i)} d={`M${n} ${y(i)}V${y(i + 1)}`} />
          <path className={groundLook(posts, i)} d={`M${g} ${y(i)}V${y(i + 1)}`} />
        </g>
      ))}
      {posts.map((post, i) => (
        <g key={post.id}>
          {post.rung !== 'none' && <path className={rungLook[post.rung]} d={`M${n} ${y(i)}H${g}`} />}
          <circle className={post.inCircuit ? 'lad-pn' : 'lad-pn lad-away'} cx={n} cy={y(i)} r="7" />
          <circle className={post.grounded ? 'lad-pg' : 'lad-pg lad-away'} cx={g} cy={y(i)} r="6" />
          <text className="lad-name lad-beside" x={g + 44} y={y(i) + 5}>
            {post.name}
          </text>
          {post.marked && post.rung !== 'cut' && <Cross x={g + 24} y={y(i)} />}
        </g>
      ))}
    </svg>
  )
}

/** The mark of an offending part: a crossed box. */
export function Cross({ x, y }: { x: number; y: number }) {
  return (
    <g className="lad-cross" transform={`translate(${x - 8} ${y - 8})`}>
      <rect width="16" height="16" />
      <path d="M4 4l8 8M12 4l-8 8" />
    </g>
  )
}
