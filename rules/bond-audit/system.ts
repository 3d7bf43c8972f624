/**
 * A power system by its parts, as the bond audit takes it: what each part is, what feeds it, and which wires come
 * along. Lengths are in feet or meters and sizes in AWG or mm², as the system's `units` say.
 */
import * as z from 'zod/mini'
import type { Gauge, SquareMillimeters } from '../circuit/conductors.ts'

export const gauges = ['14', '12', '10', '8', '6', '4', '3', '2', '1', '1/0', '2/0', '3/0', '4/0'] as const
export const millimeters = ['1.5', '2.5', '4', '6', '10', '16', '25'] as const
const allSizes: readonly (Gauge | SquareMillimeters)[] = [...gauges, ...millimeters]

const Id = z.string().check(z.regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, 'id must be lower case words joined by -'))
export const nameLength = 28
const Name = z
  .string()
  .check(z.trim(), z.minLength(1, 'Give it a name.'), z.maxLength(nameLength, `Up to ${nameLength} letters.`))
const Size = z.enum([...new Set(allSizes)] as [string, ...string[]])

/** Feet or meters, one way. */
const Length = z.number('How long? A number.').check(z.gte(0, '0 or more.'), z.lte(5000, '5000 or less.'))

/** The wires of one run: what its neutral and its grounding conductor are made of. Stranded, at 75 °C. */
export const Run = z.strictObject({
  length: Length,
  neutral: Size,
  ground: Size,
  metal: z.enum(['copper', 'aluminum']),
})

/** What brings power to a part. */
export const Feed = z.strictObject({
  /** The part it comes from. */
  from: Id,
  /** `cord` can be plugged in or not; `taken-away` is a cord that stays unplugged. */
  joined: z.enum(['wired', 'cord', 'taken-away']),
  neutral: z.boolean(),
  /** A grounding conductor (or metal raceway) comes along. */
  ground: z.boolean(),
  /** A GFCI, RCD or ground-fault breaker where the run starts. */
  gfci: z.boolean(),
  run: z.optional(Run),
})

const volts = ['120', '120/240', '240', '230'] as const
/**
 * Somewhere power comes from. `output` says what ties its neutral to its own ground: `bonded` a wire, `relay` a
 * contact that closes in the states `relay` lists, `floating` nothing, `isolated` nothing, with the receptacles'
 * grounds tied to nothing either; `balanced` has no neutral, both its wires stand at half voltage.
 */
export const Source = z.strictObject({
  kind: z.literal('source'),
  id: Id,
  name: Name,
  type: z.enum(['utility', 'inverter', 'power-station', 'portable-generator', 'standby-generator']),
  /** `240`: two hots without a neutral. */
  volts: z.enum(volts),
  output: z.enum(['bonded', 'relay', 'floating', 'balanced', 'isolated']),
  relay: z.array(z.enum(['own-power', 'passing-through'])),
  /** Its receptacles or its output breaker have ground-fault protection. */
  gfci: z.boolean(),
  /** Runs into the same wires as another; `alone`: either goes on when the other stops. */
  parallel: z.optional(z.strictObject({ with: Id, alone: z.boolean() })),
})

/** A separately derived source out of another: a listed isolation transformer. */
export const Transformer = z.strictObject({
  kind: z.literal('transformer'),
  id: Id,
  name: Name,
  feed: Feed,
  volts: z.enum(volts),
  /** Its secondary neutral is bonded to its case. */
  bond: z.boolean(),
})

/** Makes a neutral between two hots. `relay`: its bond closes only while no utility feeds it. */
export const Autotransformer = z.strictObject({
  kind: z.literal('autotransformer'),
  id: Id,
  name: Name,
  feed: Feed,
  bond: z.enum(['none', 'fixed', 'relay']),
})

