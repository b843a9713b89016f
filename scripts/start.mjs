import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join, resolve } from 'node:path'
import { ensureDatabase, psql, startDatabase, stopDatabase } from './database.mjs'
import { checkSettings, runScript, startParts } from './support/application.mjs'
import { ensureBuild } from './support/build.mjs'
import { takeLock } from './support/lock.mjs'
import { ensureModules } from './support/modules.mjs'
import { childSettings, readEnvFile, wantsSandbox } from './support/settings.mjs'
import { main, say, Stop } from './support/shell.mjs'

// One command from a fresh clone to a served page: see README.md.
const isDev = process.argv.includes('--dev')
const began = performance.now()
let isEnding = false
let stopEverything = async () => {}

main(async () => {
  process.chdir(resolve(import.meta.dirname, '..'))
  readEnvFile()
  const dataFolder = resolve(process.env.BRIMLINE_DATA || '.data')
  const running = join(dataFolder, 'running')
  const release = await takeLock(join(dataFolder, 'start.lock'), { wait: false })
  if (!release) {
    const where = existsSync(running) ? ` at ${readFileSync(running, 'utf8')}` : ''
    throw new Stop(`Brimline is already running from this folder${where}.`)
  }
  for (const signal of ['SIGTERM', 'SIGINT', 'SIGHUP']) process.on(signal, end)

  try {
    await start(dataFolder, running)
  } catch (error) {
    await stopEverything()
    throw error
  }
})

async function start(dataFolder, running) {
  await ensureModules()
  const databaseUrl = await database(dataFolder)
  const env = await childSettings(process.env, { dataFolder, databaseUrl, isDev })
  if (wantsSandbox(process.env))
    say('No payment key and no mail server given: the sandbox plays both. Nothing is charged or sent.')
  await checkSettings(env)
  const [signIns] = await Promise.all([prepareData(env, dataFolder), isDev ? undefined : ensureBuild()])
  say('Starting web, worker and what they need …')
  const parts = await startParts(env, { isDev })
  const stopDatabaseAfter = stopEverything
  stopEverything = async () => {
    await parts.stop()
    await stopDatabaseAfter()
  }
  process.on('SIGINT', () => isEnding && parts.kill())
  writeFileSync(running, env.BASE_URL)
  if (signIns) say(signIns)
  say(
    `\nBrimline is at ${env.BASE_URL} (ready in ${Math.round((performance.now() - began) / 1000)} s). Ctrl-C stops it.`,
  )
}

/** A given server is used as it is; otherwise the project's own is started, and stopped with us. */
async function database(dataFolder) {
  if (process.env.DATABASE_URL) return process.env.DATABASE_URL
  const { url, port } = await startDatabase(dataFolder, {
    port: Number(process.env.POSTGRES_PORT) || undefined,
  })
  stopEverything = () => stopDatabase(dataFolder)
  if (existsSync(join(dataFolder, 'seeding'))) {
    say('The last start was cut short while it made the demo; beginning that again.')
    await psql(url, 'drop database if exists brimline with (force)')
    rmSync(join(dataFolder, 'seeding'))
  }
  say(`PostgreSQL runs on port ${port}.`)
  return ensureDatabase(url)
}

/** The database as the code wants it; the demo fills an empty sandbox before anything else runs. Gives back who can sign in. */
async function prepareData(env, dataFolder) {
  const { output } = await runScript('scripts/migrate.ts', env)
  if (output.trim()) say(output.trim())
  if (env.SANDBOX !== '1') return ''
  const marker = join(dataFolder, 'seeding')
  const isNew = output.includes('migrated')
  if (isNew) say('Making the demo (a minute or so) …')
  return (await runScript('scripts/seed.ts', env, { args: [marker] })).output.trim()
}

async function end() {
  if (isEnding) return
  isEnding = true
  say('\nStopping …')
  await stopEverything()
  rmSync(join(resolve(process.env.BRIMLINE_DATA || '.data'), 'running'), { force: true })
  process.exit(0)
}
