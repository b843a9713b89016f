import { type ChildProcess, spawn } from 'node:child_process'
import { cpSync, mkdirSync, rmSync } from 'node:fs'
import { join, resolve } from 'node:path'
import { ensureDatabase, psql, removeDatabase, startDatabase } from '../database.mjs'
import { ensureBuild } from '../support/build.mjs'
import { freePort } from '../support/ports.mjs'
import { childSettings } from '../support/settings.mjs'
import { run } from '../support/shell.mjs'

const NEXT = resolve('node_modules/next/dist/bin/next')

export type Servers = { ours: string; bare: string; env: Record<string, string>; close: () => Promise<void> }

/**
 * Our web server and a bare one of the same framework side by side, on one throw-away database: a page that says one
 * word, and a handler that inserts one row through the driver. No worker runs, so that nothing else takes the machine.
 */
export async function openServers(prepare: (env: Record<string, string>) => Promise<void>): Promise<Servers> {
  const folder = resolve('.data/bench', String(process.pid))
  const server = await startDatabase(folder, { throwAway: true })
  const databaseUrl = await ensureDatabase(server.url)
  const { PATH, HOME } = process.env
  const given = { PATH, HOME, SANDBOX: '1', LOG_LEVEL: 'error', PORT: String(await freePort()) }
  const env = await childSettings(given, { dataFolder: folder, databaseUrl })
  await run(process.execPath, ['scripts/run.mjs', 'scripts/migrate.ts'], { env })
  await psql(
    databaseUrl,
    'create table bench_rows (id bigint generated always as identity primary key, email text)',
  )
  await ensureBuild()
  await prepare(env)

  const site = join(folder, 'baseline')
  mkdirSync(site, { recursive: true })
  cpSync('scripts/bench/baseline', site, { recursive: true })
  await run(process.execPath, [NEXT, 'build', site], { env })
  const barePort = await freePort()
  const started = [
    start(['--import', 'tsx', 'scripts/server.ts'], env, /^ready\b/m),
    start([NEXT, 'start', site, '-H', '127.0.0.1', '-p', String(barePort)], env, /Ready/),
  ]
  await Promise.all(started.map(({ ready }) => ready))
  return {
    ours: env.BASE_URL!,
    bare: `http://127.0.0.1:${barePort}`,
    env,
    close: async () => {
      for (const { child } of started) child.kill('SIGKILL')
      await removeDatabase(folder)
      rmSync(folder, { recursive: true, force: true })
    },
  }
}

function start(args: string[], env: Record<string, string>, sign: RegExp) {
  const child: ChildProcess = spawn(process.execPath, args, {
    env: { ...env, NODE_ENV: 'production', TSX_TSCONFIG_PATH: resolve('tsconfig.scripts.json') },
    stdio: ['ignore', 'pipe', 'inherit'],
  })
  const ready = new Promise<void>((done, fail) => {
    child.stdout!.on('data', (chunk: Buffer) => sign.test(chunk.toString()) && done())
    child.once('exit', (code) => fail(new Error(`${args.join(' ')} ended with ${code}`)))
  })
  return { child, ready }
}
