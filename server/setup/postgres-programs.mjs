import { existsSync, mkdirSync, readdirSync, writeFileSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { installPackage } from './debian.mjs'
import { Fault } from './fault.mjs'

const debian = '/usr/lib/postgresql'
const clusterSettings = '/etc/postgresql-common/createcluster.conf'

/** Debian's folders of PostgreSQL programs, the newest first. What else is on the PATH may be a wrapper. */
function versions() {
  if (!existsSync(debian)) return []
  return readdirSync(debian)
    .filter(
      (version) =>
        existsSync(join(debian, version, 'bin/initdb')) && existsSync(join(debian, version, 'bin/postgres')),
    )
    .sort((a, b) => Number(b) - Number(a))
}

/** Installs PostgreSQL where it is missing. */
export async function needPostgres() {
  if (versions().length > 0) return
  // Else Debian makes and starts a cluster of its own, which nobody asked for.
  if (process.getuid?.() === 0 && !existsSync(clusterSettings)) {
    mkdirSync(dirname(clusterSettings), { recursive: true })
    writeFileSync(clusterSettings, 'create_main_cluster = false\n')
  }
  await installPackage('postgresql', 'PostgreSQL')
}

/** The version a new cluster is made with. */
export const newestVersion = () => versions()[0]

/** The folder of the programs of one version. A cluster works with the version that made it alone. */
export function postgresPrograms(version) {
  if (!versions().includes(version))
    throw new Fault(
      `The database was made by PostgreSQL ${version}, which is missing: apt-get install postgresql-${version}`,
    )
  return join(debian, version, 'bin')
}
