import { describe, expect, test } from 'vitest'
import { readLoopDirective } from '../../../rules/loop/loop-directive.ts'
import { loopDefaults } from '../../../rules/loop/loop-wiring.ts'
import { typicalContext } from '../../../rules/loop/known-context.ts'
import { plainText } from '../../../rules/search/plain-text.ts'
import { readStarter } from '../../../server/editions/read-starter.ts'

const { articles } = await readStarter()
const shelf = [...articles.everyone.articles, ...articles.qualified.articles]
const blocks = shelf.flatMap(({ slug, body }) =>
  [...body.matchAll(/^```loop\n([^]*?)^```$/gm)].map((match) => [slug, match[1] ?? ''] as const),
)

describe('a loop block', () => {
  test('names a cause and a state, in either order; a fault unless it says so', () => {
    expect(readLoopDirective('cause: floating-neutral\nstate: load\n')).toEqual({
      ok: true,
      cause: 'floating-neutral',
      state: 'load',
    })
    expect(readLoopDirective('  cause:   sound')).toEqual({ ok: true, cause: 'sound', state: 'fault' })
  })
  test.each([
    ['', 'names no cause'],
    ['state: fault', 'names no cause'],
    ['cause: gremlins', 'no cause “gremlins”'],
    ['cause: sound\nstate: upside-down', 'not “upside-down”'],
    ['cause: sound\ncolor: red', 'the lines “cause:” and “state:” alone'],
    ['cause: <img src=x onerror=harm()>', 'the lines “cause:” and “state:” alone'],
    ['cause: __proto__', 'the lines “cause:” and “state:” alone'],
    ['cause: constructor', 'no cause “constructor”'],
  ])('%j is one plain sentence', (text, says) => {
    const read = readLoopDirective(text)
    expect(read.ok).toBe(false)
    if (!read.ok) expect(read.says).toContain(says)
  })
  test('is no part of what search reads', () => {
    expect(plainText('Before.\n\n```loop\ncause: sound\nstate: fault\n```\n\nAfter.')).toBe('Before. After.')
  })
})

describe('in the starter articles', () => {
  test('loops stand where they teach most', () => {
    expect(blocks.map(([slug]) => slug)).toEqual(
      expect.arrayContaining(['ground-rod-trips-nothing', 'one-bond-only', 'rod-only-return']),
    )
  })
  test.each(blocks)('%s: its block can be drawn', (_, text) => {
    const read = readLoopDirective(text)
    expect(read).toMatchObject({ ok: true })
    if (read.ok) expect(loopDefaults(typicalContext(read.cause), read.cause)).toBeDefined()
  })
})
