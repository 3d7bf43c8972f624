import { pointsApart } from './joined.ts'
import { switchKey } from './device-keys.ts'
import type { Wiring } from './wiring.ts'

/**
 * Devices on a loop: where two ways lead from one part to another (a bypass beside an inverter, two cords between
 * the same two). Of these, two that are another way at once can do what neither does alone.
 */
export function devicesOnLoops(wiring: Wiring): ReadonlySet<string> {
  const { point, parts, groups } = wiring
  const edges = wiring.feeds.flatMap((at) => {
    const apart = at.to.kind === 'receptacle' && at.to.neutralAt !== undefined ? [at.to.neutralAt] : []
    return [at.feed.from, ...apart].map((from) => ({
      at,
      from: point(from),
      to: point(at.to.id),
    }))
  })
  // A run is on a loop when its ends stay joined without it.
  const onLoop = edges.filter((edge) => {
    const joined = pointsApart(parts.size)
    for (const [first, ...others] of groups)
      for (const { id } of others) if (first !== undefined) joined.join(point(first.id), point(id))
    for (const other of edges) if (other !== edge) joined.join(other.from, other.to)
    return joined.of(edge.from) === joined.of(edge.to)
  })
  return new Set(onLoop.flatMap(({ at }) => [at.cord, at.position, switchKey(at.feed.from)]))
}
