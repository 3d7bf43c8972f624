import { createHash } from 'node:crypto'
import { sql } from 'kysely'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { editionBytes, editionHash } from '../../server/editions/edition-bytes.ts'
import { editionInForce, listEditions } from '../../server/editions/editions.queries.ts'
import { putInForce } from '../../server/editions/put-in-force.ts'
import { readStarter } from '../../server/editions/read-starter.ts'
import { seedStarter } from '../../server/editions/seed-starter.ts'
import { testDatabase } from './database.ts'
import type { TestDatabase } from './database.ts'
import { changedEdition, starterBytes } from './some-edition.ts'

let database: TestDatabase
beforeAll(async () => {
  database = await testDatabase()
  await putInForce(database.db, starterBytes, { note: 'starter edition', reason: 'first' })
})
afterAll(() => database.close())

const sha256 = (data: Buffer | string) => createHash('sha256').update(data).digest('hex')

test('the same parts give the same bytes, and so the same hash', async () => {
  expect(editionBytes(await readStarter()).hash).toBe(starterBytes.hash)
  expect(changedEdition('Another title').hash).not.toBe(starterBytes.hash)
})

test('a file’s hash is SHA-256 of its bytes, the edition’s that of its sorted manifest', () => {
  for (const file of starterBytes.files) expect(file.hash).toBe(sha256(file.bytes))
  const manifest = starterBytes.files.map((f) => `${f.audience} ${f.name} ${f.hash}`).sort()
  expect(manifest).toHaveLength(5)
  expect(starterBytes.hash).toBe(sha256(manifest.join('\n')))
  expect(editionHash([...starterBytes.files].reverse())).toBe(starterBytes.hash)
})

test('the bytes come back from the database as they went in', async () => {
  const kept = await database.db.selectFrom('edition_file').select(['name', 'bytes']).execute()
  for (const file of starterBytes.files)
    expect(kept.find((k) => k.name === file.name)?.bytes.equals(file.bytes), file.name).toBe(true)
})

test.each([
  ['an edition’s hash', sql`update edition set hash = repeat('0', 64)`],
  ['an edition’s note', sql`update edition set note = 'another'`],
  ['an edition', sql`delete from edition`],
  ['a file’s bytes', sql`update edition_file set bytes = 'x'`],
  ['a file', sql`delete from edition_file`],
  ['all files', sql`truncate edition_file`],
  ['all editions', sql`truncate edition cascade`],
  ['the record of what was in force', sql`delete from edition_in_force`],
])('the database refuses to change or delete %s', async (_what, change) => {
  await expect(change.execute(database.db)).rejects.toThrow(/is never changed or deleted/)
})

test('the database refuses to add a file to an edition that is there', async () => {
  const bytes = Buffer.from('{}')
  const add = database.db
    .insertInto('edition_file')
    .values({ edition_number: 1, name: 'added', audience: 'everyone', hash: sha256(bytes), bytes })
    .execute()
  await expect(add).rejects.toThrow(/not those of its hash/)
})

test('the database refuses an edition without files, and a file whose hash is not of its bytes', async () => {
  const empty = database.db
    .insertInto('edition')
    .values({ number: 90, hash: '9'.repeat(64), note: 'empty' })
    .execute()
  await expect(empty).rejects.toThrow(/not those of its hash/)
  const [first, ...others] = changedEdition('With a wrong file').files
  const files = [{ ...first!, bytes: Buffer.from('{"format":1}') }, ...others]
  const wrong = putInForce(
    database.db,
    { hash: editionHash(files), files },
    { note: 'wrong', reason: 'test' },
  )
  await expect(wrong).rejects.toThrow(/edition_file_hash_is_of_its_bytes/)
  expect((await editionInForce(database.db))?.hash).toBe(starterBytes.hash)
})

test('an edition put in force again keeps its number, and the record holds each time', async () => {
  const { db } = database
  const second = await putInForce(db, changedEdition('Second'), { note: 'by people', reason: 'new rules' })
  expect(second).toMatchObject({ changed: true, inForce: { number: 2 } })
  const back = await putInForce(db, starterBytes, { note: 'unused', reason: 'recall' })
  expect(back).toMatchObject({ changed: true, inForce: { number: 1, note: 'starter edition' } })
  const once = await putInForce(db, starterBytes, { note: 'unused', reason: 'again' })
  expect(once.changed).toBe(false)

  const record = await db
    .selectFrom('edition_in_force')
    .select(['edition_number', 'reason'])
    .orderBy('id')
    .execute()
  expect(record.map((r) => r.edition_number)).toEqual([1, 2, 1])
  const [two, one] = await listEditions(db)
  expect(two).toMatchObject({ number: 2, until: one?.since })
  expect(one).toMatchObject({ number: 1, until: null })
})

test('the starter never takes the place of an edition that people put in force', async () => {
  const { db } = database
  await putInForce(db, changedEdition('Ours'), { note: 'our own', reason: 'test' })
  expect(await seedStarter(db)).toMatchObject({ changed: false, inForce: { note: 'our own' } })
  await putInForce(db, changedEdition('An older starter'), { note: 'starter edition', reason: 'test' })
  expect(await seedStarter(db)).toMatchObject({ changed: true, inForce: { hash: starterBytes.hash } })
  expect(await seedStarter(db)).toMatchObject({ changed: false, inForce: { hash: starterBytes.hash } })
})

test('ten servers that start at once put the starter in force once', async () => {
  const fresh = await testDatabase()
  try {
    const all = await Promise.all(Array.from({ length: 10 }, () => seedStarter(fresh.db)))
    expect(all.filter((one) => one.changed)).toHaveLength(1)
    expect(new Set(all.map((one) => one.inForce.number))).toEqual(new Set([1]))
  } finally {
    await fresh.close()
  }
})
