/** The conductors from the source to the receptacle: where they run, cross and end, and which way current goes. */
import { inAmps } from './amounts.ts'
import { gapOf } from './frame.ts'
import type { Frame } from './frame.ts'
import type { Piece } from './lay-parts.ts'
import { isAtReceptacle, worthTheName } from './loop-state.ts'
import type { LoopState, Run } from './loop-state.ts'
import type { LoopScene, Points } from './scene.ts'
import { goesRound, wayRound } from './way.ts'

type Pair = readonly [number, number]
/** Half of the opening in an open conductor, and half of a poor joint, px. */
const half = 12

/** In the source ground begins at its case, and neutral at the bond where that belongs here. */
function sourceEnd(frame: Frame, state: LoopState, run: Run): number {
  const tied = state.ties.some((tie) => tie.place === 'source' && tie.kind !== 'middle')
  const here = tied || (state.bondMissing === 'source' && state.ties.every((tie) => tie.kind !== 'middle'))
  return run.from === 'ground' || (run.from === 'neutral' && here) ? frame.tie : frame.coil
}

/** Where a run begins at the source's side, and where it ends. */
function endsOf(frame: Frame, state: LoopState, run: Run): Pair {
  const panel = state.places.includes('panel')
  const begin = run.stretch === 'circuit' && panel ? frame.bus : sourceEnd(frame, state, run)
  if (run.stretch === 'feeder') {
    // A leg that feeds nothing here ends at its own load.
    const idle =
      run.from === 'leg2' && !state.runs.some((one) => one.stretch === 'circuit' && one.from === 'leg2')
    return [begin, idle ? frame.house : frame.bus]
  }
  const jumper = state.ties.some(isAtReceptacle)
  const touched = (state.touch?.place === 'receptacle' || state.leak !== undefined) && run.from === 'hot'
  const last =
    run.to === 'ground'
      ? frame.metal
      : touched
        ? frame.touch
        : state.load !== undefined
          ? frame.load
          : jumper && run.to === 'neutral'
            ? frame.jumper
            : frame.slot + 24
  return [begin, last]
}

/** Its corners: straight, or crossed over to another terminal before the receptacle. */
function cornersOf(frame: Frame, [begin, end]: Pair, run: Run): Pair[] {
  const [from, to] = [frame.rows[run.from], frame.rows[run.to]]
  if (from === to)
    return [
      [begin, from],
      [end, to],
    ]
  return [
    [begin, from],
    [frame.cross[0], from],
    [frame.cross[1], to],
    [end, to],
  ]
}

/** Where along the run it is open or poor. */
export function faultAlong(frame: Frame, run: Run): number {
  if (run.openAt === 'source') return frame.pin
  const [from, to] = gapOf(frame, run.stretch)
  return from + (run.from === run.to ? 0.66 : 0.2) * (to - from)
}

/** Neutral's way on to a bond in the source is the bond's own; in the panel it comes from the loads there. */
function currentBegin(frame: Frame, state: LoopState, run: Run, begin: number): number {
  // With no ground wire from there on, what comes back goes into the rod.
  const ends = state.runs.some(
    (one) => one.stretch === 'feeder' && one.from === 'ground' && one.state === 'absent',
  )
  if (run.from === 'ground' && run.stretch === 'circuit' && ends) return frame.panelRod
  if (run.from !== 'neutral') return begin
  return run.stretch === 'circuit' && state.house.length > 0 ? frame.house : Math.max(begin, frame.coil)
}

/** How far current reaches along a run: to what draws it. The metal's stub carries none. */
function currentEnd(frame: Frame, state: LoopState, run: Run, end: number): number {
  if (run.stretch !== 'circuit' || run.to !== 'ground') return end
  if (run.from === 'hot') return frame.metal
  return state.touch?.place === 'receptacle' && state.touch.amps >= worthTheName
    ? frame.touch
    : state.ties.some(isAtReceptacle)
      ? frame.jumper
      : frame.load
}

