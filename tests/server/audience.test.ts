/** Nothing written for qualified people is in anything that a visitor or a homeowner can download. */
import { randomUUID } from 'node:crypto'
import { readFileSync, readdirSync, statSync } from 'node:fs'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { ArticlesFound } from '../../server/articles/articles.contract.ts'
import { Draft } from '../../server/articles/drafts.contract.ts'
import { EditionInForce } from '../../server/editions/editions.contract.ts'
import { putInForce } from '../../server/editions/put-in-force.ts'
import { readStarter } from '../../server/editions/read-starter.ts'
import { seedDemoPeople } from '../../server/people/demo-people.ts'
import { Asker, signedIn } from './asker.ts'
import { testDatabase } from './database.ts'
import type { TestDatabase } from './database.ts'
import { runApp } from './running-app.ts'
import type { RunningApp } from './running-app.ts'
import { changedEdition, starterBytes } from './some-edition.ts'

let database: TestDatabase
let app: RunningApp
const askers = {} as Record<'visitor' | 'helper' | 'tech' | 'senior', Asker>
beforeAll(async () => {
  database = await testDatabase()
  await seedDemoPeople(database.db)
  app = await runApp(database.url)
  // A former edition's files are still served, so there is one.
  await putInForce(database.db, changedEdition('A former title'), { note: 'starter edition', reason: 'test' })
  await putInForce(database.db, starterBytes, { note: 'starter edition', reason: 'test' })
  askers.visitor = new Asker(app)
  askers.helper = await signedIn(app, 'helper')
  askers.tech = await signedIn(app, 'tech')
  askers.senior = await signedIn(app, 'senior')
  // What a senior is writing for them, what was written before, and what readers said.
  for (const line of ['', secretLine]) await writeDraft(line)
  await askers.tech.post('/api/articles/double-bond/feedback', { edition: 1, helped: false, why: secretWhy })
})
afterAll(async () => {
  await app.close()
  await database.close()
})

const starter = await readStarter()
const isText = (value: unknown): value is string => typeof value === 'string'
/** Every text in a value, however deep. */
const textsIn = (value: unknown): string[] =>
  isText(value)
    ? [value]
    : typeof value === 'object' && value !== null
      ? Object.values(value).flatMap(textsIn)
      : []
