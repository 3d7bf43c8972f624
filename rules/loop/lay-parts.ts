/** The source's winding, the bonds and the rods. */
import { flowsRodToRod, isAtReceptacle } from './loop-state.ts'
import type { LoopState, Tie, Wire } from './loop-state.ts'
import type { Frame } from './frame.ts'
import type { LoopScene, Points } from './scene.ts'

/** A piece of conductor with its current, from where it begins at the source's side. */
export type Piece = { points: Points; amps: number; toward: 'load' | 'source' }
type Text = LoopScene['texts'][number]

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
  astray: 'touches',
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
        ? // Beside where a bond would stand, so that both can be seen.
          line([frame.coil, middle], [along - 14, middle], [along - 14, rows.ground])
        : line([along, rows.neutral], [along, rows.ground])
    ties.push({ points, look: tie.kind === 'middle' ? 'middle' : 'closed' })
    // In the source its current goes on to the winding.
    const through = tie.place === 'source' && tie.kind !== 'middle' ? line([frame.coil, rows.neutral]) : []
    pieces.push({ points: [...through, ...points], amps: tie.amps, toward: toGround })
  }
  if (state.bondMissing !== undefined && state.ties.every(isAtReceptacle)) {
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
  const pieces = state.rods.map((rod, index): Piece => ({
    points: rods[index]!.lead,
    amps: rod.amps,
    // Seen from the metal: into the ground at the panel, out of it at the source.
    toward: rod.place === 'panel' ? 'load' : 'source',
  }))
  if (!flowsRodToRod(state)) return { rods, earthPath: undefined, pieces, texts }
  const far = deep + (lie === 'lying' ? 22 : 18)
  const earthPath = line(
    [frame.panelRod, deep + 14],
    [frame.panelRod, far],
    [frame.sourceRod, far],
    [frame.sourceRod, deep + 14],
  )
  const into = state.rods.find((rod) => rod.toward === 'earth')
  pieces.push({
    points: earthPath,
    amps: into?.amps ?? 0,
    toward: into?.place === 'panel' ? 'load' : 'source',
  })
  const half = (frame.panelRod + frame.sourceRod) / 2
  if (lie === 'lying')
    texts.push({ at: at(half, far + 18), text: 'through the ground', look: 'quiet', anchor: 'middle' })
  return { rods, earthPath, pieces, texts }
}
