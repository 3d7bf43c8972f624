import * as z from 'zod/mini'
import { chooseOne, mend, oneOf, quantity } from '../quantity.ts'
import { remembered, seen } from '../result.ts'
import type { Reference } from '../result.ts'
import type { Times } from '../written.ts'

const limited = <Kind extends string>(kind: Kind) =>
  z
    .object({
      kind: z.literal(kind),
      ratedWatts: quantity('the source’s rated watts', 50, 1_000_000),
      /** The voltage its rating is for: 240 where it feeds two legs. */
      ratedVolts: quantity('the volts it is rated at', 50, 1000),
      /** Fault current as a multiple of the rated one, least and most. */
      timesLeast: quantity('times the rated current', 0.5, 20),
      timesMost: quantity('times the rated current', 0.5, 20),
      /** How long it gives that. */
      secondsLeast: quantity('seconds', 0.001, 600),
      secondsMost: quantity('seconds', 0.001, 600),
      /** `stops`: it shuts down or its field collapses. `holds`: it goes on with `thenTimes` its rated current. */
      then: oneOf(['stops', 'holds']),
      thenTimes: z.optional(quantity('times the rated current', 0.05, 20)),
    })
    .check((payload) => {
      const { value } = payload
      if (value.timesMost < value.timesLeast)
        mend(payload, ['timesMost'], 'The most can’t be under the least.')
      if (value.secondsMost < value.secondsLeast)
        mend(payload, ['secondsMost'], 'The longest can’t be under the shortest.')
      if (value.then === 'holds' && value.thenTimes === undefined)
        mend(
          payload,
          ['thenTimes'],
          'Type what it holds, as times its rated current: a number from 0.05 to 20.',
        )
    })

/** What feeds the fault, as typed. */
export const Source = z.discriminatedUnion(
  'kind',
  [
    z.object({
      kind: z.literal('utility'),
      /** Line to neutral, at its terminals. */
      shortCircuitAmps: quantity('the short-circuit current in amps', 10, 200_000),
    }),
    limited('inverter'),
    limited('generator'),
  ],
  chooseOne,
)
export type Source = z.infer<typeof Source>
type Kind = Source['kind']

/** What a source gives into a fault. */
export type SourceLimit = {
  kind: Kind
  volts: number
  /** Inside the source. */
  ohms: number
  ratedAmps: number
  /** Most it gives: least and most of the band. */
  limitAmps: readonly [least: number, most: number]
  /** How long it gives its limit. */
  lasts: Times
  /** What it goes on with after that, A; 0 where it stops. */
  thenAmps: number
}

/** @param volts to ground, with nothing loaded */
export function sourceLimit(source: Source, volts: number): SourceLimit {
  if (source.kind === 'utility')
    return {
      kind: source.kind,
      volts,
      ohms: volts / source.shortCircuitAmps,
      ratedAmps: Infinity,
      limitAmps: [Infinity, Infinity],
      lasts: { fromSeconds: Infinity, toSeconds: Infinity },
      thenAmps: Infinity,
    }
  const ratedAmps = source.ratedWatts / source.ratedVolts
  return {
    kind: source.kind,
    volts,
    ohms: 0,
    ratedAmps,
    limitAmps: [source.timesLeast * ratedAmps, source.timesMost * ratedAmps],
    lasts: { fromSeconds: source.secondsLeast, toSeconds: source.secondsMost },
    thenAmps: source.then === 'holds' ? (source.thenTimes ?? 0) * ratedAmps : 0,
  }
}

/**
 * How long the source feeds this current: for ever up to its rating, its surge time at its limit, and at least that
 * between the two.
 */
export function feedsFor({ ratedAmps, limitAmps, lasts }: SourceLimit, amps: number): Times {
  if (amps <= ratedAmps * (1 + 1e-9)) return { fromSeconds: Infinity, toSeconds: Infinity }
  return {
    fromSeconds: lasts.fromSeconds,
    toSeconds: amps < limitAmps[0] * (1 - 1e-9) ? Infinity : lasts.toSeconds,
  }
}

/** What most give, to begin with: no standard fixes it, so the instructions' figures belong here. */
export const typicalLimits = {
  inverter: { timesLeast: 1.5, timesMost: 3, secondsLeast: 0.01, secondsMost: 10, then: 'stops' },
  generator: { timesLeast: 5, timesMost: 10, secondsLeast: 0.1, secondsMost: 0.35, then: 'stops' },
} as const

/** How a source is called, and how it ends. */
export const sourceWords: Readonly<Record<Kind, { name: string; stopping: string; stops: string }>> = {
  utility: { name: 'the utility', stopping: 'the utility’s own fuse', stops: 'stops' },
  inverter: { name: 'the inverter', stopping: 'the inverter shutting down', stops: 'shuts down' },
  generator: {
    name: 'the generator',
    stopping: 'the generator’s field collapsing',
    stops: 'loses its field',
  },
}

/** Where the typical figures come from. */
export function sourceReferences(kind: Kind): Reference[] {
  if (kind === 'utility') return []
  return kind === 'inverter'
    ? [remembered('No standard fixes an inverter’s fault current: the band is typical of battery inverters')]
    : [
        seen(
          'A generator whose regulator is fed from its own output loses its fault current within some 0.35 s',
        ),
        remembered('A generator excited separately holds about three times its rating for 5 to 10 s'),
      ]
}