/** Chooses one of its inputs. A pair of interlocked breakers is one too: manual, neutral solid. */
export const Switch = z.strictObject({
  kind: z.literal('switch'),
  id: Id,
  name: Name,
  operated: z.enum(['automatic', 'manual', 'built-in']),
  /** Built in: the inverter whose own output is one of the inputs. */
  inverter: z.optional(Id),
  neutral: z.enum(['switched', 'solid']),
  inputs: z.array(Feed).check(z.minLength(2), z.maxLength(6)),
})

export const Panel = z.strictObject({
  kind: z.literal('panel'),
  id: Id,
  name: Name,
  /** `main`: service equipment, the first disconnect of the utility's service. */
  role: z.enum(['main', 'sub']),
  feed: Feed,
  /** Screw or strap in: neutral and ground joined here. */
  bond: z.boolean(),
  /** Feeds circuits of two hots that share a neutral. */
  multiwire: z.boolean(),
  /** In a building of its own, and what NEC 250.32(B)(1) Ex. asks of an old feeder without a grounding conductor. */
  outbuilding: z.optional(z.strictObject({ oldFeeder: z.boolean(), noMetalPath: z.boolean() })),
})

/** A receptacle, or an appliance wired like one. */
export const Receptacle = z.strictObject({
  kind: z.literal('receptacle'),
  id: Id,
  name: Name,
  feed: Feed,
  gfci: z.boolean(),
  /** Neutral joined to ground here: by a jumper, or by an existing range's or dryer's frame. */
  bond: z.enum(['none', 'jumper', 'existing-range']),
  /** Another panel whose neutral bar its neutral wire lands on. */
  neutralAt: z.optional(Id),
})

/** A rod at a part, or another electrode. */
export const Rod = z.strictObject({
  kind: z.literal('rod'),
  id: Id,
  name: Name,
  at: Id,
  ohms: z
    .number('How many ohms? A number.')
    .check(z.gt(0, 'More than 0 Ω.'), z.lte(10_000, '10,000 Ω or less.')),
})

/** A grounding conductor run apart from the power wires. */
export const GroundWire = z.strictObject({
  kind: z.literal('ground-wire'),
  id: Id,
  name: Name,
  from: Id,
  to: Id,
  run: z.optional(Run),
})

export const Part = z.discriminatedUnion('kind', [
  Source,
  Transformer,
  Autotransformer,
  Switch,
  Panel,
  Receptacle,
  Rod,
  GroundWire,
])

export const mostSources = 5
export const mostParts = 40
export const System = z.strictObject({
  name: z.string().check(z.maxLength(60, 'Up to 60 letters.')),
  units: z.enum(['us', 'metric']),
  parts: z.array(Part).check(z.maxLength(mostParts, `Up to ${mostParts} parts.`)),
})

export type Run = z.infer<typeof Run>
export type Feed = z.infer<typeof Feed>
export type Source = z.infer<typeof Source>
export type Transformer = z.infer<typeof Transformer>
export type Autotransformer = z.infer<typeof Autotransformer>
export type Switch = z.infer<typeof Switch>
export type Panel = z.infer<typeof Panel>
export type Receptacle = z.infer<typeof Receptacle>
export type Rod = z.infer<typeof Rod>
export type GroundWire = z.infer<typeof GroundWire>
export type Part = z.infer<typeof Part>
export type System = z.infer<typeof System>

/** A part that has a neutral and a case: everything but rods and grounding conductors. */
export type PowerPart = Exclude<Part, Rod | GroundWire>
export const isPower = (part: Part): part is PowerPart => part.kind !== 'rod' && part.kind !== 'ground-wire'

/** The feeds of a part, each with a key of its own: the part's id, or `id#1` for the second input of a switch. */
export function feedsOf(part: Part): { key: string; feed: Feed; input: number }[] {
  if (part.kind === 'switch')
    return part.inputs.map((feed, input) => ({ key: `${part.id}#${input}`, feed, input }))
  return 'feed' in part ? [{ key: part.id, feed: part.feed, input: 0 }] : []
}
