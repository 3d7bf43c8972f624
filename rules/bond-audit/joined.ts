/** Which of a number of points are joined by wires: union–find. */
export type Joined = {
  join: (a: number, b: number) => void
  /** The same number for any two points that are joined. */
  of: (point: number) => number
}

export function pointsApart(count: number): Joined {
  const up = new Int32Array(count)
  for (let i = 0; i < count; i++) up[i] = i
  const of = (point: number): number => {
    let at = point
    while (up[at] !== at) at = up[at] = up[up[at]!]!
    return at
  }
  return {
    of,
    join: (a, b) => {
      up[of(a)] = of(b)
    },
  }
}
