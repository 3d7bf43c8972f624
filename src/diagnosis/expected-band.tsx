import type { Reading } from '../../rules/edition/schema.ts'
import { placeInBand } from '../../rules/bands/place-in-band.ts'
import { useDesk } from './desk.ts'
import { useExpectedHere } from './expected.ts'
import { isOverLimit, numberIn } from './raw-sheet.ts'
import { overLimitOhms } from '../../rules/findings/sheet.ts'
import type { ReadingEntry } from './sheet-content.ts'
import { inSentence } from './words.ts'

/** The number of an entry: of an unsteady one the middle. */
function valueOf(entry: ReadingEntry | undefined, unit: string): number | undefined {
  if (entry === undefined || entry.unreachable === true) return undefined
  if ((unit === 'Ω' || unit === 'MΩ') && isOverLimit(entry.text)) return overLimitOhms
  const value = numberIn(entry.text)
  const other = numberIn(entry.upper ?? '')
  return value !== undefined && other !== undefined ? (value + other) / 2 : value
}

/** Where the scale of a unit ends unless what is placed on it goes farther. */
const fullOf = (reading: Reading, nominal: number): number =>
  reading.unit === 'V' ? 1.2 * nominal * (reading.pair === 'l1l2' ? 2 : 1) : reading.unit === 'A' ? 15 : 1

/**
 * What the selected cause lets one expect here: its band as a box, the reading as a bar in it. A reading outside is
 * said in words.
 */
export function ExpectedBand({ reading, entry }: { reading: Reading; entry: ReadingEntry | undefined }) {
  const { edition, nominal, meterOhms } = useDesk()
  const expected = useExpectedHere()
  const band = expected?.bandOf(reading.id, entry?.meterOhms ?? meterOhms)
  if (expected === undefined || band === undefined) return null
  const value = valueOf(entry, reading.unit)
  const { from, to, at, outside, words } = placeInBand(band, reading.unit, fullOf(reading, nominal), value)
  const cause = inSentence(edition.causes.get(expected.cause)?.label ?? expected.cause)
  if (value === undefined || at === undefined) return <span className="band-words">expected {words}</span>
  const percent = (part: number) => `${(part * 100).toFixed(1)}%`
  return (
    <>
      <span className={outside === undefined ? 'band' : 'band band-missed'} aria-hidden="true">
        <i style={{ left: percent(from), width: percent(to - from) }} />
        <b style={{ left: percent(at) }} />
      </span>
      {outside === undefined ? (
        <span className="sr-only">
          within {words}, expected with {cause}
        </span>
      ) : (
        <span className="band-words">
          <b>
            {entry?.text} {isOverLimit(entry?.text ?? '') ? '' : reading.unit}:
          </b>{' '}
          {words} expected with {cause}
        </span>
      )}
    </>
  )
}
