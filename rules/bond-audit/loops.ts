import { pointsApart } from './joined.ts'
import { cordKey, switchKey } from './state.ts'
import type { Wiring } from './wiring.ts'

/**
 * Devices on a loop: where two ways lead from one part to another (a bypass beside an inverter, two cords between
 * the same two). Of these, two that are another way at once can do what neither does alone.
 */
export function devicesOnLoops(wiring: Wiring): ReadonlySet<string> {
  const ids = [...wiring.parts.keys()]
  const number = new Map(ids.map((id, i) => [id, i]))
  const edges = wiring.feeds.flatMap((at) => {
    const apart = at.to.kind === 'receptacle' && at.to.neutralAt !== undefined ? [at.to.neutralAt] : []
    return [at.feed.from, ...apart].map((from) => ({
      at,
      from: number.get(from) ?? 0,
      to: number.get(at.to.id) ?? 0,
    }))
  })
  // A run is on a loop when its ends stay joined without it.
  const onLoop = edges.filter((edge) => {
    const joined = pointsApart(ids.length)
    for (const id of ids)
      for (const one of wiring.group(id)) joined.join(number.get(id) ?? 0, number.get(one.id) ?? 0)
    for (const other of edges) if (other !== edge) joined.join(other.from, other.to)
    return joined.of(edge.from) === joined.of(edge.to)
  })
  return new Set(onLoop.flatMap(({ at }) => [cordKey(at.key), switchKey(at.to.id), switchKey(at.feed.from)]))
}
