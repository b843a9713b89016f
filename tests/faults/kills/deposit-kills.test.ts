import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { DEPOSIT_CRASH_POINTS, type CrashPoint } from '@/lib/db/crash-points'
import { clock } from '@/lib/gateways/clock'
import { readSandboxMails } from '@/lib/gateways/mailer/sandbox-mailbox'
import { callOffRun } from '@/lib/services/runs/call-off-run'
import { Order, PaymentAttempt, Refund, Run } from '@/models'
import { moneyWorld, orderInput } from '@/tests/support/worlds/money'
import { actorOf } from '@/tests/support/worlds/person'
import { customerOf } from './customer'
import { ROUNDS, Stage, WITHIN } from './stage'

// Web and worker are killed at each point of a deposit's way and of its way back, then started again: nothing is lost,
// nobody is charged twice.
let stage: Stage
let world: Awaited<ReturnType<typeof moneyWorld>>

beforeAll(async () => {
  stage = await Stage.open()
}, 400_000)
afterAll(() => stage.close())

const customer = () => customerOf(stage.baseUrl)
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
  await expect.poll(async () => (await order.reload()).state, WITHIN).toBe('reserved')
  stage.noteRecovered()
  const captured = { orderId: order.id, state: 'captured' }
  expect(await PaymentAttempt.count({ where: captured })).toBe(1)
  expect(await Order.count({ where: { personId: buyer.person.id } })).toBe(1)
  await expect.poll(() => depositMails(buyer), WITHIN).toBe(1)
  await stage.expectBooks({ charged: 1 })
}

const depositMails = async ({ person }: Customer) =>
  (await readSandboxMails({ to: person.emailNormal! })).filter(({ subject }) =>
    /^Deposit received/.test(subject),
  ).length

async function reservedOrder() {
  const buyer = await customer()
  const order = await payDeposit(buyer)
  await expect.poll(async () => (await order.reload()).state, WITHIN).toBe('reserved')
  await stage.expectBooks({ charged: 1 })
  return { buyer, order }
}

describe.each(ROUNDS)('round %i', (round) => {
  beforeAll(async () => {
    world = await moneyWorld({ minimum: 2, maximum: 60 })
    // Others stand in the run beside the buyer the kill is about.
    for (let other = 1; other < round; other += 1) await reservedOrder()
  }, 120_000)

  describe('web, while an order is placed', () => {
    test.each<CrashPoint>(['order_placed', 'attempt_requested', 'provider_answered', 'attempt_sent'])(
      'killed at %s',
      async (point) => {
        const buyer = await customer()
        const answer = await stage.killedAt('web', point, () => buyer.place(orderInput(world.run)))
        expect(answer, 'an answer from a dead process').toBeNull()
        await expectOneDeposit(buyer, await payDeposit(buyer))
      },
    )
  })

  test('web, killed once the provider’s event is stored', async () => {
    const buyer = await customer()
    const order = await stage.killedAt('web', 'event_stored', () => payDeposit(buyer))
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
      const order = await stage.killedAt('worker', point, () => payDeposit(buyer))
      await expectOneDeposit(buyer, order)
    })
  })

  test('the worker, killed between the end of a card session and the release of its place', async () => {
    const buyer = await customer()
    const placed = await buyer.place(orderInput(world.run))
    const before = (await world.run.reload()).committedUnits
    await stage.killedAt('worker', 'hold_session_ended', async () => {
      await clock.advance(40 / 60)
      await stage.letTimeFall()
    })
    await stage.letTimeFall()
    const order = await Order.findByPk(placed!.order, { rejectOnEmpty: true })
    await expect.poll(async () => (await order.reload()).state, WITHIN).toBe('expired')
    stage.noteRecovered()
    expect((await world.run.reload()).committedUnits).toBe(before - 1)
    await expect(buyer.typeCard(placed!.payUrl!)).rejects.toThrow('the card page answered 200')
    await stage.expectBooks()
  })

  describe('the worker, while a deposit goes back', () => {
    test.each<CrashPoint>([
      'refund_requested',
      'refund_provider_answered',
      'refund_before_commit',
      'refund_sent',
    ])('killed at %s', async (point) => {
      const { buyer, order } = await reservedOrder()
      await stage.killedAt('worker', point, () => buyer.cancel(order.id))
      await expect.poll(() => refundsOf(order), WITHIN).toEqual(['succeeded'])
      stage.noteRecovered()
      expect((await order.reload()).state).toBe('cancelled')
      await stage.expectBooks({ repaid: 1 })
    })

    const refundsOf = async (order: Order) =>
      (await Refund.findAll({ where: { orderId: order.id } })).map(({ state }) => state)
  })

  test('the worker, killed in the middle of calling a run off: everyone is paid back, once', async () => {
    const now = await clock.now()
    const asked = { actor: await actorOf(world.owner), workshopId: world.workshop.id, runId: world.run.id }
    const left = await Order.count({ where: { runId: world.run.id, state: 'reserved' } })
    expect(left).toBeGreaterThan(5)
    const before = await Refund.count()
    const callOff = () => callOffRun({ ...asked, reason: 'A test of faults.', now })
    await stage.killedAt('worker', 'bulk_item_done', callOff)
    await expect
      .poll(() => Order.count({ where: { runId: world.run.id, state: 'reserved' } }), WITHIN)
      .toBe(0)
    stage.noteRecovered()
    await expect
      .poll(async () => (await Refund.findAll()).filter(({ state }) => state === 'succeeded').length, WITHIN)
      .toBe(before + left)
    expect((await Run.findByPk(world.run.id, { rejectOnEmpty: true })).state).toBe('called_off')
    await stage.expectBooks({ repaid: left })
  })
})

test('every crash point of a deposit was reached, and left behind quickly', () => {
  expect([...stage.reached].sort()).toEqual([...DEPOSIT_CRASH_POINTS].sort())
  stage.expectSwift()
})
