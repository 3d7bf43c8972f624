/** How the page words numbers, evidence and places. */
import type { Edition } from '../../rules/edition/open.ts'
import type { CauseRow, Evidence, RankedCause } from '../../rules/ranking/diagnosis-types.ts'

/** "61", or "<1" for what is there and less. */
export function percent(share: number): string {
  if (share > 0 && share < 0.005) return '<1'
  return String(Math.round(share * 100))
}

const strengths = ['', 'Slight', 'Some', 'Good', 'Strong', 'Near certain'] as const

/** "Good, for". */
export const strengthOf = (bits: number): string =>
  `${strengths[Math.min(5, Math.abs(bits))]}, ${bits > 0 ? 'for' : 'against'}`

export const causeLabel = (edition: Edition, id: string): string => edition.causes.get(id)?.label ?? id

/** A label inside a sentence: "floating neutral", but "GFCI worn out". */
export const inSentence = (label: string): string =>
  /^[A-Z][a-z’ -]/.test(label) ? label.charAt(0).toLowerCase() + label.slice(1) : label

export const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1)

/** Names in a row: "a", "a and b", "a, b and c". */
export const listed = (names: readonly string[], word = 'and'): string =>
  names.length < 2 ? (names[0] ?? '') : `${names.slice(0, -1).join(', ')} ${word} ${names[names.length - 1]}`

export const rowLabel = (edition: Edition, row: CauseRow): string =>
  listed(
    row.causes.map((one) => causeLabel(edition, one.cause)),
    'or',
  )

export const modeLabel = (edition: Edition, id: string): string => {
  const mode = edition.file.modes.find((one) => one.id === id)
  return mode?.short ?? mode?.label ?? id
}

/** What a finding is called: "Hot–neutral at the receptacle", "Tester lamp H–N". */
export function findingLabel(edition: Edition, id: string): string {
  const reading = edition.readings.get(id)
  if (reading === undefined) return edition.observations.get(id)?.label ?? id
  return reading.place === 'receptacle' && reading.pair !== undefined
    ? `${reading.label} at the receptacle`
    : reading.label
}

/** The strongest against, where it is worth saying that the cause leaves it unexplained. */
export const unexplained = (cause: RankedCause): Evidence | undefined =>
  cause.evidence.filter((e) => e.bits <= -2).sort((a, b) => a.bits - b.bits)[0]

/** What to do where causes can't be parted: as for the worst of them. */
const actAsFor = [
  'nothing here is dangerous by itself; go on measuring.',
  'leave it as it is until a test parts them.',
  'a fault may not trip anything, or a wire may overheat: leave that circuit off until a test parts them.',
  'metal may be live now: keep off it, and switch the source off.',
] as const
export const actingAsFor = (edition: Edition, row: CauseRow): string =>
  actAsFor[Math.max(...row.causes.map((one) => edition.causes.get(one.cause)?.danger ?? 0))] ?? actAsFor[3]
