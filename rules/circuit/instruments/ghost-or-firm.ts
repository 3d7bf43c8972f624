import type { Meter } from './meter.ts'

/** One voltage, and the instrument that was in the circuit while it was read. */
export type TakenWith = { volts: number; meter: Meter }

export type GhostOrFirm =
  /**
   * The voltage falls away under load: what couples it, and what it could deliver. A ghost is not harmless for being
   * one: from half a milliamp a person feels it (IEC 60479-1, line a).
   */
  | { kind: 'ghost'; farads: number; openVolts: number; amps: number }
  /** It falls to less than the heavier instrument can show: the coupling and the current are these at most. */
  | { kind: 'ghost-at-most'; farads: number; amps: number }
  /** The voltage stays: at least this current flowed while it was read. */
  | { kind: 'firm'; atLeastAmps: number }
  /** No voltage, or two instruments too much alike, or more volts under the heavier one. */
  | { kind: 'not-told' }

/** Two instruments part a ghost from a firm voltage where one has at least four times the other's resistance. */
const apart = 4
/** Fewer volts than this with the lighter meter say nothing: pick-up of the leads (common practice). */
const leastVolts = 2
/** A tenth less is the most two readings of one firm voltage differ by: meters, and a source that wanders. */
const stays = 0.9
/** The last digit of a handheld meter, V: what it calls 0 may be half of it. */
const digitVolts = 0.1

/**
 * Ghost or firm, from one voltage read twice, with a light meter and with a heavy one or the test bulb.
 *
 * A ghost reaches the wire through a capacitance C, from a voltage V behind it. Against a meter of conductance G and
 * capacitance K that leaves |v|² (G² + ω²(C + K)²) = (ω·C·V)². The right side is the same for both meters, so
 *
 *   v₁² (G₁² + ω²(C + K₁)²) = v₂² (G₂² + ω²(C + K₂)²)
 *
 * is a quadratic equation in C. Its leading term ω²(v₁² − v₂²) is positive and its last one negative for a voltage
 * that falls by more than the meters' capacitances explain, so just one root is a capacitance. V then follows from
 * either reading, and a wire across it would carry ω·C·V.
 *
 * For the test bulb `meter` is its filament at the volts it had (`filamentOhms`), with no capacitance. A source with
 * resistance in place of capacitance reads as a ghost with as much impedance; two voltages can't tell them apart.
 * @param hertz of the system, above 0
 */
export function ghostOrFirm(one: TakenWith, other: TakenWith, hertz: number): GhostOrFirm {
  const [light, heavy] = one.meter.ohms >= other.meter.ohms ? [one, other] : [other, one]
  if (light.meter.ohms < apart * heavy.meter.ohms || light.volts < leastVolts) return { kind: 'not-told' }
  if (heavy.volts > light.volts / stays) return { kind: 'not-told' }
  if (heavy.volts >= stays * light.volts) return { kind: 'firm', atLeastAmps: heavy.volts / heavy.meter.ohms }
  const shown = heavy.volts >= digitVolts / 2
  const behind = capacitance(light, shown ? heavy : { ...heavy, volts: digitVolts / 2 }, hertz)
  if (behind === undefined) return { kind: 'not-told' }
  const { farads, openVolts } = behind
  const amps = 2 * Math.PI * hertz * farads * openVolts
  return shown ? { kind: 'ghost', farads, openVolts, amps } : { kind: 'ghost-at-most', farads, amps }
}

function capacitance(light: TakenWith, heavy: TakenWith, hertz: number) {
  const w = 2 * Math.PI * hertz
  const [u, v] = [light.volts ** 2, heavy.volts ** 2]
  const [j, k] = [light.meter.farads, heavy.meter.farads]
  const [g, h] = [1 / light.meter.ohms, 1 / heavy.meter.ohms]
  const a = w * w * (u - v)
  const b = w * w * (u * j - v * k)
  const c = u * (g * g + w * w * j * j) - v * (h * h + w * w * k * k)
  if (c >= 0) return undefined
  const farads = -c / (b + Math.sqrt(b * b - a * c))
  const openVolts = (light.volts * Math.hypot(g, w * (farads + j))) / (w * farads)
  return { farads, openVolts }
}
