import type { Line, Point } from '../../../rules/triangle/geometry.ts'
import type { Node, Scene, SideLine } from '../../../rules/triangle/scene.ts'
import type { Side } from '../../../rules/triangle/sides.ts'
import type { Weight } from '../../../rules/triangle/weight.ts'

const at = ([x, y]: Point) => `${x.toFixed(1)} ${y.toFixed(1)}`
/** A path through points. */
const through = (points: readonly Point[]): string => `M${points.map(at).join('L')}`

/** A straight stroke from one point to another. */
export function Stroke({ line: [a, b], look }: { line: Line; look: string }) {
  return <path className={look} d={through([a, b])} />
}

const sideLook: Record<SideLine['look'], string> = {
  rail: 'wgs-rail',
  dotted: 'wgs-dotted',
  cord: 'wgs-cord',
  tie: '',
}
const nodeLook: Record<Node['corner'], string> = { N: 'wgs-neutral', H: 'wgs-hot', G: 'wgs-ground' }
const nodeRadius = 17

function Lettered({ node }: { node: Node }) {
  const [x, y] = node.at
  return (
    <g className={`wgs-node ${nodeLook[node.corner]} ${node.loose ? 'wgs-loose' : ''}`}>
      <circle cx={x} cy={y} r={nodeRadius} />
      <text x={x} y={y + 6}>
        {node.corner}
      </text>
    </g>
  )
}

/** The meter, or the bulb, hanging from the lamp. */
function Pull({ from: [x, y], weight, width }: { from: Point; weight: Weight; width: number }) {
  const top = y + nodeRadius + 14
  const tall = 7 * weight.size + 5
  const half = 6 * weight.size
  // At the right edge the words stand at the left of the weight.
  const atRight = x > width - 130
  return (
    <g className="wgs-pull">
      <path className="wgs-hair" d={`M${x} ${y + nodeRadius}V${top}`} />
      <path className="wgs-load" d={`M${x - half - 4} ${top + tall}l4 ${-tall}h${2 * half}l4 ${tall}z`} />
      <text x={atRight ? x - half - 14 : x + half + 14} y={top + 12} textAnchor={atRight ? 'end' : 'start'}>
        {weight.label}
      </text>
    </g>
  )
}

type DrawingProps = {
  scene: Scene
  weight: Weight | undefined
  behindLabel: string
  chosen: Side | undefined
  /** Id of the hatching, once on a page for each picture. */
  hatch: string
}

/** Draws a scene as it is; all that is decided was decided in the layout. */
export function SceneDrawing({ scene, weight, behindLabel, chosen, hatch }: DrawingProps) {
  const { behind, tick, gap } = scene
  return (
    <>
      <defs>
        <pattern id={hatch} width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <path className="wgs-hatch" d="M0 0V7" />
        </pattern>
      </defs>
      {behind && (
        <g className="wgs-behind">
          {behind.cords.map((line, i) => (
            <Stroke key={i} line={line} look="wgs-cord" />
          ))}
          {behind.ends.map(([x, y], i) => (
            <circle key={i} className="wgs-end" cx={x} cy={y} r="4" />
          ))}
          <text x={behind.at[0]} y={behind.at[1]}>
            {behindLabel}
          </text>
        </g>
      )}
      {scene.hatched && <path d={`${through(scene.hatched)}Z`} fill={`url(#${hatch})`} />}
      {scene.swings.map((points, i) => (
        <path key={i} className="wgs-swing" d={through(points)} />
      ))}
      {scene.loci.map((points, i) => (
        <path key={i} className="wgs-locus" d={through(points)} />
      ))}
      {scene.around && <path className="wgs-around" d={through(scene.around)} />}
      {scene.sides.map(({ side, line, look }, i) => (
        <Stroke
          key={i}
          line={line}
          look={`${sideLook[look]} ${side === chosen && look !== 'dotted' ? 'wgs-chosen' : ''}`}
        />
      ))}
      {scene.hooks.map((line, i) => (
        <Stroke key={i} line={line} look="wgs-hook" />
      ))}
      {scene.ends.map(([x, y], i) => (
        <circle key={i} className="wgs-end" cx={x} cy={y} r="4" />
      ))}
      {scene.pull && weight && <Pull from={scene.pull} weight={weight} width={scene.width} />}
      {scene.nodes.map((node) => (
        <Lettered key={node.corner} node={node} />
      ))}
      {gap && (
        <text className="wgs-gap" x={gap.at[0]} y={gap.at[1]}>
          {gap.text}
        </text>
      )}
      {scene.lengths.map(({ at: [x, y], text }) => (
        <text key={`${x} ${text}`} className="wgs-length" x={x} y={y}>
          {text}
        </text>
      ))}
      {tick && (
        <>
          <path className="wgs-tick" d={`M${tick.at[0]} ${tick.at[1] - 14}v26`} />
          <text className="wgs-length" x={tick.at[0]} y={tick.at[1] - 20}>
            {tick.text}
          </text>
        </>
      )}
    </>
  )
}
