import * as z from 'zod/mini'
import { chooseOne, mend, oneOf, quantity } from '../quantity.ts'
import type { Result } from '../result.ts'
import { MetalOf } from '../wire.ts'
import { sizes } from './conductor-sizes.ts'
import { electrodeConductor } from './electrode-conductor.ts'
import { equipmentConductor } from './equipment-conductor.ts'

const Size = oneOf(sizes)

/** What the grounding-sizes worksheet asks. Its tables know AWG and kcmil alone. */
export const SizesInputs = z.discriminatedUnion(
  'which',
  [
    z
      .object({
        which: z.literal('equipment'),
        ratedAmps: quantity('the breaker’s or fuse’s rating in amps', 1, 1200),
        metal: MetalOf,
        /** The hot conductors as run, and the smallest that would have carried the current. */
        hot: Size,
        hotMetal: MetalOf,
        upsized: oneOf(['no', 'yes']),
        hotLeast: z.optional(Size),
      })
      .check((payload) => {
        const { upsized, hotLeast, hot } = payload.value
        if (upsized === 'no') return
        if (hotLeast === undefined)
          mend(payload, ['hotLeast'], 'Choose the smallest size that would have done.')
        else if (sizes.indexOf(hotLeast) > sizes.indexOf(hot))
          mend(payload, ['hotLeast'], 'That is thicker than what was run.')
      }),
    z.object({
      which: z.literal('electrode'),
      largest: Size,
      largestMetal: MetalOf,
      metal: MetalOf,
      electrode: oneOf(['rod', 'concrete', 'water-or-steel']),
    }),
  ],
  chooseOne,
)
export type SizesInputs = z.infer<typeof SizesInputs>

/** Size of an equipment grounding conductor or of a grounding electrode conductor, by the NEC's tables. */
export const groundingSizes = (inputs: SizesInputs): Result =>
  inputs.which === 'equipment' ? equipmentConductor(inputs) : electrodeConductor(inputs)
