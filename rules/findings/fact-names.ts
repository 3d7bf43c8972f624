import type { DiagnosisFile } from '../edition/schema.ts'

/**
 * The derived facts, version 1: what each can say. Rules may ask for these and for the findings themselves.
 * A fact that can't be derived is absent, never a value of its own, so that absence is never evidence.
 */
export const places = ['receptacle', 'panel', 'source'] as const
export type Place = (typeof places)[number]

/** Where the third corner lies, from three volts at one place; `volts-pattern.ts` says how each is told. */
const patterns = [
  'dead',
  'on-neutral',
  'on-hot',
  'half',
  'uneven',
  'just-short',
  'short',
  'far-short',
  'nowhere',
  'beyond-neutral',
  'beyond-hot',
  'off-line',
  'needle',
  'neutral-untied',
  'hot-untied',
  'across-legs',
  'other-leg',
  'three-live',
] as const
export type Pattern = (typeof patterns)[number]

/** A voltage against the system's nominal one. */
const levels = ['nil', 'trace', 'part', 'half', 'sagging', 'low', 'within', 'high', 'over', 'double'] as const
export type Level = (typeof levels)[number]

const weights = ['light', 'middle', 'heavy'] as const
const drops = ['rise', 'none', 'usual', 'much', 'severe', 'collapse'] as const
const shares = ['none', 'little', 'small', 'half', 'most'] as const
/** Hot–neutral against the limits for this kind of source. */
const supplies = ['far-low', 'low', 'lowish', 'within', 'highish', 'high', 'far-high'] as const
export type Supply = (typeof supplies)[number]
const ghosts = ['short', 'cable', 'filters', 'held', 'firm'] as const
export type Ghost = (typeof ghosts)[number]
const ohmBands = ['tied', 'poor', 'rods', 'load', 'open'] as const
const bulbStates = ['dark', 'dim', 'bright'] as const

const derived: Record<string, 'number' | readonly string[]> = {
  'context.legs': ['1', '2'],
  // Loads and wires
  'receptacle.drop': drops,
  'panel.drop': drops,
  'source.drop': drops,
  'drop.sits': ['source', 'feeder', 'branch'],
  'receptacle.rise-share': shares,
  'panel.rise-share': shares,
  'feeder.rise-share': shares,
  'receptacle.loaded-alone': ['low', 'within'],
  'receptacle.ng.rise': ['none', 'small', 'some', 'much', 'collapse'],
  // Volts of one place against those of the place before it
  'panel.against-source': ['same', 'less', 'gone', 'fed-elsewhere', 'more'],
  'receptacle.against-panel': ['same', 'less', 'gone', 'fed-elsewhere', 'more'],
  'receptacle.against-source': ['same', 'less', 'gone', 'fed-elsewhere', 'more'],
  // One voltage to ground read with two instruments: what ties ground at the receptacle
  'receptacle.ghost': ghosts,
  // Two legs
  'legs.pattern': ['equal', 'apart', 'opposite', 'one-dead', 'both-dead', 'same-phase', 'not-twice'],
  'legs.ground': ['equal', 'apart', 'one-on-ground'],
  // Dead circuit
  'receptacle.ng.band': ohmBands,
  'receptacle.hg.band': ohmBands,
  'panel.ng.band': ohmBands,
  'source.ng.band': ohmBands,
  'branch.egc.band': ohmBands,
  'insulation.band': ['poor', 'fair', 'good'],
  'loop.band': ['low', 'raised', 'rods', 'open'],
  // Test bulbs
  'bulb.ng.shows': bulbStates,
  'bulb.hg.shows': bulbStates,
  'source-bulb.holds': ['nothing', 'half', 'neutral', 'hot', 'sagged'],
  // Testers
  'tester.lamps': [],
  'shock.felt': ['yes', 'no'],
  'gfci.buttons': ['both-trip', 'own-only', 'plug-only', 'neither'],
  'gfci.time': ['in-time', 'slow'],
  // Earth
  'ground-to-earth.level': ['nil', 'some', 'touch', 'line'],
  'ground-to-earth.meter': weights,
  // Clamp
  'feeder.egc.flow': ['none', 'trace', 'some', 'much'],
  'branch.egc.flow': ['none', 'trace', 'some', 'much'],
  'rod.flow': ['none', 'trace', 'some', 'much'],
  'leakage.band': ['small', 'near', 'trips'],
  'neutral.against-hot': ['same', 'more', 'less', 'none'],
  'load.against-breaker': ['under', 'over'],
  'load.against-wire': ['under', 'over'],
  'breaker.against-wire': ['fits', 'too-large'],
  // Source
  'source.hertz': ['within', 'fast', 'off'],
  'source.ng.dc': ['none', 'some', 'much'],
  'battery.state': ['charged', 'flat', 'over'],
  // Modes compared
  'modes.bond': ['same', 'comes-and-goes'],
  'modes.second-bond': ['same', 'comes-and-goes'],
}
for (const place of places) {
  derived[`${place}.pattern`] = patterns
  derived[`${place}.meter`] = weights
  derived[`${place}.supply`] = supplies
  for (const pair of ['hn', 'hg', 'ng']) {
    derived[`${place}.${pair}.level`] = levels
    /** The same while not all three are there: a pattern of three replaces what each says alone. */
    derived[`${place}.${pair}.alone`] = levels
  }
}
const lamp = ['lit', 'dim', 'dark']
derived['tester.lamps'] = lamp.flatMap((a) => lamp.flatMap((b) => lamp.map((c) => `${a}/${b}/${c}`)))

const derivedFacts: Readonly<Record<string, 'number' | readonly string[]>> = derived

/** Every fact a rule of this edition may ask for, with its values, or 'number'. */
export function factValues(file: DiagnosisFile): ReadonlyMap<string, 'number' | readonly string[]> {
  return new Map<string, 'number' | readonly string[]>([
    ...Object.entries(derivedFacts),
    ['context.source', file.sources.map((s) => s.id)],
    ['context.system', file.systems.map((s) => s.id)],
    ['context.wiring', file.wirings.map((w) => w.id)],
    ...file.readings.map((r) => [r.id, 'number'] as const),
    ...file.observations.map((o) => [o.id, o.values.map((v) => v.id)] as const),
  ])
}
