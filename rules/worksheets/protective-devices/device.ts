import * as z from 'zod/mini'
import { chooseOne, mend, oneOf, quantity } from '../quantity.ts'
import type { Band } from './band.ts'
import { gG, gGRatings, ul248 } from './fuses.ts'
import { iec60898 } from './iec-60898.ts'
import { ul489 } from './ul-489.ts'

/** A breaker or fuse as it is typed. The magnetic multiples belong to UL 489 alone: no standard sets them. */
export const Device = z
  .discriminatedUnion(
    'kind',
    [
      z.object({
        kind: z.literal('ul489'),
        amps: quantity('the breaker’s rating in amps', 1, 400),
        magneticLeast: quantity('times the rating', 2, 50),
        magneticMost: quantity('times the rating', 2, 50),
      }),
      z.object({
        kind: z.literal('iec60898'),
        curve: oneOf(['B', 'C', 'D']),
        amps: quantity('the breaker’s rating in amps', 1, 125),
      }),
      z.object({ kind: z.literal('ul248'), amps: quantity('the fuse’s rating in amps', 1, 100) }),
      z.object({ kind: z.literal('gG'), rating: oneOf(gGRatings) }),
    ],
    chooseOne,
  )
  .check((payload) => {
    const { value } = payload
    if (value.kind === 'ul489' && value.magneticMost < value.magneticLeast)
      mend(payload, ['magneticMost'], 'The upper end can’t lie under the lower one.')
  })
export type Device = z.infer<typeof Device>

/** Its band. */
export function bandOf(device: Device): Band {
  switch (device.kind) {
    case 'ul489':
      return ul489(device.amps, { least: device.magneticLeast, most: device.magneticMost })
    case 'iec60898':
      return iec60898(device.amps, device.curve)
    case 'ul248':
      return ul248(device.amps)
    case 'gG':
      return gG(Number(device.rating))
  }
}
