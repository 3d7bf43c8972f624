import type { DangerId } from './triage-state.ts'

/** One of the things a question joins: what is recorded, and which stop's words it has. */
type Part = {
  id: string
  label: string
  /** Finding → value. */
  findings: Readonly<Record<string, string>>
  /** Stop whose words are shown. Absent: a caution, not a stop. */
  stop?: string
  /** How it is said on the phone. */
  said: string
}

export type Danger = {
  id: DangerId
  question: string
  /** "Which was it?" The worst first: its words stand until one was chosen. */
  parts: readonly [Part, ...Part[]]
  /** What "No" records. */
  no: Readonly<Record<string, string>>
}

/** Asked before anything is plugged in. Where one joins several dangers, any yes stops. */
export const dangers: readonly Danger[] = [
  {
    id: 'metal',
    question: 'Did anyone feel a shock or a tingle from metal?',
    parts: [
      {
        id: 'shock',
        label: 'A shock',
        said: 'Someone had a shock from metal.',
        findings: { shock: 'yes' },
        stop: 'shock',
      },
      {
        id: 'tingle',
        label: 'A tingle',
        said: 'Someone felt a tingle from metal.',
        findings: { tingle: 'yes' },
        stop: 'tingle',
      },
    ],
    no: { shock: 'no', tingle: 'no' },
  },
  {
    id: 'smoke',
    question: 'Smoke, sparks, sizzling or a burnt smell?',
    parts: [
      {
        id: 'smoke',
        label: 'Smoke, sparks or sizzling',
        said: 'There is smoke, sparks or sizzling.',
        findings: { 'smoke-or-arcing': 'yes' },
        stop: 'smoke-or-arcing',
      },
      {
        id: 'burnt',
        label: 'A burnt smell',
        said: 'It smells burnt.',
        findings: { smell: 'burnt' },
        stop: 'smell-burnt',
      },
      {
        id: 'fishy',
        label: 'A fishy smell',
        said: 'It smells fishy.',
        findings: { smell: 'fishy' },
        stop: 'smell-fishy',
      },
    ],
    no: { 'smoke-or-arcing': 'no' },
  },
  {
    id: 'heat',
    question: 'Is an outlet (receptacle), switch or panel hot, scorched or buzzing?',
    parts: [
      {
        id: 'burnt',
        label: 'Hot or scorched',
        said: 'Something electrical is hot or scorched.',
        findings: { heat: 'burnt' },
        stop: 'heat-burnt',
      },
      {
        id: 'warm-buzz',
        label: 'Warm, and it buzzes',
        said: 'Something electrical is warm, and it buzzes.',
        findings: { heat: 'warm', buzz: 'yes' },
        stop: 'heat-warm-and-buzz',
      },
      {
        id: 'buzz',
        label: 'It buzzes. I can’t tell if it’s warm',
        said: 'Something electrical buzzes.',
        findings: { buzz: 'yes' },
        stop: 'heat-warm-and-buzz',
      },
      {
        id: 'warm',
        label: 'Only a little warm, no buzz',
        said: 'Something electrical is a little warm. It doesn’t buzz.',
        findings: { heat: 'warm', buzz: 'no' },
      },
    ],
    no: { heat: 'none', buzz: 'no' },
  },
  {
    id: 'water',
    question: 'Is there water near it?',
    parts: [
      { id: 'wet', label: 'Water', said: 'There is water near it.', findings: { wet: 'yes' }, stop: 'wet' },
    ],
    no: { wet: 'no' },
  },
  {
    id: 'lights',
    question: 'Are some lights very bright while others dim?',
    parts: [
      {
        id: 'some',
        label: 'Some bright, some dim',
        said: 'Some lights are very bright while others dim.',
        findings: { lights: 'some-bright-some-dim' },
        stop: 'some-bright-some-dim',
      },
      {
        id: 'all',
        label: 'All too bright',
        said: 'All lights are too bright.',
        findings: { lights: 'too-bright' },
        stop: 'lights-too-bright',
      },
    ],
    no: {},
  },
  {
    id: 'engine',
    question: 'Is an engine running indoors, in a garage or near a window? Or does anyone have a headache?',
    parts: [
      {
        id: 'headache',
        label: 'Someone has a headache, or feels dizzy or sick',
        said: 'Someone has a headache, or feels dizzy or sick.',
        findings: { headache: 'yes' },
        stop: 'headache',
      },
      {
        id: 'indoors',
        label: 'It runs indoors or in a garage',
        said: 'An engine runs indoors or in a garage.',
        findings: { 'engine.place': 'indoors' },
        stop: 'engine-indoors',
      },
      {
        id: 'near',
        label: 'It runs near a door or window',
        said: 'An engine runs near a door or window.',
        findings: { 'engine.place': 'near-opening' },
        stop: 'engine-near-opening',
      },
      {
        id: 'exhaust',
        label: 'It smells of exhaust inside',
        said: 'It smells of exhaust inside.',
        findings: { smell: 'exhaust' },
        stop: 'smell-exhaust',
      },
    ],
    no: { headache: 'no' },
  },
  {
    id: 'battery',
    question: 'Is a battery hot, swollen, hissing or smelling?',
    parts: [
      {
        id: 'hot',
        label: 'Hot, swollen or hissing',
        said: 'A battery is hot, swollen or hissing.',
        findings: { battery: 'hot-swollen-hissing' },
        stop: 'battery',
      },
      {
        id: 'egg',
        label: 'A rotten-egg smell',
        said: 'It smells of rotten eggs near the battery.',
        findings: { smell: 'egg' },
        stop: 'smell-egg',
      },
    ],
    no: { battery: 'normal' },
  },
  {
    id: 'joined',
    question: 'Are two sources joined by a cord with two plugs, or is a panel fed twice?',
    parts: [
      {
        id: 'joined',
        label: 'Two sources joined',
        said: 'Two sources are joined.',
        findings: { 'two-sources-joined': 'yes' },
        stop: 'two-sources-joined',
      },
    ],
    no: { 'two-sources-joined': 'no' },
  },
]

/** Stops where people leave first and touch nothing, the worst first. */
export const leaveFirst: readonly string[] = [
  'headache',
  'engine-indoors',
  'smell-exhaust',
  'engine-near-opening',
  'battery',
  'smell-egg',
]

/** Which words stand first when several stop. The rest follow in the edition's order. */
export const worstFirst: readonly string[] = [
  ...leaveFirst,
  'smoke-or-arcing',
  'shock',
  'tingle',
  'smell-burnt',
  'heat-burnt',
]
