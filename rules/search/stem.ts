import { sameWords } from './same-words.ts'

const vowel = /[aeiouy]/
const undouble = (stem: string) => (/([bdfgmnprt])\1$/.test(stem) ? stem.slice(0, -1) : stem)

/** Takes the plainest endings of English off, so that trips, tripped and tripping are one word. Not for reading. */
function withoutEnding(word: string): string {
  let stem = word.replace(/'s$/, '').replaceAll("'", '')
  if (/ies$/.test(stem) && stem.length > 4) stem = `${stem.slice(0, -3)}y`
  else if (/(s|x|z|ch|sh)es$/.test(stem)) stem = stem.slice(0, -2)
  else if (/[^sui]s$/.test(stem) && stem.length > 3) stem = stem.slice(0, -1)
  for (const ending of ['ing', 'ed']) {
    const rest = stem.slice(0, -ending.length)
    if (stem.endsWith(ending) && rest.length >= 3 && vowel.test(rest)) {
      stem = undouble(rest)
      break
    }
  }
  return stem.length > 3 && stem.endsWith('e') ? stem.slice(0, -1) : stem
}

const filedUnder = new Map<string, string>()
for (const { words } of sameWords)
  for (const word of words) {
    filedUnder.set(word, words[0]!)
    const stem = withoutEnding(word)
    if (!filedUnder.has(stem)) filedUnder.set(stem, words[0]!)
  }

/** Every word of the table of same words, as people type it. */
export const tableWords: readonly string[] = sameWords.flatMap((row) => row.words)

/** What a word is filed under: its row's first word, or itself without its ending. Numbers stay as they are. */
export function fileUnder(word: string): string {
  const stem = withoutEnding(word)
  return filedUnder.get(word) ?? filedUnder.get(stem) ?? stem
}
