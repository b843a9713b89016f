import { mkdirSync } from 'node:fs'
import { join, resolve } from 'node:path'
import { psql } from '../database.mjs'
import { runScript, startParts } from './application.mjs'
import { freePort } from './ports.mjs'
import { childSettings } from './settings.mjs'

/**
 * The application as `npm start` runs it (production build, sandbox, supervisor), on a database of its own cloned
 * from a migrated template and on free ports. The fake provider misbehaves in every way unless told otherwise.
 */
export async function startTestApplication({ serverUrl, template, name, folder, settings = {} }) {
  await psql(serverUrl, `create database "${name}" template "${template}"`)
  const databaseUrl = new URL(serverUrl)
  databaseUrl.pathname = `/${name}`
  const dataFolder = resolve(folder, name)
  mkdirSync(dataFolder, { recursive: true })
  // Nothing of the shell's own settings: a test must not reach a real mail server.
  const { PATH, HOME, LANG } = process.env
  const given = {
    PATH,
    HOME,
    LANG,
    PORT: String(await freePort()),
    SANDBOX: '1',
    SANDBOX_FAULTS: 'all',
    LOG_LEVEL: 'warn',
    ...settings,
  }
  const env = await childSettings(given, { dataFolder, databaseUrl: databaseUrl.href })
  const application = await startParts(env)
  return {
    baseUrl: env.BASE_URL,
    databaseUrl: databaseUrl.href,
    logFolder: join(dataFolder, 'log'),
    env,
    run: (script, args = []) => runScript(script, env, { args }),
    pidOf: (part) => application.parts.find((each) => each.name === part)?.pid(),
    stop: async () => {
      await application.stop()
      await psql(serverUrl, `drop database "${name}" with (force)`)
    },
  }
}
