/** The conductors in circuit while certain sources are live and the switches, cords and relays are one way. */
import { pointsApart } from './joined.ts'
import type { Joined } from './joined.ts'
import { isJoined, relayClosed, switchKey, way } from './state.ts'
import type { State } from './state.ts'
import type { PowerPart, Source, Transformer } from './system.ts'
import type { Bond, FeedAt, Wiring } from './wiring.ts'

export type Live = Source | Transformer

export type Circuit = {
  wiring: Wiring
  /** What is live, in the order of their ids: one source, or several in parallel. */
  live: readonly Live[]
  state: State
  /** Runs that carry power, in the order it takes, and the parts it reaches. */
  carrying: readonly FeedAt[]
  /** Where a live run ends at an input of a switch that stands on another. */
  waiting: readonly FeedAt[]
  reached: ReadonlySet<string>
  /** Where power is used: panels, receptacles, a transformer's primary; a source by itself where it feeds nothing. */
  places: readonly PowerPart[]
  neutral: Joined
  /** By wire and raceway; soil is left out. */
  ground: Joined
  /** Numbers of points: a part's neutral and ground have the same; the end of a run at a switch has its own. */
  point: (partId: string) => number
  endOf: (at: FeedAt) => number
  /** Neutral points that are one piece of metal, with no run between them. */
  bar: Joined
  /** The two points that a run's neutral joins, where it has one and is there. */
  neutralOf: (at: FeedAt) => readonly [number, number] | undefined
  /** Whether a neutral point is joined to the live source's neutral. */
  onNeutral: (point: number) => boolean
  /** The bonds whose neutral side is. */
  bonds: readonly Bond[]
}

const sameOrder = (a: PowerPart, b: PowerPart) => (a.id < b.id ? -1 : 1)

/** Where power goes from the live sources. */
function follow(wiring: Wiring, live: readonly Live[], state: State) {
  const carrying: FeedAt[] = []
  const waiting: FeedAt[] = []
  const reached = new Set(live.map(({ id }) => id))
  const ahead = [...(live[0] === undefined ? [] : wiring.leaving(live[0].id))]
  for (let at = ahead.shift(); at !== undefined; at = ahead.shift()) {
    if (!isJoined(at, state)) continue
    const { to } = at
    if (to.kind === 'switch' && way(state, switchKey(to.id)) !== at.input) {
      waiting.push(at)
      continue
    }
    if (reached.has(to.id)) continue
    carrying.push(at)
    reached.add(to.id)
    // Behind a transformer another source begins.
    if (to.kind !== 'transformer') ahead.push(...wiring.leaving(to.id))
  }
  return { carrying, waiting, reached }
}

/**
 * The circuit of one state.
 * @param without keys of runs whose neutral counts as cut, to see what lies behind them
 */
export function circuitOf(
  wiring: Wiring,
  live: readonly Live[],
  state: State,
  without: ReadonlySet<string> = new Set(),
): Circuit {
  const ids = [...wiring.parts.keys()]
  const number = new Map(ids.map((id, i) => [id, i]))
  const feedNumber = new Map(wiring.feeds.map(({ key }, i) => [key, ids.length + i]))
  const point = (id: string) => number.get(id) ?? -1
  // A switch's inputs and a transformer's primary end at points of their own; elsewhere a run ends at its part.
  const endOf = ({ key, to }: FeedAt) =>
    to.kind === 'switch' || to.kind === 'transformer' ? (feedNumber.get(key) ?? -1) : point(to.id)
  const neutral = pointsApart(ids.length + wiring.feeds.length)
  const ground = pointsApart(ids.length)
  const bar = pointsApart(ids.length + wiring.feeds.length)
  const neutralOf = (at: FeedAt): readonly [number, number] | undefined => {
    const { feed, to, key } = at
    const from = wiring.parts.get(feed.from)
    const landsAt = to.kind === 'receptacle' ? (to.neutralAt ?? feed.from) : feed.from
    const has = feed.neutral && !(from?.kind === 'source' && from.volts === '240') && number.has(landsAt)
    return has && !without.has(key) && isJoined(at, state) ? [point(landsAt), endOf(at)] : undefined
  }
  for (const at of wiring.feeds) {
    const { feed, to, input } = at
    const ends = neutralOf(at)
    if (ends !== undefined) neutral.join(...ends)
    if (feed.ground && isJoined(at, state)) ground.join(point(feed.from), point(to.id))
    if (to.kind === 'switch' && (to.neutral === 'solid' || way(state, switchKey(to.id)) === input))
      for (const joined of [neutral, bar]) joined.join(endOf(at), point(to.id))
  }
  for (const { id } of wiring.parts.values())
    for (const other of wiring.group(id))
      for (const joined of [neutral, bar, ground]) joined.join(point(id), point(other.id))
  for (const { from, to } of wiring.groundWires) ground.join(point(from), point(to))

  const { carrying, waiting, reached } = follow(wiring, live, state)
  const roots = new Set<number>()
  const withoutNeutral = live.every(({ volts }) => volts === '240')
  if (!withoutNeutral) for (const { id } of live) roots.add(neutral.of(point(id)))
  for (const { to } of carrying) if (to.kind === 'autotransformer') roots.add(neutral.of(point(to.id)))
  const onNeutral = (at: number) => roots.has(neutral.of(at))
  const places = carrying
    .map(({ to }) => to)
    .filter(({ kind }) => kind === 'panel' || kind === 'receptacle' || kind === 'transformer')
  const alone = live.filter(({ id }) => wiring.leaving(id).length === 0)
  const liveIds = live.map(({ id }) => id)
  const utility = live.some((part) => part.kind === 'source' && part.type === 'utility')
  const closed = ({ part, how }: Bond) =>
    (how !== 'relay' || (part.kind === 'source' && relayClosed(wiring, part, liveIds, state))) &&
    !(how === 'autotransformer' && part.kind === 'autotransformer' && part.bond === 'relay' && utility)
  return {
    wiring,
    live,
    state,
    carrying,
    waiting,
    reached,
    places: [...places, ...alone].sort(sameOrder),
    neutral,
    ground,
    bar,
    neutralOf,
    point,
    endOf,
    onNeutral,
    bonds: wiring.bonds.filter((bond) => closed(bond) && onNeutral(point(bond.onto))),
  }
}
