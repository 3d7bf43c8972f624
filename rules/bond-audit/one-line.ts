/** The one-line picture of a mode: what stands where, px. The page draws it and decides nothing. */
import type { Audited } from './audit.ts'
import { levelsOf } from './levels.ts'
import { isJoined } from './state.ts'
import { feedsOf, isPower } from './system.ts'
import type { PowerPart, System } from './system.ts'

export type Box = {
  id: string
  name: string
  kind: PowerPart['kind']
  x: number
  y: number
  /** Power reaches it in this mode. */
  live: boolean
  marked: boolean
  bond: 'none' | 'in' | 'excepted' | 'cut'
}
type Wire = {
  key: string
  points: readonly (readonly [number, number])[]
  /** `dead` is there without power; `out` is a cord that is not plugged in. */
  look: 'live' | 'dead' | 'out'
  /** A grounding conductor goes with it. */
  ground: boolean
}
export type OneLine = {
  width: number
  height: number
  box: { width: number; height: number }
  boxes: Box[]
  wires: Wire[]
}

type Spot = { id: string; level: number; lane: number }

/**
 * Places parts in columns and lanes. A run that passes a column takes a lane of its own there, so that no line
 * crosses a box.
 */
function spotsOf(parts: readonly PowerPart[]): { spots: Map<string, Spot>; via: Map<string, string[]> } {
  const level = levelsOf(parts)
  const of = (id: string) => level.get(id) ?? 0
  const spots = new Map<string, Spot>()
  const via = new Map<string, string[]>()
  const before = new Map<string, string[]>()
  const columns: string[][] = []
  const put = (id: string, at: number) => (columns[at] ??= []).push(id)
  for (const part of parts) put(part.id, of(part.id))
  for (const part of parts)
    for (const { key, feed } of feedsOf(part)) {
      if (!level.has(feed.from)) continue
      let last = feed.from
      const passed: string[] = []
      for (let at = of(feed.from) + 1; at < of(part.id); at++) {
        const id = `${key}@${at}`
        put(id, at)
        before.set(id, [last])
        passed.push(id)
        last = id
      }
      via.set(key, passed)
      before.set(part.id, [...(before.get(part.id) ?? []), last])
    }
  columns.forEach((column, at) => {
    const wanted = column.map((id, i) => {
      const lanes = (before.get(id) ?? []).map((one) => spots.get(one)?.lane ?? 0)
      const own = lanes.length === 0 ? Infinity : lanes.reduce((a, b) => a + b, 0) / lanes.length
      return { id, i, own }
    })
    let next = 0
    for (const { id, own } of wanted.sort((a, b) => (a.own === b.own ? a.i - b.i : a.own - b.own))) {
      const lane = Number.isFinite(own) ? Math.max(next, own) : next
      spots.set(id, { id, level: at, lane })
      next = lane + 1
    }
  })
  return { spots, via }
}

const boxHeight = 68
const edge = 10
/** Sizes: lying boxes are as wide as two words; standing ones share the room there is. */
function sizesFor(way: Way, lanes: number, room: number) {
  if (way === 'lying') return { box: { width: 112, height: boxHeight }, level: 148, lane: 92 }
  const lane = Math.max(66, Math.min(160, (room - 2 * edge + 10) / lanes))
  return { box: { width: lane - 10, height: boxHeight }, level: 112, lane }
}
export type Way = 'lying' | 'standing'

/**
 * Lays a mode out.
 * @param way `lying`: power goes to the right; `standing`: down, for a phone
 * @param room px that a standing picture may be wide
 */
export function oneLineOf(
  { circuit, counted, excepted, findings }: Audited,
  way: Way,
  room: number,
): OneLine {
  const { wiring, state, reached, carrying, live } = circuit
  const parts = wiring.system.parts.filter(isPower)
  const { spots, via } = spotsOf(parts)
  const lanes = 1 + Math.max(0, ...[...spots.values()].map((spot) => spot.lane))
  const { box, level, lane } = sizesFor(way, lanes, room)
  const at = (id: string): readonly [number, number] => {
    const spot = spots.get(id) ?? { level: 0, lane: 0 }
    const [along, across] = [spot.level * level, spot.lane * lane]
    return way === 'lying'
      ? [edge + box.width / 2 + along, edge + box.height / 2 + across]
      : [edge + box.width / 2 + across, edge + box.height / 2 + along]
  }
  const marked = new Set(findings.flatMap((finding) => finding.parts))
  const is = (list: readonly { part: PowerPart }[], id: string) => list.some(({ part }) => part.id === id)
  const boxes = parts.map((part): Box => {
    const [x, y] = at(part.id)
    const own = wiring.bonds.some((bond) => bond.part.id === part.id)
    return {
      id: part.id,
      name: part.name,
      kind: part.kind,
      x,
      y,
      live: reached.has(part.id) || live.some(({ id }) => id === part.id),
      marked: marked.has(part.id),
      bond: is(counted, part.id) ? 'in' : is(excepted, part.id) ? 'excepted' : own ? 'cut' : 'none',
    }
  })
  const carries = new Set(carrying.map(({ key }) => key))
  const wires = wiring.feeds.map((run): Wire => {
    const stops = [run.feed.from, ...(via.get(run.key) ?? []), run.to.id].map(at)
    const points = stops.flatMap((to, i): (readonly [number, number])[] => {
      const from = stops[i - 1]
      if (from === undefined) return [to]
      const turn = way === 'lying' ? to[0] - level / 2 : to[1] - level / 2
      return way === 'lying' ? [[turn, from[1]], [turn, to[1]], to] : [[from[0], turn], [to[0], turn], to]
    })
    return {
      key: run.key,
      points,
      look: !isJoined(run, state) ? 'out' : carries.has(run.key) ? 'live' : 'dead',
      ground: run.feed.ground,
    }
  })
  const far = (axis: 'x' | 'y') => Math.max(0, ...boxes.map((one) => one[axis]))
  return {
    width: far('x') + box.width / 2 + edge,
    height: far('y') + box.height / 2 + edge,
    box,
    boxes,
    // What is live is drawn last, over the rest.
    wires: [...wires].sort((a, b) => Number(a.look === 'live') - Number(b.look === 'live')),
  }
}

/** Letters of 13 px that one line of a box has room for. */
export const boxLetters = ({ box }: OneLine): number => Math.floor((box.width - 10) / 7.3)

/** A name in up to two lines; what does not fit ends in an ellipsis. */
export function nameLines(name: string, letters: number): string[] {
  const lines: string[] = []
  for (const word of name.split(' ')) {
    const last = lines.at(-1)
    if (last !== undefined && `${last} ${word}`.length <= letters) lines[lines.length - 1] = `${last} ${word}`
    else lines.push(word)
  }
  const cut = (line: string) => (line.length > letters ? `${line.slice(0, letters - 1)}…` : line)
  const [first = '', ...rest] = lines
  return rest.length === 0 ? [cut(first)] : [cut(first), cut(rest.join(' '))]
}

/** The picture in words. */
export function oneLineWords(system: System, { boxes, wires }: OneLine): string {
  const live = boxes.filter((box) => box.live).map(({ name }) => name)
  const marked = boxes.filter((box) => box.marked).map(({ name }) => name)
  const out = wires.filter(({ look }) => look === 'out').length
  const says = [`Live: ${live.join(', ')}.`]
  if (marked.length > 0) says.push(`Marked: ${marked.join(', ')}.`)
  if (out > 0) says.push(out === 1 ? 'One cord is not plugged in.' : `${out} cords are not plugged in.`)
  return `${system.name === '' ? '' : `${system.name}. `}${says.join(' ')}`
}
