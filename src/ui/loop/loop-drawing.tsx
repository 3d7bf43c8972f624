import type { LoopScene, Points } from '../../../rules/loop/scene.ts'

const through = (points: Points) => `M${points.map(([x, y]) => `${round(x)} ${round(y)}`).join('L')}`
const round = (x: number) => Math.round(x * 10) / 10
/** Two decimals are plenty for seconds. */
const lengthOf = (points: Points) =>
  points.slice(1).reduce((sum, [x, y], i) => sum + Math.hypot(x - points[i]![0], y - points[i]![1]), 0)

/** Casing below, core above: a conductor passes over what was drawn before it. */
function WireLine({ wire, points, look }: LoopScene['wires'][number]) {
  const d = through(points)
  if (look === 'absent') return <path className="loop-absent" d={d} />
  return (
    <g className={`loop-wire loop-${wire}`}>
      <path className="loop-under" d={d} />
      <path className="loop-case" d={d} />
      <path className="loop-core" d={d} />
      {wire === 'leg2' && <path className="loop-ticks" d={d} />}
    </g>
  )
}

function Plate({ plate }: { plate: LoopScene['plates'][number] }) {
  return (
    <g className={`loop-plate loop-plate-${plate.look}`}>
      <path className="loop-leader" d={through(plate.leader)} />
      <rect x={plate.x} y={plate.y} width={plate.width} height={plate.height} />
      {plate.lines.map(({ text, strong }, i) => (
        <text
          key={text}
          className={strong ? 'loop-title' : 'loop-quiet'}
          x={plate.x + 9}
          y={plate.y + 18 + 18 * i}
        >
          {text}
        </text>
      ))}
    </g>
  )
}

/** Marks that travel along a current at one pace, whatever its size; the size is in their width. */
function Moving({ points, dots }: LoopScene['currents'][number]) {
  return lengthOf(points) < 24 ? null : <path className="loop-dots" d={through(points)} strokeWidth={dots} />
}

/**
 * What the scene lays out, and nothing else.
 * @param hatch an id for the pattern of live metal, unique on the page
 */
export function LoopDrawing({ scene, hatch }: { scene: LoopScene; hatch: string }) {
  return (
    <>
      <defs>
        <pattern id={hatch} width="9" height="9" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <path className="loop-hatch" d="M0 0V9" />
        </pattern>
      </defs>
      {scene.boxes.map(({ place, live, ...box }) => (
        <g key={place} className={live ? 'loop-box loop-box-live' : 'loop-box'}>
          <rect {...box} rx="3" />
          {live && <rect {...box} rx="3" className="loop-hatched" style={{ fill: `url(#${hatch})` }} />}
        </g>
      ))}
      {scene.earthPath && <path className="loop-earth" d={through(scene.earthPath)} />}
      {scene.currents.map(({ points, wash }, i) => (
        <path key={i} className="loop-wash" d={through(points)} strokeWidth={wash} />
      ))}
      {scene.links.map((points, i) => (
        <g key={i}>
          <path className="loop-link" d={through(points)} />
          <circle className="loop-link-end" cx={points.at(-1)![0]} cy={points.at(-1)![1]} r="4" />
        </g>
      ))}
      {scene.rods.map(({ lead, bars }, i) => (
        <g key={i} className="loop-rod">
          <path d={through(lead)} />
          {bars.map((bar, j) => (
            <path key={j} d={through(bar)} />
          ))}
        </g>
      ))}
      {scene.coils.map(({ leads }, i) => (
        <g key={i}>
          {leads.map((lead, j) => (
            <path key={j} className="loop-lead" d={through(lead)} />
          ))}
        </g>
      ))}
      {scene.wires.map((wire, i) => (
        <WireLine key={i} {...wire} />
      ))}
      {scene.ties.map(({ points, look }, i) => (
        <g key={i} className={`loop-tie loop-tie-${look}`}>
          <path className="loop-under" d={through(points)} />
          <path className="loop-tie-line" d={through(points)} />
          {look === 'closed' && (
            <>
              <circle cx={points[0]![0]} cy={points[0]![1]} r="4.5" />
              <circle cx={points.at(-1)![0]} cy={points.at(-1)![1]} r="4.5" />
            </>
          )}
        </g>
      ))}
      {scene.coils.map(({ at: [x, y], radius }) => (
        <g key={`${x} ${y}`} className="loop-coil">
          <circle cx={x} cy={y} r={radius} />
          <path d={`M${x - 10} ${y}q5 -11 10 0t10 0`} />
        </g>
      ))}
      {scene.loads.map(({ leads, box }, i) => (
        <g key={i} className="loop-load">
          {leads.map((lead, j) => (
            <path key={j} d={through(lead)} />
          ))}
          <rect {...box} />
        </g>
      ))}
      <g className="loop-breaker">
        <path className="loop-breaker-gap" d={through(scene.breaker.ends)} />
        <path d={through(scene.breaker.arc)} />
        {scene.breaker.ends.map(([x, y]) => (
          <circle key={`${x} ${y}`} cx={x} cy={y} r="5" />
        ))}
      </g>
      {scene.touch && <path className="loop-touch" d={through(scene.touch)} />}
      {scene.currents.map((current, i) => (
        <Moving key={i} {...current} />
      ))}
      {scene.ends.map(([x, y], i) => (
        <circle key={i} className="loop-end" cx={x} cy={y} r="4.5" />
      ))}
      {scene.joints.map(([x, y], i) => (
        <path key={i} className="loop-joint" d={`M${x - 9} ${y}l9 -9 9 9 -9 9z`} />
      ))}
      {scene.arrows.map(({ at: [x, y], degrees, hollow }, i) => (
        <path
          key={i}
          className={hollow ? 'loop-arrow loop-arrow-hollow' : 'loop-arrow'}
          transform={`translate(${x} ${y}) rotate(${degrees})`}
          d="M-8 -9L10 0L-8 9z"
        />
      ))}
      {scene.discs.map(({ at: [x, y], wire, letter }, i) => (
        <g key={i} className={`loop-disc loop-${wire}`}>
          <circle cx={x} cy={y} r="11" />
          <text x={x} y={y + 4.6}>
            {letter}
          </text>
        </g>
      ))}
      {scene.plates.map((plate, i) => (
        <Plate key={i} plate={plate} />
      ))}
      {scene.labels.map(({ x, y, width, height, text, look }) => (
        <g key={`${x} ${y}`} className={`loop-label loop-label-${look}`}>
          <rect x={x} y={y} width={width} height={height} rx="2" />
          <text x={x + width / 2} y={y + 16.5}>
            {text}
          </text>
        </g>
      ))}
      {scene.texts.map(({ at: [x, y], text, look, anchor }, i) => (
        <text key={i} className={`loop-${look}`} x={x} y={y} textAnchor={anchor}>
          {text}
        </text>
      ))}
    </>
  )
}
