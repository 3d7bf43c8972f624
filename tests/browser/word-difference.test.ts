import * as fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { wordDifference } from '../../src/articles/word-difference.ts'

const said = (former: string, now: string) =>
  wordDifference(former, now)
    .map(({ kind, text }) => (kind === 'same' ? text : kind === 'gone' ? `[-${text}-]` : `[+${text}+]`))
    .join('')
const former = (changes: ReturnType<typeof wordDifference>) =>
  changes
    .filter((one) => one.kind !== 'new')
    .map((one) => one.text)
    .join('')
const now = (changes: ReturnType<typeof wordDifference>) =>
  changes
    .filter((one) => one.kind !== 'gone')
    .map((one) => one.text)
    .join('')

describe('the difference of two texts', () => {
  test.each([
    ['The wire is open.', 'The wire is open.', 'The wire is open.'],
    ['', '', ''],
    ['', 'New text', '[+New text+]'],
    ['Old', '', '[-Old-]'],
    ['Read 120 V here.', 'Read 118.5 V here.', 'Read [-120-][+118.5+] V here.'],
    ['One two three.', 'One three.', 'One [-two -]three.'],
    ['hot–neutral', 'hot–ground', 'hot–[-neutral-][+ground+]'],
    ['It’s dead.', 'It’s live.', 'It’s [-dead-][+live+].'],
  ])('%j to %j', (from, to, words) => expect(said(from, to)).toBe(words))

  test('holds both texts to the letter, and marks nothing where they are the same', () => {
    const text = fc.array(fc.constantFrom('hot', 'neutral', ' ', '\n', '.', '–', '120', '’', 'é', '🔌'), {
      maxLength: 40,
    })
    fc.assert(
      fc.property(text, text, (a, b) => {
        const [from, to] = [a.join(''), b.join('')]
        const changes = wordDifference(from, to)
        expect(former(changes)).toBe(from)
        expect(now(changes)).toBe(to)
        if (from === to) expect(changes.every((one) => one.kind === 'same')).toBe(true)
      }),
    )
  })

  test('of two long texts comes in reasonable time, to the letter', () => {
    const long = (word: string) => Array.from({ length: 12_000 }, (_, n) => `${word} ${n}.\n`).join('')
    const since = Date.now()
    const changes = wordDifference(long('hot'), long('neutral'))
    expect(former(changes)).toBe(long('hot'))
    expect(now(changes)).toBe(long('neutral'))
    expect(Date.now() - since).toBeLessThan(5_000)
  })
})
