import type { Readings } from '../../rules/triangle/sides.ts'

/** How a cause typically reads at the receptacle, to a digital meter of 10 MΩ. */
export type Typical = Readings & {
  /** What has to be so for these readings, in a few words. */
  when?: string
}

const volts = (hn: number, ng: number, hg: number, when?: string): Typical => ({
  hn,
  ng,
  hg,
  nominal: 120,
  ...(when === undefined ? {} : { when }),
})

/**
 * Typical readings on a 120 V system, for the drawing beside a cause. A cause that three readings say nothing of is
 * not here: a drawing of readings that could be any would teach the wrong thing.
 */
const typical: Readonly<Record<string, Typical>> = {
  sound: volts(120, 0.3, 119.7),
  'floating-neutral': volts(119.6, 56.8, 57.2),
  'balanced-output': volts(119.6, 59.8, 59.9),
  'isolated-output': volts(119.8, 1.6, 2.1),
  'bond-lost-on-transfer': volts(119.6, 57.9, 55.6, 'in the mode that loses the bond'),
  'standing-ground-fault': volts(119.8, 119.6, 0.4, 'the same three volts as hot and neutral swapped'),
  'open-ground': volts(
    120,
    0.8,
    1.4,
    'with a few feet of dead ground wire; a long one reads like a floating neutral',
  ),
  'open-neutral': volts(14, 31, 120, 'with nothing plugged in on that circuit'),
  'reversed-polarity': volts(120, 119.8, 0.3),
  'hot-ground-swapped': volts(0.6, 120, 119.8),
  'two-hots': volts(240, 120, 120),
  'bootleg-ground': volts(120, 0, 120),
  'bootleg-ground-reversed': volts(
    120,
    0,
    120,
    'and still every metal part is live: only a reading to earth shows it',
  ),
  'shared-neutral-lost': volts(152, 32, 120, 'on the leg with the lighter load'),
  'loose-neutral': volts(112, 6.4, 118.4, 'with a load running'),
  'loose-hot': volts(110, 0.8, 109.2, 'with a load running'),
  'long-run': volts(112, 3.6, 115.6, 'with a load running'),
  'low-source-voltage': volts(97, 0.3, 96.7),
  'high-source-voltage': volts(138, 0.3, 137.7),
  'source-off': volts(0.4, 0.1, 0.3),
}

/** Typical readings of a cause, or undefined where three readings don't tell. */
export const typicalOf = (cause: string): Typical | undefined => typical[cause]
