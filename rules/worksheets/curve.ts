/**
 * A value on a line through points, in order of x. Two points with one x are a jump: at it the earlier one counts.
 * `logarithmic`: straight on log-log paper, as breaker curves are drawn. Outside the points the ends go on level.
 */
export function throughPoints(
  points: readonly (readonly [x: number, y: number])[],
  x: number,
  paper: 'straight' | 'logarithmic',
): number {
  const after = points.findIndex(([at]) => at >= x)
  const next = points[after === -1 ? points.length - 1 : after]
  const last = points[after - 1]
  if (next === undefined) throw new RangeError('a line needs a point')
  if (last === undefined || after === -1 || next[0] === last[0]) return next[1]
  if (paper === 'straight') return last[1] + ((next[1] - last[1]) * (x - last[0])) / (next[0] - last[0])
  const part = Math.log(x / last[0]) / Math.log(next[0] / last[0])
  return last[1] * (next[1] / last[1]) ** part
}
