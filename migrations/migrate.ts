import { Migrator } from 'kysely'
import type { Kysely } from 'kysely'
import { migrations } from './index.ts'

/**
 * Brings a database to the latest migration; several processes may call it at once (kysely holds an advisory lock).
 * @returns the names of those that ran
 * @throws what the failed migration threw; a migration that fails leaves nothing behind
 */
export async function migrateToLatest<Tables>(db: Kysely<Tables>): Promise<string[]> {
  const migrator = new Migrator({ db, provider: { getMigrations: () => Promise.resolve({ ...migrations }) } })
  const { error, results = [] } = await migrator.migrateToLatest()
  if (error !== undefined)
    throw error instanceof Error ? error : new Error('migration failed', { cause: error })
  return results.map((result) => result.migrationName)
}
