import type { Seat } from './seat.ts'
import { inVolts } from './sides.ts'
import type { Readings } from './sides.ts'
import type { Weight } from './weight.ts'

/** What the page says below the picture: a few words first, the sentence of the picture, and what it leaves open. */
export type Verdict = { lead: string; say: string; open: string }

function leadOf(seat: Seat, { ng, hg }: Readings): string {
  switch (seat.kind) {
    case 'empty':
      return 'Nothing taken yet.'
    case 'part':
      return seat.missing.length === 1 ? 'Not on its own rail yet.' : 'One taken.'
    case 'arc':
      return 'Ground is somewhere on this arc.'
    case 'dead':
      return 'Next to no volts between any two.'
    case 'needle':
      return 'One line, ground far from it.'
    case 'gap': {
      if (seat.corner !== 'G') return `${inVolts(seat.gap)} V missing.`
      if (seat.nowhere) return 'Tied to nothing you can read here.'
      const share = (ng ?? 0) / ((ng ?? 0) + (hg ?? 0))
      return Math.abs(share - 0.5) < 0.05 ? 'About halfway, untied.' : 'Ground is untied here.'
    }
    case 'closed':
      return {
        neutral: 'Closed, on neutral.',
        hot: 'Closed, on hot.',
        middle: 'Closed, halfway.',
        between: 'Closed, part of the way.',
        'off-line': seat.driven ? 'Outside the half circle.' : 'Off the line.',
      }[seat.at]
  }
}

function openOf(seat: Seat, weight: Weight): string {
  const light = weight.size === 1
  if (seat.kind === 'gap' && seat.corner === 'G' && !seat.nowhere)
    return light ? 'Ghost or firm: a low-resistance meter or the test bulb tells.' : ''
  if (seat.kind !== 'closed') return ''
  if (weight.kind === 'bulb' && seat.at === 'neutral')
    return 'A ghost lands on neutral too while the bulb hangs there: the bulb is then the only bond here.'
  // A closed triangle under a light meter is no proof of anything: not of a bond, not of a balanced output.
  if (light && seat.at !== 'off-line')
    return `At ${weight.label} a long dead wire closes alike: ghost or firm is still open.`
  if (seat.driven) return 'Look for another source or leg.'
  return ''
}

/**
 * The verdict in words. It carries everything that the drawing shows, for whoever can't see it; and it never says
 * firm from a picture that closes under a light meter.
 */
export const verdictOf = (seat: Seat, readings: Readings, weight: Weight): Verdict => ({
  lead: leadOf(seat, readings),
  say: seat.say,
  open: openOf(seat, weight),
})

const pairNames = { hn: 'hot to neutral', ng: 'neutral to ground', hg: 'hot to ground' } as const

/** The whole picture for a reader: the three readings with their units spelled, then what is said. */
export function spoken(readings: Readings, seat: Seat): string {
  const sides = (['hn', 'ng', 'hg'] as const).map((side) => {
    const taken = readings[side]
    return `${pairNames[side]} ${taken === undefined ? 'not taken' : `${taken} volts`}`
  })
  return `${sides.join(', ')}. ${seat.say}`
}
