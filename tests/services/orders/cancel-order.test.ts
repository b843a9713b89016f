import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import { breakCalls } from '@/lib/gateways/payments/fake/break-calls'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { cancelOrder } from '@/lib/services/orders/cancel-order'
import { MailOutbox, Refund, Run } from '@/models'
import { runJobs } from '@/tests/support/run-jobs'
import { NOW } from '@/tests/support/worlds/base'
import {
  attemptsOf,
  booksOf,
  makeBuyer,
  moneyWorld,
  pay,
  placed,
  reserved,
  settleAll,
} from '@/tests/support/worlds/money'

let world: Awaited<ReturnType<typeof moneyWorld>>
beforeEach(async () => {
  breakCalls(null)
  world = await moneyWorld()
})
afterAll(closeSandboxPool)

describe('before the lock', () => {
  test('everything comes back, once, however often it is asked for', async () => {
    const { run, workshop } = world
    const { order, actor } = await reserved(run)
    const first = await cancelOrder({ actor, orderId: order.id, now: NOW })
    expect(first).toEqual({ ok: true, value: { state: 'cancelled', refundMinor: 2_500 } })
    expect(await cancelOrder({ actor, orderId: order.id, now: NOW })).toEqual(first)
    await settleAll()
    expect(await cancelOrder({ actor, orderId: order.id, now: NOW })).toEqual(first)
    const refunds = await Refund.findAll({ where: { orderId: order.id } })
    expect(refunds).toMatchObject([
      { state: 'succeeded', cause: 'cancelled', amountMinor: 2_500, sequence: 1 },
    ])
    expect((await run.reload()).committedUnits).toBe(0)
    expect(await booksOf(workshop.id)).toEqual({ provider_balance: -63, fees_lost_on_refunds: 63 })
    const mails = await MailOutbox.findAll({ order: [['queuedAt', 'ASC']] })
    const kinds = mails.filter(({ personId }) => personId === order.personId).map(({ kind }) => kind)
    expect(kinds.sort()).toEqual(['deposit_received', 'order_cancelled', 'refund_sent'])
  })

  test('two presses at once cancel once', async () => {
    const { order, actor } = await reserved(world.run)
    const answers = await Promise.all([1, 2].map(() => cancelOrder({ actor, orderId: order.id, now: NOW })))
    expect(answers).toMatchObject([{ value: { refundMinor: 2_500 } }, { value: { refundMinor: 2_500 } }])
    expect(await Refund.count({ where: { orderId: order.id } })).toBe(1)
    expect((await world.run.reload()).committedUnits).toBe(0)
  })

  test('an open card page is closed at the provider first', async () => {
    const { order, actor, payUrl } = await placed(world.run)
    expect(await cancelOrder({ actor, orderId: order.id, now: NOW })).toMatchObject({
      value: { state: 'cancelled', refundMinor: 0 },
    })
    expect(await pay(payUrl)).toMatchObject({ outcome: 'failed' })
    await settleAll()
    expect(await attemptsOf(order)).toMatchObject([{ state: 'abandoned' }])
    expect((await world.run.reload()).committedUnits).toBe(0)
  })

  test('a deposit that was faster is paid back like any other', async () => {
    const { order, actor, payUrl } = await placed(world.run)
    await pay(payUrl)
    expect(await cancelOrder({ actor, orderId: order.id, now: NOW })).toMatchObject({
      value: { state: 'cancelled', refundMinor: 2_500 },
    })
    await settleAll()
    expect(await Refund.findAll({ where: { orderId: order.id } })).toMatchObject([{ state: 'succeeded' }])
  })

  test('nothing happens while the provider has not said what became of a payment', async () => {
    const { order, actor } = await placed(world.run)
    breakCalls(() => 'before')
    expect(await cancelOrder({ actor, orderId: order.id, now: NOW })).toMatchObject({
      reason: 'payment_in_flight',
    })
    expect((await order.reload()).state).toBe('awaiting_deposit')
  })

  test('who waits leaves the list', async () => {
    await world.run.update({ maximum: 1, minimum: 1 })
    await placed(world.run)
    const { order, actor } = await placed(world.run)
    expect(await cancelOrder({ actor, orderId: order.id, now: NOW })).toMatchObject({
      value: { state: 'cancelled', refundMinor: 0 },
    })
    expect((await order.reload()).cancelCause).toBe('left_queue')
    await runJobs()
    expect((await world.run.reload()).committedUnits).toBe(1)
  })
})

describe('is refused', () => {
  test('once the run is locked', async () => {
    const { order, actor } = await reserved(world.run)
    await Run.update({ state: 'locked', lockedAt: NOW }, { where: { id: world.run.id } })
    expect(await cancelOrder({ actor, orderId: order.id, now: NOW })).toMatchObject({ reason: 'run_locked' })
    expect(await Refund.count({ where: { orderId: order.id } })).toBe(0)
  })

  test('to anyone but its person, who learns nothing of it', async () => {
    const { order } = await reserved(world.run)
    const { actor } = await makeBuyer()
    expect(await cancelOrder({ actor, orderId: order.id, now: NOW })).toMatchObject({ reason: 'not_found' })
    expect(await cancelOrder({ actor: { kind: 'visitor' }, orderId: order.id, now: NOW })).toMatchObject({
      reason: 'not_found',
    })
  })

  test('while the buyer’s bank disputes the payment', async () => {
    const { order, actor } = await reserved(world.run)
    await order.update({ disputedAt: NOW })
    expect(await cancelOrder({ actor, orderId: order.id, now: NOW })).toMatchObject({ reason: 'disputed' })
  })
})
