import { expect } from 'vitest'
import type { CrashPoint } from '@/lib/db/crash-points'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { closeSandboxMailbox } from '@/lib/gateways/mailer/sandbox-mailbox'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { enqueue } from '@/lib/jobs/enqueue'
import { compareBooks } from '@/tests/support/books'
import { ensureBuild } from '../../../scripts/support/build.mjs'
import { Machine, type Part } from './machine'

export const isLong = process.env.FAULTS === 'long'
/** How often every kill is done in the long version, each time with another buyer's payment under way beside it. */
export const ROUNDS = isLong ? [1, 2, 3] : [1]
export const WITHIN = { timeout: 45_000, interval: 150 }
/** A part that was killed has done what it was doing within so long of being up again. */
const RECOVERY_MS = 10_000

/** The application as processes, what was charged and paid back so far, and how it recovers. */
export class Stage {
  readonly reached = new Set<CrashPoint>()
  private charged = 0
  private repaid = 0
  private upAgainAt = 0
  private slowestMs = 0

  private constructor(readonly machine: Machine) {}

  static async open(): Promise<Stage> {
    await ensureBuild()
    const machine = await Machine.open()
    await Promise.all([machine.start('mail-server'), machine.start('provider')])
    await Promise.all([machine.start('worker'), machine.start('web')])
    return new Stage(machine)
  }

  get baseUrl(): string {
    return this.machine.env.BASE_URL!
  }

  /** Starts a part anew with the order to kill itself at the point; `during` must bring it there. Then it lives again. */
  async killedAt<T>(part: Part, point: CrashPoint, during: () => Promise<T>): Promise<T> {
    await this.machine.stop(part)
    await this.machine.start(part, point)
    const [outcome] = await Promise.all([during(), this.machine.crashed(part)])
    this.reached.add(point)
    await this.machine.start(part)
    this.upAgainAt = performance.now()
    return outcome
  }

  /** Starts again what ended because its database went away, as the supervisor does. */
  async revive(): Promise<void> {
    await this.machine.revive()
    this.upAgainAt = performance.now()
  }

  /** What was going on when the part was killed is done by now. */
  noteRecovered(): void {
    if (this.upAgainAt === 0) return
    this.slowestMs = Math.max(this.slowestMs, performance.now() - this.upAgainAt)
    this.upAgainAt = 0
  }

  /** What the minute does by itself, now: the queue's own cron would make the test wait for it. */
  async letTimeFall(): Promise<void> {
    await inTransaction(async (tx) => {
      await enqueue(tx, 'due', {}, { key: 'due', queue: 'due', maxAttempts: 1 })
      return ok({})
    })
  }

  /** The provider charged as often as people paid, and both books say the same once the last event has come. */
  async expectBooks(more: { charged?: number; repaid?: number } = {}): Promise<void> {
    this.charged += more.charged ?? 0
    this.repaid += more.repaid ?? 0
    const said = { wrong: [], charges: this.charged, refunds: this.repaid }
    await expect.poll(() => compareBooks(), WITHIN).toMatchObject(said)
  }

  expectSwift(): void {
    console.warn(`the slowest recovery took ${(this.slowestMs / 1000).toFixed(1)} s`)
    expect(this.slowestMs).toBeGreaterThan(0)
    // A machine that does other things beside the short version must not turn it red.
    if (isLong) expect(this.slowestMs).toBeLessThan(RECOVERY_MS)
  }

  async close(): Promise<void> {
    await this.machine.close()
    await closeSandboxMailbox()
    await closeSandboxPool()
  }
}
