import { fileUnder } from './stem.ts'
import { tokensOf } from './tokens.ts'

/** A run of text; marked where it is what was searched for. */
export type Piece = { text: string; marked: boolean }

/** What counts as found: words by what they are filed under, and beginnings typed so far. */
export type Matched = { filed: ReadonlySet<string>; beginnings: readonly string[] }

type Mark = { start: number; end: number; what: string }

function marksIn(text: string, matched: Matched): Mark[] {
  return tokensOf(text).flatMap(({ word, start, end }) => {
    const filed = fileUnder(word)
    if (matched.filed.has(filed)) return [{ start, end, what: filed }]
    const beginning = matched.beginnings.find((b) => word.startsWith(b))
    return beginning === undefined ? [] : [{ start, end, what: beginning }]
  })
}

function cut(text: string, marks: readonly Mark[], from: number, to: number): Piece[] {
  const pieces: Piece[] = []
  let at = from
  for (const mark of marks.filter((m) => m.start >= from && m.end <= to)) {
    if (mark.start > at) pieces.push({ text: text.slice(at, mark.start), marked: false })
    pieces.push({ text: text.slice(mark.start, mark.end), marked: true })
    at = mark.end
  }
  if (at < to) pieces.push({ text: text.slice(at, to), marked: false })
  return pieces
}

/** Whether anything of what was searched for stands in a text. */
export const isIn = (text: string, matched: Matched): boolean => marksIn(text, matched).length > 0

/** The whole text with what was found marked. */
export const markAll = (text: string, matched: Matched): Piece[] =>
  cut(text, marksIn(text, matched), 0, text.length)

/**
 * About `length` characters of a text where most of what was found stands close together, with it marked. Begins
 * and ends at words; an ellipsis says that there is more. The beginning of the text where nothing was found in it.
 */
export function excerpt(text: string, matched: Matched, length = 110): Piece[] {
  if (text === '') return []
  const marks = marksIn(text, matched)
  let first = 0
  let most = 0
  for (const [index, mark] of marks.entries()) {
    const within = marks.slice(index).filter((m) => m.end <= mark.start + length - 30)
    const kinds = new Set(within.map((m) => m.what)).size
    if (kinds > most) {
      most = kinds
      first = mark.start
    }
  }
  let from = Math.max(0, first - 30)
  if (from > 0) from = text.indexOf(' ', from) + 1
  let to = Math.min(text.length, from + length)
  if (to < text.length) to = Math.max(text.lastIndexOf(' ', to), from + 1)
  const lead: Piece[] = from > 0 ? [{ text: '… ', marked: false }] : []
  const tail: Piece[] = to < text.length ? [{ text: ' …', marked: false }] : []
  return [...lead, ...cut(text, marks, from, to), ...tail]
}
