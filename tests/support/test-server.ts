import { spawnSync } from 'node:child_process'
import { existsSync, readdirSync } from 'node:fs'
import { join } from 'node:path'
import { ensureDatabase, psql, removeDatabase, startDatabase } from '../../scripts/database.mjs'

const ROOT = '.data/test'

/** A PostgreSQL server with one migrated template in it; `remove` leaves nothing behind. */
export type TestServer = { serverUrl: string; template: string; folder: string; remove: () => Promise<void> }

/** Uses the server `npm test` has started, else starts one to throw away. */
export async function openTestServer(): Promise<TestServer> {
  const given = process.env.TEST_DATABASE_URL
  await sweep()
  const folder = join(ROOT, String(process.pid))
  const serverUrl = given ?? (await startDatabase(folder, { throwAway: true })).url
  const template = `template_${process.pid}`
  const remove = async () => {
    if (!given) return removeDatabase(folder)
    await psql(serverUrl, `alter database "${template}" with is_template false`)
    await psql(serverUrl, `drop database "${template}" with (force)`)
  }
  try {
    migrate(await ensureDatabase(serverUrl, template))
  } catch (error) {
    await remove()
    throw error
  }
  await psql(serverUrl, `alter database "${template}" with is_template true allow_connections false`)
  return { serverUrl, template, folder, remove }
}

function migrate(url: string) {
  const env = { ...process.env, DATABASE_URL: url, NODE_ENV: 'test' as const }
  const result = spawnSync(process.execPath, ['scripts/run.mjs', 'scripts/migrate.ts'], {
    env,
    encoding: 'utf8',
  })
  if (result.status !== 0) throw new Error(`The template did not migrate:\n${result.stdout}${result.stderr}`)
}

/** Clusters of runs that were killed. */
async function sweep() {
  if (!existsSync(ROOT)) return
  for (const name of readdirSync(ROOT)) {
    if (/^\d+$/.test(name) && !existsSync(`/proc/${name}`)) await removeDatabase(join(ROOT, name))
  }
}
