import { readdirSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { sql } from 'kysely'
import { expect, test } from 'vitest'
import { migrations } from '../../migrations/index.ts'
import { migrateToLatest } from '../../migrations/migrate.ts'
import { testDatabase } from './database.ts'

test('the index lists every migration in the folder, in the order of their dates', () => {
  const folder = fileURLToPath(new URL('../../migrations', import.meta.url))
  const files = readdirSync(folder).filter((name) => /^\d{4}-/.test(name))
  expect(Object.keys(migrations)).toEqual(files.map((name) => name.replace(/\.ts$/, '')).sort())
})

test('an empty database comes to the latest, once, even when several processes migrate it at once', async () => {
  const { db, close } = await testDatabase('empty')
  try {
    const ran = await Promise.all([migrateToLatest(db), migrateToLatest(db), migrateToLatest(db)])
    expect(ran.flat()).toEqual(Object.keys(migrations))
    expect(await migrateToLatest(db)).toEqual([])
    const { rows } = await sql<{ name: string }>`
      select table_name as name from information_schema.tables
      where table_schema = 'public' and table_name not like 'kysely%' order by 1
    `.execute(db)
    expect(rows.map((row) => row.name)).toEqual([
      'article_draft',
      'article_feedback',
      'article_revision',
      'edition',
      'edition_file',
      'edition_in_force',
      'one_time_link',
      'person',
      'session',
      'sheet',
      'sheet_entry',
      'sheet_link',
      'sheet_result',
      'sign_in_try',
    ])
  } finally {
    await close()
  }
})
