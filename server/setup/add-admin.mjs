/** `npm run add-admin -- e-mail name`: makes an admin and prints a one-time link, with the server running or not. */
import { join } from 'node:path'
import { host, port, sessionEnv } from './environment.mjs'
import { Fault, sayWhy } from './fault.mjs'
import { takeLock } from './lock.mjs'
import { needPackages } from './packages.mjs'
import { dataFolder } from './places.mjs'
import { startDatabase } from './postgres.mjs'
import { runningDatabase } from './running-database.mjs'
import { tryToRun } from './run.mjs'
import { beforeEnd, stopAll, stopOnSignals } from './stop.mjs'

async function databaseUrl() {
  const running = runningDatabase()
  if (running !== undefined) return running
  beforeEnd(takeLock('another command'))
  return startDatabase('tracelamp', { folder: join(dataFolder, 'postgres'), beforeEnd })
}

async function main() {
  const [email, ...name] = process.argv.slice(2)
  if (email === undefined || name.length === 0)
    throw new Fault(
      'Usage: npm run add-admin -- e-mail name\nFor example: npm run add-admin -- ana@example.test Ana',
    )
  stopOnSignals()
  await needPackages()
  const env = {
    ...process.env,
    ...sessionEnv(),
    HOST: host,
    PORT: String(port),
    DATABASE_URL: await databaseUrl(),
  }
  const args = ['--import', 'tsx', 'server/commands/add-admin.ts', email, name.join(' ')]
  const { code } = await tryToRun(process.execPath, args, { env, show: true })
  await stopAll(code)
}

main().catch((error) => {
  sayWhy(error)
  void stopAll(1)
})
