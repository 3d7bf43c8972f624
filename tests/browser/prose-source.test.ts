// @vitest-environment jsdom
import { describe, expect, test } from 'vitest'
import { partsOf, proseOf, signalOf, targetOf } from '../../src/articles/prose-source.ts'
import { hostileMarkdown } from './hostile-markdown.ts'

const allowed = new Set(
  'H1 H2 H3 H4 H5 H6 P BR HR UL OL LI STRONG EM DEL CODE PRE BLOCKQUOTE A TABLE THEAD TBODY TR TH TD'.split(
    ' ',
  ),
)
const elementsOf = (markdown: string) => [...proseOf(markdown).querySelectorAll('*')]

describe('hostile Markdown', () => {
  test.each(hostileMarkdown)('%s leaves known tags and nothing but harmless links', (_, markdown) => {
    for (const element of elementsOf(markdown)) {
      expect(allowed).toContain(element.tagName)
      for (const { name } of element.attributes) expect([element.tagName, name]).toEqual(['A', 'href'])
      const href = element.getAttribute('href')
      const target = href === null ? undefined : targetOf(href)
      if (target?.kind === 'elsewhere') expect(target.href).toMatch(/^(https?:\/\/|mailto:)/)
      if (target?.kind === 'page')
        expect(new URL(target.to, 'https://here.test').origin).toBe('https://here.test')
    }
  })
  test('HTML is shown as the text it is', () => {
    const fragment = proseOf('Read <b onclick="alert(1)">this</b>')
    expect(fragment.textContent?.trim()).toBe('Read <b onclick="alert(1)">this</b>')
    expect(fragment.querySelector('b')).toBeNull()
  })
  test('a picture is its words', () => {
    expect(proseOf('![a panel](https://elsewhere.test/p.png)').querySelector('img')).toBeNull()
    expect(proseOf('![a panel](https://elsewhere.test/p.png)').textContent?.trim()).toBe('a panel')
  })
})

describe('loop pictures', () => {
  test('a block named loop is cut out as data; the text around it stays', () => {
    expect(partsOf('One.\n\n```loop\ncause: sound\n```\n\nTwo.')).toEqual([
      { kind: 'text', markdown: 'One.\n\n' },
      { kind: 'loop', block: 'cause: sound' },
      { kind: 'text', markdown: expect.stringContaining('Two.') as string },
    ])
  })
  test('other code stays text, and so does a loop inside a quotation', () => {
    expect(partsOf('```\ncause: sound\n```').map((part) => part.kind)).toEqual(['text'])
    expect(partsOf('> ```loop\n> cause: sound\n> ```').map((part) => part.kind)).toEqual(['text'])
  })
})

describe('where links lead', () => {
  test.each([
    '/articles/floating-neutral',
    '/causes/open-ground',
    '/tests/source-bulb',
    '/articles?q=half%20voltage',
    '/check',
    '/diagnosis',
  ])('%s is a page', (href) => expect(targetOf(href)).toEqual({ kind: 'page', to: href }))
  test.each(['https://example.test/a?b=c', 'http://example.test/', 'mailto:shop@example.test'])(
    '%s lies elsewhere',
    (href) => expect(targetOf(href)).toEqual({ kind: 'elsewhere', href }),
  )
  test.each([
    'javascript:alert(1)',
    'JaVaScRiPt:alert(1)',
    'java\tscript:alert(1)',
    ' javascript:alert(1)',
    'data:text/html,<script>alert(1)</script>',
    'vbscript:msgbox(1)',
    'blob:https://here.test/1',
    'file:///etc/passwd',
    '//elsewhere.test/x',
    '/\\elsewhere.test/x',
    '/\t/elsewhere.test',
    '\\\\elsewhere.test',
    '/api/edition-files/0',
    '../articles/x',
    'articles/x',
    '/articles/../api/edition',
    '',
    'https://',
  ])('%j leads nowhere', (href) => expect(targetOf(href)).toBeUndefined())
})

describe('signal panels', () => {
  const words = (markdown: string) =>
    [...proseOf(markdown).querySelectorAll('blockquote')].map(
      (one) => signalOf(one) ?? one.textContent?.trim(),
    )
  test('danger goes before what follows it closely', () => {
    expect(
      words('> **Notice:** d\n\n> **Warning:** b\n\n> **Danger:** a\n\n> said\n\n> **Caution:** c'),
    ).toEqual(['danger', 'warning', 'caution', 'notice', 'said'])
  })
  test('and stays where words stand between', () =>
    expect(words('> **Warning:** b\n\nWords.\n\n> **Danger:** a')).toEqual(['warning', 'danger']))
  test('a word inside a sentence is no signal', () => {
    expect(words('> The **Danger:** of it')).toEqual(['The Danger: of it'])
    expect(words('> **Dangerous** it is')).toEqual(['Dangerous it is'])
  })
})

describe('what an article may hold', () => {
  test('headings, steps, quotations, tables, links', () => {
    const names = elementsOf(
      '## Danger\n\n> **Warning:** hot\n\n1. one\n2. two\n\n- a\n\n| x | y |\n|---|---|\n| 1 | 2 |\n\n[test](/tests/source-bulb) *and* `code`',
    ).map((element) => element.tagName)
    for (const name of ['H2', 'BLOCKQUOTE', 'STRONG', 'OL', 'LI', 'UL', 'TABLE', 'TD', 'A', 'EM', 'CODE'])
      expect(names).toContain(name)
  })
})
