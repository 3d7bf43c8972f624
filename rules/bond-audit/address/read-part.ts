import {
  joinedWays,
  types,
  voltages,
  outputs,
  operated,
  neutrals,
  fixedBonds,
  roles,
  receptacleBonds,
  sizes,
  unnumber,
  nth,
} from './codes.ts'
import type { Part } from '../system.ts'

const readRun = ([length, neutral, ground, metal]: readonly string[]) =>
  length === undefined
    ? undefined
    : {
        length: unnumber(length),
        neutral: nth(sizes, neutral),
        ground: nth(sizes, ground),
        metal: metal === 'a' ? 'aluminum' : 'copper',
      }

type Raw = Record<string, unknown>

function readFeed(words: string | undefined, ref: (index: string | undefined) => string): Raw {
  const [from, flags = '', ...run] = (words ?? '').split('.')
  const read = readRun(run)
  return {
    from: ref(from),
    joined: nth(joinedWays, flags[0]),
    neutral: flags[1] === '1',
    ground: flags[2] === '1',
    gfci: flags[3] === '1',
    ...(read && { run: read }),
  }
}

/** A part's fields as they were written; whether they make a part is the schema's to say. */
export function readPart(
  kind: Part['kind'],
  fields: readonly string[],
  ref: (index: string | undefined) => string,
): Raw {
  const [flags = '', second = '', third] = fields
  switch (kind) {
    case 'source': {
      const [beside, alone] = (third ?? '').split('.')
      return {
        type: nth(types, flags[0]),
        volts: nth(voltages, flags[1]),
        output: nth(outputs, flags[2]),
        gfci: flags[3] === '1',
        relay: [
          ...(second[0] === '1' ? ['own-power'] : []),
          ...(second[1] === '1' ? ['passing-through'] : []),
        ],
        ...(third ? { parallel: { with: ref(beside), alone: alone === '1' } } : {}),
      }
    }
    case 'transformer':
      return { volts: nth(voltages, flags[0]), bond: flags[1] === '1', feed: readFeed(second, ref) }
    case 'autotransformer':
      return { bond: nth(fixedBonds, flags), feed: readFeed(second, ref) }
    case 'switch':
      return {
        operated: nth(operated, flags[0]),
        neutral: nth(neutrals, flags[1]),
        ...(second === '' ? {} : { inverter: ref(second) }),
        inputs: fields.slice(2).map((words) => readFeed(words, ref)),
      }
    case 'panel':
      return {
        role: nth(roles, flags[0]),
        bond: flags[1] === '1',
        multiwire: flags[2] === '1',
        feed: readFeed(second, ref),
        ...(flags.length > 3 && {
          outbuilding: { oldFeeder: flags[3] === '1', noMetalPath: flags[4] === '1' },
        }),
      }
    case 'receptacle':
      return {
        bond: nth(receptacleBonds, flags[0]),
        gfci: flags[1] === '1',
        ...(second === '' ? {} : { neutralAt: ref(second) }),
        feed: readFeed(third, ref),
      }
    case 'rod':
      return { at: ref(flags), ohms: unnumber(second) }
    case 'ground-wire': {
      const run = third ? readRun(third.split('.')) : undefined
      return { from: ref(flags), to: ref(second), ...(run && { run }) }
    }
  }
}
