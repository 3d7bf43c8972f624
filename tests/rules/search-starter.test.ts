import { expect, test } from 'vitest'
import { buildIndex, search } from '../../rules/search/search.ts'
import { readStarter } from '../../server/editions/read-starter.ts'

const { diagnosis, articles, procedures } = await readStarter()
const index = buildIndex(
  [...articles.everyone.articles, ...articles.qualified.articles],
  diagnosis.causes,
  diagnosis.tests,
  [procedures.everyone, procedures.qualified],
)
const first = (query: string, count: number) => search(index, query, count).hits.map((hit) => hit.id)

// What people type, and what they must find among the first three.
test.each([
  ['60 volts on ground', 'floating-neutral'],
  ['60 volts on ground', 'balanced-output'],
  ['60v', 'floating-neutral'],
  ['57.4 V to ground', 'floating-neutral'],
  ['half voltage', 'balanced-output'],
  ['breaker won’t trip', 'breaker-unsuitable'],
  ['breaker trips at once', 'short-circuit'],
  ['tingle', 'stray-earth-voltage'],
  ['tingle', 'ask-shock'],
  ['gfci wont reset', 'gfci-faulty'],
  ['rcd won’t reset', 'gfci-faulty'],
  ['lights bright and dim', 'shared-neutral-lost'],
  ['flotaing nuetral', 'floating-neutral'],
  ['hot and neutral reversed', 'reversed-polarity'],
  ['bootleg', 'bootleg-ground'],
  ['generator gfci trips when house is connected', 'unswitched-neutral'],
  ['gfci trips when it rains', 'leakage-to-ground'],
  ['extension cord voltage drop', 'long-run'],
  ['two bonds', 'double-bond'],
  ['warm outlet', 'loose-hot'],
])('%s leads to %s', (query, wanted) => expect(first(query, 3)).toContain(wanted))

test('every article is found by its own title and by each phrase it is to be looked up by', () => {
  for (const article of [...articles.everyone.articles, ...articles.qualified.articles]) {
    expect(first(article.title, 3)).toContain(article.slug)
    for (const phrase of article.words)
      expect([phrase, first(phrase, 12).includes(article.slug)]).toEqual([phrase, true])
  }
})

test('every cause and test is found by its label', () => {
  for (const one of [...diagnosis.causes, ...diagnosis.tests]) expect(first(one.label, 5)).toContain(one.id)
})
