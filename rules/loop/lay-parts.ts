/** The source's winding, the bonds, the rods, what draws current and what hot touches. */
import { inVolts } from './amounts.ts'
import { worthTheName } from './loop-state.ts'
import type { LoopState, Run, Tie, Wire } from './loop-state.ts'
import type { Frame } from './frame.ts'
import type { LoopScene, Points } from './scene.ts'

/** A piece of conductor with its current, from where it begins at the source's side. */
export type Piece = { points: Points; amps: number; toward: 'load' | 'source' }
type Text = LoopScene['texts'][number]

const runOf = (state: LoopState, stretch: 'feeder' | 'circuit', to: Wire): Run | undefined =>
  state.runs.find((run) => run.stretch === stretch && run.to === to)

/** One winding, or two end to end: neutral between them. */
export function coilsOf(frame: Frame, state: LoopState): LoopScene['coils'] {
  const { coil, rows, at, line, lie } = frame
  const radius = lie === 'lying' ? 17 : 16
  const pairs: [Wire, Wire][] = state.twoLegs
    ? [
        ['hot', 'neutral'],
        ['neutral', 'leg2'],
      ]
    : [['hot', 'neutral']]
  return pairs.map(([a, b]) => {
    const middle = (rows[a] + rows[b]) / 2
    return {
      at: at(coil, middle),
      radius,
      leads: [line([coil, rows[a]], [coil, middle - radius]), line([coil, middle + radius], [coil, rows[b]])],
    }
  })
}

/** Along the run, where a tie of this place stands. */
export const tieAlong = (frame: Frame, place: Tie['place']): number =>
  place === 'source' ? frame.tie : place === 'panel' ? frame.bus : frame.jumper

export const tieNames: Readonly<Record<Tie['kind'], string>> = {
  wanted: 'bond',
  second: 'second bond',
  jumper: 'jumper',
  middle: 'tied to middle',
}

export function tiesOf(frame: Frame, state: LoopState): { ties: LoopScene['ties']; pieces: Piece[] } {
  const { rows, line } = frame
  const ties: LoopScene['ties'][number][] = []
  const pieces: Piece[] = []
  for (const tie of state.ties) {
    const along = tieAlong(frame, tie.place)
    const middle = (rows.hot + rows.neutral) / 2
    const toGround = tie.toward === 'ground' ? 'load' : 'source'
    const points =
      tie.kind === 'middle'
        ? line([frame.coil, middle], [along, middle], [along, rows.ground])
        : line([along, rows.neutral], [along, rows.ground])
    ties.push({ points, look: tie.kind === 'middle' ? 'middle' : 'closed' })
    // In the source its current goes on to the winding.
    const through = tie.place === 'source' && tie.kind !== 'middle' ? line([frame.coil, rows.neutral]) : []
    pieces.push({ points: [...through, ...points], amps: tie.amps, toward: toGround })
  }
  if (state.bondMissing !== undefined && state.ties.every((tie) => tie.kind === 'jumper')) {
    const along = tieAlong(frame, state.bondMissing)
    const [from, to] = [rows.neutral, rows.ground]
    const middle = (from + to) / 2
    ties.push({ points: line([along, from], [along, middle - 12]), look: 'open' })
    ties.push({ points: line([along, middle + 12], [along, to]), look: 'open' })
  }
  return { ties, pieces }
}

/** The place of a bond that is not there: between its two stubs. */
export const missingBondAt = (frame: Frame, place: Tie['place']): readonly [number, number] => [
  tieAlong(frame, place),
  (frame.rows.neutral + frame.rows.ground) / 2,
]

export function rodsOf(
  frame: Frame,
  state: LoopState,
): Pick<LoopScene, 'rods' | 'earthPath'> & { pieces: Piece[]; texts: Text[] } {
  const { rows, line, at, edge, lie, width } = frame
  const texts: Text[] = []
  const deep = lie === 'lying' ? edge[1] + 24 : width - 30
  const rods = state.rods.map((rod) => {
    const along = rod.place === 'source' ? frame.sourceRod : frame.panelRod
    const bar = (from: number, half: number) => line([along - half, from], [along + half, from])
    const name = `rod ${Math.round(rod.ohms)} Ω`
    texts.push(
      lie === 'lying'
        ? rod.place === 'source'
          ? { at: at(along + 22, deep + 6), text: name, look: 'quiet', anchor: 'start' }
          : { at: at(along - 22, deep + 6), text: name, look: 'quiet', anchor: 'end' }
        : { at: at(along - 8, deep - 12), text: name, look: 'quiet', anchor: 'end' },
    )
    return {
      lead: line([along, rows.ground], [along, deep]),
      bars: [bar(deep, 15), bar(deep + 7, 10), bar(deep + 14, 5)],
    }
  })
  const both = state.rods.length === 2 && state.rods.every((rod) => rod.amps >= worthTheName)
  const pieces = state.rods.map((rod, index): Piece => ({
    points: rods[index]!.lead,
    amps: rod.amps,
    // Seen from the metal: into the ground at the panel, out of it at the source.
    toward: rod.place === 'panel' ? 'load' : 'source',
  }))
  if (!both) return { rods, earthPath: undefined, pieces, texts }
  const far = deep + (lie === 'lying' ? 22 : 18)
  const earthPath = line(
    [frame.panelRod, deep + 14],
    [frame.panelRod, far],
    [frame.sourceRod, far],
    [frame.sourceRod, deep + 14],
  )
  pieces.push({ points: earthPath, amps: state.rods[0]!.amps, toward: 'load' })
  const half = (frame.panelRod + frame.sourceRod) / 2
  if (lie === 'lying')
    texts.push({ at: at(half, far + 18), text: 'through the ground', look: 'quiet', anchor: 'middle' })
  return { rods, earthPath, pieces, texts }
}

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
