import { randomBytes } from 'node:crypto'
import { existsSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { Fault } from './fault.mjs'
import { clusterAccount } from './postgres-account.mjs'
import { needPostgres, newestVersion, postgresPrograms } from './postgres-programs.mjs'
import { step } from './progress.mjs'
import { run } from './run.mjs'

/** The database role that owns everything in a private cluster. */
export const role = 'tracelamp'

/**
 * What is remembered of a cluster stands beside it, in a file of whoever runs the set-up: root without the power to
 * read everything can't look into the folder itself.
 */
function openNotes(folder) {
  const path = `${folder}.json`
  return {
    read: () => (existsSync(path) ? JSON.parse(readFileSync(path, 'utf8')) : {}),
    write: (notes) => writeFileSync(path, JSON.stringify(notes), { mode: 0o600 }),
  }
}

/** Makes a cluster in `folder`. It appears there only once it is whole. */
async function makeCluster({ folder, account, quick }, version, password) {
  const draft = `${folder}.new`
  const passwordFile = `${folder}.new.password`
  rmSync(draft, { recursive: true, force: true })
  rmSync(passwordFile, { force: true })
  mkdirSync(draft, { mode: 0o700 })
  writeFileSync(passwordFile, password, { mode: 0o600 })
  account.give(draft)
  account.give(passwordFile)
  const settings = [
    '--auth=scram-sha-256',
    '--encoding=UTF8',
    '--locale=C.UTF-8',
    `--pwfile=${passwordFile}`,
    ...(quick ? ['--no-sync'] : []),
  ]
  const args = ['-D', draft, '-U', role, ...settings]
  await step('Making a private PostgreSQL cluster', () =>
    run(...account.command(join(postgresPrograms(version), 'initdb'), args), { cwd: '/' }),
  )
  rmSync(passwordFile)
  renameSync(draft, folder)
}

/**
 * The private cluster of a folder, made first where there is none.
 * @param wanted where it is to lie; `folder` of the answer says where it does
 * @param quick what is written while it is made need not reach the disk
 */
export async function openCluster(wanted, quick) {
  mkdirSync(dirname(wanted), { recursive: true })
  await needPostgres()
  const account = clusterAccount(wanted)
  const { folder } = account
  mkdirSync(dirname(folder), { recursive: true })
  const notes = openNotes(folder)
  let { version, password, port } = notes.read()
  if (!existsSync(folder)) {
    version = newestVersion()
    password = randomBytes(24).toString('hex')
    notes.write({ version, password })
    await makeCluster({ folder, account, quick }, version, password)
  }
  if (version === undefined || password === undefined)
    throw new Fault(
      `The notes beside the cluster in ${folder} are gone, and its password with them. Move it away to start anew.`,
    )
  return {
    folder,
    /** A program of PostgreSQL, as a command for whoever may run it here. */
    command: (program, args) => account.command(join(postgresPrograms(version), program), args),
    password,
    /** Where it listened last. */
    lastPort: port,
    rememberPort: (taken) => notes.write({ version, password, port: taken }),
  }
}
