/** Before the tests: a cluster of their own on which nothing is forced to the disk, with one migrated template. */
import { chmodSync, existsSync, mkdtempSync, readFileSync, readdirSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { sql } from 'kysely'
import { migrateToLatest } from '../../migrations/migrate.ts'
import { openDatabase } from '../../server/database.ts'
import { openLog } from '../../server/log.ts'
import { startPostgres } from '../../server/setup/postgres.mjs'

const prefix = 'tracelamp-test-'
const template = 'tracelamp_template'

/** Clusters of runs that were killed: the run's process id is in the folder's name. */
function sweep() {
  for (const name of readdirSync(tmpdir())) {
    const owner = new RegExp(`^${prefix}(\\d+)-`).exec(name)?.[1]
    if (owner === undefined || existsSync(`/proc/${owner}`)) continue
    try {
      process.kill(
        Number(readFileSync(join(tmpdir(), name, 'postgres/postmaster.pid'), 'utf8').split('\n')[0]),
        'SIGQUIT',
      )
    } catch {
      // It is down already.
    }
    rmSync(join(tmpdir(), name), { recursive: true, force: true })
  }
}

export default async function setup(project) {
  sweep()
  const home = mkdtempSync(join(tmpdir(), `${prefix}${process.pid}-`))
  chmodSync(home, 0o711) // for the account that runs PostgreSQL where this one is root
  const postgres = await startPostgres({ folder: join(home, 'postgres'), quick: true, say: () => undefined })
  const end = async () => {
    await postgres.stop()
    rmSync(home, { recursive: true, force: true })
  }
  try {
    const log = openLog('silent')
    const admin = openDatabase(`${postgres.url}/postgres`, log)
    await sql`create database ${sql.ref(template)}`.execute(admin)
    await admin.destroy()
    // Nothing may stay connected to a template.
    const db = openDatabase(`${postgres.url}/${template}`, log)
    await migrateToLatest(db)
    await db.destroy()
  } catch (error) {
    await end()
    throw error
  }
  project.provide('postgresUrl', postgres.url)
  project.provide('template', template)
  return end
}
