import { feedsOf } from './system.ts'
import type { PowerPart } from './system.ts'

/** A column for each part: after what feeds it; a source just before the first that it feeds. */
export function levelsOf(parts: readonly PowerPart[]): Map<string, number> {
  const level = new Map<string, number>()
  const byId = new Map(parts.map((part) => [part.id, part]))
  const of = (part: PowerPart, seen: ReadonlySet<string>): number => {
    const known = level.get(part.id)
    if (known !== undefined) return known
    const before = feedsOf(part)
      .map(({ feed }) => byId.get(feed.from))
      .filter((from) => from !== undefined && !seen.has(from.id))
      .map((from) => (from === undefined ? 0 : of(from, new Set([...seen, part.id]))))
    const own = before.length === 0 ? 0 : Math.max(...before) + 1
    level.set(part.id, own)
    return own
  }
  parts.forEach((part) => of(part, new Set([part.id])))
  for (const part of parts) {
    if (feedsOf(part).length > 0) continue
    const next = parts.flatMap((other) =>
      feedsOf(other).some(({ feed }) => feed.from === part.id) ? [level.get(other.id) ?? 1] : [],
    )
    if (next.length > 0) level.set(part.id, Math.min(...next) - 1)
  }
  return level
}