const sentences = (text: string) =>
  text
    .split(/\n+|(?<=[.:;?!])\s+/)
    .map((part) =>
      part
        .replace(/^[\s>#*|\-\d.]+/, '')
        .replace(/[.:;?!*]+$/, '')
        .trim(),
    )
    .filter((part) => part.length >= 40)

/** What everyone may read, as its writers wrote it. Stock phrases that stand there too are nobody's secret. */
const open = textsIn([starter.diagnosis, starter.procedures.everyone, starter.articles.everyone]).join('\n')
const secretOf = (value: unknown) => [
  ...new Set(
    textsIn(value)
      .flatMap(sentences)
      .filter((sentence) => !open.includes(sentence)),
  ),
]
const secretLine = 'A sentence in a draft for qualified people, put in force by nobody yet.'
const secretWhy = 'A tech says that the third step of this article leaves out the main breaker.'
const secrets = [
  ...secretOf([starter.articles.qualified, starter.procedures.qualified]),
  secretLine.slice(0, -1),
  secretWhy.slice(0, -1),
]
/** Addresses of what is written, all of an article's. */
const drafts = [
  '',
  '/double-bond',
  '/double-bond/revisions',
  '/double-bond/revisions/1',
  '/double-bond/feedback',
].map((rest) => `/api/article-drafts${rest}`)

async function writeDraft(line: string): Promise<void> {
  const path = '/api/article-drafts/double-bond'
  const { version, text } = Draft.parse(await (await askers.senior.get(path)).json())
  const answer = await askers.senior.ask('PUT', path, {
    body: { version, ...text, body: `${text!.body}\n\n${line}`, apart: true },
  })
  if (answer.status !== 200) throw new Error(await answer.text())
}

/** Which of the secrets stand in these bytes, as they are or as JSON and JavaScript escape them. */
function leaks(bytes: string): string[] {
  const plain = bytes.replace(/\\u([0-9a-f]{4})/gi, (_, code: string) =>
    String.fromCharCode(parseInt(code, 16)),
  )
  const bare = plain.replace(/\\(["'`/\\])/g, '$1')
  return secrets.filter((sentence) => plain.includes(sentence) || bare.includes(sentence))
}

test('there is something to keep: most of what is written for qualified people stands nowhere else', () => {
  expect(starter.articles.qualified.articles.length).toBeGreaterThan(5)
  for (const article of starter.articles.qualified.articles) {
    const kept = secretOf(article).length
    expect([article.slug, kept >= 20, kept / sentences(article.body).length > 0.8]).toEqual([
      article.slug,
      true,
      true,
    ])
  }
  expect(secretOf(starter.procedures.qualified).length).toBeGreaterThan(200)
})

test('the search for it finds it where it may be: a tech gets every one', async () => {
  const { files } = EditionInForce.parse(await (await askers.tech.get('/api/edition')).json())
  expect(files).toHaveLength(5)
  const bodies = await Promise.all(
    files.map(async ({ hash }) => (await askers.tech.get(`/api/edition-files/${hash}`)).text()),
  )
  const written = await Promise.all(drafts.map(async (path) => (await askers.senior.get(path)).text()))
  expect(leaks([...bodies, ...written].join('\n'))).toHaveLength(secrets.length)
})

const words = [
  ...new Set(secrets.flatMap((sentence) => sentence.toLowerCase().match(/[a-z]{6,}/g) ?? [])),
].filter((_, index) => index % 12 === 0)

/** A tech's sheet with findings, to which everybody here has the link, and one of the homeowner's own. */
async function sheetsWithFindings(): Promise<{ shared: string; own: string }> {
  const head = {
    kind: 'diagnosis',
    title: 'Cabin',
    context: { source: 'all-in-one-inverter', system: '120', wiring: 'panel', mode: 'battery' },
    edition: starterBytes.hash,
    madeAt: '2026-11-30T09:00:00.000Z',
    changedAt: '2026-11-30T09:00:00.000Z',
  }
  const entry = (finding: string, value: unknown) => {
    const deviceAt = '2026-11-30T09:01:00.000Z'
    return { id: randomUUID(), mode: 'battery', finding, value, kept: null, after: [], deviceAt }
  }
  const entries = () => [
    entry('receptacle.hn.volts', 120),
    entry('receptacle.ng.volts', 119.8),
    entry('receptacle.hg.volts', 0.3),
    entry('smoke-or-arcing', 'yes'),
  ]
  const begin = async (asker: Asker, kind: string) => {
    const id = randomUUID()
    const made = await asker.ask('PUT', `/api/sheets/${id}`, { body: { ...head, kind } })
    const added = await asker.post(`/api/sheets/${id}/entries`, { entries: entries() })
    expect([made.status, added.status]).toEqual([200, 200])
    return id
  }
  const link = await askers.tech.post(`/api/sheets/${await begin(askers.tech, 'diagnosis')}/link`)
  const { token } = (await link.json()) as { token: string }
  return { shared: token, own: await begin(askers.helper, 'triage') }
}

describe.each(['visitor', 'helper'] as const)('a %s', (who) => {
  test('is given no sentence of it with a sheet, its link, or an earlier edition', async () => {
    const { shared, own } = await sheetsWithFindings()
    const former = changedEdition('A former title').hash
    const paths = [
      `/api/shared/${shared}`,
      `/api/sheets/${own}`,
      '/api/sheets',
      '/api/sheets?q=cabin',
      `/api/editions/${former}`,
      `/api/editions/${starterBytes.hash}`,
    ]
    for (const path of paths) {
      const answer = await askers[who].get(path)
      expect([path, answer.status < 500, leaks(await answer.text())]).toEqual([path, true, []])
    }
    for (const hash of [former, starterBytes.hash]) {
      const named = async (asker: Asker) =>
        EditionInForce.parse(await (await asker.get(`/api/editions/${hash}`)).json()).files.map(
          (file) => file.audience,
        )
      expect(new Set(await named(askers[who]))).toEqual(new Set(['everyone']))
      expect(new Set(await named(askers.tech))).toEqual(new Set(['everyone', 'qualified']))
    }
  })

  test('is given no sentence of it by any address of the server', async () => {
    const paths = [
      '/api/edition',
      '/api/editions',
      '/api/me',
      '/api/people',
      '/api/links/nonsense',
      '/',
      '/articles/double-bond',
      '/articles/double-bond/edit',
      ...drafts,
      ...starterBytes.files.map(({ hash }) => `/api/edition-files/${hash}`),
      ...changedEdition('A former title').files.map(({ hash }) => `/api/edition-files/${hash}`),
      ...starter.articles.qualified.articles.flatMap(({ title, slug }) => [
        `/api/articles?q=${encodeURIComponent(title)}`,
        `/api/articles?q=${encodeURIComponent(slug)}`,
      ]),
      ...words.map((word) => `/api/articles?q=${word}`),
    ]
    expect(paths.length).toBeGreaterThan(60)
    for (const path of paths) {
      const answer = await askers[who].get(path)
      expect([path, leaks(await answer.text())]).toEqual([path, []])
    }
  })

  test('is named none of its files, and none of its articles is found', async () => {
    const { files } = EditionInForce.parse(await (await askers[who].get('/api/edition')).json())
    expect(files.map((file) => file.name).sort()).toEqual([
      'articles-everyone',
      'diagnosis',
      'procedures-everyone',
    ])
    for (const { title, slug } of starter.articles.qualified.articles) {
      const ask = async (asker: Asker) =>
        ArticlesFound.parse(await (await asker.get(`/api/articles?q=${encodeURIComponent(title)}`)).json())
      const found = (hits: ArticlesFound['hits']) =>
        hits.filter((hit) => hit.kind === 'article').map((hit) => hit.id)
      expect(found((await ask(askers[who])).hits)).not.toContain(slug)
      expect(found((await ask(askers.tech)).hits)).toContain(slug)
    }
  })

  test('gets no answer from a cache that a tech’s answer went into', async () => {
    for (const path of ['/api/edition', '/api/articles?q=bond']) {
      const { headers } = await askers.tech.get(path)
      expect(headers.get('cache-control')).toMatch(/^private/)
      expect(headers.get('vary')).toMatch(/cookie/i)
      expect(headers.get('etag')).toBeNull()
    }
    const hash = starterBytes.files.find((file) => file.name === 'articles-qualified')!.hash
    const theirs = await askers.tech.get(`/api/edition-files/${hash}`)
    expect(theirs.headers.get('cache-control')).toBe('private, no-store')
    const tagged = await askers[who].ask('GET', `/api/edition-files/${hash}`, {
      headers: { 'if-none-match': theirs.headers.get('etag')! },
    })
    expect([401, 403]).toContain(tagged.status)
  })
})

test('no file of the built pages holds a sentence of it', () => {
  const dist = fileURLToPath(new URL('../../dist', import.meta.url))
  const files = readdirSync(dist, { recursive: true, encoding: 'utf8' })
    .map((name) => join(dist, name))
    .filter((path) => statSync(path).isFile())
  expect(files.some((path) => path.endsWith('.js'))).toBe(true)
  const found = files.map((path) => [path, leaks(readFileSync(path, 'utf8'))] as const)
  expect(found.filter(([, sentences]) => sentences.length > 0)).toEqual([])
})
