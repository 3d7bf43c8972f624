import { describe, expect, test } from 'vitest'
import type { Cause, ProceduresFile, Test } from '../../rules/edition/schema.ts'
import { buildIndex, search } from '../../rules/search/search.ts'
import type { Hit } from '../../rules/search/search.ts'
import type { SearchableArticle } from '../../rules/search/documents.ts'

const article = (slug: string, title: string, words: string[], body: string): SearchableArticle => ({
  slug,
  title,
  audience: 'everyone',
  causes: [slug],
  tests: [],
  words,
  sources: ['common practice, no source'],
  reviewed: '2026-11-30',
  body,
})
const articles = [
  article(
    'afloat',
    'Half to ground on both wires: floating neutral',
    ['60 volts on ground', 'half voltage'],
    'A source with no bond works, and what it **can’t** do is trip a [breaker](/tests/look).',
  ),
  article(
    'lost-neutral',
    'Some lights bright while others dim',
    ['lights bright and dim', 'tv burned out'],
    'One leg reads 152 V. The shared neutral is gone.',
  ),
  article(
    'worn',
    'A GFCI that will not reset',
    ['gfci wont reset', 'test button dead'],
    'Its Test button does nothing. An outlet behind it is dead. 600 of them were tried at 6 mA.',
  ),
  article(
    'metal',
    'Metal that tingles',
    ['shock from case'],
    'The breaker does not trip, because nothing leads the current back.',
  ),
]
const causes: Cause[] = [
  {
    id: 'afloat',
    label: 'Floating neutral',
    title: 'Neutral floating: no bond anywhere',
    electrical: true,
    weight: 1,
    danger: 2,
  },
]
const tests: Test[] = [
  {
    id: 'look',
    label: 'Look at the face',
    title: 'What the receptacle’s face looks like',
    enter: 'Enter it',
    findings: ['receptacle.face'],
    hazard: 'closed',
    who: 'qualified',
    minutes: 1,
    eachMode: false,
    outcomes: [
      { id: 'whole', label: 'Whole', findings: { 'receptacle.face': 'sound' } },
      { id: 'burnt', label: 'Burnt', findings: { 'receptacle.face': 'burnt' } },
    ],
  },
]
const procedures: ProceduresFile = {
  format: 1,
  audience: 'everyone',
  tests: [],
  causes: [
    { cause: 'afloat', audience: 'everyone', means: 'Nothing joins neutral to ground.', remedies: [] },
  ],
}
const index = buildIndex(articles, causes, tests, [procedures])

const keys = (query: string) => search(index, query).hits.map((hit) => `${hit.kind}:${hit.id}`)
const marked = (hit: Hit | undefined, part: 'title' | 'snippet') =>
  hit?.[part].filter((piece) => piece.marked).map((piece) => piece.text)

describe('words for one thing', () => {
  test.each([
    ['outlet, socket and receptacle', 'dead socket', 'article:worn'],
    ['RCD, GFI and GFCI', 'rcd reset', 'article:worn'],
    ['won’t, wont and does not', 'breaker won’t trip', 'article:metal'],
    ['a straight apostrophe', "breaker won't trip", 'article:metal'],
    ['no apostrophe at all', 'breaker wont trip', 'article:metal'],
    ['trips and tripped', 'tripped breaker', 'article:metal'],
    ['tingle and zap', 'zap', 'article:metal'],
    ['earth and ground', '60 volts to earth', 'article:afloat'],
  ])('%s', (_, query, first) => expect(keys(query)[0]).toBe(first))
})

describe('numbers', () => {
  test.each(['60v', '60 V', '60 volts', '60 VAC', '60 voltage'])('%s is sixty volts', (query) =>
    expect(keys(query)[0]).toBe('article:afloat'),
  )
  test('a reading near half is looked up as half', () => expect(keys('57.2 V')).toContain('article:afloat'))
  test('60 is not 600, and no slip is mended in a number', () => {
    expect(keys('60 v')).not.toContain('article:worn')
    expect(search(index, '61234').total).toBe(0)
    expect(search(index, '153 V')).toMatchObject({ total: 0, readAs: undefined })
  })
  test('152 is found as it stands', () => expect(keys('152')).toEqual(['article:lost-neutral']))
})

