/** What a diagnosis says. Screens, the command line and the tests read these shapes. */

/** One piece of evidence: the strongest of its group, for or against. */
export type Evidence = {
  group: string
  rule: string
  /** −5 … 5, never 0. */
  bits: number
  because: string
  source: string
  /** The numbers behind it, in words: "57.2 and 56.8 of 119.6 V". Empty when the sentence says it all. */
  numbers: string
  /** The mode the findings were taken in. */
  mode: string
}

export type RankedCause = {
  cause: string
  /** 0 … 1; the whole ranking adds to 1. */
  share: number
  /** Share before any finding. */
  before: number
  evidence: readonly Evidence[]
  /** Two or more groups against, eight bits together: struck on a screen, the share stays as computed. */
  ruledOut: boolean
}

/** A row of the screen: one cause, or several that the findings can't part. */
export type CauseRow = {
  /** Most dangerous first when there are several; all of them level. */
  causes: readonly RankedCause[]
  share: number
}

export type Stop = {
  /** Names its words: `rules/starter/stops.json`. */
  id: string
  /** The findings that say so. */
  findings: readonly string[]
  mode: string
  /** Read at 1 MΩ or more, so it may be a ghost: treat as live all the same. */
  mayBeGhost: boolean
}

export type Misfit = {
  /** Plain sentence: why no single cause fits. */
  because: string
  /** The finding to take again. */
  again: string
  mode: string
}

export type BondLine = { line: 1 | 2 | 3 | 4 | 5; met: boolean; says: string }
export type Bond = {
  state: 'released' | 'held-back'
  /** The mode in which the most lines hold, and the lines there. */
  mode: string
  lines: readonly BondLine[]
}

export type ForkOutcome = {
  id: string
  label: string
  lamp: 'lit' | 'dim' | 'dark' | undefined
  /** Chance of this outcome, from the rules' own tables. */
  chance: number
  /** What the ranking would lead with. */
  leads: string
  share: number
  /** Whether it would say stop. */
  stop: boolean
}
export type NextTest = {
  test: string
  /** Findings of it not taken yet. */
  findings: readonly string[]
  /** Set when it is to be done in another mode than the sheet's. */
  mode: string | undefined
  gainBits: number
  /** Causes it would part best, two or three ids. */
  parts: readonly string[]
  outcomes: readonly ForkOutcome[]
}

export type Diagnosis = {
  ranking: readonly RankedCause[]
  rows: readonly CauseRow[]
  stops: readonly Stop[]
  misfit: Misfit | undefined
  bond: Bond
  nextTests: readonly NextTest[]
}
