/** The conductors in circuit while certain sources are live and the switches, cords and relays are one way. */
import { pointsApart } from './joined.ts'
import type { Joined } from './joined.ts'
import { isChosen, isJoined, relayClosed } from './state.ts'
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
  /** Which parts' grounds are joined by wire or raceway; soil is left out. */
  ground: Joined
  /** Whether a neutral point is joined to the live source's neutral. */
  onNeutral: (point: number) => boolean
  /** The same with the neutrals of some runs cut, to see what lies behind them. */
  onNeutralBut: (cut: readonly FeedAt[]) => (point: number) => boolean
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
    if (!isChosen(at, state)) {
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

/** Which neutral points are joined, with the neutrals of some runs cut. */
function neutralJoined(wiring: Wiring, state: State, cut: readonly FeedAt[]): Joined {
  const joined = pointsApart(wiring.neutralPoints)
  for (const at of wiring.feeds) {
    const { neutral, to, end } = at
    if (neutral !== undefined && isJoined(at, state) && !cut.includes(at)) joined.join(...neutral)
    if (to.kind === 'switch' && (to.neutral === 'solid' || isChosen(at, state)))
      joined.join(end, wiring.point(to.id))
  }
  joinGroups(wiring, joined)
  return joined
}

/** Outputs of sources in parallel are one piece of metal. */
function joinGroups({ groups, point }: Wiring, joined: Joined): void {
  for (const [first, ...others] of groups)
    for (const { id } of others) if (first !== undefined) joined.join(point(first.id), point(id))
}

function groundJoined(wiring: Wiring, state: State): Joined {
  const { parts, feeds, groundWires, point } = wiring
  const joined = pointsApart(parts.size)
  for (const at of feeds)
    if (at.feed.ground && isJoined(at, state)) joined.join(point(at.feed.from), point(at.to.id))
  for (const { from, to } of groundWires) joined.join(point(from), point(to))
  joinGroups(wiring, joined)
  return joined
}

/** The circuit of one state. */
export function circuitOf(wiring: Wiring, live: readonly Live[], state: State): Circuit {
  const { point } = wiring
  const { carrying, waiting, reached } = follow(wiring, live, state)
  const withoutNeutral = live.every(({ volts }) => volts === '240')
  const roots = [
    ...(withoutNeutral ? [] : live.map(({ id }) => point(id))),
    ...carrying.flatMap(({ to }) => (to.kind === 'autotransformer' ? [point(to.id)] : [])),
  ]
  const onNeutralBut = (cut: readonly FeedAt[]) => {
    const joined = neutralJoined(wiring, state, cut)
    const own = roots.map(joined.of)
    return (at: number) => own.includes(joined.of(at))
  }
  const onNeutral = onNeutralBut([])
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
    ground: groundJoined(wiring, state),
    onNeutral,
    onNeutralBut,
    bonds: wiring.bonds.filter((bond) => closed(bond) && onNeutral(point(bond.onto))),
  }
}
