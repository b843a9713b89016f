import { createHash } from 'node:crypto'
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { withLock } from './lock.mjs'
import { run, say } from './shell.mjs'

const SOURCES = [
  'app',
  'components',
  'emails',
  'fonts',
  'lib',
  'models',
  'public',
  'package-lock.json',
  'tsconfig.json',
]
const FRAMEWORK = [
  'next.config.mjs',
  'cache-handler.mjs',
  'proxy.ts',
  'instrumentation.ts',
  'tailwind.config.ts',
  'postcss.config.mjs',
]
const MARKER = join('.next', 'built-from')

/** Builds the application when its sources differ from those of the last whole build. */
export async function ensureBuild() {
  if (isCurrent(hashOfSources())) return
  await withLock(join('.data', 'build.lock'), async () => {
    const sources = hashOfSources()
    if (isCurrent(sources)) return
    say('Building the application (a minute or two the first time) …')
    const env = { ...process.env, NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1' }
    await run(process.execPath, ['node_modules/next/dist/bin/next', 'build'], { env })
    writeFileSync(MARKER, sources)
  })
}

const isCurrent = (sources) => existsSync(MARKER) && readFileSync(MARKER, 'utf8') === sources

function hashOfSources() {
  const hash = createHash('sha256')
  for (const file of [...SOURCES, ...FRAMEWORK].flatMap(filesUnder))
    hash.update(file).update('\0').update(readFileSync(file))
  return hash.digest('hex')
}

function filesUnder(path) {
  if (!existsSync(path)) return []
  if (!statSync(path).isDirectory()) return [path]
  return readdirSync(path)
    .sort()
    .flatMap((name) => filesUnder(join(path, name)))
}