describe('slips', () => {
  test('letters in each other’s place, doubled, left out', () => {
    const found = search(index, 'flotaing nuetral')
    expect(found.readAs).toBe('floating neutral')
    expect(found.hits[0]?.id).toBe('afloat')
    expect(search(index, 'brekaer').readAs).toBe('breaker')
    expect(search(index, 'gfcii').readAs).toBe('gfci')
  })
  test('a word that is known is left alone', () => expect(search(index, 'bright').readAs).toBeUndefined())
  test('three letters hold no slip', () => expect(search(index, 'tvx').total).toBe(0))
  test('only the slip is mended in what is read back', () =>
    expect(search(index, 'Lights brihgt AND dim').readAs).toBe('Lights bright AND dim'))
  test('a left-out letter goes before a wrong one', () =>
    // shok is one letter from both "shock" and "shop".
    expect(
      search(buildIndex([...articles, article('x', 'Our shop shop shop', [], '')], [], []), 'shok').readAs,
    ).toBe('shock'))
})

describe('search as you type', () => {
  test.each(['f', 'fl', 'flo', 'float', 'floatin', 'floating', 'floating n', 'floating neut'])(
    '%s',
    (query) => {
      const found = keys(query)
      if (query.length > 1) expect(found[0]).toMatch('afloat')
      else expect(found).toEqual([])
    },
  )
  test('nothing typed, nothing found', () => {
    expect(search(index, '')).toEqual({ total: 0, hits: [], readAs: undefined })
    expect(search(index, '  …  ').total).toBe(0)
  })
  test('hits are cut, the count is not', () => {
    const all = search(index, 'neutral')
    expect(search(index, 'neutral', 1)).toMatchObject({ total: all.total, hits: [all.hits[0]] })
    expect(all.total).toBeGreaterThan(1)
  })
})

describe('what is shown', () => {
  test('marks stand in titles, whatever word was typed for it', () => {
    const [hit] = search(index, 'neutral float').hits
    expect(marked(hit, 'title')).toEqual(['Neutral', 'floating'])
    expect(marked(search(index, 'rcd').hits[0], 'title')).toEqual(['GFCI'])
  })
  test('an excerpt is the words of the text, without its Markdown', () => {
    const [hit] = search(index, 'trip breaker source').hits
    const text = hit?.snippet.map((piece) => piece.text).join('')
    expect(text).toContain('what it can’t do is trip a breaker.')
    expect(marked(hit, 'snippet')).toEqual(['source', 'trip', 'breaker'])
  })
  test('pieces put together give the title back', () => {
    for (const hit of search(index, 'lights neutral gfci').hits)
      expect([...articles, ...causes, ...tests].map((one) => one.title)).toContain(
        hit.title.map((piece) => piece.text).join(''),
      )
  })
  test('each says what it is and for whom', () => {
    expect(search(index, 'face').hits[0]).toMatchObject({ kind: 'test', id: 'look', audience: 'qualified' })
    expect(keys('no bond anywhere')).toContain('cause:afloat')
  })
  test('a cause is found by the symptoms of its article', () =>
    expect(keys('half voltage')).toContain('cause:afloat'))
  test('a body that is not handed over can’t be found or shown', () => {
    const closed = buildIndex([{ ...articles[2]!, body: '' }], [], [])
    expect(search(closed, 'outlet behind').total).toBe(0)
    expect(search(closed, 'gfci reset').total).toBe(1)
  })
})

test('a title says more than a body', () => {
  const pair = [
    article('body', 'Something else', [], 'buzzing '.repeat(3)),
    article('title', 'Buzzing', [], 'Nothing.'),
  ]
  expect(search(buildIndex(pair, [], []), 'buzzing').hits.map((hit) => hit.id)).toEqual(['title', 'body'])
})
