import { type ChildProcess, spawn } from 'node:child_process'
import { createWriteStream, mkdirSync } from 'node:fs'
import { join, resolve } from 'node:path'
import { freePort } from '../../../scripts/support/ports.mjs'
import { childSettings } from '../../../scripts/support/settings.mjs'

const SCRIPTS = {
  'mail-server': 'scripts/mail-server.ts',
  provider: 'scripts/provider.ts',
  worker: 'scripts/worker.ts',
  web: 'scripts/server.ts',
} as const
export type Part = keyof typeof SCRIPTS

/**
 * The parts of the application as processes of their own on the database of this test file, each started, killed and
 * started again by hand: no supervisor, since a restarted part must not carry the order to crash again.
 */
export class Machine {
  private readonly running = new Map<Part, ChildProcess>()

  private constructor(
    readonly env: Record<string, string>,
    private readonly logFolder: string,
  ) {}

  static async open(): Promise<Machine> {
    const dataFolder = resolve('.data/test', `faults-${process.pid}`)
    mkdirSync(dataFolder, { recursive: true })
    const { PATH = '', HOME = '', DATABASE_URL = '', AUTH_SECRET = '' } = process.env
    const given = { PATH, HOME, AUTH_SECRET, SANDBOX: '1', LOG_LEVEL: 'warn', PORT: String(await freePort()) }
    const env = await childSettings(given, { dataFolder, databaseUrl: DATABASE_URL })
    return new Machine(env, dataFolder)
  }

  /** Starts a part and waits until it says that it is ready; `crashAt` is where it kills itself. */
  async start(part: Part, crashAt?: string): Promise<void> {
    const child = spawn(process.execPath, ['--import', 'tsx', SCRIPTS[part]], {
      env: {
        ...this.env,
        TSX_TSCONFIG_PATH: resolve('tsconfig.scripts.json'),
        ...(crashAt && { CRASH_AT: crashAt }),
      } as unknown as NodeJS.ProcessEnv,
      stdio: ['ignore', 'pipe', 'pipe'],
    })
    this.running.set(part, child)
    const log = createWriteStream(join(this.logFolder, `${part}.log`), { flags: 'a' })
    child.stderr.pipe(log, { end: false })
    await new Promise<void>((done, fail) => {
      child.stdout.on('data', (chunk: Buffer) => {
        log.write(chunk)
        if (/^ready\b/m.test(chunk.toString())) done()
      })
      child.once('exit', (code, signal) =>
        fail(new Error(`${part} ended with ${signal ?? code} before it was ready`)),
      )
    })
  }

  /** Waits until a part has killed itself; fails when it lives on. */
  async crashed(part: Part, withinMs = 30_000): Promise<void> {
    const child = this.running.get(part)!
    if (child.exitCode === null && child.signalCode === null) {
      await new Promise<void>((done, fail) => {
        const late = setTimeout(() => fail(new Error(`${part} never reached its crash point`)), withinMs)
        child.once('exit', () => {
          clearTimeout(late)
          done()
        })
      })
    }
    if (child.signalCode !== 'SIGKILL')
      throw new Error(`${part} ended with ${child.signalCode ?? child.exitCode}`)
  }

  async stop(part: Part): Promise<void> {
    const child = this.running.get(part)
    if (!child || child.exitCode !== null || child.signalCode !== null) return
    const ended = new Promise((done) => child.once('exit', done))
    child.kill('SIGTERM')
    await ended
  }

  /** Starts every part again that has ended by itself. */
  async revive(): Promise<void> {
    for (const [part, { exitCode, signalCode }] of this.running)
      if (exitCode !== null || signalCode !== null) await this.start(part)
  }

  async close(): Promise<void> {
    for (const part of ['web', 'worker', 'provider', 'mail-server'] as const) await this.stop(part)
  }
}
