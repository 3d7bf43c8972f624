/** Wirings drawn by chance from the stated ranges: the same seed gives the same wirings, on any machine. */
import { systemKinds } from './context.ts'
import type { ElectricalCause, SourceKind, SystemKind, WiringContext } from './context.ts'
import { canOccur } from './occurs.ts'
import { isRange } from './parameters.ts'
import type { Choice, Option, Parameters, Range, Ranges } from './parameters.ts'
import { rangesWith } from './wire.ts'

/** Numbers from 0 to under 1, one after another. */
export type Chance = () => number

/**
 * A generator of chance numbers: xorshift on 32 bits (Marsaglia 2003, shifts 13, 17, 5), started from a text so that
 * every case has a stream of its own.
 */
export function chanceFrom(seed: string): Chance {
  // Each letter is folded in by a multiplication, so that seeds of one letter apart share nothing.
  let state = 0x9e3779b9
  for (const letter of seed) state = Math.imul(state ^ letter.charCodeAt(0), 0x01000193) ^ (state >>> 15)
  state = state === 0 ? 1 : state
  const next = () => {
    state ^= state << 13
    state ^= state >>> 17
    state ^= state << 5
    return (state >>> 0) / 2 ** 32
  }
  for (let i = 0; i < 8; i++) next()
  return next
}

export const between = (chance: Chance, low: number, high: number): number => low + (high - low) * chance()
export const happens = (chance: Chance, how: number): boolean => chance() < how
export const betweenLog = (chance: Chance, low: number, high: number): number =>
  low * (high / low) ** chance()

/** One of weighted options. */
export function pick<T>(chance: Chance, options: readonly Option<T>[]): T {
  let left = chance() * options.reduce((sum, o) => sum + o.weight, 0)
  for (const { value, weight } of options) {
    left -= weight
    if (left < 0) return value
  }
  const last = options.at(-1)
  if (last === undefined) throw new RangeError('nothing to pick from')
  return last.value
}

function draw(chance: Chance, one: Range | Choice<unknown>): unknown {
  if (!isRange(one)) return pick(chance, one.options)
  if (one.absent !== undefined && happens(chance, one.absent)) return 0
  return one.spread === 'log' ? betweenLog(chance, one.low, one.high) : between(chance, one.low, one.high)
}

/** Whether what runs on two legs differs enough that a lost neutral shows: on even legs nobody would call. */
const uneven = (p: Parameters): boolean =>
  Math.max(p.houseAmps, p.houseAmpsOther) > 1.3 * Math.min(p.houseAmps, p.houseAmpsOther)

/** Parameters drawn from these ranges. */
export const sampleFrom = (chance: Chance, ranges: Ranges): Parameters =>
  Object.fromEntries(
    Object.entries(ranges).map(([name, one]) => [name, draw(chance, one as Range | Choice<unknown>)]),
  ) as Parameters

/** A wiring's parameters within their ranges, for this cause. */
export function sampleParameters(chance: Chance, context: WiringContext, cause: ElectricalCause): Parameters {
  const ranges = rangesWith(context, cause)
  for (;;) {
    const p = sampleFrom(chance, ranges)
    if (cause !== 'shared-neutral-lost' || p.faultAt !== 'feeder' || uneven(p)) return p
  }
}

/** How often each kind of source stands behind a panel or feeds plugs by itself; common practice, no source. */
const panelSources: readonly Option<SourceKind>[] = [
  { value: 'all-in-one-inverter', weight: 7 },
  { value: 'utility', weight: 5 },
  { value: 'generator', weight: 4 },
  { value: 'standalone-inverter', weight: 3 },
  { value: 'power-station', weight: 1.5 },
]
const plugSources: readonly Option<SourceKind>[] = [
  { value: 'standalone-inverter', weight: 1 },
  { value: 'power-station', weight: 1 },
  { value: 'generator', weight: 1 },
]
const systemWeights: Record<SourceKind, readonly [number, number, number]> = {
  'all-in-one-inverter': [8, 7, 5],
  'standalone-inverter': [11, 3, 6],
  'power-station': [13, 2, 5],
  generator: [8, 7, 5],
  utility: [4, 11, 5],
}

/** A context in which the cause can occur. */
export function sampleContext(chance: Chance, cause: ElectricalCause): WiringContext {
  // An isolated output is what a portable set has by itself.
  const direct = cause === 'isolated-output' ? 0.6 : 0.27
  for (;;) {
    const wiring = happens(chance, direct) ? 'direct' : 'panel'
    const source = pick(chance, wiring === 'panel' ? panelSources : plugSources)
    const weights = systemWeights[source]
    const system: SystemKind = pick(
      chance,
      systemKinds.map((value, i) => ({ value, weight: weights[i] ?? 0 })),
    )
    const context: WiringContext = { source, system, wiring }
    if (canOccur(cause, context)) return context
  }
}
