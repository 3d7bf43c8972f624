/** When people say it began, cause by cause: how a fault comes about. Common practice, no source. */
import type { ElectricalCause } from '../../../rules/circuit/wiring/context.ts'
import type { Option } from '../../../rules/circuit/wiring/parameters.ts'

type Weights = Partial<Record<Onset, number>>
export const onsets = [
  'always',
  'after-new-work',
  'after-storm',
  'after-source-change',
  'only-on-battery',
  'only-on-backup-or-grid',
] as const
export type Onset = (typeof onsets)[number]

/** Miswired: it was so from the day of the work. */
const miswired: Weights = { 'after-new-work': 52, always: 38, 'after-source-change': 5, 'after-storm': 5 }
/** A matter of the source's bond: there since the source, or only while it runs. */
const bond: Weights = {
  always: 38,
  'after-source-change': 27,
  'after-new-work': 14,
  'only-on-battery': 10,
  'only-on-backup-or-grid': 8,
  'after-storm': 3,
}
/** Something that worked loose. */
const wear: Weights = { 'after-new-work': 34, 'after-storm': 33, always: 25, 'after-source-change': 8 }
const level: Weights = {
  'after-source-change': 38,
  always: 26,
  'only-on-battery': 12,
  'only-on-backup-or-grid': 14,
  'after-storm': 10,
}

const weights: Record<ElectricalCause, Weights> = {
  sound: { always: 62, 'after-new-work': 16, 'after-source-change': 14, 'after-storm': 8 },
  'floating-neutral': bond,
  'balanced-output': bond,
  'isolated-output': bond,
  'double-bond': { 'after-source-change': 42, 'after-new-work': 30, always: 24, 'only-on-backup-or-grid': 4 },
  'rod-only-return': { always: 48, 'after-source-change': 28, 'after-new-work': 24 },
  'standing-ground-fault': {
    'after-new-work': 38,
    always: 26,
    'after-storm': 24,
    'after-source-change': 12,
  },
  'open-ground': miswired,
  'open-neutral': wear,
  'open-hot': wear,
  'reversed-polarity': miswired,
  'hot-ground-swapped': miswired,
  'two-hots': miswired,
  'bootleg-ground': miswired,
  'bootleg-ground-reversed': miswired,
  'shared-neutral-lost': {
    'after-storm': 46,
    'after-new-work': 40,
    always: 8,
    'after-source-change': 6,
  },
  'loose-neutral': wear,
  'loose-hot': wear,
  'long-run': { always: 56, 'after-new-work': 44 },
  'low-source-voltage': level,
  'high-source-voltage': level,
  'source-off': { 'after-storm': 46, 'after-source-change': 34, 'after-new-work': 12, always: 8 },
}

/** The onsets of a cause, weighted. */
export const onsetsOf = (cause: ElectricalCause): Option<Onset>[] =>
  onsets.flatMap((value) => {
    const weight = weights[cause][value] ?? 0
    return weight > 0 ? [{ value, weight }] : []
  })
