import { createHash } from 'node:crypto'
import { get } from 'node:http'
import { brotliDecompressSync, gunzipSync } from 'node:zlib'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { EditionInForce, EditionList } from '../../server/editions/editions.contract.ts'
import { putInForce } from '../../server/editions/put-in-force.ts'
import { seedDemoPeople } from '../../server/people/demo-people.ts'
import { signedIn } from './asker.ts'
import { testDatabase } from './database.ts'
import type { TestDatabase } from './database.ts'
import { runApp } from './running-app.ts'
import type { RunningApp } from './running-app.ts'
import { changedEdition, starterBytes } from './some-edition.ts'

let database: TestDatabase
let app: RunningApp
let cookie: string
beforeAll(async () => {
  database = await testDatabase()
  app = await runApp(database.url)
  await seedDemoPeople(database.db)
  cookie = (await signedIn(app, 'tech')).cookie()
})
afterAll(async () => {
  await app.close()
  await database.close()
})

/** A file as it goes over the wire; `fetch` would unpack it. */
const raw = (path: string, headers: Record<string, string>) =>
  new Promise<{ status: number; headers: Record<string, unknown>; body: Buffer }>((resolve, reject) => {
    get(`${app.url}${path}`, { headers }, (answer) => {
      const chunks: Buffer[] = []
      answer.on('data', (chunk: Buffer) => chunks.push(chunk))
      answer.on('end', () =>
        resolve({ status: answer.statusCode ?? 0, headers: answer.headers, body: Buffer.concat(chunks) }),
      )
    }).on('error', reject)
  })

test('before any edition is in force, the answer is "not ready"', async () => {
  const answer = await fetch(`${app.url}/api/edition`)
  expect(answer.status).toBe(503)
  expect(answer.headers.get('retry-after')).toBe('2')
})

test('the edition in force is named with its counts and files', async () => {
  await putInForce(database.db, starterBytes, { note: 'starter edition', reason: 'test' })
  const answer = await fetch(`${app.url}/api/edition`, { headers: { cookie } })
  expect(answer.headers.get('cache-control')).toBe('private, no-cache')
  expect(answer.headers.get('vary')).toMatch(/cookie/i)
  const edition = EditionInForce.parse(await answer.json())
  const diagnosis = JSON.parse(
    starterBytes.files.find((file) => file.name === 'diagnosis')!.bytes.toString('utf8'),
  ) as { causes: unknown[]; tests: unknown[]; groups: { rules: unknown[] }[] }
  expect(edition).toMatchObject({ number: 1, hash: starterBytes.hash })
  expect(edition.counts).toMatchObject({
    causes: diagnosis.causes.length,
    tests: diagnosis.tests.length,
    rules: diagnosis.groups.flatMap((group) => group.rules).length,
  })
  expect(Math.abs(Date.now() - Date.parse(edition.inForceSince))).toBeLessThan(60_000)
  const listed = starterBytes.files.map((f) => ({
    name: f.name,
    audience: f.audience,
    hash: f.hash,
    bytes: f.bytes.length,
  }))
  expect(edition.files).toHaveLength(listed.length)
  expect(edition.files).toEqual(expect.arrayContaining(listed))
})

test('every file is served by its hash, whole, in each encoding; what is for everyone is kept for ever', async () => {
  for (const file of starterBytes.files) {
    const path = `/api/edition-files/${file.hash}`
    const plain = await raw(path, { cookie })
    expect(plain.body.equals(file.bytes)).toBe(true)
    expect(createHash('sha256').update(plain.body).digest('hex')).toBe(file.hash)
    const br = await raw(path, { cookie, 'accept-encoding': 'gzip, deflate, br' })
    expect(br.headers['content-encoding']).toBe('br')
    expect(brotliDecompressSync(br.body).equals(file.bytes)).toBe(true)
    const gz = await raw(path, { cookie, 'accept-encoding': 'gzip' })
    expect(gz.headers['content-encoding']).toBe('gzip')
    expect(gunzipSync(gz.body).equals(file.bytes)).toBe(true)
    if (file.bytes.length > 10_000) expect(br.body.length).toBeLessThan(file.bytes.length / 3)
    for (const answer of [plain, br, gz]) {
      const open = file.audience === 'everyone'
      expect(answer.headers['cache-control']).toBe(
        !open
          ? 'private, no-store'
          : `${file.name === 'articles-everyone' ? 'private' : 'public'}, max-age=31536000, immutable`,
      )
      // A cookie handed out from a shared cache would be somebody else's.
      expect(answer.headers['set-cookie']).toBeUndefined()
      expect(String(answer.headers['vary'])).toMatch(/accept-encoding/i)
      expect(answer.headers['content-type']).toMatch(/^application\/json/)
    }
    expect(new Set([plain, br, gz].map((answer) => answer.headers['etag'])).size).toBe(3)
  }
})

test('who has a file already is told so', async () => {
  const path = `/api/edition-files/${starterBytes.files[0]!.hash}`
  const first = await raw(path, { 'accept-encoding': 'br' })
  const again = await raw(path, { 'accept-encoding': 'br', 'if-none-match': String(first.headers['etag']) })
  expect(again).toMatchObject({ status: 304 })
  expect(again.body).toHaveLength(0)
})

test.each(['0'.repeat(64), 'nonsense', `${'A'.repeat(64)}`, "' or 1=1"])(
  'there is no file %j',
  async (hash) => {
    const answer = await fetch(`${app.url}/api/edition-files/${encodeURIComponent(hash)}`)
    expect(answer.status).toBe(404)
    expect(answer.headers.get('cache-control')).toBe('no-store')
  },
)

test('the list holds every edition, the newest first, and files of a former edition are still served', async () => {
  const next = changedEdition('A title that changed')
  await putInForce(database.db, next, { note: 'second edition', reason: 'test' })
  const { editions } = EditionList.parse(await (await fetch(`${app.url}/api/editions`)).json())
  expect(editions.map(({ number, inForce, hash }) => ({ number, inForce, hash }))).toEqual([
    { number: 2, inForce: true, hash: next.hash },
    { number: 1, inForce: false, hash: starterBytes.hash },
  ])
  expect(editions[1]?.until).toBe(editions[0]?.since)
  const former = starterBytes.files.find((file) => file.name === 'diagnosis')!
  expect((await fetch(`${app.url}/api/edition-files/${former.hash}`)).status).toBe(200)
})
