/** What can be changed about a part itself: a screw, a strap, a setting, the part. */
import type { Part, Receptacle, Source } from '../system.ts'
import { change } from './change.ts'
import type { Change } from './change.ts'

function ofReceptacle(part: Receptacle): Change[] {
  const { neutralAt, ...plain } = part
  return [
    ...(part.bond === 'none' && !part.feed.ground
      ? [
          change(
            part,
            3,
            'put a GFCI in and mark it “No Equipment Ground”, where it replaces a receptacle that never had one (NEC 406.4(D)(2)).',
            { ...part, gfci: true },
          ),
        ]
      : []),
    ...(part.bond === 'jumper' && !part.feed.ground
      ? [
          change(
            part,
            3,
            'take the jumper out; put a GFCI in and mark it “No Equipment Ground”, or run a grounding conductor.',
            { ...part, bond: 'none', gfci: true },
          ),
        ]
      : []),
    ...(part.bond === 'jumper' && part.feed.ground
      ? [
          change(part, 1, 'take the jumper out, then look for what it was to hide.', {
            ...part,
            bond: 'none',
          }),
        ]
      : []),
    ...(part.bond === 'existing-range' && part.feed.ground
      ? [
          change(part, 2, 'use its grounding conductor, and take the frame off the neutral.', {
            ...part,
            bond: 'none',
          }),
        ]
      : []),
    ...(neutralAt === undefined
      ? []
      : [change(part, 2, 'move its neutral to the panel its breaker is in.', plain)]),
  ]
}

function ofSource(part: Source): Change[] {
  if (part.type === 'utility' || part.volts === '240') return []
  const found: Change[] = []
  if (part.output === 'bonded')
    found.push(
      change(part, 5, 'have its bond taken out, only as its instructions allow.', {
        ...part,
        output: 'floating',
      }),
    )
  const generates = part.type === 'portable-generator' || part.type === 'standby-generator'
  if (part.output === 'floating' && generates)
    found.push(
      change(
        part,
        6,
        'have it bonded in itself, as its instructions show.',
        { ...part, output: 'bonded' },
        true,
      ),
    )
  if (part.output !== 'relay') return found
  if (part.relay.includes('passing-through'))
    found.push(
      change(part, 3, 'set its bond relay to close on its own power alone.', {
        ...part,
        relay: part.relay.filter((when) => when === 'own-power'),
      }),
    )
  found.push(
    part.relay.length > 0
      ? change(part, 3, 'turn its bond relay off, as its instructions allow.', { ...part, relay: [] })
      : change(
          part,
          3,
          'turn its own bond relay on for its own power.',
          { ...part, relay: ['own-power'] },
          true,
        ),
  )
  return found
}

export function ownChanges(part: Part): Change[] {
  switch (part.kind) {
    case 'panel': {
      const found: Change[] = []
      if (part.bond && part.role === 'sub')
        found.push(
          part.feed.ground
            ? change(
                part,
                1,
                'take the bond screw or strap out. Keep neutrals and grounds on separate bars.',
                { ...part, bond: false },
              )
            : change(part, 5, 'run a grounding conductor to it, then take the bond screw or strap out.', {
                ...part,
                bond: false,
                feed: { ...part.feed, ground: true },
              }),
        )
      if (part.multiwire)
        found.push(change(part, 6, 'give each circuit a neutral of its own.', { ...part, multiwire: false }))
      return found
    }
    case 'receptacle':
      return ofReceptacle(part)
    case 'source':
      return ofSource(part)
    case 'transformer':
      return [
        part.bond
          ? change(part, 3, 'leave its bond out.', { ...part, bond: false })
          : change(part, 3, 'bond its secondary, as its instructions show.', { ...part, bond: true }, true),
      ]
    case 'autotransformer':
      return part.bond === 'none'
        ? []
        : [change(part, 3, 'leave its bond out, as its instructions allow.', { ...part, bond: 'none' })]
    case 'switch':
      // The one inside an inverter comes with it.
      if (part.operated === 'built-in') return []
      return [
        part.neutral === 'solid'
          ? change(part, 8, 'replace it with transfer equipment that switches the neutral.', {
              ...part,
              neutral: 'switched',
            })
          : change(part, 8, 'replace it with transfer equipment that leaves the neutral joined.', {
              ...part,
              neutral: 'solid',
            }),
      ]
    case 'rod':
    case 'ground-wire':
      return []
  }
}
