import { idFrom } from '../../rules/bond-audit/address/codes.ts'
import { feedsOf, isPower } from '../../rules/bond-audit/system.ts'
import type { Feed, Part, Source, System } from '../../rules/bond-audit/system.ts'

/** Stands for "not chosen yet": no part has it, so the check says so beside the field. */
export const notChosen = 'nothing'

/** What can be added, in the order of the list. */
export const addable = [
  ['utility', 'Utility'],
  ['inverter', 'Inverter'],
  ['power-station', 'Power station'],
  ['portable-generator', 'Portable generator'],
  ['standby-generator', 'Standby generator'],
  ['panel', 'Panel'],
  ['switch', 'Transfer switch'],
  ['built-in', 'Transfer inside an inverter'],
  ['receptacle', 'Receptacle'],
  ['transformer', 'Isolation transformer'],
  ['autotransformer', 'Autotransformer'],
  ['rod', 'Rod'],
  ['ground-wire', 'Grounding conductor'],
] as const
export type Addable = (typeof addable)[number][0]

/** A name, and an id of it, that no other part has. */
function fresh({ parts }: System, name: string): { id: string; name: string } {
  for (let i = 1; ; i++) {
    const own = i === 1 ? name : `${name} ${i}`
    const id = idFrom(own)
    if (!parts.some((part) => part.id === id || part.name.toLowerCase() === own.toLowerCase()))
      return { id, name: own }
  }
}

/** A part with the usual values, fed from the last part that can feed one. */
export function newPart(what: Addable, system: System): Part {
  const named = fresh(system, addable.find(([kind]) => kind === what)?.[1] ?? 'Part')
  const powers = system.parts.filter(isPower)
  const last = powers.filter(({ kind }) => kind !== 'receptacle').at(-1)?.id ?? notChosen
  const feed = (from: string, more: Partial<Feed> = {}): Feed => ({
    from,
    joined: 'wired',
    neutral: true,
    ground: true,
    gfci: false,
    ...more,
  })
  const source = (more: Partial<Source>): Source => ({
    kind: 'source',
    ...named,
    type: 'inverter',
    volts: '120/240',
    output: 'floating',
    relay: [],
    gfci: false,
    ...more,
  })
  switch (what) {
    case 'utility':
    case 'standby-generator':
      return source({ type: what })
    case 'inverter':
      return source({ volts: '120', output: 'relay', relay: ['own-power'] })
    case 'power-station':
      return source({ type: what, volts: '120', output: 'isolated' })
    case 'portable-generator':
      return source({ type: what, output: 'bonded', gfci: true })
    case 'panel': {
      const first = !powers.some(({ kind }) => kind === 'panel')
      const onUtility = powers.some(
        (part) => part.kind === 'source' && part.id === last && part.type === 'utility',
      )
      return {
        kind: 'panel',
        ...named,
        role: first && onUtility ? 'main' : 'sub',
        feed: feed(last),
        bond: first && onUtility,
        multiwire: false,
      }
    }
    case 'switch': {
      const used = new Set(powers.flatMap((part) => feedsOf(part).map((one) => one.feed.from)))
      const free = powers.filter(({ id, kind }) => !used.has(id) && kind !== 'receptacle').map(({ id }) => id)
      return {
        kind: 'switch',
        ...named,
        operated: 'manual',
        neutral: 'solid',
        inputs: [feed(free[0] ?? last), feed(free[1] ?? notChosen)],
      }
    }
    case 'built-in': {
      const inverter = powers.filter((part) => part.kind === 'source' && part.type !== 'utility').at(-1)
      const other = powers.filter(({ id, kind }) => id !== inverter?.id && kind !== 'receptacle').at(-1)
      return {
        kind: 'switch',
        ...named,
        operated: 'built-in',
        inverter: inverter?.id ?? notChosen,
        neutral: 'switched',
        inputs: [feed(inverter?.id ?? notChosen), feed(other?.id ?? notChosen)],
      }
    }
    case 'receptacle':
      return { kind: 'receptacle', ...named, feed: feed(last), gfci: false, bond: 'none' }
    case 'transformer':
      return { kind: 'transformer', ...named, feed: feed(last), volts: '120', bond: true }
    case 'autotransformer':
      return { kind: 'autotransformer', ...named, feed: feed(last, { neutral: false }), bond: 'none' }
    case 'rod':
      return { kind: 'rod', ...named, at: last, ohms: 30 }
    case 'ground-wire':
      return { kind: 'ground-wire', ...named, from: powers[0]?.id ?? notChosen, to: last }
  }
}

/** The system without a part. What it fed is fed by what fed it, where there is such. */
export function withoutPart(system: System, id: string): System {
  const gone = system.parts.find((part) => part.id === id)
  const before = (gone === undefined ? undefined : feedsOf(gone)[0]?.feed.from) ?? notChosen
  const moved = (feed: Feed): Feed => (feed.from === id ? { ...feed, from: before } : feed)
  const at = (one: string) => (one === id ? before : one)
  return {
    ...system,
    parts: system.parts.flatMap((part): Part[] => {
      if (part.id === id) return []
      if (part.kind === 'switch') return [{ ...part, inputs: part.inputs.map(moved) }]
      if (part.kind === 'rod') return [{ ...part, at: at(part.at) }]
      if (part.kind === 'ground-wire') return [{ ...part, from: at(part.from), to: at(part.to) }]
      if (part.kind === 'source') {
        const { parallel, ...alone } = part
        return [parallel?.with === id ? alone : part]
      }
      const fed = { ...part, feed: moved(part.feed) }
      if (fed.kind !== 'receptacle') return [fed]
      const { neutralAt, ...plain } = fed
      return [neutralAt === id ? plain : fed]
    }),
  }
}
