/** Wires to run and cords to take away. */
import type { Feed, Part, System } from '../system.ts'
import { change } from './change.ts'
import type { Change } from './change.ts'

/** Each feed of a part, with the part as it is when that feed is another. */
function withFeed(part: Part, how: (feed: Feed) => Feed | undefined): Part[] {
  if (part.kind === 'switch')
    return part.inputs.flatMap((feed, i) => {
      const next = how(feed)
      return next === undefined
        ? []
        : [{ ...part, inputs: part.inputs.map((old, k) => (k === i ? next : old)) }]
    })
  if (!('feed' in part)) return []
  const next = how(part.feed)
  return next === undefined ? [] : [{ ...part, feed: next } as Part]
}

export const wireChanges = (part: Part): Change[] => [
  ...(['wired', 'cord'] as const).flatMap((joined) =>
    withFeed(part, (feed) =>
      feed.ground || feed.joined !== joined ? undefined : { ...feed, ground: true },
    ).map((to) =>
      joined === 'cord'
        ? change(part, 2, 'use a cord that has a grounding conductor.', to)
        : change(part, 5, 'run a grounding conductor to it with its power wires.', to),
    ),
  ),
  ...withFeed(part, (feed) => (feed.neutral ? undefined : { ...feed, neutral: true })).map((to) =>
    change(part, 5, 'run a neutral to it.', to),
  ),
]

export function unplugged(part: Part, system: System): Change[] {
  return withFeed(part, (feed) =>
    feed.joined === 'cord' ? { ...feed, joined: 'taken-away' } : undefined,
  ).map((to) => {
    const feeds = (one: Part) => (one.kind === 'switch' ? one.inputs : 'feed' in one ? [one.feed] : [])
    const gone = feeds(to).find(
      ({ joined }, i) => joined === 'taken-away' && feeds(part)[i]?.joined === 'cord',
    )
    const from = system.parts.find(({ id }) => id === gone?.from)?.name ?? 'its source'
    return change(
      part,
      4,
      `take the cord from ${from} away and keep it for plug-in loads, as local code allows (NEC 250.34, 445.20). A mode taken away, not one bond.`,
      to,
    )
  })
}
