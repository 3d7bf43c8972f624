/**
 * A circuit as nodes and branches, at one frequency. Volts and amps are RMS; phase is kept, since a balanced output's
 * halves add up and two capacitors' do not.
 */

/** A point of the wiring: `panel.neutral`. `earth` is the reference, at 0 V. */
export type Node = string
export const earth: Node = 'earth'

type Ends = {
  /** Unique in its network; names what it stands for: `feeder.egc`, `bond.panel`. */
  name: string
  from: Node
  to: Node
}
export type Branch =
  | (Ends & { kind: 'resistance'; ohms: number })
  | (Ends & { kind: 'capacitance'; farads: number })
  /** A winding or choke: resistance and inductance in series. At 0 Hz its resistance alone is left. */
  | (Ends & { kind: 'winding'; ohms: number; henries: number })
  /** An electromotive force behind its inner resistance; `to` is where it pushes. At 0 Hz it gives nothing. */
  | (Ends & { kind: 'source'; volts: number; degrees: number; ohms: number })

/** `hertz` 0: as an ohmmeter sees it, capacitances open. */
export type Network = { hertz: number; branches: readonly Branch[] }

export type Complex = { re: number; im: number }
export const magnitude = ({ re, im }: Complex): number => Math.hypot(re, im)
