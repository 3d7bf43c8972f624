/** Plates that name what is not there (dashed) or not as it should be, each beside its place. */
import { inAmps } from './amounts.ts'
import { gapOf } from './frame.ts'
import type { Frame } from './frame.ts'
import { missingBondAt } from './lay-parts.ts'
import { faultAlong } from './lay-wires.ts'
import { flowsRodToRod, isAtReceptacle, worthTheName } from './loop-state.ts'
import type { LoopState, Run, Stretch } from './loop-state.ts'
import type { LoopScene, Point } from './scene.ts'
import { breakOf } from './way.ts'

type Plate = LoopScene['plates'][number]
type Named = {
  look: Plate['look']
  /** What it says, then what is beside the point. */
  says: string
  aside: string | undefined
  to: Point
  /** Which column of the picture it stands in. */
  column: 'source' | 'panel' | Stretch
}

const openWords: Readonly<Record<Run['from'], string>> = {
  hot: 'Hot open',
  leg2: 'Leg 2 open',
  neutral: 'Neutral open',
  ground: 'Ground wire open',
}

function runSays(run: Run, long: boolean): { look: Plate['look']; says: string } | undefined {
  if (run.state === 'absent') return { look: 'open', says: 'No ground wire' }
  if (run.state === 'open')
    return { look: 'open', says: run.openAt === 'source' ? 'Pin joined to nothing' : openWords[run.from] }
  if (run.state === 'poor' && !long)
    return { look: 'note', says: `Poor joint, ${Number(run.addedOhms.toPrecision(2))} Ω` }
  return undefined
}

function namesOf(frame: Frame, state: LoopState): Named[] {
  const broken = breakOf(state)
  const leak = state.drawn === 'fault' && broken !== undefined ? state.touch?.amps : undefined
  const aside =
    leak !== undefined && leak < worthTheName && leak >= 1e-5 ? `${inAmps(leak)} leaks` : undefined
  // Too many ohms in every wire alike is the run itself.
  const long = state.runs.filter((run) => run.state === 'poor').length > 1
  const names = state.runs.flatMap((run): Named[] => {
    const says = runSays(run, long)
    if (says === undefined) return []
    const first = run === broken
    return [
      {
        look: says.look,
        says: first ? `${says.says}: loop ends here` : says.says,
        aside: first ? aside : undefined,
        to: frame.at(faultAlong(frame, run), frame.rows[run.from]),
        column: run.stretch,
      },
    ]
  })
  if (long) {
    const run = state.runs.find((one) => one.state === 'poor')
    if (run !== undefined)
      names.push({
        look: 'note',
        says: `Long run, ${Number(run.addedOhms.toPrecision(2))} Ω each wire`,
        aside: undefined,
        to: frame.at(faultAlong(frame, run), frame.rows.ground),
        column: run.stretch,
      })
  }
  if (state.bondMissing === undefined || !state.ties.every(isAtReceptacle)) return names
  const place = state.bondMissing === 'panel' ? 'panel' : 'source'
  return [
    ...names,
    {
      look: 'open',
      says: broken === 'bond' ? 'No bond: loop ends here' : 'No bond',
      aside: broken === 'bond' ? aside : undefined,
      to: frame.at(...missingBondAt(frame, place)),
      column: place,
    },
  ]
}

/** Width of a letter at 14 px, bold and plain, px. */
const letter = { strong: 8.1, plain: 7.3 } as const
function wrapped(text: string, width: number, each: number): string[] {
  const lines: string[] = []
  const together = text.replaceAll(/(\d) (?=[ΩmAV])/g, '$1\u00a0')
  for (const word of together.split(' ')) {
    const last = lines.at(-1)
    if (last !== undefined && (last.length + 1 + word.length) * each <= width)
      lines[lines.length - 1] = `${last} ${word}`
    else lines.push(word)
  }
  return lines
}

/** Standing, a place and the stretch after it share the room beside that stretch. */
const standingColumn = (frame: Frame, column: Named['column']): Stretch =>
  column === 'panel' || frame.boxes.panel === undefined ? 'circuit' : column === 'source' ? 'feeder' : column

const ownColumn = (frame: Frame, column: Named['column']): Named['column'] =>
  frame.lie === 'standing' ? standingColumn(frame, column) : column

/** Where a column's plates begin, and how wide they may be. */
function columnOf(
  frame: Frame,
  column: Named['column'],
  earthPath: boolean,
): { x: number; y: number; width: number } {
  if (frame.lie === 'standing') {
    const x = frame.edge[1] + 10
    // Current through the ground runs down the right edge.
    const width = frame.width - x - (earthPath ? 26 : 6)
    return { x, y: gapOf(frame, standingColumn(frame, column))[0] + 2, width }
  }
  const y = frame.edge[1] + 10
  if (column === 'source' || column === 'panel') return { x: frame.boxOf(column)[0], y, width: 168 }
  const [from, to] = gapOf(frame, column)
  return { x: from + 6, y: frame.rows.ground + 22, width: to - from - 12 }
}

export function platesOf(frame: Frame, state: LoopState): { plates: Plate[]; height: number } {
  const earthPath = flowsRodToRod(state)
  const filled: Partial<Record<Named['column'], number>> = {}
  const names = namesOf(frame, state)
  const columns = names.map(({ column }) => ownColumn(frame, column))
  const plates = names.map((named, index): Plate => {
    const { x, y, width } = columnOf(frame, named.column, earthPath)
    const own = ownColumn(frame, named.column)
    const alone = columns.every((column, other) => other === index || column !== own)
    const lines = [
      ...wrapped(named.says, width - 16, letter.strong).map((text) => ({ text, strong: true })),
      ...(named.aside === undefined || !alone
        ? []
        : wrapped(named.aside, width - 16, letter.plain).map((text) => ({ text, strong: false }))),
    ]
    const top = filled[own] ?? y
    const height = lines.length * 18 + 11
    filled[own] = top + height + 6
    const widest = Math.max(
      ...lines.map(({ text, strong }) => text.length * (strong ? letter.strong : letter.plain)),
    )
    const wide = Math.min(width, Math.round(widest) + 20)
    const to: Point =
      frame.lie === 'lying'
        ? [Math.min(Math.max(named.to[0], x + 8), x + wide - 8), top]
        : [x, top + height / 2]
    return { x, y: top, width: wide, height, look: named.look, lines, leader: [named.to, to] }
  })
  const lowest = Math.max(0, ...plates.map((plate) => plate.y + plate.height + 4))
  return { plates, height: Math.max(frame.height, lowest) }
}
