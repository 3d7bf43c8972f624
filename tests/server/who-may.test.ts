/** Every route, asked by everyone, for one's own and for another's: what it answers, over HTTP. */
import { randomUUID } from 'node:crypto'
import { readFileSync, readdirSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { putInForce } from '../../server/editions/put-in-force.ts'
import { seedDemoPeople } from '../../server/people/demo-people.ts'
import type { Role } from '../../server/people/roles.contract.ts'
import { tokenHash } from '../../server/token.ts'
import { Asker, signedIn } from './asker.ts'
import { testDatabase } from './database.ts'
import type { TestDatabase } from './database.ts'
import { runApp } from './running-app.ts'
import type { RunningApp } from './running-app.ts'
import { starterBytes } from './some-edition.ts'

const who = ['visitor', 'helper', 'tech', 'senior', 'admin'] as const
type Who = (typeof who)[number]

let database: TestDatabase
let app: RunningApp
const askers = {} as Record<Who, Asker>
const ids = {} as Record<Role, string>
/** Somebody whom no test signs in. */
let another: string

async function addSheets(): Promise<void> {
  const owners = [...who.map((asker) => [sheetOf(asker), asker === 'visitor' ? null : ids[asker]] as const)]
  for (const [id, owner_id] of [...owners, [anothersSheet, another] as const])
    await database.db
      .insertInto('sheet')
      .values({
        id,
        owner_id,
        key_hash: owner_id === null ? 'a'.repeat(64) : null,
        kind: 'triage',
        title: 'A sheet',
        context: JSON.stringify(head.context),
        edition_hash: head.edition,
        made_at: new Date(head.madeAt),
        changed_at: new Date(head.changedAt),
      })
      .execute()
  await database.db
    .insertInto('sheet_link')
    .values({ sheet_id: anothersSheet, token_hash: tokenHash(sharedToken) })
    .execute()
}

beforeAll(async () => {
  database = await testDatabase()
  await putInForce(database.db, starterBytes, { note: 'starter edition', reason: 'test' })
  await seedDemoPeople(database.db)
  app = await runApp(database.url)
  askers.visitor = new Asker(app)
  for (const role of ['helper', 'tech', 'senior', 'admin'] as const) askers[role] = await signedIn(app, role)
  for (const { id, role } of await database.db.selectFrom('person').select(['id', 'role']).execute())
    ids[role] = id
  const row = {
    email: 'another@example.test',
    name: 'Another',
    role: 'tech',
    password_hash: null,
    made_by: null,
  } as const
  another = (await database.db.insertInto('person').values(row).returning('id').executeTakeFirstOrThrow()).id
  await addSheets()
})
afterAll(async () => {
  await app.close()
  await database.close()
})

const file = (name: string) => starterBytes.files.find((one) => one.name === name)!.hash
const all = (status: number): Record<Who, number> => ({
  visitor: status,
  helper: status,
  tech: status,
  senior: status,
  admin: status,
})
const forQualified = { visitor: 401, helper: 403, tech: 200, senior: 200, admin: 200 }
const forAdmin = (status: number) => ({ visitor: 401, helper: 403, tech: 403, senior: 403, admin: status })

const forSenior = (status: number) => ({
  visitor: 401,
  helper: 403,
  tech: 403,
  senior: status,
  admin: status,
})
const unfinished = {
  head: {
    title: '',
    audience: 'qualified',
    causes: [],
    tests: [],
    words: [],
    sources: [],
    reviewed: '',
    dueForReview: '',
  },
  body: '',
}

type Row = {
  route: string
  /** Which object is asked for, where it matters. */
  of?: string
  path: (asker: Who) => string
  /** A function is given an id that nothing else has. */
  body?: unknown
  status: Record<Who, number>
}
const own = (asker: Who) => (asker === 'visitor' ? ids.helper : ids[asker])

const head = {
  kind: 'triage',
  title: 'A sheet',
  context: { source: 'power-station', system: '120', wiring: 'panel' },
  edition: starterBytes.hash,
  madeAt: '2026-11-30T09:00:00.000Z',
  changedAt: '2026-11-30T09:00:00.000Z',
}
const entries = (id: string) => ({
  entries: [
    {
      id,
      mode: 'battery',
      finding: 'tingle',
      value: 'no',
      kept: null,
      after: [],
      deviceAt: '2026-11-30T09:01:00.000Z',
    },
  ],
})
/** A sheet of each asker's; that of a visitor has a key which nobody here holds. */
const sheetOf = (asker: Who) => `5ee70000-0000-4000-8000-00000000000${who.indexOf(asker)}`
const anothersSheet = '5ee70000-0000-4000-8000-0000000000aa'
const sharedToken = 'the token of the link that is given to everyone here'
const ownSheet = (status: number) => ({ ...all(status), visitor: 404 })
const forOwner = { visitor: 401, helper: 200, tech: 200, senior: 200, admin: 200 }

/** Routes that end a session stand at the bottom, with one that is no session's. */
const table: Row[] = [
  { route: 'get /health', path: () => '/api/health', status: all(200) },
  { route: 'get /edition', path: () => '/api/edition', status: all(200) },
  { route: 'get /edition/events', path: () => '/api/edition/events', status: all(200) },
  { route: 'get /editions', path: () => '/api/editions', status: all(200) },
  { route: 'get /editions/:hash', path: () => `/api/editions/${starterBytes.hash}`, status: all(200) },
  { route: 'get /editions/:hash', of: 'no hash', path: () => '/api/editions/1', status: all(404) },
  {
    route: 'get /edition-files/:hash',
    of: 'for everyone',
    path: () => `/api/edition-files/${file('articles-everyone')}`,
    status: all(200),
  },
  {
    route: 'get /edition-files/:hash',
    of: 'for qualified people: articles',
    path: () => `/api/edition-files/${file('articles-qualified')}`,
    status: forQualified,
  },
  {
    route: 'get /edition-files/:hash',
    of: 'for qualified people: procedures',
    path: () => `/api/edition-files/${file('procedures-qualified')}`,
    status: forQualified,
  },
  { route: 'get /articles', path: () => '/api/articles?q=neutral', status: all(200) },
  {
    route: 'post /articles/:slug/feedback',
    of: 'for everyone',
    path: () => '/api/articles/open-ground/feedback',
    body: { edition: 1, helped: true },
    status: all(201),
  },
  {
    route: 'post /articles/:slug/feedback',
    of: 'for qualified people',
    path: () => '/api/articles/double-bond/feedback',
    body: { edition: 1, helped: false, why: 'No figure.' },
    status: { visitor: 404, helper: 404, tech: 201, senior: 201, admin: 201 },
  },
  { route: 'get /article-drafts', path: () => '/api/article-drafts', status: forSenior(200) },
  {
    route: 'get /article-drafts/:slug',
    path: () => '/api/article-drafts/double-bond',
    status: forSenior(200),
  },
  {
    route: 'put /article-drafts/:slug',
    of: 'a new one',
    path: (asker) => `/api/article-drafts/by-${asker}`,
    body: { version: '0-new', ...unfinished },
    status: forSenior(200),
  },
  {
    route: 'put /article-drafts/:slug',
    of: 'another’s',
    path: () => '/api/article-drafts/by-senior',
    body: { version: '0-new', ...unfinished },
    status: forSenior(409),
  },
  {
    route: 'get /article-drafts/:slug/revisions',
    path: () => '/api/article-drafts/double-bond/revisions',
    status: forSenior(200),
  },
  {
    route: 'get /article-drafts/:slug/revisions/:number',
    of: 'none yet',
    path: () => '/api/article-drafts/double-bond/revisions/1',
    status: forSenior(404),
  },
  {
    route: 'get /article-drafts/:slug/feedback',
    path: () => '/api/article-drafts/double-bond/feedback',
    status: forSenior(200),
  },
  {
    route: 'post /article-drafts/:slug/let-go',
    of: 'no draft',
    path: () => '/api/article-drafts/nothing-there/let-go',
    body: { version: '0-new' },
    status: forSenior(409),
  },
  {
    route: 'put /article-drafts/:slug/in-force',
    of: 'an unfinished one',
    path: (asker) => `/api/article-drafts/by-${asker}/in-force`,
    body: { version: '1-new', reason: 'test' },
    status: forSenior(400),
  },
  {
    route: 'put /article-drafts/:slug/in-force',
    of: 'another’s, unfinished',
    path: () => '/api/article-drafts/by-senior/in-force',
    body: { version: '1-new', reason: 'test' },
    status: forSenior(400),
  },
  {
    route: 'post /article-drafts/:slug/let-go',
    of: 'another’s; the second finds none',
    path: () => '/api/article-drafts/by-admin/let-go',
    body: { version: '1-new' },
    status: { ...forSenior(200), admin: 409 },
  },
  {
    route: 'get /article-drafts/:slug/revisions/:number',
    of: 'another’s',
    path: () => '/api/article-drafts/by-admin/revisions/1',
    status: forSenior(200),
  },
  {
    route: 'put /article-drafts/:slug/withdrawn',
    of: 'nothing in force',
    path: () => '/api/article-drafts/nothing-there/withdrawn',
    body: { withdrawn: true, reason: 'test' },
    status: forSenior(404),
  },
  { route: 'get /me', path: () => '/api/me', status: all(200) },
  { route: 'get /people', path: () => '/api/people', status: forAdmin(200) },
  {
    route: 'post /people',
    path: () => '/api/people',
    body: { email: 'made-in-the-table@example.test', name: 'Made', role: 'admin' },
    status: forAdmin(201),
  },
  {
    route: 'patch /people/:id',
    of: 'own: a higher role',
    path: (asker) => `/api/people/${own(asker)}`,
    body: { role: 'admin' },
    status: forAdmin(403),
  },
  {
    route: 'patch /people/:id',
    of: 'another’s',
    path: () => `/api/people/${another}`,
    body: { role: 'senior' },
    status: forAdmin(200),
  },
  {
    route: 'patch /people/:id',
    of: 'nobody’s',
    path: () => '/api/people/00000000-0000-4000-8000-000000000000',
    body: { role: 'senior' },
    status: forAdmin(404),
  },
  {
    route: 'post /people/:id/link',
    of: 'own',
    path: (asker) => `/api/people/${own(asker)}/link`,
    status: forAdmin(201),
  },
  {
    route: 'post /people/:id/link',
    of: 'another’s',
    path: () => `/api/people/${another}/link`,
    status: forAdmin(201),
  },
  { route: 'post /people/:id/link', of: 'no id', path: () => '/api/people/1/link', status: forAdmin(404) },
  { route: 'get /links/:token', of: 'made up', path: () => '/api/links/nonsense', status: all(404) },
  {
    route: 'post /links/:token',
    of: 'made up',
    path: () => '/api/links/nonsense',
    body: { password: 'a good long password' },
    status: all(404),
  },
  { route: 'post /sign-in', of: 'nothing typed', path: () => '/api/sign-in', status: all(400) },
  { route: 'post /sign-up', of: 'nothing typed', path: () => '/api/sign-up', status: all(400) },
  {
    route: 'post /account/password',
    of: 'nothing typed',
    path: () => '/api/account/password',
    status: { ...all(400), visitor: 401 },
  },
  { route: 'get /sheets', path: () => '/api/sheets', status: forOwner },
  {
    route: 'put /sheets/:id',
    of: 'own',
    path: (asker) => `/api/sheets/${sheetOf(asker)}`,
    body: head,
    status: forOwner,
  },
  {
    route: 'put /sheets/:id',
    of: 'another’s',
    path: () => `/api/sheets/${anothersSheet}`,
    body: head,
    status: { ...all(404), visitor: 401 },
  },
  {
    route: 'put /sheets/:id',
    of: 'a new Diagnosis sheet',
    path: (asker) => `/api/sheets/${sheetOf(asker).replace('5ee7', '5ee8')}`,
    body: { ...head, kind: 'diagnosis' },
    status: forQualified,
  },
  {
    route: 'get /sheets/:id',
    of: 'own',
    path: (asker) => `/api/sheets/${sheetOf(asker)}`,
    status: ownSheet(200),
  },
  {
    route: 'get /sheets/:id',
    of: 'another’s',
    path: () => `/api/sheets/${anothersSheet}`,
    status: all(404),
  },
  { route: 'get /sheets/:id', of: 'no id', path: () => '/api/sheets/1', status: all(404) },
  {
    route: 'post /sheets/:id/entries',
    of: 'own',
    path: (asker) => `/api/sheets/${sheetOf(asker)}/entries`,
    body: entries,
    status: ownSheet(200),
  },
  {
    route: 'post /sheets/:id/entries',
    of: 'another’s',
    path: () => `/api/sheets/${anothersSheet}/entries`,
    body: entries,
    status: all(404),
  },
  {
    route: 'get /sheets/:id/events',
    of: 'own',
    path: (asker) => `/api/sheets/${sheetOf(asker)}/events`,
    status: ownSheet(200),
  },
  {
    route: 'get /sheets/:id/events',
    of: 'another’s',
    path: () => `/api/sheets/${anothersSheet}/events`,
    status: all(404),
  },
  {
    route: 'post /sheets/:id/link',
    of: 'own',
    path: (asker) => `/api/sheets/${sheetOf(asker)}/link`,
    status: ownSheet(201),
  },
  {
    route: 'post /sheets/:id/link',
    of: 'another’s',
    path: () => `/api/sheets/${anothersSheet}/link`,
    status: all(404),
  },
  {
    route: 'delete /sheets/:id/link',
    of: 'own',
    path: (asker) => `/api/sheets/${sheetOf(asker)}/link`,
    status: ownSheet(200),
  },
  {
    route: 'delete /sheets/:id/link',
    of: 'another’s',
    path: () => `/api/sheets/${anothersSheet}/link`,
    status: all(404),
  },
  // What somebody without an account began opens with the key of their device alone.
  ...(
    [
      ['get /sheets/:id', ''],
      ['get /sheets/:id/events', '/events'],
      ['put /sheets/:id', ''],
      ['post /sheets/:id/entries', '/entries'],
      ['post /sheets/:id/link', '/link'],
      ['delete /sheets/:id/link', '/link'],
    ] as const
  ).map(([route, rest]): Row => ({
    route,
    of: 'a visitor’s, without its key',
    path: () => `/api/sheets/${sheetOf('visitor')}${rest}`,
    ...(route.startsWith('put') && { body: head }),
    ...(rest === '/entries' && { body: entries('e0000000-0000-4000-8000-0000000000bb') }),
    status: { ...all(404), ...(route.startsWith('put') && { visitor: 401 }) },
  })),
  { route: 'get /shared/:token', of: 'given', path: () => `/api/shared/${sharedToken}`, status: all(200) },
  { route: 'get /shared/:token', of: 'made up', path: () => '/api/shared/nonsense', status: all(404) },
  {
    route: 'post /shared/:token/entries',
    of: 'given',
    path: () => `/api/shared/${sharedToken}/entries`,
    body: entries,
    status: forQualified,
  },
  {
    route: 'post /shared/:token/entries',
    of: 'made up',
    path: () => '/api/shared/nonsense/entries',
    body: entries,
    status: { ...all(404), visitor: 401, helper: 403 },
  },
  {
    route: 'get /shared/:token/events',
    of: 'given',
    path: () => `/api/shared/${sharedToken}/events`,
    status: all(200),
  },
  {
    route: 'get /shared/:token/events',
    of: 'made up',
    path: () => '/api/shared/nonsense/events',
    status: all(404),
  },
  {
    route: 'post /sign-out-everywhere',
    path: () => '/api/sign-out-everywhere',
    status: { ...all(200), visitor: 401 },
  },
  { route: 'post /sign-out', path: () => '/api/sign-out', status: all(200) },
]

test('the table holds every route there is', () => {
  const server = fileURLToPath(new URL('../../server', import.meta.url))
  const sources = readdirSync(server, { recursive: true, encoding: 'utf8' })
    .filter((name) => name.endsWith('.routes.ts') || name === 'app.ts')
    .map((name) => readFileSync(`${server}/${name}`, 'utf8'))
  const routes = sources
    .flatMap((source) => [...source.matchAll(/\.(get|post|put|patch|delete)\('(\/[^']*)'/g)])
    .map(([, method, path]) => `${method} ${path!.replace(/^\/api/, '')}`)
  expect(routes.length).toBeGreaterThan(15)
  expect([...new Set(table.map((row) => row.route))].sort()).toEqual([...new Set(routes)].sort())
})

describe.each(table)('$route $of', ({ route, path, body, status }) => {
  test.each(who)('asked by a %s', async (asker) => {
    const method = route.split(' ')[0]!.toUpperCase()
    const before = await askers[asker].whoAmI()
    const sent: unknown = typeof body === 'function' ? (body as (id: string) => unknown)(randomUUID()) : body
    const answer = await askers[asker].ask(method, path(asker), { body: sent })
    expect(answer.status).toBe(status[asker])
    if (status[asker] >= 400) {
      expect(answer.headers.get('content-type')).toMatch(/^application\/problem\+json/)
      expect(answer.headers.get('cache-control')).toBe('no-store')
      expect(await askers[asker].whoAmI()).toBe(before)
    }
    if (route.endsWith('/events')) await answer.body?.cancel()
  })
})

test('nobody’s role has changed but another’s', async () => {
  const roles = await database.db.selectFrom('person').select(['id', 'role']).execute()
  for (const role of ['helper', 'tech', 'senior', 'admin'] as const)
    expect(roles.find((person) => person.id === ids[role])?.role).toBe(role)
  expect(roles.find((person) => person.id === another)?.role).toBe('senior')
})
