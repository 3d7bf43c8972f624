import type { Edition } from '../../rules/edition/open.ts'
import type { ReadAt } from '../../rules/loop/lay-words.ts'
import { numberIn } from './raw-sheet.ts'
import { readingOf } from './sheet-content.ts'
import type { SheetContent } from './sheet-content.ts'

const places = ['source', 'panel', 'receptacle'] as const
const pairs = [
  ['hn', 'H–N'],
  ['ng', 'N–G'],
  ['hg', 'H–G'],
] as const

/** The three voltages of each place in the mode in view, as they stand beside it in the loop picture. */
export function readAtPlaces(edition: Edition, content: SheetContent): ReadAt {
  const at = places.map((place) => {
    const lines = pairs.flatMap(([pair, name]) => {
      const id = `${place}.${pair}.volts`
      const entry = readingOf(content, content.mode, id)
      const known = edition.readings.has(id) && entry !== undefined && entry.unreachable !== true
      if (!known || numberIn(entry.text) === undefined) return []
      const upper = numberIn(entry.upper ?? '') === undefined ? '' : `–${entry.upper?.trim()}`
      return [`${name} ${entry.text.trim()}${upper} V`]
    })
    return [place, lines] as const
  })
  return Object.fromEntries(at.filter(([, lines]) => lines.length > 0))
}
