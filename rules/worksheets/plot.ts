/** A drawing on two logarithmic axes, in points of its frame: whoever draws it decides nothing more. */

type Point = readonly [x: number, y: number]
type Mark = { at: number; text: string }

export type Plot = {
  width: number
  height: number
  /** The field between the axes. */
  field: { left: number; top: number; right: number; bottom: number }
  xTicks: readonly Mark[]
  yTicks: readonly Mark[]
  xLabel: string
  yLabel: string
  /** The band of the device, closed. */
  band: readonly Point[]
  /** The currents that can flow, and the times that follow. */
  operating: { left: number; right: number; top: number; bottom: number; text: string }
  /** Where the source lets go: a line across, with the words beside it. */
  ends: readonly { y: number; text: string }[]
  /** All of it in words. */
  words: string
}
