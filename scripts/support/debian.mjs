import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { run, say, Stop } from './shell.mjs'

const CLUSTER_SETTINGS = '/etc/postgresql-common/createcluster.conf'

export const isRoot = () => process.getuid?.() === 0

/** Installs Debian packages as root; anyone else is told the one command and stops here. */
export async function installPackages(packages, reason) {
  const command = `apt-get install -y --no-install-recommends ${packages.join(' ')}`
  if (!existsSync('/usr/bin/apt-get')) throw new Stop(`${reason} Please install: ${packages.join(', ')}.`)
  const sparesCluster = packages.includes('postgresql')
  if (!isRoot()) {
    const first = sparesCluster
      ? `mkdir -p /etc/postgresql-common && echo create_main_cluster = false >> ${CLUSTER_SETTINGS} && `
      : ''
    throw new Stop(
      `${reason} Please run this once, then start again:\n  sudo sh -c '${first}apt-get update && ${command}'`,
    )
  }
  say(`${reason} Installing ${packages.join(', ')} from Debian's packages …`)
  if (sparesCluster) refuseSystemCluster()
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive', UCF_FORCE_CONFFOLD: '1' }
  const wait = ['-o', 'DPkg::Lock::Timeout=300', '-o', 'Dpkg::Options::=--force-confold']
  await run('apt-get', [...wait, 'update'], { env, allowFailure: true })
  await run('apt-get', [...wait, ...command.split(' ').slice(1)], { env })
}

/** The package would make and start a cluster of its own, which nobody asked for. */
function refuseSystemCluster() {
  mkdirSync('/etc/postgresql-common', { recursive: true })
  const before = existsSync(CLUSTER_SETTINGS) ? readFileSync(CLUSTER_SETTINGS, 'utf8') : ''
  if (/^\s*create_main_cluster\s*=\s*false/m.test(before)) return
  const kept = before.replace(/^\s*create_main_cluster\s*=.*$/gm, '')
  writeFileSync(
    CLUSTER_SETTINGS,
    `${kept}${kept && !kept.endsWith('\n') ? '\n' : ''}create_main_cluster = false\n`,
  )
}
