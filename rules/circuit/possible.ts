/**
 * Misfit by physics: findings that no wiring of any one cause gives, beyond what instruments are off, and which of
 * them is most likely wrong.
 */
import { expect } from './expect.ts'
import type { Band, Expected } from './expect.ts'
import { relations, valueOf } from './relations.ts'
import { nominalVolts } from './wiring/context.ts'
import type { ElectricalCause, WiringContext } from './wiring/context.ts'
import { causesIn } from './wiring/occurs.ts'

export type Impossible = {
  /** The finding to take again: without it some cause could give all the others. */
  again: string
  /** What it could have been, were that cause the one; undefined for a lamp or bulb. */
  band: Band | undefined
  cause: ElectricalCause
}

/** What a tech reports of what a lamp did is as good as a reading; what people remember is not. */
const judged = ['tester.hn-lamp', 'tester.hg-lamp', 'tester.ng-lamp']

/**
 * Ohms are judged by what they say: joined by a wire, or open. Between lies all that somebody may have left plugged
 * in, or a rod, and a winding or an idle output may stand beside either.
 */
const joinedOhms = 3
const openOhms = 1000

function ohmsBeyond(value: number, { low, high }: Band): boolean {
  if (value <= joinedOhms) return low > openOhms
  return value >= openOhms && high < 10 * joinedOhms
}

/**
 * Whether a value lies beyond its band by more than instruments are off. The bands come from a dozen wirings of all
 * that are possible, so a part of their own width is allowed beside the instrument's error.
 */
function beyond(id: string, value: number, band: Band, nominal: number): boolean {
  if (id.endsWith('.ohms')) return ohmsBeyond(value, band)
  const error = id.endsWith('amps') ? 0.3 + 0.1 * band.high : 0.08 * nominal
  const off = Math.max(band.low - value, value - band.high)
  return off > error + (band.high - band.low) / 3
}

/** What of the findings a cause does not let one expect: one reading each, or two that don't go together. */
function outside(
  findings: Readonly<Record<string, number | string>>,
  { readings, observations, together }: Expected,
  nominal: number,
): (readonly string[])[] {
  const alone = Object.entries(findings).flatMap(([id, value]) => {
    if (typeof value === 'string') {
      const states = judged.includes(id) ? observations.get(id) : undefined
      return states !== undefined && !states.can.includes(value) ? [[id]] : []
    }
    const band = readings.get(id)
    return band !== undefined && beyond(id, value, band, nominal) ? [[id]] : []
  })
  const pairs = relations.flatMap((relation, i) => {
    const [value, band] = [valueOf(relation, findings), together[i]]
    return value !== undefined && band !== undefined && beyond(relation.ids[0], value, band, nominal)
      ? [relation.ids]
      : []
  })
  return [...alone, ...pairs]
}

/** The finding that the most of these speak of; of level ones the first. */
function mostOften(complaints: readonly (readonly string[])[]): string | undefined {
  const count = new Map<string, number>()
  for (const id of complaints.flat()) count.set(id, (count.get(id) ?? 0) + 1)
  const most = Math.max(...count.values())
  return [...count].find(([, n]) => n === most)?.[0]
}

/** Findings to take again before nothing is left to complain of, the one most spoken of first. */
function toTakeAgain(complaints: readonly (readonly string[])[]): string[] {
  const again = mostOften(complaints)
  if (again === undefined) return []
  return [again, ...toTakeAgain(complaints.filter((ids) => !ids.includes(again)))]
}

/**
 * Whether some one cause could give all of these findings; if none can, which finding to take again.
 * @param findings numbers in each reading's unit, observations by value, all taken in one mode
 * @param meterOhms input resistance of the meter they were taken with
 * @param likely causes, the likeliest first: of two that leave equally much unexplained the likelier names the reading
 */
export function impossible(
  context: WiringContext,
  findings: Readonly<Record<string, number | string>>,
  meterOhms: number,
  likely: readonly string[] = [],
): Impossible | undefined {
  const nominal = nominalVolts(context)
  const rank = (cause: string) => (likely.includes(cause) ? likely.indexOf(cause) : likely.length)
  const all = causesIn(context).map((cause) => {
    const expected = expect(context, cause, meterOhms)
    return { cause, expected, again: toTakeAgain(outside(findings, expected, nominal)) }
  })
  const best = all.sort((a, b) => a.again.length - b.again.length || rank(a.cause) - rank(b.cause))[0]
  const again = best?.again[0]
  if (best === undefined || again === undefined) return undefined
  return { again, band: best.expected.readings.get(again), cause: best.cause }
}
