import * as z from 'zod/mini'

/** The eight questions of step 1, in the order they are asked. */
export const dangerIds = ['metal', 'smoke', 'heat', 'water', 'lights', 'engine', 'battery', 'joined'] as const
export type DangerId = (typeof dangerIds)[number]

const YesNo = z.enum(['yes', 'no'])
const Lamp = z.enum(['lit', 'dim', 'dark'])
const optionalText = z.optional(z.string())

/** All that a homeowner answered. A field that is missing was not answered. */
export const Triage = z.object({
  version: z.literal(1),
  /** What they came with: decides which steps follow. */
  have: z.optional(z.enum(['tester', 'meter', 'senses'])),
  dangers: z.partialRecord(z.enum(dangerIds), YesNo),
  /** Which of the joined dangers it was, by question. */
  which: z.partialRecord(z.enum(dangerIds), z.string()),
  /** "It's off now", or "Everyone is out now". */
  madeOff: z.optional(z.boolean()),
  feeds: z.object({
    source: optionalText,
    twoForty: optionalText,
    wiring: optionalText,
    mode: optionalText,
  }),
  /** Observations of step 3: finding → value. */
  notices: z.record(z.string(), z.string()),
  /** Where it is, in their words: read out on the phone, never computed with. */
  where: z.string(),
  lamps: z.object({ hn: z.optional(Lamp), ng: z.optional(Lamp), hg: z.optional(Lamp) }),
  usedMeter: z.optional(YesNo),
  /** The five conditions, ticked or not. */
  ticked: z.array(z.boolean()),
  /** As typed. */
  volts: z.object({ hn: z.string(), ng: z.string(), hg: z.string() }),
})
export type Triage = z.infer<typeof Triage>
export type VoltsPair = keyof Triage['volts']
export type LampPair = keyof Triage['lamps']

export const conditions = [
  'The meter says CAT II 300 V or better',
  'No cut, crack or bare metal on the leads',
  'The dial is on V AC. Never on ohms or amps',
  'The leads are in V and COM',
  'The probes touch the slots only. Fingers stay behind the guards',
] as const

/** Nothing answered yet. */
export const blank: Triage = {
  version: 1,
  dangers: {},
  which: {},
  feeds: {},
  notices: {},
  where: '',
  lamps: {},
  ticked: conditions.map(() => false),
  volts: { hn: '', ng: '', hg: '' },
}

/** Whether volts typed here count: they have used a meter, and all five conditions hold. */
export const measuredWell = (triage: Triage): boolean =>
  triage.usedMeter === 'yes' && conditions.every((_, i) => triage.ticked[i] === true)

/** Whether volts may be taken now: not at all after a yes to a danger. */
export const mayMeasure = (triage: Triage): boolean =>
  measuredWell(triage) && !dangerIds.some((id) => triage.dangers[id] === 'yes')

/** A number as typed, with comma or point; undefined when it is none. */
export function readVolts(text: string): number | undefined {
  const plain = text.trim().replace(',', '.')
  return /^\d*\.?\d+$|^\d+\.$/.test(plain) ? Number(plain) : undefined
}
