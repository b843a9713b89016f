import { payments } from '@/lib/gateways/payments'
import { breakCalls, type Break } from '@/lib/gateways/payments/fake/break-calls'
import { deliverDueEvents } from '@/lib/gateways/payments/fake/deliver'
import { passTime } from '@/lib/gateways/payments/fake/pass-time'
import type { CrashPoint } from '@/lib/db/crash-points'
import type { Actor } from '@/lib/core/policy/can'
import type { OrderState } from '@/lib/core/states/order'
import { JOBS, type JobName } from '@/lib/jobs/names'
import { due } from '@/lib/tasks/due'
import { Op } from 'sequelize'
import Stripe from 'stripe'
import { expect } from 'vitest'
import { DueItem, Order, type Person, SignUp } from '@/models'
import { compareBooks } from '@/tests/support/books'
import { businessTime, minutesLater, setBusinessTime } from '@/tests/support/business-time'
import { makeReady } from '@/tests/support/worlds/decision'
import { makeBuyer, moneyWorld, toOurDoor } from '@/tests/support/worlds/money'
import { actorOf } from '@/tests/support/worlds/person'
import { clearAway, wakeQueue, work } from '../support/queue'
import { killAt } from '../support/kill-here'
import { wrongNow } from './invariants'
import type { Model } from './model'
import { leftWhenQuiet } from './quiet'

type Buyer = { person: Person; actor: Actor }
/** What a buyer holds of an order: its id, once answered, and every link they were given. */
export type Placed = { buyer: Buyer; id: string | null; links: string[] }

const ALL_BUT_MAIL = (Object.keys(JOBS) as JobName[]).filter((name) => name !== 'send_mail')
/** Only these can be lost for good without the books differing: a look-up brings the same news. */
const LOSABLE = /"type": "(checkout\.session|payment_intent)\./

/** How the provider's events arrive: as sent, backwards, each twice, some later than the rest, some never. */
export type Arrival = 'as_sent' | 'backwards' | 'twice' | 'some_late' | 'some_lost'
/** What befalls one command: the n-th call to the provider breaks, or this process is killed. */
export type Mishap = { calls: readonly { n: number; how: Break }[] } | { kill: CrashPoint } | null

/** One run of one workshop, all its people, and the provider's events on their way. */
export class History {
  readonly orders: Placed[] = []
  /** Every state an order was quiet in. */
  readonly seen = new Set<OrderState>()
  private late: string[] = []

  private constructor(
    readonly world: Awaited<ReturnType<typeof moneyWorld>>,
    readonly owner: Actor,
  ) {}

  static async begin(): Promise<History> {
    await clearAway()
    const world = await moneyWorld({ minimum: 2, maximum: 5, balanceWhen: 'at_lock' })
    await payments().setManualPayouts({ account: world.account, key: `manual:${world.account}` })
    await makeReady(world)
    const history = new History(world, await actorOf(world.owner))
    await history.settle()
    return history
  }

  now = businessTime

  buyer = (): Promise<Buyer> => makeBuyer()

  /** Does something while a mishap befalls it; null when the process was killed. */
  async under<T>(mishap: Mishap, run: () => Promise<T>): Promise<T | null> {
    if (mishap === null) return run()
    if ('kill' in mishap) return killAt(mishap.kill, run)
    breakCalls(({ n }) => mishap.calls.find((call) => call.n === n)?.how ?? null)
    try {
      return await run()
    } finally {
      breakCalls(null)
    }
  }

  /** What the provider has sent, through our door; answers how many were taken. */
  async receive(arrival: Arrival): Promise<void> {
    const fresh: string[] = []
    await deliverDueEvents({ isHurried: true, deliver: async (body) => (fresh.push(body), 200) })
    const arriving = [...this.late, ...fresh]
    this.late = []
    if (arrival === 'backwards') arriving.reverse()
    const isOdd = (index: number) => index % 2 === 1
    for (const [index, body] of arriving.entries()) {
      if (arrival === 'some_lost' && isOdd(index) && LOSABLE.test(body)) continue
      if (arrival === 'some_late' && isOdd(index)) this.late.push(body)
      else for (let copy = arrival === 'twice' ? 0 : 1; copy < 2; copy += 1) await this.deliver(body)
    }
  }

