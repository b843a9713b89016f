import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import type { Actor } from '@/lib/core/policy/can'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { cancelForBuyer } from '@/lib/services/orders/cancel-for-buyer'
import { withdrawOrder } from '@/lib/services/orders/withdraw-order'
import { payOrder } from '@/lib/services/payments/pay-order'
import { receiveReturn } from '@/lib/services/returns/receive-return'
import { askBalances } from '@/lib/services/runs/ask-balances'
import { Invoice, MailOutbox, type Order, OrderLine, Refund } from '@/models'
import { compareBooks } from '@/tests/support/books'
import { runJobs } from '@/tests/support/run-jobs'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { makeBuyer, moneyWorld, pay, reserved, settleAll } from '@/tests/support/worlds/money'
import { actorOf } from '@/tests/support/worlds/person'
import { handOver, pack } from '@/tests/support/worlds/post-order'

// By hand: a kit of 95.00 with 4.90 of postage is 99.90, 25.00 of it deposit.
let world: Awaited<ReturnType<typeof moneyWorld>>
beforeEach(async () => {
  world = await moneyWorld()
})
afterAll(closeSandboxPool)

type Mine = { actor: Actor; order: Order }
const owner = () => actorOf(world.owner)
const withdraw = ({ actor, order }: Mine, now = NOW) => withdrawOrder({ actor, orderId: order.id, now })

async function locked(): Promise<Mine> {
  const mine = await reserved(world.run)
  await world.run.update({ state: 'locked', lockedAt: NOW })
  return mine
}

async function paid(): Promise<Mine> {
  const mine = await locked()
  await askBalances({ actor: await owner(), workshopId: world.workshop.id, runId: world.run.id, now: NOW })
  await runJobs()
  const link = await payOrder({ actor: mine.actor, orderId: mine.order.id, now: NOW })
  if (!link.ok) throw new Error(link.reason)
  await pay(link.value.payUrl)
  await settleAll()
  await mine.order.reload()
  return mine
}

const paidBack = (order: Order) =>
  Refund.sum('amountMinor', { where: { orderId: order.id, state: 'succeeded' } })
const acknowledged = async (order: Order) =>
  (await MailOutbox.findOne({ where: { kind: 'withdrawal_acknowledged', subjectId: order.id } }))?.props

describe('after the lock', () => {
  test('an order under deposit is cancelled and paid back, with day and time by mail', async () => {
    const mine = await locked()
    expect(await withdraw(mine)).toEqual({ ok: true, value: { state: 'cancelled', refundMinor: 2500 } })
    await settleAll()
    expect(await mine.order.reload()).toMatchObject({ state: 'cancelled', cancelCause: 'withdrawal' })
    expect(await paidBack(mine.order)).toBe(2500)
    // 14 days after 1 March 2027.
    expect(await acknowledged(mine.order)).toMatchObject({
      receivedAt: NOW.toISOString(),
      refundMinor: 2500,
      refundBy: '2027-03-15',
      returnTo: null,
    })
    expect((await world.run.reload()).committedUnits).toBe(0)
    expect(await withdraw(mine)).toMatchObject({ ok: true, value: { state: 'cancelled' } })
    expect(await Refund.count({ where: { orderId: mine.order.id } })).toBe(1)
    expect((await compareBooks()).wrong).toEqual([])
  })

  test('a packed one is unpacked first; deposit, balance and postage go back', async () => {
    const mine = await paid()
    await pack(world, mine.order)
    expect((await mine.order.reload()).state).toBe('packed')
    expect(await withdraw(mine)).toMatchObject({ ok: true, value: { state: 'cancelled', refundMinor: 9990 } })
    await settleAll()
    expect(await paidBack(mine.order)).toBe(9990)
    expect((await compareBooks()).wrong).toEqual([])
  })

  test('a posted one comes back first, then price and standard postage go back, once', async () => {
    const mine = await paid()
    await pack(world, mine.order)
    await handOver(world, mine.order)
    expect(await withdraw(mine)).toMatchObject({ ok: true, value: { state: 'withdrawn', refundMinor: 9990 } })
    expect(await acknowledged(mine.order)).toMatchObject({ returnBy: '2027-03-15' })
    expect(await Refund.count({ where: { orderId: mine.order.id } })).toBe(0)
    const back = { workshopId: world.workshop.id, orderId: mine.order.id, now: NOW }
    expect(await receiveReturn({ ...back, actor: mine.actor })).toMatchObject({ reason: 'not_found' })
    expect(await receiveReturn({ ...back, actor: await owner() })).toMatchObject({
      value: { state: 'returned', refundMinor: 9990 },
    })
    expect(await receiveReturn({ ...back, actor: await owner() })).toMatchObject({
      value: { refundMinor: 0 },
    })
    await settleAll()
    expect(await paidBack(mine.order)).toBe(9990)
    const notes = await Invoice.findAll({ where: { orderId: mine.order.id, kind: 'credit_note' } })
    const final = await Invoice.findOne({
      where: { orderId: mine.order.id, kind: 'final' },
      rejectOnEmpty: true,
    })
    expect(notes.every(({ correctsInvoiceId }) => correctsInvoiceId === final.id)).toBe(true)
    expect(notes.reduce((sum, { grossMinor }) => sum + grossMinor, 0)).toBe(9990)
    expect(notes.reduce((sum, { taxMinor }) => sum + taxMinor, 0)).toBe(1595)
    expect((await compareBooks()).wrong).toEqual([])
  })

  test('fourteen days after it arrived it is over, not before', async () => {
    const mine = await paid()
    await pack(world, mine.order)
    await handOver(world, mine.order)
    // Delivered on Monday 1 March; the last day is Monday 15 March.
    await mine.order.update({ deliveredAt: NOW })
    expect(await withdraw(mine, hoursAfter(NOW, 24 * 15))).toMatchObject({ reason: 'withdrawal_over' })
    expect(await withdraw(mine, hoursAfter(NOW, 24 * 14))).toMatchObject({ ok: true })
  })

  test('where no law gives the right it ends with packing', async () => {
    const mine = await paid()
    await mine.order.update({ country: 'US' })
    await pack(world, mine.order)
    expect(await withdraw(mine)).toMatchObject({ reason: 'packed_already' })
  })

  test('before the lock, and for anybody else, it is refused', async () => {
    const mine = await reserved(world.run)
    expect(await withdraw(mine)).toMatchObject({ reason: 'run_not_locked' })
    const stranger = await makeBuyer()
    expect(await withdraw({ ...stranger, order: mine.order })).toMatchObject({ reason: 'not_found' })
  })
})

test('the owner cancels one order with a reason its buyer reads, and everything goes back', async () => {
  const mine = await paid()
  const cmd = {
    workshopId: world.workshop.id,
    orderId: mine.order.id,
    reason: 'Customs there sends these back.',
    now: NOW,
  }
  expect(await cancelForBuyer({ ...cmd, actor: mine.actor })).toMatchObject({ reason: 'not_found' })
  expect(await cancelForBuyer({ ...cmd, actor: await owner() })).toMatchObject({
    value: { refundMinor: 9990 },
  })
  await settleAll()
  expect(await paidBack(mine.order)).toBe(9990)
  const mail = await MailOutbox.findOne({
    where: { kind: 'order_cancelled', subjectId: mine.order.id },
    rejectOnEmpty: true,
  })
  expect(mail.props).toMatchObject({ cause: 'owner', reason: 'Customs there sends these back.' })
  expect(await OrderLine.count({ where: { orderId: mine.order.id } })).toBe(1)
})
