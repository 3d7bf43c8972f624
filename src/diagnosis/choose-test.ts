/** Which of the tests still to do is put first on the screen, and which are behind it. Pure. */
import { fitsContext } from '../../rules/edition/open.ts'
import type { Edition } from '../../rules/edition/open.ts'
import type { Hazard, Test } from '../../rules/edition/schema.ts'
import type { NextTest } from '../../rules/ranking/diagnosis-types.ts'
import { inView, isTaken, readingOf } from './sheet-content.ts'
import type { SheetContent } from './sheet-content.ts'

export type Offer = {
  key: string
  test: Test
  next: NextTest
  hazard: Hazard
  /** The mode it is to be done in. */
  mode: string
  /** Minutes of the test, and of bringing the source into that mode where it isn't. */
  minutes: number
}

/** What it takes to change the operating mode and wait until the source is steady in it. */
export const modeChangeMinutes = 5

/** Names a test in a mode: what is put aside in one is still to do in another. */
const testKey = (next: NextTest, sheetMode: string): string => `${next.test} ${next.mode ?? sheetMode}`

/** How much of the enclosure is open. Plugged straight into the source it can be less. */
const hazardOf = (test: Test, wiring: string): Hazard =>
  wiring === 'direct' ? (test.hazardDirect ?? test.hazard) : test.hazard

const hazardOrder: readonly Hazard[] = ['closed', 'open-dead', 'closed-can-energize', 'open-live']

/** What it is expected to tell for each minute it takes. */
const worth = (offer: Offer) => offer.next.gainBits / offer.minutes

export type Offers = {
  /** By bits a minute, the less dangerous first when level; none of them put aside. */
  open: readonly Offer[]
  skipped: readonly Offer[]
}

/** The tests still to do for a qualified person, in the order to do them. */
export function offersOf(edition: Edition, content: SheetContent, nextTests: readonly NextTest[]): Offers {
  const offers = nextTests.flatMap((next): Offer[] => {
    const test = edition.tests.get(next.test)
    const mode = next.mode ?? content.mode
    const reachable = next.findings.some((id) => readingOf(content, mode, id)?.unreachable !== true)
    if (test === undefined || !reachable) return []
    const minutes = test.minutes + (mode === content.mode ? 0 : modeChangeMinutes)
    const hazard = hazardOf(test, content.context.wiring)
    return [{ key: testKey(next, content.mode), test, next, mode, hazard, minutes }]
  })
  const byWorth = (a: Offer, b: Offer) =>
    worth(b) - worth(a) ||
    hazardOrder.indexOf(a.hazard) - hazardOrder.indexOf(b.hazard) ||
    (a.key < b.key ? -1 : 1)
  return {
    open: offers.filter((offer) => !content.skipped.includes(offer.key)).sort(byWorth),
    skipped: offers.filter((offer) => content.skipped.includes(offer.key)),
  }
}

export type Done = { key: string; test: Test; mode: string; answers: string }

function answerOf(edition: Edition, content: SheetContent, mode: string, id: string): string | undefined {
  const entry = inView(content)[mode]?.[id]
  if (entry === undefined || !isTaken(entry)) return undefined
  if (entry.kind === 'observation') {
    const observation = edition.observations.get(id)
    return (
      observation &&
      `${observation.label}: ${observation.values.find((v) => v.id === entry.value)?.label ?? entry.value}`
    )
  }
  const reading = edition.readings.get(id)
  return reading && `${reading.label} ${entry.text}${entry.upper ? `–${entry.upper}` : ''} ${reading.unit}`
}

/** Tests of which every finding that this context allows was taken, each folded to its answers. */
export function doneTests(edition: Edition, content: SheetContent): Done[] {
  return Object.keys(inView(content)).flatMap((mode) =>
    edition.file.tests.flatMap((test): Done[] => {
      const ids = test.findings.filter((id) => {
        const reading = edition.readings.get(id)
        return reading === undefined || fitsContext(reading, content.context)
      })
      const answers = ids.map((id) => answerOf(edition, content, mode, id))
      if (answers.length === 0 || answers.some((answer) => answer === undefined)) return []
      return [{ key: `${test.id} ${mode}`, test, mode, answers: answers.join(' · ') }]
    }),
  )
}
