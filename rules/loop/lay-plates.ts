/** Plates that name what is not there (dashed) or not as it should be, each beside its place. */
import { inAmps } from './amounts.ts'
import { gapOf } from './frame.ts'
import type { Frame } from './frame.ts'
import { missingBondAt } from './lay-parts.ts'
import { faultAlong } from './lay-wires.ts'
import { worthTheName } from './loop-state.ts'
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
  const aside = leak !== undefined && leak < worthTheName && leak > 1e-6 ? `${inAmps(leak)} leaks` : undefined
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
  if (state.bondMissing === undefined || state.ties.some((tie) => tie.kind !== 'jumper')) return names
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
  for (const word of text.split(' ')) {
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

/** Where a column's plates begin, and how wide they may be. */
function columnOf(frame: Frame, column: Named['column']): { x: number; y: number; width: number } {
  if (frame.lie === 'standing') {
    const x = frame.edge[1] + 10
    const width = frame.width - x - 26
    return { x, y: gapOf(frame, standingColumn(frame, column))[0] + 2, width }
  }
  const y = frame.edge[1] + 10
  if (column === 'source' || column === 'panel') return { x: frame.boxOf(column)[0], y, width: 168 }
  const [from, to] = gapOf(frame, column)
  return { x: from + 6, y: frame.rows.ground + 22, width: to - from - 12 }
}

export function platesOf(frame: Frame, state: LoopState): { plates: Plate[]; height: number } {
  const filled: Partial<Record<Named['column'], number>> = {}
  const plates = namesOf(frame, state).map((named): Plate => {
    const { x, y, width } = columnOf(frame, named.column)
    const lines = [
      ...wrapped(named.says, width - 16, letter.strong).map((text) => ({ text, strong: true })),
      ...(named.aside === undefined
        ? []
        : wrapped(named.aside, width - 16, letter.plain).map((text) => ({ text, strong: false }))),
    ]
    const own = frame.lie === 'standing' ? standingColumn(frame, named.column) : named.column
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
