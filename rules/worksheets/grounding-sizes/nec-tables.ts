import type { Metal } from '../../circuit/conductors.ts'
import { circularMils } from './conductor-sizes.ts'
import type { Size } from './conductor-sizes.ts'

/** NEC 250.122: rating of the overcurrent device up to, A; copper; aluminum. To 400 A seen, above from memory. */
const table250_122 = [
  [15, '14', '12'],
  [20, '12', '10'],
  [60, '10', '8'],
  [100, '8', '6'],
  [200, '6', '4'],
  [300, '4', '2'],
  [400, '3', '1'],
  [500, '2', '1/0'],
  [600, '1', '2/0'],
  [800, '1/0', '3/0'],
  [1000, '2/0', '4/0'],
  [1200, '3/0', '250'],
] as const

/** Up to here table 250.122 was seen. */
export const seenTo = 400

/** The smallest equipment grounding conductor behind a device of this rating; a rating between rows takes the next. */
export function equipmentSize(ratedAmps: number, metal: Metal): Size | undefined {
  const row = table250_122.find(([upTo]) => ratedAmps <= upTo)
  return row?.[metal === 'copper' ? 1 : 2]
}

/** NEC 250.66: largest ungrounded conductor up to, copper and aluminum; electrode conductor, copper and aluminum. */
const table250_66 = [
  ['2', '1/0', '8', '6'],
  ['1/0', '3/0', '6', '4'],
  ['3/0', '250', '4', '2'],
  ['350', '500', '2', '1/0'],
  ['600', '900', '1/0', '3/0'],
  // From here from memory.
  ['1000', '1750', '2/0', '4/0'],
  [undefined, undefined, '3/0', '250'],
] as const satisfies readonly (readonly [Size | undefined, Size | undefined, Size, Size])[]

/** The electrode conductor's size, and whether its row is one from memory. */
export function electrodeSize(
  largest: Size,
  itsMetal: Metal,
  metal: Metal,
): { size: Size; fromMemory: boolean } {
  const side = itsMetal === 'copper' ? 0 : 1
  const at = table250_66.findIndex((row) => {
    const upTo = row[side]
    return upTo === undefined || circularMils[largest] <= circularMils[upTo]
  })
  return { size: table250_66[at]![metal === 'copper' ? 2 : 3], fromMemory: at >= 5 }
}

export type Electrode = 'rod' | 'concrete' | 'water-or-steel'
/** 250.66(A) and (B): where it goes to nothing but that electrode, it need not be larger than this. */
export function electrodeCap(electrode: Electrode, metal: Metal): Size | undefined {
  if (electrode === 'rod') return metal === 'copper' ? '6' : '4'
  return electrode === 'concrete' && metal === 'copper' ? '4' : undefined
}

/** NEC 240.4(D): the largest device on a small conductor, A; undefined where it sets none. */
export function smallConductorLimit(size: Size, metal: Metal): number | undefined {
  const limits: Partial<Record<Size, number>> =
    metal === 'copper' ? { '14': 15, '12': 20, '10': 30 } : { '12': 15, '10': 25 }
  return limits[size]
}
