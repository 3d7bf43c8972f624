/** What draws current, and what hot touches. */
import { inVolts } from './amounts.ts'
import type { Frame } from './frame.ts'
import type { Piece } from './lay-parts.ts'
import type { LoopState, Run, Wire } from './loop-state.ts'
import type { LoopScene, Points } from './scene.ts'

type Text = LoopScene['texts'][number]

const runOf = (state: LoopState, stretch: 'feeder' | 'circuit', to: Wire): Run | undefined =>
  state.runs.find((run) => run.stretch === stretch && run.to === to)

/** Jagged from a to b across the run. */
function jagged(frame: Frame, along: number, from: number, to: number): Points {
  const step = (to - from) / 4
  return frame.line(
    [along, from],
    [along + 9, from + step],
    [along - 9, from + 2 * step],
    [along + 9, from + 3 * step],
    [along, to],
  )
}

/** What draws current between two rows: a box with its leads. */
function loadAt(frame: Frame, along: number, from: number, to: number): LoopScene['loads'][number] {
  const middle = (from + to) / 2
  const [half, wide] = [Math.min(15, (to - from) / 2 - 9), 9]
  const [x, y] = frame.at(along, middle)
  const size =
    frame.lie === 'lying' ? { width: 2 * wide, height: 2 * half } : { width: 2 * half, height: 2 * wide }
  return {
    leads: [
      frame.line([along, from], [along, middle - half]),
      frame.line([along, middle + half], [along, to]),
    ],
    box: { x: x - size.width / 2, y: y - size.height / 2, ...size },
  }
}

export function loadsOf(
  frame: Frame,
  state: LoopState,
): Pick<LoopScene, 'loads' | 'touch'> & { pieces: Piece[]; texts: Text[] } {
  const { rows, at, line, lie } = frame
  const loads: LoopScene['loads'][number][] = []
  const pieces: Piece[] = []
  const texts: Text[] = []
  if (state.load !== undefined) {
    loads.push(loadAt(frame, frame.load, rows.hot, rows.neutral))
    const toward = runOf(state, 'circuit', 'hot')?.toward ?? 'load'
    pieces.push({
      points: line([frame.load, rows.hot], [frame.load, rows.neutral]),
      amps: state.load.amps,
      toward,
    })
    texts.push(
      lie === 'lying'
        ? {
            at: at(frame.load + 16, (rows.hot + rows.neutral) / 2 + 5),
            text: 'load',
            look: 'quiet',
            anchor: 'start',
          }
        : {
            at: at(frame.load + 26, (rows.hot + rows.neutral) / 2),
            text: 'load',
            look: 'quiet',
            anchor: 'middle',
          },
    )
  }
  if (state.leak !== undefined && state.touch === undefined) {
    loads.push(loadAt(frame, frame.touch, rows.hot, rows.ground))
    pieces.push({
      points: line([frame.touch, rows.hot], [frame.touch, rows.ground]),
      amps: state.leak.amps,
      toward: 'load',
    })
    texts.push(
      lie === 'lying'
        ? {
            at: at(frame.touch + 16, (rows.hot + rows.ground) / 2 + 5),
            text: 'leak',
            look: 'quiet',
            anchor: 'start',
          }
        : {
            at: at(frame.touch + 26, (rows.hot + rows.ground) / 2),
            text: 'leak',
            look: 'quiet',
            anchor: 'middle',
          },
    )
  }
  for (const house of state.house) {
    const [from, to] = house.leg === 'hot' ? [rows.hot, rows.neutral] : [rows.neutral, rows.leg2]
    loads.push(loadAt(frame, frame.house, from, to))
    // Hot pushes through its own load into neutral, and neutral's share on through the other leg's.
    pieces.push({ points: line([frame.house, from], [frame.house, to]), amps: house.amps, toward: 'load' })
    if (lie === 'lying')
      texts.push({
        at: at(frame.house + 16, (from + to) / 2 + 5),
        text: inVolts(house.volts),
        look: 'name',
        anchor: 'start',
      })
    else
      texts.push({
        at: at(frame.house + 24, (from + to) / 2),
        text: inVolts(house.volts),
        look: 'name',
        anchor: 'middle',
      })
  }
  const touch = touchOf(frame, state)
  if (touch !== undefined && state.touch !== undefined)
    pieces.push({ points: touch, amps: state.touch.amps, toward: 'load' })
  if (state.touch !== undefined) texts.push(...touchWords(frame, state))
  return { loads, touch, pieces, texts }
}

function touchOf(frame: Frame, state: LoopState): Points | undefined {
  const { touch } = state
  if (touch === undefined) return undefined
  const { rows } = frame
  if (touch.place === 'receptacle') {
    // The terminal that the hot wire lands on; on the ground terminal itself there is nothing to draw.
    const terminal = state.runs.find((run) => run.stretch === 'circuit' && run.from === 'hot')?.to ?? 'hot'
    return terminal === 'ground' ? undefined : jagged(frame, frame.touch, rows[terminal], rows.ground)
  }
  const along = touch.place === 'panel' ? frame.bus : frame.sourceDisc - 20
  return jagged(frame, along, rows[touch.leg], rows.ground)
}

function touchWords(frame: Frame, state: LoopState): Text[] {
  const { rows, at, lie } = frame
  const place = state.touch?.place ?? 'receptacle'
  const words = touchOf(frame, state) === undefined ? ['hot wire', 'on the metal'] : ['hot touches', 'metal']
  const along = place === 'receptacle' ? frame.touch : place === 'panel' ? frame.bus : frame.sourceDisc - 20
  if (lie === 'standing')
    return [{ at: at(along + 30, 16), text: words.join(' '), look: 'name', anchor: 'start' }]
  // Between the rows, right of the jagged line.
  return words.map((text, index) => ({
    at: at(along + 16, rows.hot + 24 + 17 * index),
    text,
    look: 'name' as const,
    anchor: 'start' as const,
  }))
}
