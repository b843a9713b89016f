import { existsSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { withLock } from './lock.mjs'
import { run, say, Stop } from './shell.mjs'

const INSTALLED = join('node_modules', '.package-lock.json')

/** Installs the packages of the lock file when node_modules are missing or hold others. */
export async function ensureModules() {
  const [major, minor] = process.versions.node.split('.').map(Number)
  if (major < 20 || (major === 20 && minor < 12))
    throw new Stop(`Node 20.12 or newer is needed; this is ${process.version}.`)
  if (matchesLock()) return
  await withLock(join('.data', 'modules.lock'), async () => {
    if (matchesLock()) return
    say('Installing node modules (about a minute) …')
    await run('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'])
  })
}

/** Compares what npm wrote down at its last install with the lock; optional packages may be left out. */
function matchesLock() {
  if (!existsSync(INSTALLED)) return false
  const wanted = JSON.parse(readFileSync('package-lock.json', 'utf8')).packages
  const found = JSON.parse(readFileSync(INSTALLED, 'utf8')).packages
  const same = (name) => found[name]?.version === wanted[name]?.version
  const needed = Object.keys(wanted).filter((name) => name !== '' && !wanted[name].optional)
  return needed.every(same) && Object.keys(found).every(same)
}