export type Laid = Pick<LoopScene, 'wires' | 'ends' | 'joints' | 'arrows'> & {
  pieces: Piece[]
  texts: LoopScene['texts'][number][]
}

export function layRuns(frame: Frame, state: LoopState): Laid {
  const wires: LoopScene['wires'][number][] = []
  const ends: LoopScene['ends'][number][] = []
  const joints: LoopScene['joints'][number][] = []
  const arrows: LoopScene['arrows'][number][] = []
  const pieces: Piece[] = []
  const texts: Laid['texts'] = []
  const { out, back } = wayRound(state)
  const round = goesRound(state)
  const draw = (run: Run, points: Points) =>
    wires.push({ wire: run.from, points, look: run.state === 'absent' ? 'absent' : 'whole' })
  // A wire that nobody ran is drawn first, so that nothing hides behind it; crossed ones last.
  const order = [...state.runs].sort((a, b) => Number(a.from !== a.to) - Number(b.from !== b.to))
  for (const run of order) {
    const span = endsOf(frame, state, run)
    const corners = cornersOf(frame, span, run)
    const at = faultAlong(frame, run)
    const row = frame.rows[run.from]
    if (run.state === 'open') {
      const [before, after] = split(corners, at)
      draw(run, frame.line(...before))
      draw(run, frame.line(...after))
      ends.push(frame.at(at - half, row), frame.at(at + half, row))
    } else if (run.state === 'absent') {
      // From the box it leaves to the one it never reaches.
      const [from, to] = gapOf(frame, run.stretch)
      draw(run, frame.line([from - 24, row], [to + 24, row]))
      wires.push({ wire: run.from, points: frame.line([span[0], row], [from - 24, row]), look: 'whole' })
      wires.push({ wire: run.from, points: frame.line([to + 24, row], [span[1], row]), look: 'whole' })
    } else draw(run, frame.line(...corners))
    if (run.state === 'poor') joints.push(frame.at(at, row))
    const flows = run.amps >= worthTheName
    if (flows) {
      const reach = currentEnd(frame, state, run, span[1])
      pieces.push({
        points: frame.line(...cornersOf(frame, [currentBegin(frame, state, run, span[0]), reach], run)),
        amps: run.amps,
        toward: run.toward,
      })
    }
    const onTheWay = !round && (out.includes(run) || back.includes(run))
    if (!flows && !onTheWay) continue
    const place = arrowAlong(frame, run)
    const toward = flows ? run.toward : out.includes(run) ? 'load' : 'source'
    if (run.state !== 'absent')
      arrows.push({ at: frame.at(place, row), degrees: degreesOf(frame, toward), hollow: !flows })
    if (flows)
      texts.push(
        frame.lie === 'lying'
          ? {
              at: frame.at(place + 8, row - 15),
              text: inAmps(run.amps),
              look: 'amps',
              anchor: 'middle',
            }
          : { at: frame.at(place + 24, row + 10), text: inAmps(run.amps), look: 'amps', anchor: 'start' },
      )
  }
  return { wires, ends, joints, arrows, pieces, texts }
}

/** Before what is open, poor or crossed, in the same place on every wire. */
function arrowAlong(frame: Frame, run: Run): number {
  const [from, to] = gapOf(frame, run.stretch)
  return from + (run.from === run.to ? 0.32 : 0.24) * (to - from)
}

const degreesOf = ({ lie }: Frame, toward: 'load' | 'source'): number =>
  lie === 'lying' ? (toward === 'load' ? 0 : 180) : toward === 'load' ? 90 : 270

/** Two polylines either side of an opening on the first straight piece. */
function split(corners: readonly Pair[], at: number): [Pair[], Pair[]] {
  const [first, ...rest] = corners
  if (first === undefined) return [[], []]
  return [
    [first, [at - half, first[1]]],
    [[at + half, first[1]], ...rest],
  ]
}
