import { useId, useRef } from 'react'
import type { MouseEvent } from 'react'
import { layOut, sideAt } from '../../../rules/triangle/layout.ts'
import { seat } from '../../../rules/triangle/seat.ts'
import type { Readings, Side } from '../../../rules/triangle/sides.ts'
import { spoken } from '../../../rules/triangle/verdict.ts'
import type { Weight } from '../../../rules/triangle/weight.ts'
import { SceneDrawing } from './scene-drawing.tsx'
import { useLanding } from './use-landing.ts'
import './where-ground-sits.css'

type WhereGroundSitsProps = {
  readings: Readings
  /** What hangs from the lamp: nothing is firm but against this. */
  weight?: Weight | undefined
  /** The same two readings under a lighter meter, drawn paler behind. */
  behind?: { ng: number; hg: number; label: string } | undefined
  /** Writes volts on the sides: for a picture that is only shown (340 × 196), not typed into. */
  lengths?: boolean
  width?: number
  height?: number
  /** The side whose field is chosen, drawn thicker. */
  chosen?: Side | undefined
  /** A tap within 24 px of a side. The fields do the same for whoever has no pointer. */
  onSide?: ((side: Side) => void) | undefined
}

/**
 * Where ground sits: hot–neutral as a rail, ground as a lamp on two cords as long as its readings. To a reader it is
 * one picture with the readings and what they say.
 */
export function WhereGroundSits({
  readings,
  weight,
  behind,
  lengths = false,
  width = lengths ? 340 : 400,
  height = lengths ? 196 : 236,
  chosen,
  onSide,
}: WhereGroundSitsProps) {
  const hatch = useId()
  const picture = useRef<SVGSVGElement>(null)
  const scene = layOut(readings, { width, height, lengths, behind, weighted: weight !== undefined })
  const shown = useLanding(scene)
  const tap = (event: MouseEvent) => {
    const box = picture.current?.getBoundingClientRect()
    if (box === undefined || box.width === 0) return
    const scale = width / box.width
    const side = sideAt(
      scene,
      [(event.clientX - box.left) * scale, (event.clientY - box.top) * scale],
      24 * scale,
    )
    if (side !== undefined) onSide?.(side)
  }
  return (
    <svg
      ref={picture}
      className={`wgs ${onSide === undefined ? '' : 'wgs-tapped'}`}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={spoken(readings, seat(readings))}
      onClick={onSide === undefined ? undefined : tap}
    >
      <SceneDrawing
        scene={shown}
        weight={weight}
        behindLabel={behind?.label ?? ''}
        chosen={chosen}
        hatch={hatch}
      />
    </svg>
  )
}
