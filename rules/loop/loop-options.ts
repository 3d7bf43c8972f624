/** What can be turned on and off in the picture. */
export type LoopOptions = {
  /** A load running, or a hot wire on metal. */
  state: LoopStateName
  /** The one bond, where it belongs. */
  bond: boolean
  /** A ground rod, at each place that has one. */
  rod: boolean
  /** A bond too many, at the other end of the feeder. */
  secondBond: boolean
}
export const loopStates = ['load', 'fault'] as const
export type LoopStateName = (typeof loopStates)[number]
