import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { plainText } from '../../rules/search/plain-text.ts'
import { fileUnder } from '../../rules/search/stem.ts'
import { sameWords } from '../../rules/search/same-words.ts'
import { tokensOf } from '../../rules/search/tokens.ts'
import { slipsBetween } from '../../rules/search/typo.ts'

/** The slow, obvious twin: tries every way to spend slips on the first letters. */
function slowly(a: string, b: string): number {
  if (a === '') return b.length
  if (b === '') return a.length
  const ways = [
    slowly(a.slice(1), b) + 1,
    slowly(a, b.slice(1)) + 1,
    slowly(a.slice(1), b.slice(1)) + (a[0] === b[0] ? 0 : 1),
  ]
  if (a.length > 1 && b.length > 1 && a[0] === b[1] && a[1] === b[0])
    ways.push(slowly(a.slice(2), b.slice(2)) + 1)
  return Math.min(...ways)
}
const short = fc.stringMatching(/^[abc]{0,5}$/)

describe('slips between two words', () => {
  test('are what the slow way counts', () => {
    fc.assert(
      fc.property(short, short, (a, b) => {
        expect(slipsBetween(a, b, 9)).toBe(slowly(a, b))
      }),
    )
  })
  test('stop being counted one above the most', () => {
    fc.assert(
      fc.property(short, short, fc.integer({ min: 0, max: 3 }), (a, b, most) => {
        expect(slipsBetween(a, b, most)).toBe(Math.min(slowly(a, b), most + 1))
      }),
    )
  })
})

describe('words', () => {
  test('every word of a row is filed under its first', () => {
    for (const { words } of sameWords)
      for (const word of words) expect([word, fileUnder(word)]).toEqual([word, words[0]])
  })
  test('no word stands in two rows', () => {
    const all = sameWords.flatMap((row) => row.words)
    expect(all.filter((word, index) => all.indexOf(word) !== index)).toEqual([])
  })
  test.each([
    ['trip', ['trips', 'tripped', 'tripping']],
    ['wire', ['wires', 'wired', 'wiring', 'wire’s']],
    ['float', ['floats', 'floating', 'floated']],
    ['battery', ['batteries']],
    ['bond', ['bonds', 'bonding', 'bonded']],
    ['fuse', ['fuses', 'fused']],
    ['switch', ['switches', 'switched', 'switching']],
  ])('%s has its endings', (word, others) => {
    for (const other of others) expect(fileUnder(tokensOf(other)[0]!.word)).toBe(fileUnder(word))
  })
  test.each([
    ['ground', 'around'],
    ['hot', 'hots up'],
    ['bus', 'bu'],
    ['open', 'opera'],
  ])('%s is not %s', (a, b) => expect(fileUnder(a)).not.toBe(fileUnder(b)))
})

describe('tokens', () => {
  test('stand where they say', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme', maxLength: 60 }), (text) => {
        let at = 0
        for (const { start, end } of tokensOf(text)) {
          expect(start).toBeGreaterThanOrEqual(at)
          expect(end).toBeGreaterThan(start)
          at = end
        }
        expect(at).toBeLessThanOrEqual(text.length)
      }),
    )
  })
  test.each([
    ['60v', ['60', 'volt']],
    ['1,500 W heater', ['1500', 'w', 'heater']],
    ['15 A, and a wire', ['15', 'amp', 'and', 'a', 'wire']],
    ['59.8 and 60.0', ['59.8', 'and', '60']],
    ['won’t', ["won't"]],
    ['hot–neutral', ['hot', 'neutral']],
  ])('%s', (text, words) => expect(tokensOf(text).map((token) => token.word)).toEqual(words))
})

test('Markdown leaves its words', () => {
  expect(
    plainText(
      '## Head\n\n> **Danger:** keep [away](/causes/x).\n\n1. *One*\n2. Two `2 V`\n- <b>three</b>\n\n| a | b |\n|---|---|\n',
    ),
  ).toBe('Head Danger: keep away. One Two 2 V three a b')
})
