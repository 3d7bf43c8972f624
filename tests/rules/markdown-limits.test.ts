import { readdirSync, readFileSync } from 'node:fs'
import { describe, expect, test } from 'vitest'
import { bytesOf, mostBodyBytes, tooMuchMarkdown } from '../../rules/edition/markdown-limits.ts'

describe('too much Markdown', () => {
  test.each([
    ['quotes in one another', '> '.repeat(101) + 'deep', /more than 100 deep/],
    ['quotes without spaces', '>'.repeat(101) + 'deep', /more than 100 deep/],
    ['lists in one another', '- '.repeat(101) + 'deep', /more than 100 deep/],
    ['numbers in one another', '1. '.repeat(101) + 'deep', /more than 100 deep/],
    ['marks of all kinds', '> - 1. '.repeat(34) + 'deep', /more than 100 deep/],
    ['lists by their indent', `${'  '.repeat(101)}- deep`, /more than 100 deep/],
    ['a line without end', 'word '.repeat(4_001), /longer than 20,000 characters/],
    ['lines without an empty one', 'word\n'.repeat(5_001), /longer than 20,000 characters/],
    ['a long text of bytes', 'ö\n\n'.repeat(60_000), /longer than 200 kB/],
  ])('%s', (_, markdown, says) => {
    expect(tooMuchMarkdown(markdown)).toMatch(says)
  })

  test.each([
    ['a hundred quotes', '> '.repeat(100) + 'deep'],
    ['a dash in the middle of a line', 'volts - '.repeat(200)],
    ['code that is indented far', `${' '.repeat(400)}code`],
    ['paragraphs up to the limit', 'word word\n\n'.repeat(mostBodyBytes / 11)],
  ])('%s is not', (_, markdown) => {
    expect(tooMuchMarkdown(markdown)).toBeUndefined()
  })

  test('no article of the starter edition is', () => {
    const folder = new URL('../../rules/starter/articles/', import.meta.url)
    const names = readdirSync(folder)
    expect(names.length).toBeGreaterThan(20)
    for (const name of names)
      expect([name, tooMuchMarkdown(readFileSync(new URL(name, folder), 'utf8'))]).toEqual([name, undefined])
  })

  test('bytes are those of UTF-8', () => {
    for (const text of ['', 'volts', 'öä', '–', '⏚', '😀 and words', '日本'])
      expect(bytesOf(text)).toBe(Buffer.byteLength(text, 'utf8'))
  })
})
