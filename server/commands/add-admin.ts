/** Makes someone an admin and prints the one-time link with which they set their password. */
import { migrateToLatest } from '../../migrations/migrate.ts'
import { readConfig } from '../config.ts'
import { openDatabase } from '../database.ts'
import { openLog } from '../log.ts'
import { makeAdmin } from '../people/make-admin.ts'
import { NewPerson } from '../people/people.contract.ts'

const [email, name] = process.argv.slice(2)
try {
  const config = readConfig()
  const read = NewPerson.safeParse({ email, name, role: 'admin' })
  if (!read.success) throw new Error(read.error.issues.map((issue) => issue.message).join('\n'))
  const db = openDatabase(config.databaseUrl, openLog('silent'))
  try {
    await migrateToLatest(db)
    const { token, expiresAt } = await makeAdmin(db, read.data)
    const host = config.host.includes(':') ? `[${config.host}]` : config.host
    console.log(
      `${read.data.name} <${read.data.email}> is an admin. This link sets the password, once, until ${expiresAt}:`,
    )
    console.log(`http://${host}:${config.port}/set-password#${token}`)
    console.log(
      'Where people reach the server by another address, put that in place of what stands before /set-password.',
    )
  } finally {
    await db.destroy()
  }
} catch (fault) {
  console.error(fault instanceof Error ? fault.message : String(fault))
  process.exitCode = 1
}
