/** Which groups of rules get their bits from the circuit model, and how far a count of model cases is trusted. */

import type { ElectricalCause } from '../../../rules/circuit/wiring/context.ts'

export type Computed = {
  group: string
  /** Rules of the group that stay as written: what the model has no cases of, or too few. */
  byHand?: readonly string[]
  /** No more than so many bits for or against; 5 is the most a rule may say. */
  most?: number
  /** The part of outcomes that owes nothing to the cause: misread, of other wires, in the wrong field. */
  slips?: number
  /** Part of the bits that counts, where other groups see much of the same. */
  counts?: number
  /** Only causes with a wiring of their own are computed: what the others do here is no matter of wires. */
  wiredOnly?: boolean
  /** Causes that stay as written in this group. */
  asWritten?: readonly ElectricalCause[]
  /** By rule and cause, no fewer bits than these: where the model draws a cause narrower than it can be. */
  atLeast?: Readonly<Record<string, Partial<Record<ElectricalCause, number>>>>
  /** Bits of causes with which it can't be taken: that somebody took it speaks against them. */
  cannot?: Partial<Record<ElectricalCause, number>>
  /** Counted on sheets that hold this one reading: rules that speak while a place has no three. */
  alone?: string
  because?: string
}

/**
 * One reading in some thirty is of the wrong wires, misread, or of a house that no model knows; so what a cause never
 * shows still counts five bits against it at most. Common practice, no source.
 */
export const usualSlips = 0.03
/** Bits are whole and small; a single look never rules a cause out. */
export const mostBits = 5

const places = ['receptacle', 'panel', 'source'] as const
const alone = places.flatMap((place) =>
  (['ng', 'hg', 'hn'] as const).map((pair): Computed => ({
    group: `${place}-${pair}-alone`,
    alone: `${place}.${pair}.volts`,
    most: 4,
    because: 'One reading of three can be of the wrong two wires, and nothing beside it shows that.',
  })),
)

/** Faults that no lamp and no tester shows, so that nothing of the wires decides how far people say they reach. */
const showNowhere = [
  'sound',
  'double-bond',
  'rod-only-return',
  'bootleg-ground',
  'bootleg-ground-reversed',
] as const

export const computedGroups: readonly Computed[] = [
  { group: 'receptacle-volts', byHand: ['receptacle-beyond-hot', 'receptacle-three-live'] },
  ...alone,
  {
    group: 'panel-volts',
    byHand: ['panel-three-live'],
    counts: 0.9,
    because: 'The receptacle shows much of what the panel shows.',
  },
  {
    group: 'source-volts',
    byHand: ['source-needle', 'source-untied', 'source-three-live'],
    counts: 0.9,
    because: 'The panel shows much of what the source shows.',
  },
  { group: 'supply' },
  { group: 'along-the-run', byHand: ['receptacle-fed-elsewhere', 'panel-fed-elsewhere'], most: 4 },
  {
    group: 'legs',
    byHand: ['legs-opposite', 'legs-one-dead', 'legs-both-dead', 'legs-same-phase', 'legs-not-twice'],
  },
  { group: 'legs-ground', byHand: ['legs-ground-one'] },
  {
    group: 'tester-lamps',
    slips: 0.04,
    because: 'A lamp is judged by eye, in daylight, and testers are not made alike.',
  },
  {
    group: 'receptacle-load',
    byHand: ['load-rise'],
    atLeast: { 'load-collapse': { 'loose-neutral': 0, 'loose-hot': 0 } },
    because:
      'The model’s poor joints lose up to a fifth of the voltage; a worse one, nearly open, loses most of it.',
  },
  {
    group: 'receptacle-load-severe',
    most: 1,
    because: 'It says again, coarser, what the drop and its share on neutral say together.',
  },
  {
    group: 'neutral-rise',
    byHand: ['rise-none'],
    atLeast: { 'rise-collapse': { 'loose-neutral': 0 } },
    most: 3,
    counts: 0.6,
    because: 'The share of the drop on neutral is the same reading.',
  },
  { group: 'drop-sits', most: 4, because: 'Three drops compared, each a small difference of two readings.' },
  { group: 'source-load', byHand: ['source-sags', 'source-collapses'], most: 3 },
  { group: 'panel-rise', most: 4 },
  { group: 'feeder-rise', most: 4, because: 'Small differences, with whatever the house draws just then.' },
  { group: 'receptacle-ohms' },
  { group: 'receptacle-ng-ohms', most: 2, counts: 0.5, because: 'The pair of ohms says it already.' },
  { group: 'panel-ohms', counts: 0.8, because: 'The receptacle’s ohms see the same bond.' },
  { group: 'source-ohms', counts: 0.8, because: 'The receptacle’s ohms see the same bond.' },
  { group: 'two-bonds-by-ohms', counts: 0.7, because: 'Both ohms count by themselves too.' },
  { group: 'ground-wire-ohms', byHand: ['ground-wire-poor'] },
  { group: 'fault-loop', byHand: ['loop-raised', 'loop-rods', 'loop-open'] },
  {
    group: 'feeder-ground',
    cannot: { 'rod-only-return': -2 },
    because:
      'Without a ground wire in the feeder there is none to clamp, though the rod’s wire is taken for it.',
  },
  { group: 'branch-ground', byHand: ['branch-ground-flows'] },
  { group: 'bulb-neutral-ground' },
  { group: 'bulb-hot-ground' },
  { group: 'source-bulb', byHand: ['source-bulb-half', 'source-bulb-hot'] },
  { group: 'ground-to-earth' },
  {
    group: 'extent',
    most: 3,
    slips: 0.1,
    wiredOnly: true,
    asWritten: showNowhere,
    because:
      'Told by people: now and then wrong, and never worth more than three bits. What shows nowhere has no extent ' +
      'to compute; there what the trade says stands.',
  },
  {
    group: 'lights',
    most: 3,
    slips: 0.1,
    wiredOnly: true,
    because: 'Seen by people, and each sees other lamps.',
  },
  { group: 'gfci-own-test', most: 3, slips: 0.05, wiredOnly: true, because: 'Buttons wear out.' },
  { group: 'gfci-plug-test', slips: 0.05, wiredOnly: true, because: 'Buttons wear out.' },
  { group: 'gfci-in-use', most: 3, slips: 0.1, wiredOnly: true, because: 'A load may have tripped it.' },
]
