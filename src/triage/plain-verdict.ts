import type { Edition } from '../../rules/edition/open.ts'
import type { CauseRow, Diagnosis, NextTest } from '../../rules/ranking/diagnosis-types.ts'
import { mayMeasure } from './triage-state.ts'
import type { Triage } from './triage-state.ts'

/** From here a leading row "fits"; below it nothing stands out and all "may". */
const fitsFrom = 0.4
/** Shares under this are not worth a homeowner's time. */
const mayFrom = 0.08
/** Causes that leave metal live are named from a smaller share on. */
const dangerousFrom = 0.04
const mostMay = 4
const metalMayBeLive = 3

export type PlainVerdict = {
  fits: readonly CauseRow[]
  may: readonly CauseRow[]
  /** Some cause that counts leaves metal live: nothing more is touched. */
  metalMayBeLive: boolean
}

const dangerOf = (edition: Edition, row: CauseRow): number =>
  Math.max(...row.causes.map(({ cause }) => edition.causes.get(cause)?.danger ?? 0))
const speaksFor = (row: CauseRow): boolean =>
  row.causes.some(({ evidence }) => evidence.some(({ bits }) => bits > 0))

/** A ranking in a homeowner's words: what fits, what may, and whether metal may be live. Never a share. */
export function plainVerdict(edition: Edition, diagnosis: Diagnosis): PlainVerdict {
  // What nothing found speaks for stands only by its prior: naming it would be guessing.
  const counts = diagnosis.rows.filter(
    (row) =>
      speaksFor(row) &&
      !row.causes.every((cause) => cause.ruledOut) &&
      row.share >= (dangerOf(edition, row) >= metalMayBeLive ? dangerousFrom : mayFrom),
  )
  const [first] = counts
  const fits = first !== undefined && first.share >= fitsFrom ? [first] : []
  const may = counts.filter((row) => !fits.includes(row)).slice(0, mostMay)
  const live = [...fits, ...may].some((row) => dangerOf(edition, row) >= metalMayBeLive)
  return { fits, may, metalMayBeLive: live }
}

const mostTests = 3
const worthBits = 0.005

/** Where in the check a test's findings are entered; others have their own page. */
export function wayTo(test: string): string {
  if (test === 'tester-lamps') return '/check/4'
  if (test === 'receptacle-volts') return '/check/5'
  const asked = [
    'ask-lights',
    'ask-extent',
    'ask-onset',
    'gfci-in-use',
    'gfci-reset',
    'breaker-in-use',
    'receptacle-face',
  ]
  return asked.includes(test) ? '/check/3' : `/tests/${test}`
}

/**
 * Tests a homeowner may still do: nothing opened, nothing that can make metal live, the meter only for those who
 * may use it, never a second breaker reset.
 */
export function openTests(
  edition: Edition,
  diagnosis: Diagnosis,
  triage: Triage,
  direct: boolean,
): readonly NextTest[] {
  return diagnosis.nextTests
    .filter(({ test: id, mode, gainBits }) => {
      const test = edition.tests.get(id)
      if (test === undefined || mode !== undefined || gainBits < worthBits) return false
      const hazard = direct ? (test.hazardDirect ?? test.hazard) : test.hazard
      if (test.who !== 'anyone' || hazard !== 'closed') return false
      if (id === 'breaker-reset') return false
      return id !== 'receptacle-volts' || mayMeasure(triage)
    })
    .slice(0, mostTests)
}
