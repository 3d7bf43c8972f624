/**
 * Search over an edition's articles, causes and tests: the same in the browser, with no network, and on the server.
 */
import MiniSearch from 'minisearch'
import type { QueryCombination } from 'minisearch'
import type { Audience } from '../edition/audience.ts'
import type { Cause, ProceduresFile, Test } from '../edition/schema.ts'
import { documentsOf } from './documents.ts'
import type { Kind, SearchableArticle, SearchDocument } from './documents.ts'
import { excerpt, isIn, markAll } from './marks.ts'
import type { Matched, Piece } from './marks.ts'
import { readQuery } from './read-query.ts'
import type { QueryWord, Vocabulary } from './read-query.ts'
import { fileUnder, tableWords } from './stem.ts'
import { tokensOf } from './tokens.ts'

export type SearchIndex = {
  engine: MiniSearch<SearchDocument>
  documents: ReadonlyMap<string, SearchDocument>
  vocabulary: Vocabulary
  phrases: ReadonlyMap<string, readonly Phrase[]>
}

/** A title, a label or a symptom: as it is written, and its terms. */
type Phrase = { written: string; terms: ReadonlySet<string> }

export type Hit = {
  kind: Kind
  /** An article's slug, a cause's or a test's id. */
  id: string
  title: Piece[]
  snippet: Piece[]
  audience: Audience
}
export type Found = {
  /** How many there are; `hits` may hold fewer. */
  total: number
  hits: Hit[]
  /** How the query was read, when a slip in it was mended. */
  readAs: string | undefined
}

// A symptom in a title or among the words people search for says more than the same word in running text.
const boost = { title: 5, words: 5, label: 4, borrowed: 2, body: 1 } as const
const fields = Object.keys(boost) as (keyof typeof boost)[]
// People come for something to read and do; a cause or a test is named in it.
const weightOfKind = { article: 1.3, cause: 1, test: 0.8 } as const
// For a query that fits whole into a title or one symptom, and for one that is it, word by word.
const phraseTimes = { within: 1.5, same: 4 } as const
// What only brushes the query is left out: less of it, or far less of it than the best has.
const leastCovered = 0.6
const leastOfBest = { whole: 0.1, part: 0.35 } as const

/** Indexed as written, for beginnings, and as filed, for everything else. */
const termsOf = (word: string): string[] => [...new Set([word, fileUnder(word)])]

/**
 * Builds the index.
 * @param procedures files that causes and tests are described in; without them they are found by their titles
 */
export function buildIndex(
  articles: readonly SearchableArticle[],
  causes: readonly Cause[],
  tests: readonly Test[],
  procedures: readonly ProceduresFile[] = [],
): SearchIndex {
  const all = documentsOf(articles, causes, tests, procedures)
  const documents = new Map(all.map((document) => [document.key, document]))
  const engine = new MiniSearch<SearchDocument>({
    idField: 'key',
    fields,
    tokenize: (text) => tokensOf(text).map((token) => token.word),
    processTerm: termsOf,
    searchOptions: {
      boost,
      boostDocument: (key: string) => weightOfKind[documents.get(key)!.kind],
      tokenize: (term) => [term],
      processTerm: (term) => term,
    },
  })
  engine.addAll(all)
  const written = new Map<string, number>()
  for (const document of all)
    for (const field of fields)
      for (const { word, isNumber } of tokensOf(document[field]))
        if (!isNumber) written.set(word, (written.get(word) ?? 0) + 1)
  const filed = new Set([...written.keys()].map(fileUnder))
  for (const word of tableWords) if (filed.has(fileUnder(word)) && !written.has(word)) written.set(word, 0)
  const phrases = new Map(
    all.map((document) => [
      document.key,
      document.phrases.map((phrase) => ({
        written: asWritten(phrase),
        terms: new Set(tokensOf(phrase).flatMap((token) => termsOf(token.word))),
      })),
    ]),
  )
  return { engine, documents, vocabulary: { written, filed }, phrases }
}

const asWritten = (text: string) =>
  tokensOf(text)
    .map((token) => token.word)
    .join(' ')

const scored = (word: QueryWord): QueryCombination[] => {
  const weight = word.weak ? 0.3 : 1
  const term = (query: string, times: number, prefix = false): QueryCombination => ({
    queries: [query],
    combineWith: 'OR',
    prefix,
    boost: Object.fromEntries(fields.map((field) => [field, boost[field] * times])),
  })
  return [
    ...word.terms.map((one) => term(one, weight)),
    ...word.near.map((one) => term(one, weight * 0.6)),
    ...(word.beginning === undefined ? [] : [term(word.beginning, weight * 0.5, true)]),
  ]
}

/** Whether a document's found terms hold this word of the query. */
const holds = (word: QueryWord, terms: Iterable<string>) =>
  [...terms].some(
    (term) =>
      word.terms.includes(term) ||
      word.near.includes(term) ||
      (word.beginning !== undefined && term.startsWith(word.beginning)),
  )

/**
 * Finds what a query asks for, the best first. An empty query finds nothing.
 * @param most how many to show at most; `total` counts all
 */
export function search(index: SearchIndex, query: string, most = 40): Found {
  const { words, readAs } = readQuery(query, index.vocabulary)
  if (words.length === 0) return { total: 0, hits: [], readAs: undefined }
  const whole = asWritten(readAs ?? query)
  const strong = words.some((word) => !word.weak) ? words.filter((word) => !word.weak) : words
  const results = index.engine
    .search({ combineWith: 'OR', queries: words.flatMap(scored) })
    .map((result) => {
      const covered = strong.filter((word) => holds(word, result.terms)).length / strong.length
      const key = String(result.id)
      const phrases = index.phrases.get(key) ?? []
      const times = phrases.some((phrase) => phrase.written === whole)
        ? phraseTimes.same
        : phrases.some((phrase) => words.every((word) => holds(word, phrase.terms)))
          ? phraseTimes.within
          : 1
      return { key, covered, base: result.score * covered ** 2, times }
    })
    .filter((result) => result.covered >= leastCovered)
    .sort((a, b) => b.base * b.times - a.base * a.times || (a.key < b.key ? -1 : 1))
  const best = Math.max(0, ...results.map((result) => result.base))
  const kept = results.filter(
    ({ covered, base }) => base >= best * (covered === 1 ? leastOfBest.whole : leastOfBest.part),
  )
  const matched: Matched = {
    filed: new Set(words.flatMap((word) => [...word.terms, ...word.near])),
    beginnings: words.flatMap((word) => (word.beginning === undefined ? [] : [word.beginning])),
  }
  const hits = kept.slice(0, most).map(({ key }): Hit => {
    const found = index.documents.get(key)!
    const symptoms = found.words + found.borrowed
    return {
      kind: found.kind,
      id: found.id,
      title: markAll(found.title, matched),
      snippet: excerpt(isIn(found.body, matched) || symptoms === '' ? found.body : symptoms, matched),
      audience: found.audience,
    }
  })
  return { total: kept.length, hits, readAs }
}
