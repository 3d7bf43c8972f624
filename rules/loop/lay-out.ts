/** From what the loop is to where everything is drawn. */
import { frameOf } from './frame.ts'
import type { Frame, Lie } from './frame.ts'
import { placeWords } from './lay-words.ts'
import type { ReadAt } from './lay-words.ts'
import { loadsOf } from './lay-loads.ts'
import { coilsOf, rodsOf, tiesOf } from './lay-parts.ts'
import type { Piece } from './lay-parts.ts'
import { platesOf } from './lay-plates.ts'
import { layRuns } from './lay-wires.ts'
import { metalIsLive, worthTheName } from './loop-state.ts'
import type { LoopState, Wire } from './loop-state.ts'
import type { LoopScene } from './scene.ts'
import { isBrief } from './way.ts'

/** Wider with the current, by its order of magnitude: from 4 mA to some 400 A. */
const washOf = (amps: number) => Math.min(26, 9 + 3.3 * Math.log10(amps / worthTheName))
const dotsOf = (amps: number) => Math.min(7, 3 + 0.8 * Math.log10(amps / worthTheName))

const currentsOf = (pieces: readonly Piece[]): LoopScene['currents'] =>
  pieces
    .filter(({ amps }) => amps >= worthTheName)
    .map(({ points, amps, toward }) => ({
      points: toward === 'load' ? points : [...points].reverse(),
      wash: washOf(amps),
      dots: dotsOf(amps),
    }))

function boxesOf(frame: Frame, state: LoopState): LoopScene['boxes'] {
  return state.places.map((place) => {
    const [from, to] = frame.boxOf(place)
    const [x, y] = frame.at(from, frame.edge[0])
    const [long, wide] = [to - from, frame.edge[1] - frame.edge[0]]
    const metal = state.metal.find((one) => one.place === place)
    const live = metal !== undefined && metalIsLive(metal) && !isBrief(state, metal)
    return {
      place,
      x,
      y,
      width: frame.lie === 'lying' ? long : wide,
      height: frame.lie === 'lying' ? wide : long,
      live,
    }
  })
}

function discsOf(frame: Frame, state: LoopState): LoopScene['discs'] {
  const letters: Readonly<Record<Wire, string>> = {
    hot: state.nominal === 230 ? 'L' : 'H',
    leg2: 'L2',
    neutral: 'N',
    ground: 'G',
  }
  const disc = (along: number, wire: Wire) => ({
    at: frame.at(along, frame.rows[wire]),
    wire,
    letter: letters[wire],
  })
  const legs: Wire[] = state.twoLegs ? ['hot', 'neutral', 'leg2', 'ground'] : ['hot', 'neutral', 'ground']
  const atPanel = legs.filter((wire) =>
    state.runs.some((run) => run.stretch === 'circuit' && run.from === wire),
  )
  return [
    ...legs.map((wire) => disc(frame.sourceDisc, wire)),
    ...(state.places.includes('panel') ? atPanel.map((wire) => disc(frame.panelDisc, wire)) : []),
    ...(['hot', 'neutral', 'ground'] as const).map((wire) => disc(frame.slot, wire)),
  ]
}

function breakerOf(frame: Frame): LoopScene['breaker'] {
  const [from, to] = frame.breaker
  const { hot } = frame.rows
  const arc = Array.from({ length: 13 }, (_, i) => {
    const angle = (Math.PI * i) / 12
    return frame.at(from + ((to - from) * (1 - Math.cos(angle))) / 2, hot - Math.sin(angle) * 18)
  })
  return { arc, ends: [frame.at(from, hot), frame.at(to, hot)] }
}

/** The metal of each place is joined to its ground. */
function linksOf(frame: Frame, state: LoopState): LoopScene['links'] {
  const { rows, edge, line } = frame
  return state.places.map((place) =>
    place === 'source'
      ? line([frame.tie, rows.ground], [frame.boxOf('source')[0], rows.ground])
      : place === 'panel'
        ? line([frame.panelRod, rows.ground], [frame.panelRod, edge[1]])
        : line([frame.metal, rows.ground], [frame.metal, edge[1]]),
  )
}

/**
 * The picture of a loop.
 * @param read what was read at each place, to stand beside it
 */
export function layOutLoop(state: LoopState, lie: Lie, read: ReadAt = {}): LoopScene {
  const frame = frameOf(state, lie)
  const runs = layRuns(frame, state)
  const ties = tiesOf(frame, state)
  const rods = rodsOf(frame, state)
  const loads = loadsOf(frame, state)
  const words = placeWords(frame, state, read)
  const { plates, height } = platesOf(frame, state)
  return {
    width: frame.width,
    height,
    boxes: boxesOf(frame, state),
    wires: runs.wires,
    currents: currentsOf([...runs.pieces, ...ties.pieces, ...rods.pieces, ...loads.pieces]),
    arrows: runs.arrows,
    ends: runs.ends,
    joints: runs.joints,
    ties: ties.ties,
    links: linksOf(frame, state),
    rods: rods.rods,
    earthPath: rods.earthPath,
    coils: coilsOf(frame, state),
    breaker: breakerOf(frame),
    loads: loads.loads,
    touch: loads.touch,
    discs: discsOf(frame, state),
    plates,
    labels: words.labels,
    texts: [...words.texts, ...runs.texts, ...rods.texts, ...loads.texts],
  }
}