  private async deliver(body: string): Promise<void> {
    const secret = process.env.STRIPE_WEBHOOK_SECRETS!
    const signature = Stripe.webhooks.generateTestHeaderString({ payload: body, secret })
    const status = await toOurDoor(body, signature)
    // The provider sends again what was not taken.
    if (status !== 200) this.late.push(body)
  }

  /** The worker does what waits; jobs that failed before are tried again. */
  async work(): Promise<number> {
    await wakeQueue()
    return work(ALL_BUT_MAIL)
  }

  /** Business time passes, for the provider too. */
  async moveClock(minutes: number): Promise<void> {
    await setBusinessTime(minutesLater(await this.now(), minutes))
    await passTime()
  }

  /** The same, and what falls due is done as by the worker's minute. */
  async pass(minutes: number, mishap: Mishap = null): Promise<void> {
    await this.moveClock(minutes)
    // One that fails stays due, and is said when all is quiet.
    const fallDue = () => due({}, { jobId: '1', attempt: 1, maxAttempts: 1 }).catch(() => {})
    await this.under(mishap, fallDue)
  }

  /** Everything on its way arrives, and what follows from it is done. */
  async settle(): Promise<void> {
    for (let round = 0; round < 12; round += 1) {
      const before = this.late.length
      await this.receive('as_sent')
      const failed = await this.work()
      const { delivered } = await deliverDueEvents({
        isHurried: true,
        deliver: async (body) => (this.late.push(body), 200),
      })
      if (delivered === 0 && failed === 0 && before === 0 && this.late.length === 0) return
    }
    throw new Error('it never gets quiet')
  }

  /** How long until something of this run falls due; null when nothing does within twenty days. */
  async minutesToNextDue(): Promise<number | null> {
    const now = await this.now()
    const dueAt = { [Op.gt]: now, [Op.lt]: minutesLater(now, 20 * 1440) }
    const kind = [
      'hold_ended',
      'balance_charge',
      'balance_reminder',
      'order_lapse',
      'refund_look_up',
      'refund_retry',
    ]
    const next = await DueItem.min<Date | null, DueItem>('dueAt', { where: { kind, doneAt: null, dueAt } })
    return next && Math.ceil((next.getTime() - now.getTime()) / 60_000) + 1
  }

  private get about() {
    return { workshopId: this.world.workshop.id, runId: this.world.run.id }
  }

  /** What holds after every step. */
  async expectAlways({ signUps }: Model): Promise<void> {
    expect(await wrongNow(this.about)).toEqual([])
    // Unconfirmed ones are forgotten after 14 days; until then each answer has exactly one row.
    const since = new Date((await this.now()).getTime() - 14 * 86_400_000)
    const where = { moduleId: this.world.module.id, submittedAt: { [Op.gt]: since } }
    expect(await SignUp.count({ where }), 'sign-ups there').toBe(signUps.filter((at) => at > since).length)
  }

  /**
   * Everything arrives, a minute passes, and what was left is looked up: then nothing is unknown or held by anybody, the
   * books are the provider's, and each order stands where its people were told.
   */
  async beQuiet(told: Model): Promise<void> {
    await this.settle()
    await this.pass(61 / 60)
    await this.settle()
    expect(await leftWhenQuiet({ ...this.about, now: await this.now() })).toEqual([])
    expect((await compareBooks([this.world.workshop])).wrong).toEqual([])
    for (const { index, after } of told.orders) {
      const { state } = await Order.findByPk(this.orders[index]!.id!, { rejectOnEmpty: true })
      expect([...after], `order ${index}`).toContain(state)
      told.orders[index]!.after = new Set([state])
      this.seen.add(state)
    }
  }
}
