/**
 * The operating modes a system has.
 *
 * For each source that can be live: the state in which it feeds all it can (`rest`: what is not in its way stands
 * still and unplugged), and from there each device that touches the live wires put another way, one after another;
 * what newly comes into touch by that is tried too. Devices side by side are not multiplied, but for those on a loop.
 * No fault is missed by that: bonds add up, so where one is in circuit at rest and no single device adds or takes
 * one, no number of them does. `tests/rules/bond-audit/modes.test.ts` holds it against the product of all positions.
 */
import { circuitOf } from './circuit.ts'
import type { Circuit, Live } from './circuit.ts'
import { devicesOnLoops } from './loops.ts'
import { devicesOf } from './state.ts'
import type { Device, State } from './state.ts'
import type { Source, System } from './system.ts'
import { wiringOf } from './wiring.ts'
import type { Wiring } from './wiring.ts'

export type Mode = {
  circuit: Circuit
  /** What is another way than when its sources feed all they can. */
  other: readonly Device[]
}

/** Sources that can be live together: each by itself; those in parallel all at once, and alone where they can be. */
export function liveSets(wiring: Wiring): Live[][] {
  const sets: Live[][] = []
  for (const part of wiring.parts.values()) {
    if (part.kind === 'transformer') sets.push([part])
    if (part.kind !== 'source') continue
    const group = wiring.group(part.id)
    if (group[0]?.id === part.id) sets.push([...group])
    if (group.length > 1 && group.some((one: Source) => one.parallel?.alone === true)) sets.push([part])
  }
  return sets
}

/** Everything these sources can reach, reached: switches stand on them, cords in their way are plugged in. */
function restState(wiring: Wiring, live: readonly Live[]): State {
  const state = new Map<string, number>()
  const ahead = [...(live[0] === undefined ? [] : wiring.leaving(live[0].id))]
  const passed = new Set<string>()
  for (let at = ahead.shift(); at !== undefined; at = ahead.shift()) {
    if (at.feed.joined === 'taken-away') continue
    if (at.feed.joined === 'cord') state.set(at.cord, 1)
    const { to } = at
    if (to.kind === 'switch') {
      if (state.has(at.position)) continue
      state.set(at.position, at.input)
    }
    if (passed.has(to.id)) continue
    passed.add(to.id)
    if (to.kind !== 'transformer') ahead.push(...wiring.leaving(to.id))
  }
  return state
}

/** Whether putting a device another way can change what is live or what is joined to the live neutral. */
function touches(circuit: Circuit, device: Device): boolean {
  const { wiring, reached, onNeutral, live, waiting } = circuit
  const { point } = wiring
  if (device.kind === 'relay')
    return (
      !wiring.group(device.part.id).some(({ id }) => live.some((one) => one.id === id)) &&
      onNeutral(point(device.part.id))
    )
  if (device.kind === 'cord') {
    const { feed } = device.at
    const ends = [point(feed.from), device.at.end]
    const onBus = wiring.group(feed.from).some(({ id }) => reached.has(id))
    return reached.has(feed.from) || onBus || (feed.neutral && ends.some(onNeutral))
  }
  const { part } = device
  if (reached.has(part.id) || waiting.some(({ to }) => to.id === part.id)) return true
  // Neutral alone: its position counts where it moves the neutral, or a relay with it.
  const moves = part.neutral === 'switched' || part.operated === 'built-in'
  const inputs = wiring.feeds.filter(({ to }) => to.id === part.id)
  return moves && (onNeutral(point(part.id)) || inputs.some(({ end }) => onNeutral(end)))
}

/** Ways a device can be put: a switch can stand on an input whose cord was taken away, too. */
const waysOf = ({ ways }: Device): number[] => Array.from({ length: ways }, (_, i) => i)

/** The states of one live set: at rest, and one device after another put another way. */
function statesOf(
  wiring: Wiring,
  devices: readonly Device[],
  loops: ReadonlySet<string>,
  live: readonly Live[],
): Mode[] {
  const found: Mode[] = []
  const seen = new Set<string>()
  const explore = (state: State, other: readonly Device[], open: readonly Device[]) => {
    const circuit = circuitOf(wiring, live, state)
    const key = devices.map((device) => state.get(device.key) ?? 0).join()
    if (seen.has(key)) return
    seen.add(key)
    if (circuit.places.length > 0) found.push({ circuit, other })
    const touched = open.filter((device) => touches(circuit, device))
    const untouched = open.filter((device) => !touched.includes(device))
    for (const device of touched)
      for (const value of waysOf(device)) {
        if (value === (state.get(device.key) ?? 0)) continue
        const again = (one: Device) => one !== device && loops.has(device.key) && loops.has(one.key)
        const next = open.filter((one) => untouched.includes(one) || again(one))
        explore(new Map(state).set(device.key, value), [...other, device], next)
      }
  }
  explore(restState(wiring, live), [], devices)
  return found
}

/** Every mode of a system that feeds something, each source's mode at rest first. */
export function modesOf(system: System): Mode[] {
  const wiring = wiringOf(system)
  const devices = devicesOf(wiring)
  const loops = devicesOnLoops(wiring)
  return liveSets(wiring).flatMap((live) => statesOf(wiring, devices, loops, live))
}

/** How many states the product of all positions has, over all live sets: what the search spares. */
export function productOfStates(system: System): number {
  const wiring = wiringOf(system)
  const ways = devicesOf(wiring).reduce((product, device) => product * device.ways, 1)
  return liveSets(wiring).length * ways
}

/**
 * Sources that would feed something, or more, if cords that were taken away were plugged in: each with the places.
 */
export function takenAway(system: System): { live: readonly Live[]; places: readonly string[] }[] {
  const plugged: System = {
    ...system,
    parts: system.parts.map((part) => {
      const back = <F extends { joined: string }>(feed: F): F =>
        feed.joined === 'taken-away' ? { ...feed, joined: 'cord' } : feed
      if (part.kind === 'switch') return { ...part, inputs: part.inputs.map(back) }
      return 'feed' in part ? { ...part, feed: back(part.feed) } : part
    }),
  }
  const [now, then] = [wiringOf(system), wiringOf(plugged)]
  return liveSets(now).flatMap((live) => {
    const has = new Set(circuitOf(now, live, restState(now, live)).places.map(({ id }) => id))
    const would = circuitOf(then, live, restState(then, live)).places
    const gone = would.filter(({ id }) => !has.has(id) && !live.some((one) => one.id === id))
    return gone.length === 0 ? [] : [{ live, places: gone.map(({ name }) => name) }]
  })
}
