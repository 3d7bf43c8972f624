/** A system looked up by its wires: what leaves each part, who runs beside whom, which bonds there are. */
import { cordKey, switchKey } from './device-keys.ts'
import { feedsOf, isPower } from './system.ts'
import type { Feed, GroundWire, PowerPart, Rod, Source, Switch, System } from './system.ts'

/** One run from a part to a part, or to one input of a switch. */
export type FeedAt = {
  key: string
  feed: Feed
  to: PowerPart
  input: number
  /** Where its neutral starts and ends, as numbers of points; undefined where it has none. */
  neutral: readonly [number, number] | undefined
  /** Where it ends: a part's number, or at a switch and a transformer a number of its own. */
  end: number
  /** Names of the devices it depends on: its own cord, and the switch it ends at. */
  cord: string
  position: string
}

/** A place where neutral and ground are joined, or a contact that can join them. */
export type Bond = {
  /** The part it is in. One part has one at most, so its id names the bond too. */
  part: PowerPart
  how: 'source' | 'relay' | 'screw' | 'jumper' | 'existing-range' | 'transformer' | 'autotransformer'
  /**
   * The part whose neutral it ties: its own, but for an inverter with a transfer switch inside. There the strap or
   * relay sits at the output, past the switch, so that it is on whatever passes through.
   */
  onto: string
}

export type Wiring = {
  system: System
  parts: ReadonlyMap<string, PowerPart>
  feeds: readonly FeedAt[]
  /** Each part's number. Neutral has a point for each part, then one for each run; ground one for each part. */
  point: (partId: string) => number
  neutralPoints: number
  /** Runs that start at this part or at one that runs into the same wires, in the order of their keys. */
  leaving: (id: string) => readonly FeedAt[]
  /** Sources that run into the same wires, this one among them, in the order of their ids. */
  group: (id: string) => readonly Source[]
  /** All of those groups that have two or more. */
  groups: readonly (readonly Source[])[]
  /** The switch inside the inverter of this source's group, and which input is its own output. */
  builtIn: (id: string) => { switch: Switch; own: number } | undefined
  bonds: readonly Bond[]
  rods: readonly Rod[]
  groundWires: readonly GroundWire[]
}

/** Lists of those that have the same name. */
function grouped<T>(all: readonly T[], nameOf: (one: T) => string): ReadonlyMap<string, readonly T[]> {
  const groups = new Map<string, T[]>()
  for (const one of all) {
    const group = groups.get(nameOf(one))
    if (group === undefined) groups.set(nameOf(one), [one])
    else group.push(one)
  }
  return groups
}

const byKey = (a: { key: string }, b: { key: string }) => (a.key < b.key ? -1 : 1)

function bondIn(part: PowerPart): Omit<Bond, 'onto'> | undefined {
  switch (part.kind) {
    case 'source':
      if (part.volts === '240') return undefined
      return part.output === 'bonded'
        ? { part, how: 'source' }
        : part.output === 'relay'
          ? { part, how: 'relay' }
          : undefined
    case 'panel':
      return part.bond ? { part, how: 'screw' } : undefined
    case 'receptacle':
      return part.bond === 'none' ? undefined : { part, how: part.bond }
    case 'transformer':
      return part.bond ? { part, how: 'transformer' } : undefined
    case 'autotransformer':
      return part.bond === 'none' ? undefined : { part, how: 'autotransformer' }
    case 'switch':
      return undefined
  }
}

/** Which source a chain of "runs in parallel with" ends at. Loops end where they began. */
function busOf(id: string, parts: ReadonlyMap<string, PowerPart>): string {
  const seen = new Set<string>()
  let at = id
  while (!seen.has(at)) {
    seen.add(at)
    const part = parts.get(at)
    if (part?.kind !== 'source' || part.parallel === undefined) return at
    at = part.parallel.with
  }
  return [...seen].sort()[0] ?? id
}

/** Looks a system up. A feed from a part that isn't there leads nowhere; `checkSystem` says so to whoever types. */
export function wiringOf(system: System): Wiring {
  const powers = system.parts.filter(isPower)
  const parts = new Map(powers.map((part) => [part.id, part]))
  const numbers = new Map(powers.map(({ id }, i) => [id, i]))
  const point = (id: string) => numbers.get(id) ?? -1
  const feeds = powers
    .flatMap((to) => feedsOf(to).map((one) => ({ ...one, to })))
    .filter(({ feed }) => parts.has(feed.from))
    .sort(byKey)
    .map((one, i): FeedAt => {
      const { feed, to, key } = one
      const from = parts.get(feed.from)
      const own = to.kind === 'switch' || to.kind === 'transformer'
      const end = own ? powers.length + i : point(to.id)
      const landsAt = to.kind === 'receptacle' ? (to.neutralAt ?? feed.from) : feed.from
      const has = feed.neutral && !(from?.kind === 'source' && from.volts === '240') && parts.has(landsAt)
      return {
        ...one,
        end,
        neutral: has ? [point(landsAt), end] : undefined,
        cord: cordKey(key),
        position: switchKey(to.id),
      }
    })
  const bus = new Map(powers.map(({ id }) => [id, busOf(id, parts)]))
  const leaving = grouped(feeds, ({ feed }) => bus.get(feed.from) ?? feed.from)
  const inOrder = [...powers].sort((a, b) => (a.id < b.id ? -1 : 1))
  const sources = inOrder.filter((part): part is Source => part.kind === 'source')
  const groups = grouped(sources, ({ id }) => bus.get(id) ?? id)
  const group = (id: string) => groups.get(bus.get(id) ?? id) ?? []
  const builtIn = new Map<string, { switch: Switch; own: number }>()
  for (const part of inOrder)
    if (part.kind === 'switch' && part.operated === 'built-in' && part.inverter !== undefined) {
      const root = bus.get(part.inverter)
      const own = part.inputs.findIndex(({ from }) => bus.get(from) === root)
      if (root !== undefined && own >= 0 && !builtIn.has(root)) builtIn.set(root, { switch: part, own })
    }
  const bonds = powers.flatMap((part): Bond[] => {
    const bond = bondIn(part)
    const past = part.kind === 'source' ? builtIn.get(bus.get(part.id) ?? part.id)?.switch : undefined
    return bond === undefined ? [] : [{ ...bond, onto: past?.id ?? part.id }]
  })
  return {
    system,
    parts,
    feeds,
    point,
    neutralPoints: powers.length + feeds.length,
    leaving: (id) => leaving.get(bus.get(id) ?? id) ?? [],
    group,
    groups: [...groups.values()].filter((all) => all.length > 1),
    builtIn: (id) => builtIn.get(bus.get(id) ?? id),
    bonds,
    rods: system.parts.filter((part): part is Rod => part.kind === 'rod' && parts.has(part.at)),
    groundWires: system.parts.filter(
      (part): part is GroundWire => part.kind === 'ground-wire' && parts.has(part.from) && parts.has(part.to),
    ),
  }
}
