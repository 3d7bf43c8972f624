import type { Facts } from '../../findings/facts.ts'

/** What the checks read: one mode's findings and facts. */
export type Look = {
  /** A reading's value in its unit. */
  amount: (id: string) => number | undefined
  observed: (id: string) => string | undefined
  fact: (name: string) => string | undefined
  nominal: number
  hertz: number
  legs: 1 | 2
  wiring: string
  facts: Facts
}
/** Findings that can't all be true: why, and which to take again. */
export type Contradiction = { because: string; again: string }
export type Check = (look: Look) => Contradiction | undefined

/** A triple of volts at one place, as parts of nominal. */
export type Triple = { place: string; hn: number; hg: number; ng: number }

const places = ['receptacle', 'panel', 'source'] as const

export function triples({ amount, nominal }: Look): Triple[] {
  return places.flatMap((place) => {
    const [hn, hg, ng] = ['hn', 'hg', 'ng'].map((pair) => amount(`${place}.${pair}.volts`))
    if (hn === undefined || hg === undefined || ng === undefined) return []
    return [{ place, hn: hn / nominal, hg: hg / nominal, ng: ng / nominal }]
  })
}

/** Whether one number is about ten times the other: a slipped point. */
export const tenfold = (a: number, b: number): boolean => {
  const ratio = Math.max(a, b) / Math.min(a, b)
  return ratio > 8 && ratio < 12.5
}
