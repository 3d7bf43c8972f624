import { randomBytes } from 'node:crypto'
import { sql } from 'kysely'
import { inject } from 'vitest'
import { openDatabase } from '../../server/database.ts'
import type { Db } from '../../server/database.ts'
import { openLog } from '../../server/log.ts'

declare module 'vitest' {
  interface ProvidedContext {
    /** Of the run's own cluster, without a database's name. */
    postgresUrl: string
    /** A migrated, empty database to copy. */
    template: string
  }
}

export type TestDatabase = { url: string; db: Db; close: () => Promise<void> }

/**
 * A database of its own for one test file.
 * @param from `migrated` copies the template; `empty` has no tables
 */
export async function testDatabase(from: 'migrated' | 'empty' = 'migrated'): Promise<TestDatabase> {
  const log = openLog('silent')
  const name = `test_${randomBytes(6).toString('hex')}`
  const source = from === 'migrated' ? inject('template') : 'template0'
  const admin = openDatabase(`${inject('postgresUrl')}/postgres`, log)
  await sql`create database ${sql.ref(name)} template ${sql.ref(source)} strategy file_copy`.execute(admin)
  const url = `${inject('postgresUrl')}/${name}`
  const db = openDatabase(url, log)
  const close = async () => {
    await db.destroy()
    await sql`drop database ${sql.ref(name)} with (force)`.execute(admin)
    await admin.destroy()
  }
  return { url, db, close }
}
