import { boxLetters, nameLines } from '../../rules/bond-audit/one-line.ts'
import type { Box, OneLine } from '../../rules/bond-audit/one-line.ts'
import { Cross } from './ladder-picture.tsx'

const through = (points: OneLine['wires'][number]['points']) =>
  `M${points.map(([x, y]) => `${x.toFixed(1)} ${y.toFixed(1)}`).join('L')}`

const radius: Record<Box['kind'], number> = {
  source: 24,
  transformer: 14,
  autotransformer: 14,
  switch: 0,
  panel: 2,
  receptacle: 8,
}
const bondWords = { in: 'bond', excepted: 'may stay', cut: 'cut off', none: '' }

function Part({ box, picture }: { box: Box; picture: OneLine }) {
  const { width, height } = picture.box
  const lines = nameLines(box.name, boxLetters(picture))
  const middle = box.bond === 'none' ? box.y : box.y - 11
  const below = box.y + height / 2 - 14
  // In a narrow box the rung alone says it: solid, dotted, dashed.
  const words = width < 96 ? '' : bondWords[box.bond]
  const left = box.x - (words === '' ? 11 : 11 + words.length * 3.7)
  return (
    <g className={`one-box ${box.live ? '' : 'one-dead'} ${box.marked ? 'one-marked' : ''}`}>
      <rect
        x={box.x - width / 2}
        y={box.y - height / 2}
        width={width}
        height={height}
        rx={radius[box.kind]}
        strokeDasharray={box.live ? undefined : '3 4'}
      />
      {lines.map((line, i) => (
        <text key={i} x={box.x} y={middle + 5 + (i - (lines.length - 1) / 2) * 16}>
          {line}
        </text>
      ))}
      {box.bond !== 'none' && (
        <g className={`one-bond one-bond-${box.bond}`}>
          <path d={`M${left} ${below}h22`} />
          <circle className="lad-pn" cx={left} cy={below} r="4.5" />
          <circle className="lad-pg" cx={left + 22} cy={below} r="4" />
          {words !== '' && (
            <text x={left + 31} y={below + 5}>
              {words}
            </text>
          )}
        </g>
      )}
      {box.marked && <Cross x={box.x + width / 2 - 4} y={box.y - height / 2 + 2} />}
    </g>
  )
}

/** The system on one line as it is in a mode: what is live, what is cut off, which part is at fault. */
export function OneLinePicture({ picture, className }: { picture: OneLine; className: string }) {
  return (
    <svg
      className={`one ${className}`}
      viewBox={`0 0 ${picture.width} ${picture.height}`}
      style={{ maxWidth: picture.width }}
      aria-hidden="true"
      focusable="false"
    >
      {picture.wires.map(({ key, points, look, ground }) => (
        <g key={key}>
          {ground && look !== 'out' && (
            <path className="one-ground" d={through(points.map(([x, y]) => [x + 4, y + 5] as const))} />
          )}
          <path className={`one-wire one-${look}`} d={through(points)} />
        </g>
      ))}
      {picture.boxes.map((box) => (
        <Part key={box.id} box={box} picture={picture} />
      ))}
    </svg>
  )
}
