/**
 * Causes that change no wire of the model, or not always the same: how often each stands there as which wiring while
 * it is measured. Common practice, no source.
 */
import type { ElectricalCause } from '../../../rules/circuit/wiring/context.ts'

export const mixtures: Readonly<Record<string, Partial<Record<ElectricalCause, number>>>> = {
  'bond-lost-on-transfer': { sound: 0.5, 'floating-neutral': 0.5 },
  'unswitched-neutral': { 'double-bond': 1 },
  'averaging-meter': { 'low-source-voltage': 0.8, sound: 0.2 },
  'leakage-to-ground': { sound: 0.85, 'open-hot': 0.15 },
  'neutral-touch-downstream': { sound: 0.75, 'open-hot': 0.25 },
  'overloaded-circuit': { sound: 0.7, 'long-run': 0.2, 'open-hot': 0.1 },
  'short-circuit': { sound: 0.6, 'open-hot': 0.4 },
  'gfci-faulty': { sound: 0.8, 'open-hot': 0.2 },
  'gfci-unsuited': { sound: 0.6, 'floating-neutral': 0.25, 'open-hot': 0.15 },
  backfeed: { sound: 0.8, 'source-off': 0.2 },
  'neutrals-crossed': { sound: 0.9, 'loose-neutral': 0.1 },
  'shared-neutral-overloaded': { sound: 0.7, 'long-run': 0.15, 'loose-neutral': 0.15 },
  'breaker-unsuitable': { sound: 0.8, 'open-hot': 0.1, 'long-run': 0.1 },
  'stray-earth-voltage': { sound: 0.95, 'rod-only-return': 0.05 },
  'dc-ground-fault': { sound: 0.8, 'floating-neutral': 0.2 },
}
