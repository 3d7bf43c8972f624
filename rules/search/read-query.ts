import { emptyWords, roundVolts, roundVoltsNear, weakWords } from './same-words.ts'
import { fileUnder } from './stem.ts'
import { tokensOf } from './tokens.ts'
import type { Token } from './tokens.ts'
import { readAs } from './typo.ts'

/** Words that occur, by how often, and what they are filed under. */
export type Vocabulary = {
  /** As written → how often. */
  written: ReadonlyMap<string, number>
  filed: ReadonlySet<string>
}

/** One word of a query, as it is looked up. */
export type QueryWord = {
  /** Terms that count in full. */
  terms: readonly string[]
  /** Terms that count for less: a number's round neighbor. */
  near: readonly string[]
  /** Looked up as a beginning too: the word still being typed, or one that is nothing else. */
  beginning: string | undefined
  /** May be missing from a result. */
  weak: boolean
}
export type ReadQuery = {
  words: readonly QueryWord[]
  /** The query as it was read, when a slip was mended; otherwise undefined. */
  readAs: string | undefined
}

const weak: ReadonlySet<string> = new Set(weakWords.map(fileUnder))

const isBeginning = (word: string, vocabulary: Vocabulary) =>
  word.length > 1 && [...vocabulary.written.keys()].some((known) => known.startsWith(word))

function readNumber({ word }: Token): QueryWord {
  const value = Number(word)
  const near = roundVolts.filter(
    (round) => round !== value && Math.abs(value - round) <= round * roundVoltsNear,
  )
  return { terms: [word], near: near.map(String), beginning: undefined, weak: false }
}

/**
 * Reads what was typed: empty words dropped, same words brought together, slips mended. Numbers are never mended:
 * 60 and 600 are two things.
 */
export function readQuery(query: string, vocabulary: Vocabulary): ReadQuery {
  const typed = tokensOf(query)
  const stillTyping = !/[\s.,!?]$/.test(query)
  // One letter of the next word says nothing yet, and must not empty the list.
  const last = typed.at(-1)
  const barelyBegun = stillTyping && typed.length > 1 && last?.word.length === 1 && !last.isNumber
  const all = barelyBegun ? typed.slice(0, -1) : typed
  const meant = all.filter((token) => !emptyWords.has(token.word))
  const tokens = meant.length > 0 ? meant : all
  const mended: { token: Token; as: string }[] = []
  const words = tokens.map((token, index): QueryWord => {
    if (token.isNumber) return readNumber(token)
    const isLast = stillTyping && index === tokens.length - 1 && token.end === query.trimEnd().length
    const known = vocabulary.filed.has(fileUnder(token.word))
    const begins = (isLast || !known) && isBeginning(token.word, vocabulary)
    const word = (term: string): QueryWord => ({
      terms: [fileUnder(term)],
      near: [],
      beginning: begins ? token.word : undefined,
      weak: weak.has(fileUnder(term)),
    })
    if (known || begins) return word(token.word)
    const as = readAs(token.word, vocabulary.written)
    if (as === undefined) return word(token.word)
    mended.push({ token, as })
    return word(as)
  })
  const read = mended.reduceRight(
    (text, { token, as }) => text.slice(0, token.start) + as + text.slice(token.end),
    query,
  )
  return { words, readAs: mended.length > 0 ? read.trim() : undefined }
}
