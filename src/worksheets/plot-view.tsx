import { useId } from 'react'
import type { Plot } from '../../rules/worksheets/plot.ts'

/** The band of a breaker with what flows in this fault; all that is decided was decided in the plot. */
export function PlotView({ plot }: { plot: Plot }) {
  const hatch = useId()
  const { field, operating } = plot
  const thin = operating.right - operating.left < 3
  const middle = (operating.left + operating.right) / 2
  // Near the right edge the words stand to the left of the line.
  const atRight = operating.right > field.right - 110
  return (
    <figure className="ws-plot">
      <svg viewBox={`0 0 ${plot.width} ${plot.height}`} role="img" aria-label={plot.words}>
        <defs>
          <pattern
            id={hatch}
            width="7"
            height="7"
            patternUnits="userSpaceOnUse"
            patternTransform="rotate(45)"
          >
            <path className="ws-hatch" d="M0 0V7" />
          </pattern>
        </defs>
        {plot.yTicks.map(({ at, text }) => (
          <g key={text}>
            <path className="ws-grid" d={`M${field.left} ${at}H${field.right}`} />
            <text className="ws-tick" x={field.left - 8} y={at + 4} textAnchor="end">
              {text}
            </text>
          </g>
        ))}
        {plot.xTicks.map(({ at, text }) => (
          <g key={text}>
            <path className="ws-grid" d={`M${at} ${field.top}V${field.bottom}`} />
            <text className="ws-tick" x={at} y={field.bottom + 18} textAnchor="middle">
              {text}
            </text>
          </g>
        ))}
        <path
          className="ws-band"
          d={`M${plot.band.map(([x, y]) => `${x.toFixed(1)} ${y.toFixed(1)}`).join('L')}Z`}
          fill={`url(#${hatch})`}
        />
        {plot.ends.map(({ y, text }) => (
          <path key={text} className="ws-end" d={`M${field.left} ${y}H${field.right}`} />
        ))}
        {thin ? (
          <path className="ws-current" d={`M${middle} ${field.top}V${field.bottom}`} />
        ) : (
          <rect
            className="ws-currents"
            x={operating.left}
            y={field.top}
            width={operating.right - operating.left}
            height={field.bottom - field.top}
          />
        )}
        {operating.bottom - operating.top > 1 && (
          <path className="ws-operating" d={`M${middle} ${operating.top}V${operating.bottom}`} />
        )}
        {plot.ends.map(({ y, text }) => (
          <text key={text} className="ws-word" x={field.left + 6} y={y - 5}>
            {text}
          </text>
        ))}
        <text
          className="ws-word ws-amps"
          x={atRight ? operating.left - 8 : operating.right + 8}
          y={field.top + 34}
          textAnchor={atRight ? 'end' : 'start'}
        >
          {operating.text}
        </text>
        <path className="ws-axis" d={`M${field.left} ${field.top}V${field.bottom}H${field.right}`} />
        <text className="ws-tick" x={field.right} y={field.bottom + 38} textAnchor="end">
          {plot.xLabel}
        </text>
        <text className="ws-tick" x={field.left + 6} y={field.top + 12}>
          {plot.yLabel}
        </text>
      </svg>
      <figcaption>{plot.words}</figcaption>
    </figure>
  )
}
