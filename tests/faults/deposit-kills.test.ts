import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { CRASH_POINTS, type CrashPoint } from '@/lib/db/crash-points'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { enqueue } from '@/lib/jobs/enqueue'
import { clock } from '@/lib/gateways/clock'
import { closeSandboxMailbox, readSandboxMails } from '@/lib/gateways/mailer/sandbox-mailbox'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { callOffRun } from '@/lib/services/runs/call-off-run'
import { Order, PaymentAttempt, Refund, Run } from '@/models'
import { compareBooks } from '@/tests/support/books'
import { moneyWorld, orderInput } from '@/tests/support/worlds/money'
import { actorOf } from '@/tests/support/worlds/person'
import { ensureBuild } from '../../scripts/support/build.mjs'
import { customerOf } from './customer'
import { Machine, type Part } from './machine'

// Web and worker are killed at each point of a deposit's way and of its way back, then started again: nothing is lost,
// nobody is charged twice.
const WITHIN = { timeout: 45_000, interval: 150 }
const reached = new Set<CrashPoint>()
let machine: Machine
let world: Awaited<ReturnType<typeof moneyWorld>>
let charged = 0

beforeAll(async () => {
  await ensureBuild()
  world = await moneyWorld({ minimum: 2, maximum: 60 })
  machine = await Machine.open()
  await Promise.all([machine.start('mail-server'), machine.start('provider')])
  await Promise.all([machine.start('worker'), machine.start('web')])
}, 400_000)

afterAll(async () => {
  await machine.close()
  await closeSandboxMailbox()
  await closeSandboxPool()
})

/** Starts a part anew with the order to kill itself at the point; `during` must bring it there. Then it lives again. */
async function killedAt<T>(part: Part, point: CrashPoint, during: () => Promise<T>): Promise<T> {
  await machine.stop(part)
  await machine.start(part, point)
  const [outcome] = await Promise.all([during(), machine.crashed(part)])
  reached.add(point)
  await machine.start(part)
  return outcome
}

const customer = () => customerOf(machine.env.BASE_URL!)
type Customer = Awaited<ReturnType<typeof customer>>

/** As a buyer does whose page broke: looks at the orders, presses pay, or orders again. */
async function payDeposit(buyer: Customer): Promise<Order> {
  const order = (await buyer.orders())?.items[0]?.id ?? (await buyer.place(orderInput(world.run)))?.order
  if (!order) throw new Error('the order is lost')
  const link = await buyer.pay(order)
  if (!link) throw new Error('nobody answered the press on pay')
  await buyer.typeCard(link.payUrl)
  return Order.findByPk(order, { rejectOnEmpty: true })
}

async function expectOneDeposit(buyer: Customer, order: Order): Promise<void> {
  charged += 1
  await expect.poll(async () => (await order.reload()).state, WITHIN).toBe('reserved')
  const captured = { orderId: order.id, state: 'captured' }
  expect(await PaymentAttempt.count({ where: captured })).toBe(1)
  expect(await Order.count({ where: { personId: buyer.person.id } })).toBe(1)
  await expect.poll(() => depositMails(buyer), WITHIN).toBe(1)
  await expectBooks()
}

const depositMails = async ({ person }: Customer) =>
  (await readSandboxMails({ to: person.emailNormal! })).filter(({ subject }) =>
    /^Deposit received/.test(subject),
  ).length

/** What the minute does by itself, now: the queue's own cron would make the test wait for it. */
async function letTimeFall(): Promise<void> {
  await inTransaction(async (tx) => {
    await enqueue(tx, 'due', {}, { key: 'due', queue: 'due', maxAttempts: 1 })
    return ok({})
  })
}

/** The provider charged as often as people paid, and both books say the same once the last event has come. */
async function expectBooks(refunds = 0): Promise<void> {
  await expect.poll(compareBooks, WITHIN).toMatchObject({ wrong: [], charges: charged, refunds })
}

