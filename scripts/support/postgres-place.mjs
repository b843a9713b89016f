import { spawnSync } from 'node:child_process'
import { createHash } from 'node:crypto'
import { chownSync, existsSync, mkdirSync, readdirSync, readFileSync, realpathSync } from 'node:fs'
import { delimiter, join } from 'node:path'
import { installPackages, isRoot } from './debian.mjs'
import { Stop } from './shell.mjs'

const DEBIAN_ROOT = '/usr/lib/postgresql'
const NEEDED = ['initdb', 'pg_ctl', 'postgres', 'psql']

/** The folder with PostgreSQL's programs: of `version` when a cluster already has one, else the newest. */
export function findBinaries(version) {
  const versions = existsSync(DEBIAN_ROOT)
    ? readdirSync(DEBIAN_ROOT).filter((name) => /^\d+$/.test(name))
    : []
  const debian = versions.sort((a, b) => b - a).map((name) => join(DEBIAN_ROOT, name, 'bin'))
  const elsewhere = (process.env.PATH ?? '').split(delimiter)
  return [...debian, ...elsewhere].find(
    (folder) =>
      NEEDED.every((name) => existsSync(join(folder, name))) && (!version || versionOf(folder) === version),
  )
}

/** The same, installing Debian's package when there is none. */
export async function ensureBinaries(version) {
  const found = findBinaries(version)
  if (found) return found
  await installPackages(
    ['postgresql'],
    version ? `PostgreSQL ${version} is missing.` : 'PostgreSQL is missing.',
  )
  const installed = findBinaries(version)
  if (!installed)
    throw new Stop(`The cluster was made by PostgreSQL ${version}, and Debian's package is another version.`)
  return installed
}

/** Who the server runs as: it refuses root, so root hands it to the account of Debian's package. */
export function serverAccount() {
  if (!isRoot()) return {}
  const line = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .find((entry) => entry.startsWith('postgres:'))
  if (!line) throw new Stop('PostgreSQL refuses to run as root and there is no account named postgres.')
  const [, , uid, gid] = line.split(':')
  return { uid: Number(uid), gid: Number(gid) }
}

/**
 * The folder that holds the cluster, its log and its password, open to the server's account. A data folder
 * that account cannot walk into (a checkout under /root) gets its own folder under /var/tmp.
 */
export function clusterPlace(dataFolder) {
  mkdirSync(dataFolder, { recursive: true })
  const wanted = join(realpathSync(dataFolder), 'postgres')
  const account = serverAccount()
  if (account.uid === undefined) {
    mkdirSync(wanted, { recursive: true, mode: 0o700 })
    return wanted
  }
  const walk = spawnSync('test', ['-x', realpathSync(dataFolder)], { ...account, cwd: '/' })
  const key = createHash('sha256').update(wanted).digest('hex').slice(0, 16)
  const place = walk.status === 0 ? wanted : `/var/tmp/brimline-${key}`
  mkdirSync(place, { recursive: true, mode: 0o700 })
  chownSync(place, account.uid, account.gid)
  return place
}

function versionOf(folder) {
  const { stdout } = spawnSync(join(folder, 'postgres'), ['--version'], { encoding: 'utf8' })
  return /(\d+)/.exec(stdout ?? '')?.[1]
}
