/**
 * Where ground sits: what three readings of one place say as a drawing. Neutral and hot hang from the ends of a
 * rail as long as hot–neutral; ground is a lamp on two cords as long as neutral–ground and hot–ground.
 */
import { cornerOpposite, inVolts, sideOrder, volts } from './sides.ts'
import type { Corner, Readings, Side } from './sides.ts'

type ClosedAt = 'neutral' | 'hot' | 'middle' | 'between' | 'off-line'

type Said = { say: string }
export type Seat =
  | (Said & { kind: 'empty' })
  /** One taken, or the two ground readings without hot–neutral. */
  | (Said & { kind: 'part'; missing: readonly Side[] })
  /** Hot–neutral and one ground reading: ground is on an arc about this corner. */
  | (Said & { kind: 'arc'; about: 'N' | 'H'; missing: readonly Side[] })
  /** Next to nothing between any two. */
  | (Said & { kind: 'dead' })
  /** One side is longer than the other two together, by `gap` volts: its opposite corner is untied. */
  | (Said & { kind: 'gap'; corner: Corner; gap: number; nowhere: boolean })
  /**
   * The sides close. `x` along the rail from neutral and `y` below it, volts; `t` is x as a part of the rail.
   * `taut`: within tolerance of the line, and drawn on it. `driven`: outside the half circle over the rail.
   */
  | (Said & {
      kind: 'closed'
      at: ClosedAt
      taut: boolean
      driven: boolean
      t: number
      x: number
      y: number
      gap: number
    })
  /** Hot and neutral read the same; ground stands `depth` volts away from both. */
  | (Said & { kind: 'needle'; depth: number })

/** Meter error, volts: what two readings may differ by before a picture is drawn of it. */
export const tolerance = (longest: number): number => Math.max(2, 0.02 * longest)

const deadShare = 0.04 // of nominal: under it, next to no volts
const nowhereShare = 0.9 // of the longest side: a gap above it leaves no cord worth the name
const endShare = 0.05 // of the rail: within it the lamp hangs under an end, or midway
/** Two ties of capacitance and wire are at most 90° apart, so ground lies in the half circle; 4 % a side to spare. */
const halfCircle = 1.08

const cornerName: Readonly<Record<Corner, string>> = { N: 'Neutral', H: 'Hot', G: 'Ground' }

function partly(taken: readonly Side[], nominal: number): Seat {
  const missing = sideOrder.filter((side) => !taken.includes(side))
  if (taken.length === 2 && taken.includes('hn'))
    return { kind: 'arc', about: taken.includes('ng') ? 'N' : 'H', missing, say: 'One more reading.' }
  if (taken.length === 2)
    return { kind: 'part', missing, say: `Hot–neutral still to take; drawn on ${nominal} V for now.` }
  return { kind: 'part', missing, say: 'Two more readings.' }
}

function gapIn(longest: Side, length: number, gap: number): Seat {
  const corner = cornerOpposite[longest]
  const nowhere = gap > nowhereShare * length
  const say =
    corner !== 'G'
      ? `${cornerName[corner]} is tied to nothing here.`
      : nowhere
        ? 'Ground sits nowhere.'
        : `The ground readings fall ${inVolts(gap)} V short of hot–neutral: this meter pulls ground down.`
  return { kind: 'gap', corner, gap, nowhere, say }
}

const onTheLine = (t: number): Exclude<ClosedAt, 'off-line'> =>
  t < endShare ? 'neutral' : t > 1 - endShare ? 'hot' : Math.abs(t - 0.5) < endShare ? 'middle' : 'between'

const sayOnTheLine = (at: ClosedAt, t: number): string =>
  at === 'neutral'
    ? 'Ground sits on neutral.'
    : at === 'hot'
      ? 'Ground sits on hot: hot and neutral are swapped, here or before here.'
      : at === 'middle'
        ? 'Ground sits halfway, and stays there against this meter.'
        : `Ground sits ${Math.round(t * 100)} % of the way from neutral to hot.`

function closedBy(hn: number, ng: number, hg: number, longest: Side, gap: number, tol: number): Seat {
  const t = ng + hg === 0 ? 0.5 : ng / (ng + hg)
  // Along the line and yet not over the rail: two sides add up to a ground reading, so ground lies past an end.
  const pastAnEnd = longest !== 'hn' && t >= endShare && t <= 1 - endShare
  if (Math.abs(gap) <= tol && !pastAnEnd) {
    const at = onTheLine(t)
    return {
      kind: 'closed',
      at,
      taut: true,
      driven: false,
      t,
      x: t * hn,
      y: 0,
      gap,
      say: sayOnTheLine(at, t),
    }
  }
  const x = (hn * hn + ng * ng - hg * hg) / (2 * hn)
  const y = Math.sqrt(Math.max(0, ng * ng - x * x))
  const driven = hg * hg + ng * ng > halfCircle * hn * hn
  const say = driven
    ? 'Something else drives it.'
    : 'A wire ties it on one side, stray capacitance on the other.'
  return { kind: 'closed', at: 'off-line', taut: false, driven, t: x / hn, x, y, gap, say }
}

/**
 * Where ground sits by these readings. It says what this meter saw, no more: nothing may be concluded about a
 * bond from a picture that closes.
 */
export function seat(readings: Readings): Seat {
  const { nominal } = readings
  const taken = sideOrder.filter((side) => volts(readings[side]) !== undefined)
  if (taken.length === 0) return { kind: 'empty', say: 'Tap a side, type the volts.' }
  if (taken.length < 3) return partly(taken, nominal)
  const [hn, ng, hg] = sideOrder.map((side) => readings[side] ?? 0) as [number, number, number]
  const length = Math.max(hn, ng, hg)
  const nothing = deadShare * nominal
  if (length < nothing) return { kind: 'dead', say: 'Dead, or a wire is open: prove your meter.' }
  const longest: Side = hn === length ? 'hn' : hg === length ? 'hg' : 'ng'
  const gap = 2 * length - (hn + ng + hg)
  const tol = tolerance(length)
  if (gap > tol) return gapIn(longest, length, gap)
  if (hn < nothing) {
    const depth = (ng + hg) / 2
    return {
      kind: 'needle',
      depth,
      say: `Hot and neutral read the same; ground stands ${inVolts(depth)} V away.`,
    }
  }
  return closedBy(hn, ng, hg, longest, gap, tol)
}
