/** Where a wiring stands, in the catalogue's own words, and what follows from it. */

export const sourceKinds = [
  'all-in-one-inverter',
  'standalone-inverter',
  'power-station',
  'generator',
  'utility',
] as const
export type SourceKind = (typeof sourceKinds)[number]
export const systemKinds = ['120', '120/240', '230'] as const
export type SystemKind = (typeof systemKinds)[number]

export type WiringContext = { source: SourceKind; system: SystemKind; wiring: 'panel' | 'direct' }

export const nominalVolts = ({ system }: WiringContext): 120 | 230 => (system === '230' ? 230 : 120)
export const hertzOf = ({ system }: WiringContext): 50 | 60 => (system === '230' ? 50 : 60)
export const hasTwoLegs = ({ system }: WiringContext): boolean => system === '120/240'
export const hasPanel = ({ wiring }: WiringContext): boolean => wiring === 'panel'

/**
 * Ohms grow with nominal volts where watts stay the same: on 230 V a source of the same power has some twice the
 * inner resistance, and a joint that loses the same part of the volts at the lower current twice the ohms.
 */
export const ohmsScale = (context: WiringContext): number => nominalVolts(context) / 120

/** The causes that change the circuit itself, in the catalogue's order: those marked electrical there. */
export const electricalCauses = [
  'sound',
  'floating-neutral',
  'balanced-output',
  'isolated-output',
  'double-bond',
  'rod-only-return',
  'standing-ground-fault',
  'open-ground',
  'open-neutral',
  'open-hot',
  'reversed-polarity',
  'hot-ground-swapped',
  'two-hots',
  'bootleg-ground',
  'bootleg-ground-reversed',
  'shared-neutral-lost',
  'loose-neutral',
  'loose-hot',
  'long-run',
  'low-source-voltage',
  'high-source-voltage',
  'source-off',
] as const
export type ElectricalCause = (typeof electricalCauses)[number]
