import type { Feed, Part, Source, System } from '../../rules/bond-audit/system.ts'

/** What a part is called in a list: kinds, types and states in the trade's words. */
export const sourceTypes: readonly (readonly [Source['type'], string])[] = [
  ['utility', 'Utility'],
  ['inverter', 'Inverter, hard-wired'],
  ['power-station', 'Power station'],
  ['portable-generator', 'Generator, portable'],
  ['standby-generator', 'Generator, standby'],
]
export const voltageWords: readonly (readonly [Source['volts'], string])[] = [
  ['120', '120 V, hot and neutral'],
  ['120/240', '120/240 V, two hots and neutral'],
  ['240', '240 V, two hots, no neutral'],
  ['230', '230 V, line and neutral'],
]
export const outputWords: readonly (readonly [Source['output'], string])[] = [
  ['bonded', 'Bonded: a wire or strap ties neutral to its case'],
  ['relay', 'Bond made by a relay'],
  ['floating', 'Floating: nothing ties neutral to ground'],
  ['isolated', 'Isolated: its ground pins are tied to nothing either'],
  ['balanced', 'Balanced: both wires at half voltage'],
]
export const joinedWords: readonly (readonly [Feed['joined'], string])[] = [
  ['wired', 'Wired'],
  ['cord', 'A cord, plugged in or not'],
  ['taken-away', 'A cord that stays unplugged'],
]

const wordFor = <T extends string>(words: readonly (readonly [T, string])[], one: T) =>
  words.find(([value]) => value === one)?.[1] ?? one

const relayWords = ({ relay }: Source): string => {
  if (relay.length === 0) return 'bond relay off'
  if (relay.length === 2) return 'bond relay closed on its own power and when passing through'
  return relay[0] === 'own-power'
    ? 'bond relay closes on its own power'
    : 'bond relay closed when passing through'
}

const outputNote = (source: Source): string => {
  if (source.type === 'utility' && source.output === 'floating') return 'bonded at the service'
  if (source.output === 'relay') return relayWords(source)
  return { bonded: 'bonded inside', floating: 'floating', isolated: 'isolated', balanced: 'balanced' }[
    source.output
  ]
}

/** A line under a part's name: what it is and how it is fed. */
export function partNote(part: Part, { parts }: System): string {
  const nameOf = (id: string) => parts.find((one) => one.id === id)?.name ?? 'nothing yet'
  const from = (feed: Feed) =>
    `fed from ${nameOf(feed.from)}${feed.joined === 'cord' ? ' by a cord' : feed.joined === 'taken-away' ? ' by a cord that stays unplugged' : ''}${feed.ground ? '' : ', no grounding conductor'}`
  switch (part.kind) {
    case 'source':
      return [
        wordFor(sourceTypes, part.type),
        `${part.volts} V`,
        outputNote(part),
        ...(part.gfci ? ['GFCI'] : []),
        ...(part.parallel === undefined ? [] : [`in parallel with ${nameOf(part.parallel.with)}`]),
      ].join(', ')
    case 'transformer':
      return `Isolation transformer, ${from(part.feed)}; secondary ${part.bond ? 'bonded' : 'not bonded'}`
    case 'autotransformer':
      return `Autotransformer, ${from(part.feed)}; ${{ none: 'no bond', fixed: 'bonded', relay: 'bond relay' }[part.bond]}`
    case 'switch': {
      const kind =
        part.operated === 'built-in'
          ? `Transfer inside ${part.inverter === undefined ? 'an inverter' : nameOf(part.inverter)}`
          : part.operated === 'automatic'
            ? 'Automatic transfer switch'
            : 'Manual transfer switch'
      return `${kind}, neutral ${part.neutral === 'solid' ? 'not switched' : 'switched'}`
    }
    case 'panel':
      return `${part.role === 'main' ? 'Service panel' : 'Panel'}, ${from(part.feed)}; bond screw ${part.bond ? 'in' : 'out'}`
    case 'receptacle':
      return `Receptacle, ${from(part.feed)}${part.bond === 'none' ? '' : part.bond === 'jumper' ? '; jumper neutral to ground' : '; frame on neutral'}${part.gfci ? '; GFCI' : ''}`
    case 'rod':
      return `Rod at ${nameOf(part.at)}, ${part.ohms} Ω`
    case 'ground-wire':
      return `Grounding conductor, ${nameOf(part.from)} to ${nameOf(part.to)}`
  }
}

/** The two-way choice that matters most of a part: bond or no bond. Undefined where it is not as plain as that. */
export function plainBond(part: Part): { bonded: boolean; put: (bonded: boolean) => Part } | undefined {
  switch (part.kind) {
    case 'panel':
    case 'transformer':
      return { bonded: part.bond, put: (bond) => ({ ...part, bond }) }
    case 'source':
      if (part.type === 'utility' || part.volts === '240') return undefined
      if (part.output === 'relay')
        return {
          bonded: part.relay.length > 0,
          put: (bonded) => ({ ...part, relay: bonded ? ['own-power'] : [] }),
        }
      return part.output === 'bonded' || part.output === 'floating'
        ? {
            bonded: part.output === 'bonded',
            put: (bonded) => ({ ...part, output: bonded ? 'bonded' : 'floating' }),
          }
        : undefined
    default:
      return undefined
  }
}
