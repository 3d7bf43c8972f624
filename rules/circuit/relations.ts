/**
 * Readings that belong together: what two of them make says more than each does alone. A floating neutral may read
 * anything from a quarter to three quarters on either side, and yet the two sides add up.
 */

export type Relation = {
  /** First plus, or minus, second. */
  sign: 1 | -1
  ids: readonly [first: string, second: string]
}

const places = ['receptacle', 'panel', 'source'] as const
const plus = (first: string, second: string): Relation => ({ sign: 1, ids: [first, second] })
const minus = (first: string, second: string): Relation => ({ sign: -1, ids: [first, second] })

export const relations: readonly Relation[] = [
  ...places.flatMap((place) => {
    const [hn, hg, ng] = ['hn', 'hg', 'ng'].map((pair) => `${place}.${pair}.volts`) as [
      string,
      string,
      string,
    ]
    return [
      plus(hg, ng),
      minus(hg, ng),
      minus(hn, hg),
      minus(hn, ng),
      minus(hn, `${hn}.loaded`),
      minus(`${ng}.loaded`, ng),
    ]
  }),
  ...(['hn', 'hg', 'ng'] as const).flatMap((pair) => [
    minus(`receptacle.${pair}.volts`, `panel.${pair}.volts`),
    minus(`panel.${pair}.volts`, `source.${pair}.volts`),
    minus(`receptacle.${pair}.volts`, `source.${pair}.volts`),
  ]),
  plus('panel.l1n.volts', 'panel.l2n.volts'),
  minus('panel.l1n.volts', 'panel.l2n.volts'),
]

/** A relation's value among these findings; undefined where one of its readings was not taken. */
export function valueOf(
  { sign, ids }: Relation,
  findings: Readonly<Record<string, number | string>>,
): number | undefined {
  const [first, second] = [findings[ids[0]], findings[ids[1]]]
  return typeof first === 'number' && typeof second === 'number' ? first + sign * second : undefined
}
