/** What can be one way or another while a system runs: switches, cords, and relays of sources that run beside. */
import { relayKey, switchKey } from './device-keys.ts'
import type { FeedAt, Wiring } from './wiring.ts'
import type { Source, Switch } from './system.ts'

export type Device =
  | { key: string; kind: 'switch'; part: Switch; ways: number }
  /** Way 0: unplugged. */
  | { key: string; kind: 'cord'; at: FeedAt; ways: 2 }
  /** A source with a bond relay and no transfer switch of its own. Way 0: not running. */
  | { key: string; kind: 'relay'; part: Source; ways: 2 }

/** Which way each device is; those left out are at 0. */
export type State = ReadonlyMap<string, number>

export const way = (state: State, key: string): number => state.get(key) ?? 0

/** Everything in this system that can be one way or another. */
export function devicesOf(wiring: Wiring): Device[] {
  const found: Device[] = []
  for (const part of wiring.parts.values()) {
    if (part.kind === 'switch')
      found.push({ key: switchKey(part.id), kind: 'switch', part, ways: part.inputs.length })
    if (
      part.kind === 'source' &&
      part.output === 'relay' &&
      part.relay.includes('own-power') &&
      wiring.builtIn(part.id) === undefined
    )
      found.push({ key: relayKey(part.id), kind: 'relay', part, ways: 2 })
  }
  for (const at of wiring.feeds)
    if (at.feed.joined === 'cord') found.push({ key: at.cord, kind: 'cord', at, ways: 2 })
  return found.sort((a, b) => (a.key < b.key ? -1 : 1))
}

/** Whether a run is there in this state. A cord that was taken away never is. */
export const isJoined = ({ cord, feed }: FeedAt, state: State): boolean =>
  feed.joined === 'wired' || (feed.joined === 'cord' && way(state, cord) === 1)

/** Whether the switch a run ends at stands on it; true for a run that ends elsewhere. */
export const isChosen = ({ to, position, input }: FeedAt, state: State): boolean =>
  to.kind !== 'switch' || way(state, position) === input

/** Whether a source's bond relay is closed while these sources are live. */
export function relayClosed(wiring: Wiring, source: Source, live: readonly string[], state: State): boolean {
  const builtIn = wiring.builtIn(source.id)
  const own = source.relay.includes('own-power')
  const among = wiring.group(source.id).some(({ id }) => live.includes(id))
  // Of sources in parallel, one that stopped has let go.
  if (among && !live.includes(source.id)) return false
  if (builtIn !== undefined)
    return way(state, switchKey(builtIn.switch.id)) === builtIn.own
      ? own
      : source.relay.includes('passing-through')
  return own && (among || way(state, relayKey(source.id)) === 1)
}
