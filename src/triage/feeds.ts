import type { Triage } from './triage-state.ts'

type Choice = { value: string; label: string; note?: string }

/** The ids are the edition's; "unsure" is ours and becomes a plain assumption, said on the result. */
export const sources: readonly Choice[] = [
  {
    value: 'all-in-one-inverter',
    label: 'A hard-wired inverter',
    note: 'A box on the wall with batteries; cables go from it into the house',
  },
  {
    value: 'standalone-inverter',
    label: 'A small inverter with its own outlets',
    note: 'Battery cables in, plugs straight into it. Vans, cabins, boats',
  },
  {
    value: 'power-station',
    label: 'A portable power station',
    note: 'Battery and outlets in one box with a handle',
  },
  { value: 'generator', label: 'An engine generator', note: 'Gasoline, propane or diesel' },
  { value: 'utility', label: 'The utility', note: 'The power company’s line' },
  { value: 'unsure', label: 'Not sure' },
]

export const twoForty: readonly Choice[] = [
  { value: 'yes', label: 'Yes', note: 'A large dryer, range or well pump runs' },
  { value: 'no', label: 'No', note: 'Only plain 120 V outlets' },
  { value: '230', label: 'All is 230 V', note: 'Outside North America' },
  { value: 'unsure', label: 'Not sure' },
]

export const wirings: readonly Choice[] = [
  { value: 'panel', label: 'Through a breaker panel', note: 'The outlets are in the walls' },
  { value: 'direct', label: 'Plugged into the source itself', note: 'Or into a cord from it' },
  { value: 'unsure', label: 'Not sure' },
]

export const modes: readonly Choice[] = [
  { value: 'battery', label: 'On battery', note: 'It makes the power itself' },
  { value: 'pass-through', label: 'Passing power through', note: 'From the utility or a generator' },
  { value: 'unsure', label: 'Not sure' },
]

const hasModes = new Set(['all-in-one-inverter', 'power-station'])
/** Whether the source works in more than one mode, so that it is worth asking. */
export const asksMode = (source: string | undefined): boolean => source !== undefined && hasModes.has(source)

const plugsIntoItself = new Set(['standalone-inverter', 'power-station', 'generator'])

export type Assumed = {
  context: { source: string; system: string; wiring: string; mode?: string }
  words: string[]
}

/** What feeds it, with a plain assumption for whatever they left open or weren't sure of; each is said. */
export function assume(feeds: Triage['feeds']): Assumed {
  const words: string[] = []
  const known = (value: string | undefined) => (value === undefined || value === 'unsure' ? undefined : value)
  const given = (value: string | undefined, otherwise: string, says: string): string => {
    const one = known(value)
    if (one === undefined) words.push(says)
    return one ?? otherwise
  }
  const source = given(feeds.source, 'all-in-one-inverter', 'a hard-wired inverter feeds it')
  const utility = source === 'utility'
  const answer = given(
    feeds.twoForty,
    utility ? 'yes' : 'no',
    utility ? 'there is 240 V too' : 'there is only 120 V',
  )
  const direct = plugsIntoItself.has(source)
  const wiring = given(
    feeds.wiring,
    direct ? 'direct' : 'panel',
    direct ? 'things plug straight into it' : 'a breaker panel stands between',
  )
  const system = answer === 'yes' ? '120/240' : answer === '230' ? '230' : '120'
  if (!asksMode(source)) return { context: { source, system, wiring }, words }
  const mode = given(feeds.mode, 'battery', 'it ran on its battery')
  return { context: { source, system, wiring, mode }, words }
}
