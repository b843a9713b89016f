import { existsSync } from 'node:fs'
import { join } from 'node:path'
import { keepRunning } from './children.mjs'
import { run, Stop } from './shell.mjs'

const SANDBOX_PARTS = [
  { name: 'mail-server', script: 'scripts/mail-server.ts' },
  { name: 'provider', script: 'scripts/provider.ts' },
]
const PARTS = [
  { name: 'worker', script: 'scripts/worker.ts' },
  { name: 'web', script: 'scripts/server.ts' },
]

/** Says what is wrong with the settings and stops, before anything runs on them. */
export async function checkSettings(env) {
  const { code, output } = await runScript('scripts/check-env.ts', env, { allowFailure: true })
  if (code !== 0) throw new Stop(`The settings are not complete:\n${output.trim()}`)
}

/** Runs one of our TypeScript scripts to its end. */
export function runScript(script, env, options = {}) {
  return run(process.execPath, ['scripts/run.mjs', script, ...(options.args ?? [])], { env, ...options })
}

/** Starts web, worker and, in the sandbox, the fakes, side by side; gives back how to stop them. */
export async function startParts(env, { isDev = false } = {}) {
  const logFolder = join(env.BRIMLINE_DATA, 'log')
  const sandbox = env.SANDBOX === '1' ? SANDBOX_PARTS.filter(({ script }) => existsSync(script)) : []
  const parts = [...sandbox, ...PARTS].map((part) =>
    keepRunning({
      ...part,
      env,
      logFolder,
      loud: isDev && part.name === 'web',
      watch: isDev && part.name !== 'web',
    }),
  )
  const stop = async () => {
    // Web first: nothing new comes in while the others finish.
    for (const part of [...parts].reverse()) await part.stop()
  }
  const begun = await Promise.allSettled(parts.map((part) => part.start()))
  const failure = begun.find(({ status }) => status === 'rejected')
  if (failure) {
    await stop()
    throw failure.reason
  }
  return { parts, stop, kill: () => parts.forEach((part) => part.kill()) }
}
