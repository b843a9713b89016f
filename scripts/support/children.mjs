import { spawn } from 'node:child_process'
import { createWriteStream, existsSync, mkdirSync, renameSync, statSync } from 'node:fs'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { say, Stop } from './shell.mjs'

const READY_WITHIN_MS = 90_000
const STOP_WITHIN_MS = 25_000
const HEALTHY_AFTER_MS = 60_000
const MAX_WAIT_MS = 30_000
const MAX_LOG_BYTES = 20_000_000
const fromHere = (path) => fileURLToPath(new URL(path, import.meta.url))

/**
 * Keeps one program running: `start` settles when it first prints a line `ready`; ended unasked, it is
 * started again after a wait that doubles; `stop` lets it finish its work. What it prints goes to its log,
 * complaints also to the terminal.
 */
export function keepRunning({ name, script, args = [], env, logFolder, watch = false, loud = false }) {
  let child
  let isStopping = false
  let failures = 0
  let timer
  const log = openLog(logFolder, name)

  function launch(onReady, onEnd) {
    const began = Date.now()
    child = spawn(process.execPath, [...flags(watch), script, ...args], {
      env: { ...env, TSX_TSCONFIG_PATH: fromHere('../../tsconfig.scripts.json') },
      stdio: ['pipe', 'pipe', 'pipe'],
      // Ctrl-C reaches the supervisor alone, which stops the children in order.
      detached: true,
    })
    child.stdin.on('error', () => {})
    child.stdout.on('data', (chunk) => {
      log.write(chunk)
      if (loud) process.stdout.write(chunk)
      if (/^ready\b/m.test(String(chunk))) onReady?.()
    })
    child.stderr.on('data', (chunk) => {
      log.write(chunk)
      process.stderr.write(chunk)
    })
    child.on('exit', (code, signal) => {
      child = undefined
      onEnd?.(code, signal)
      if (isStopping) return
      failures = Date.now() - began > HEALTHY_AFTER_MS ? 1 : failures + 1
      const waitMs = Math.min(MAX_WAIT_MS, 500 * 2 ** (failures - 1))
      say(`${name} ended with ${signal ?? code}; starting it again in ${waitMs / 1000} s.`)
      timer = setTimeout(launch, waitMs)
    })
  }

  function start() {
    return new Promise((resolve, reject) => {
      const late = setTimeout(() => fail('was not ready in time'), READY_WITHIN_MS)
      const fail = (why) => {
        isStopping = true
        clearTimeout(late)
        reject(new Stop(`${name} ${why}. Its log: ${join(logFolder, `${name}.log`)}`))
      }
      let isReady = false
      launch(
        () => {
          isReady = true
          clearTimeout(late)
          resolve()
        },
        (code, signal) => !isReady && !isStopping && fail(`ended with ${signal ?? code} before it was ready`),
      )
    })
  }

  async function stop() {
    isStopping = true
    clearTimeout(timer)
    if (child) {
      const ended = new Promise((resolve) => child.once('exit', resolve))
      child.kill('SIGTERM')
      const late = setTimeout(() => child?.kill('SIGKILL'), STOP_WITHIN_MS)
      await ended
      clearTimeout(late)
    }
    log.end()
  }

  return { name, start, stop, kill: () => child?.kill('SIGKILL'), pid: () => child?.pid }
}

function flags(watch) {
  const parent = ['--import', fromHere('end-with-parent.mjs')]
  return watch
    ? [...parent, fromHere('../../node_modules/tsx/dist/cli.mjs'), 'watch']
    : [...parent, '--import', 'tsx']
}

function openLog(folder, name) {
  mkdirSync(folder, { recursive: true })
  const file = join(folder, `${name}.log`)
  if (existsSync(file) && statSync(file).size > MAX_LOG_BYTES) renameSync(file, `${file}.1`)
  return createWriteStream(file, { flags: 'a' })
}
