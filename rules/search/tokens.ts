/** A word or number of a text, with its place, so that it can be marked. */
export type Token = { word: string; start: number; end: number; isNumber: boolean }

// "59.8", "1,000", "breaker", "won't", "rcd's"; "60v" is a number and a word, since people leave the gap out.
const wordOrNumber = /\d+(?:,\d{3})*(?:\.\d+)?|\p{L}+(?:['’ʼ]\p{L}+)*/gu

const unitLetters: Readonly<Record<string, string>> = { a: 'amp', v: 'volt' }

/** Words and numbers of a text in order, in lower case, apostrophes straight, thousands without a comma. */
export function tokensOf(text: string): Token[] {
  const tokens: Token[] = []
  for (const match of text.matchAll(wordOrNumber)) {
    const start = match.index
    const end = start + match[0].length
    if (/^\d/.test(match[0])) {
      tokens.push({ word: String(Number(match[0].replaceAll(',', ''))), start, end, isNumber: true })
      continue
    }
    const word = match[0].toLowerCase().replaceAll(/[’ʼ]/g, "'")
    const last = tokens.at(-1)
    const behindNumber = last?.isNumber === true && start - last.end <= 1
    tokens.push({ word: (behindNumber && unitLetters[word]) || word, start, end, isNumber: false })
  }
  return tokens
}
