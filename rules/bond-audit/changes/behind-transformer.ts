import type { Feed, Part } from '../system.ts'
import type { Change } from './change.ts'

/** Its loads behind a listed isolation transformer. */
export function behindTransformer(part: Part): Change[] {
  if (part.kind !== 'source' || part.output !== 'balanced' || part.volts === '240') return []
  const id = `${part.id}-isolation`
  const moved = (feed: Feed): Feed => (feed.from === part.id ? { ...feed, from: id } : feed)
  return [
    {
      part: part.id,
      says: 'replace it with a source that has a neutral, or put a listed isolation transformer with a bonded secondary behind it.',
      work: 8,
      bonds: false,
      apply: (system) => ({
        ...system,
        parts: [
          ...system.parts.map((one): Part => {
            if (one.kind === 'switch') return { ...one, inputs: one.inputs.map(moved) }
            // A panel behind it is a first disconnect with the bond ahead of it: its own screw comes out.
            if (one.kind === 'panel')
              return { ...one, feed: moved(one.feed), bond: one.role === 'main' && one.bond }
            return 'feed' in one ? { ...one, feed: moved(one.feed) } : one
          }),
          {
            kind: 'transformer',
            id,
            name: `Transformer of ${part.name}`.slice(0, 28),
            feed: { from: part.id, joined: 'wired', neutral: true, ground: true, gfci: false },
            volts: part.volts,
            bond: true,
          },
        ],
      }),
    },
  ]
}
