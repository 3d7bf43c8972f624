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
  number,
  flag,
  place,
} from './codes.ts'
import type { Feed, Part, Run } from '../system.ts'

const writeRun = (run: Run | undefined): string[] =>
  run === undefined
    ? []
    : [
        number(run.length),
        place(sizes, run.neutral),
        place(sizes, run.ground),
        run.metal === 'copper' ? 'c' : 'a',
      ]
type Write = (part: Part, ref: (id: string) => string) => string[]
const writeFeed = (feed: Feed, ref: (id: string) => string) =>
  [
    ref(feed.from),
    place(joinedWays, feed.joined) + [feed.neutral, feed.ground, feed.gfci].map(flag).join(''),
    ...writeRun(feed.run),
  ].join('.')

/** The fields of a part after its kind, id and name. */
export const writePart: Write = (part, ref) => {
  switch (part.kind) {
    case 'source':
      return [
        place(types, part.type) + place(voltages, part.volts) + place(outputs, part.output) + flag(part.gfci),
        flag(part.relay.includes('own-power')) + flag(part.relay.includes('passing-through')),
        part.parallel === undefined ? '' : `${ref(part.parallel.with)}.${flag(part.parallel.alone)}`,
      ]
    case 'transformer':
      return [place(voltages, part.volts) + flag(part.bond), writeFeed(part.feed, ref)]
    case 'autotransformer':
      return [place(fixedBonds, part.bond), writeFeed(part.feed, ref)]
    case 'switch':
      return [
        place(operated, part.operated) + place(neutrals, part.neutral),
        part.inverter === undefined ? '' : ref(part.inverter),
        ...part.inputs.map((feed) => writeFeed(feed, ref)),
      ]
    case 'panel': {
      const apart = part.outbuilding
      const out = apart === undefined ? '' : flag(apart.oldFeeder) + flag(apart.noMetalPath)
      return [
        place(roles, part.role) + flag(part.bond) + flag(part.multiwire) + out,
        writeFeed(part.feed, ref),
      ]
    }
    case 'receptacle':
      return [
        place(receptacleBonds, part.bond) + flag(part.gfci),
        part.neutralAt === undefined ? '' : ref(part.neutralAt),
        writeFeed(part.feed, ref),
      ]
    case 'rod':
      return [ref(part.at), number(part.ohms)]
    case 'ground-wire':
      return [ref(part.from), ref(part.to), writeRun(part.run).join('.')]
  }
}
