import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { join, resolve } from 'node:path'
import { setTimeout as pause } from 'node:timers/promises'
import { psql } from '../database.mjs'
import { runScript } from './application.mjs'
import { childSettings } from './settings.mjs'

const LONGEST_MS = 480_000
const markOf = (folder) => join(folder, 'demo-template')

/**
 * Makes a database with the demo in it, from a migrated template, to be cloned by whoever tests with it. A mark in the
 * folder says how it went, since others wait for it in their own processes.
 */
export async function makeDemoTemplate({ serverUrl, template, folder, secret }) {
  const name = `${template}_demo`
  try {
    await psql(serverUrl, `create database "${name}" template "${template}"`)
    const databaseUrl = new URL(serverUrl)
    databaseUrl.pathname = `/${name}`
    const dataFolder = resolve(folder, 'demo')
    mkdirSync(dataFolder, { recursive: true })
    const { PATH, HOME, LANG } = process.env
    const given = { PATH, HOME, LANG, SANDBOX: '1', LOG_LEVEL: 'error', AUTH_SECRET: secret }
    const env = await childSettings(given, { dataFolder, databaseUrl: databaseUrl.href })
    await runScript('scripts/seed.ts', env)
    await psql(serverUrl, `alter database "${name}" with is_template true allow_connections false`)
    writeFileSync(markOf(folder), name)
  } catch (error) {
    writeFileSync(markOf(folder), `failed: ${error.message}`)
  }
}

/** Takes it away again, where the server stays. */
export async function dropDemoTemplate({ serverUrl, template }) {
  const name = `${template}_demo`
  await psql(serverUrl, `update pg_database set datistemplate = false where datname = '${name}'`)
  await psql(serverUrl, `drop database if exists "${name}" with (force)`)
}

/** The name of the template once it is made. */
export async function demoTemplate(folder) {
  const began = Date.now()
  while (!existsSync(markOf(folder))) {
    if (Date.now() - began > LONGEST_MS) throw new Error('The demo was not made in time.')
    await pause(250)
  }
  const mark = readFileSync(markOf(folder), 'utf8')
  if (mark.startsWith('failed')) throw new Error(`The demo could not be made; ${mark}`)
  return mark
}
