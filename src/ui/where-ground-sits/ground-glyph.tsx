import { glyphOf, glyphSize } from '../../../rules/triangle/glyph.ts'
import type { Readings } from '../../../rules/triangle/sides.ts'
import { Stroke } from './scene-drawing.tsx'
import './where-ground-sits.css'

/** The triangle in a list, 44 × 30, without letters. The words beside it carry the meaning, so readers skip it. */
export function GroundGlyph({ readings }: { readings: Readings }) {
  const { rail, faint, cords, neutral, hot, ground, tick } = glyphOf(readings)
  return (
    <svg
      className="wgs-glyph"
      viewBox={`0 0 ${glyphSize.width} ${glyphSize.height}`}
      width={glyphSize.width}
      height={glyphSize.height}
      aria-hidden="true"
      focusable="false"
    >
      {rail && <Stroke line={rail} look={faint ? 'wgs-dotted' : 'wgs-rail'} />}
      {cords.map((line, i) => (
        <Stroke key={i} line={line} look="wgs-cord" />
      ))}
      {ground && (
        <circle
          className={`wgs-lamp ${ground.loose ? 'wgs-loose' : ''}`}
          cx={ground.at[0]}
          cy={ground.at[1]}
          r="5"
        />
      )}
      {tick && <path className="wgs-tick" d={`M${tick[0]} ${tick[1] - 5}v10`} />}
      <circle className="wgs-small-n" cx={neutral[0]} cy={neutral[1]} r="3.5" />
      <circle className="wgs-small-h" cx={hot[0]} cy={hot[1]} r="3.5" />
    </svg>
  )
}
