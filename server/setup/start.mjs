/** `npm start` and, with --dev, `npm run dev`: from a fresh clone to a running Tracelamp. Plain Node, since nothing is installed yet. */
import { join } from 'node:path'
import { needClient } from './client.mjs'
import { host, isPrivate, port, sessionEnv, sessionEnvToCheck } from './environment.mjs'
import { Fault, sayWhy } from './fault.mjs'
import { takeLock } from './lock.mjs'
import { needPackages } from './packages.mjs'
import { dataFolder } from './places.mjs'
import { faultOfPort, freePort } from './port.mjs'
import { startDatabase } from './postgres.mjs'
import { tryToRun } from './run.mjs'
import { sayDemoPeople } from './say-demo-people.mjs'
import { startPages, startServer } from './serve.mjs'
import { beforeEnd, isStopping, stopAll, stopOnSignals } from './stop.mjs'

const dev = process.argv.includes('--dev')
const urlOf = (name, number) => `http://${name.includes(':') ? `[${name}]` : name}:${number}`
const address = urlOf(host, port)
/** Where this machine reaches itself when the server listens everywhere. */
const nearby = { '0.0.0.0': '127.0.0.1', '::': '::1' }[host] ?? host

async function needPort() {
  // A port that is no number is named by the configuration check, with every other fault.
  if (!Number.isInteger(port) || port < 0 || port > 65_535) return
  const fault = await faultOfPort(host, port)
  if (fault === 'EADDRINUSE') throw new Fault(`Port ${port} on ${host} is taken. Set PORT to another one.`)
  if (fault !== undefined) throw new Fault(`${host}:${port} can't be served on (${fault}).`)
}

async function checkConfig() {
  const DATABASE_URL = process.env.DATABASE_URL || 'postgres://127.0.0.1/private'
  const env = { ...process.env, ...sessionEnvToCheck(), DATABASE_URL }
  const { code, output } = await tryToRun(
    process.execPath,
    ['--import', 'tsx', 'server/commands/check-config.ts'],
    { env },
  )
  if (code !== 0 && !isStopping()) throw new Fault(output.trimEnd())
}

async function databaseUrl() {
  if (process.env.DATABASE_URL) return process.env.DATABASE_URL
  return startDatabase('tracelamp', { folder: join(dataFolder, 'postgres'), beforeEnd })
}

async function main() {
  beforeEnd(takeLock(address))
  stopOnSignals()
  await needPort()
  await needPackages()
  await checkConfig()
  if (!dev) await needClient()
  const DATABASE_URL = await databaseUrl()
  if (dev) {
    const apiPort = await freePort()
    const api = urlOf('127.0.0.1', apiPort)
    const env = {
      ...sessionEnv(),
      DATABASE_URL,
      HOST: '127.0.0.1',
      PORT: String(apiPort),
      NODE_ENV: 'development',
      WORKER: 'off',
    }
    await startServer({ env, address: api, watch: true })
    await startPages({ host, port, api })
  } else await startServer({ env: { ...sessionEnv(), DATABASE_URL }, address: urlOf(nearby, port) })
  if (isStopping()) return
  console.log(`Tracelamp is at ${address} (Ctrl-C stops it)`)
  if (isPrivate) sayDemoPeople()
}

main().catch((error) => {
  if (isStopping()) return
  sayWhy(error)
  void stopAll(1)
})
