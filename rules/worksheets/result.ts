import type { Plot } from './plot.ts'

/** What every worksheet answers with, so that pages, print and service calls draw them all alike. Words are English. */

/** One step of the working: the formula, and the same with the numbers put in. */
export type Step = { name: string; formula: string; filled: string }

/** Where a figure or a rule comes from. */
export type Reference = {
  /** Standard and section, with what must be known of its editions. */
  cite: string
  /** Not checked against a copy of the standard: look it up in the adopted edition before it decides anything. */
  fromMemory: boolean
}

export type Caution = { word: 'danger' | 'warning' | 'caution' | 'notice'; text: string }

/** A number of the answer, already written out. */
export type Figure = { label: string; value: string; unit: string; note?: string }

export type Table = {
  title: string
  head: readonly string[]
  rows: readonly (readonly string[])[]
  /** Index of the row that this answer stands on. */
  chosen?: number
}

/** `holds`: what must be so is so. `fails`: it is not. `depends`: either way. `said`: nothing to judge. */
export type Judgment = 'holds' | 'fails' | 'depends' | 'said'

export type Result = {
  judgment: Judgment
  /** The answer in a few words, and then in sentences. */
  verdict: string
  because: readonly string[]
  figures: readonly Figure[]
  tables: readonly Table[]
  plot?: Plot
  steps: readonly Step[]
  references: readonly Reference[]
  assumptions: readonly string[]
  /** The gravest first. */
  cautions: readonly Caution[]
}

/** A standard that was seen. */
export const seen = (cite: string): Reference => ({ cite, fromMemory: false })
/** A standard from memory. */
export const remembered = (cite: string): Reference => ({ cite, fromMemory: true })

/** Ends the cautions of every worksheet. */
export const whoDecides: Caution = {
  word: 'notice',
  text: 'A computation, not an inspection. Local code and the authority having jurisdiction decide; work on wiring is for qualified people.',
}