describe('web, while an order is placed', () => {
  test.each<CrashPoint>(['order_placed', 'attempt_requested', 'provider_answered', 'attempt_sent'])(
    'killed at %s',
    async (point) => {
      const buyer = await customer()
      const answer = await killedAt('web', point, () => buyer.place(orderInput(world.run)))
      expect(answer, 'an answer from a dead process').toBeNull()
      await expectOneDeposit(buyer, await payDeposit(buyer))
    },
  )
})

test('web, killed once the provider’s event is stored', async () => {
  const buyer = await customer()
  const order = await killedAt('web', 'event_stored', () => payDeposit(buyer))
  await expectOneDeposit(buyer, order)
})

describe('the worker, while the deposit is applied and told', () => {
  test.each<CrashPoint>([
    'event_before_apply',
    'event_before_commit',
    'event_applied',
    'mail_claimed',
    'mail_accepted',
    'mail_sent',
  ])('killed at %s', async (point) => {
    const buyer = await customer()
    const order = await killedAt('worker', point, () => payDeposit(buyer))
    await expectOneDeposit(buyer, order)
  })
})

test('the worker, killed between the end of a card session and the release of its place', async () => {
  const buyer = await customer()
  const placed = await buyer.place(orderInput(world.run))
  const before = (await world.run.reload()).committedUnits
  await killedAt('worker', 'hold_session_ended', async () => {
    await clock.advance(40 / 60)
    await letTimeFall()
  })
  await letTimeFall()
  const order = await Order.findByPk(placed!.order, { rejectOnEmpty: true })
  await expect.poll(async () => (await order.reload()).state, WITHIN).toBe('expired')
  expect((await world.run.reload()).committedUnits).toBe(before - 1)
  await expect(buyer.typeCard(placed!.payUrl!)).rejects.toThrow('the card page answered 200')
  await expectBooks()
})

describe('the worker, while a deposit goes back', () => {
  let repaid = 0
  test.each<CrashPoint>([
    'refund_requested',
    'refund_provider_answered',
    'refund_before_commit',
    'refund_sent',
  ])('killed at %s', async (point) => {
    const { buyer, order } = await reservedOrderAfter(repaid)
    await killedAt('worker', point, () => buyer.cancel(order.id))
    repaid += 1
    await expect
      .poll(
        async () => (await Refund.findAll({ where: { orderId: order.id } })).map(({ state }) => state),
        WITHIN,
      )
      .toEqual(['succeeded'])
    expect((await order.reload()).state).toBe('cancelled')
    await expectBooks(repaid)
  })

  async function reservedOrderAfter(refunds: number) {
    const buyer = await customer()
    const order = await payDeposit(buyer)
    charged += 1
    await expect.poll(async () => (await order.reload()).state, WITHIN).toBe('reserved')
    await expectBooks(refunds)
    return { buyer, order }
  }
})

test('the worker, killed in the middle of calling a run off: everyone is paid back, once', async () => {
  const now = await clock.now()
  const asked = { actor: await actorOf(world.owner), workshopId: world.workshop.id, runId: world.run.id, now }
  const left = await Order.count({ where: { runId: world.run.id, state: 'reserved' } })
  expect(left).toBeGreaterThan(5)
  const before = await Refund.count()
  await killedAt('worker', 'bulk_item_done', () => callOffRun({ ...asked, reason: 'A test of faults.' }))
  await expect.poll(() => Order.count({ where: { runId: world.run.id, state: 'reserved' } }), WITHIN).toBe(0)
  await expect
    .poll(async () => (await Refund.findAll()).filter(({ state }) => state === 'succeeded').length, WITHIN)
    .toBe(before + left)
  expect((await Run.findByPk(world.run.id, { rejectOnEmpty: true })).state).toBe('called_off')
  await expectBooks(before + left)
})

test('every crash point was reached', () => {
  expect([...reached].sort()).toEqual([...CRASH_POINTS].sort())
})
