/** Bytes of an article's text in UTF-8, at most. */
export const mostBodyBytes = 200_000
export const tooLong = 'The text is longer than 200 kB. Make two articles of it.'

/** Quotes and lists within one another, at most. A renderer of Markdown calls itself for each. */
const mostNested = 100
/** Characters without an empty line, at most: what renders a paragraph takes the square of its length. */
const mostTogether = 20_000

/** Bytes of a text in UTF-8; of a far longer one than may be, at least its characters. */
export function bytesOf(text: string): number {
  if (text.length > mostBodyBytes) return text.length
  let bytes = 0
  for (const one of text) {
    const code = one.codePointAt(0)!
    bytes += code < 0x80 ? 1 : code < 0x800 ? 2 : code < 0x10000 ? 3 : 4
  }
  return bytes
}

const mark = /[ \t]*(?:>|[-*+][ \t]|\d{1,9}[.)][ \t])/y

/** How deep a line lies in quotes and lists: by the marks it begins with, and by how far it is indented. */
function depthOf(line: string): number {
  let marks = 0
  mark.lastIndex = 0
  while (marks <= mostNested && mark.test(line)) marks += 1
  const indent = /^[ \t]*/.exec(line)![0].replaceAll('\t', '    ').length
  return marks === 0 ? 0 : marks + Math.floor(indent / 2)
}

/** What would take a page too long to draw, as a sentence; undefined for any text that people write. */
export function tooMuchMarkdown(body: string): string | undefined {
  if (bytesOf(body) > mostBodyBytes) return tooLong
  let together = 0
  for (const line of body.split('\n')) {
    together = line.trim() === '' ? 0 : together + line.length
    if (together > mostTogether)
      return 'A paragraph is longer than 20,000 characters. Put empty lines between its parts.'
    if (depthOf(line) > mostNested)
      return `Quotes and lists lie more than ${mostNested} deep. Make them flatter.`
  }
  return undefined
}
