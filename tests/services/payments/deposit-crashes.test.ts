import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import type { CrashPoint } from '@/lib/db/crash-points'
import { breakCalls } from '@/lib/gateways/payments/fake/break-calls'
import { deliverDueEvents } from '@/lib/gateways/payments/fake/deliver'
import { closeSandboxPool, sandboxPool } from '@/lib/gateways/payments/fake/pool'
import { expireHold } from '@/lib/services/orders/expire-hold'
import { placeOrder } from '@/lib/services/orders/place-order'
import { applyProviderEvent } from '@/lib/services/payments/apply-provider-event'
import { readEvent } from '@/lib/gateways/payments/read-event'
import { receiveProviderEvent } from '@/lib/services/payments/receive-provider-event'
import { payOrder } from '@/lib/services/payments/pay-order'
import { settleAttempt } from '@/lib/services/payments/settle-attempt'
import { LedgerTransfer, MailOutbox, Order, PaymentAttempt, ProviderEvent } from '@/models'
import { minutesLater, setBusinessTime } from '@/tests/support/business-time'
import { crashAt } from '@/tests/support/crash-at'
import { runJobs } from '@/tests/support/run-jobs'
import { NOW } from '@/tests/support/worlds/base'
import {
  attemptsOf,
  makeBuyer,
  moneyWorld,
  orderInput,
  pay,
  placed,
  settleAll,
  toOurDoor,
} from '@/tests/support/worlds/money'

let world: Awaited<ReturnType<typeof moneyWorld>>
beforeEach(async () => {
  breakCalls(null)
  world = await moneyWorld()
  await settleAll()
})
afterAll(closeSandboxPool)

/** Charges of the world's account in the provider's own books. */
async function chargesAtProvider(): Promise<number> {
  const { rows } = await (
    await sandboxPool()
  ).query(`select count(*)::int as count from sandbox.objects where kind = 'charge' and account = $1`, [
    world.account,
  ])
  return rows[0].count
}

async function expectOneDeposit(order: Order) {
  expect((await order.reload()).state).toBe('reserved')
  expect(await chargesAtProvider()).toBe(1)
  expect((await attemptsOf(order)).filter(({ state }) => state === 'captured')).toHaveLength(1)
  expect(await LedgerTransfer.count({ where: { orderId: order.id, kind: 'deposit_paid' } })).toBe(1)
  expect(await MailOutbox.count({ where: { subjectId: order.id, kind: 'deposit_received' } })).toBe(1)
  expect((await world.run.reload()).committedUnits).toBe(1)
}

describe('killed while an order is placed', () => {
  test.each<CrashPoint>(['order_placed', 'attempt_requested', 'provider_answered', 'attempt_sent'])(
    'at %s: the order is there, the buyer presses pay, and pays once',
    async (point) => {
      const { actor } = await makeBuyer()
      await crashAt(point, () => placeOrder({ actor, input: orderInput(world.run), now: NOW }))
      const [order] = await Order.findAll({ where: { runId: world.run.id } })
      expect(order).toMatchObject({ state: 'awaiting_deposit' })
      expect((await world.run.reload()).committedUnits).toBe(1)
      const link = await payOrder({ actor, orderId: order!.id, now: NOW })
      if (!link.ok) throw new Error(link.reason)
      // However often it is asked for, it is one and the same session.
      expect(await payOrder({ actor, orderId: order!.id, now: NOW })).toEqual(link)
      await pay(link.value.payUrl)
      await settleAll()
      await expectOneDeposit(order!)
      expect(await attemptsOf(order!)).toHaveLength(1)
    },
  )

  test.each<CrashPoint>(['order_placed', 'attempt_requested', 'provider_answered', 'attempt_sent'])(
    'at %s and never heard of again: the place comes back when the hold ends',
    async (point) => {
      const { actor } = await makeBuyer()
      await crashAt(point, () => placeOrder({ actor, input: orderInput(world.run), now: NOW }))
      const [order] = await Order.findAll({ where: { runId: world.run.id } })
      const later = minutesLater(NOW, 40)
      await setBusinessTime(later)
      expect(await expireHold({ orderId: order!.id, now: later })).toMatchObject({
        value: { state: 'expired' },
      })
      expect((await world.run.reload()).committedUnits).toBe(0)
      expect(await attemptsOf(order!)).toMatchObject([{ state: 'abandoned' }])
    },
  )
})

describe('killed while an event is taken in', () => {
  async function paidOrder() {
    const { order, payUrl } = await placed(world.run)
    await pay(payUrl)
    return order
  }

  async function keptBack() {
    const kept: { body: string; signature: string }[] = []
    const deliver = async (body: string, signature: string) => (kept.push({ body, signature }), 200)
    await deliverDueEvents({ isHurried: true, deliver })
    return kept
  }

  test('at event_stored: its job is there already, and a second delivery changes nothing', async () => {
    const order = await paidOrder()
    const events = await keptBack()
    for (const { body, signature } of events) {
      const read = readEvent(body)
      if (!read.ok) throw new Error(read.reason)
      await crashAt('event_stored', () => receiveProviderEvent(read.value, NOW))
      // The provider had no answer and sends it again.
      expect(await toOurDoor(body, signature)).toBe(200)
    }
    const waiting = { account: world.account, appliedAt: null }
    expect(await ProviderEvent.count({ where: waiting })).toBe(events.length)
    await settleAll()
    await expectOneDeposit(order)
  })

  test.each<CrashPoint>(['event_before_apply', 'event_before_commit', 'event_applied'])(
    'at %s: run again it has its effect once',
    async (point) => {
      const order = await paidOrder()
      await deliverDueEvents({ isHurried: true, deliver: toOurDoor })
      const [event] = await ProviderEvent.findAll({
        where: { account: world.account, appliedAt: null, type: 'payment_intent.succeeded' },
      })
      await crashAt(point, () => applyProviderEvent({ eventId: event!.id, now: NOW }))
      if (point !== 'event_applied') expect((await order.reload()).state).toBe('awaiting_deposit')
      await applyProviderEvent({ eventId: event!.id, now: NOW })
      await settleAll()
      await expectOneDeposit(order)
    },
  )
})

test('killed between the session’s end and the release of its place: released the second time', async () => {
  const { order } = await placed(world.run)
  const later = minutesLater(NOW, 40)
  await setBusinessTime(later)
  await crashAt('hold_session_ended', () => expireHold({ orderId: order.id, now: later }))
  expect((await order.reload()).state).toBe('awaiting_deposit')
  await expireHold({ orderId: order.id, now: later })
  expect((await order.reload()).state).toBe('expired')
  expect((await world.run.reload()).committedUnits).toBe(0)
  await runJobs()
})

describe('an answer that is lost', () => {
  test('after the session was made: the look-up finds it at once', async () => {
    breakCalls(({ method, path }) =>
      method === 'post' && path.endsWith('/checkout/sessions') ? 'error_500' : null,
    )
    const { order, payUrl } = await placed(world.run)
    expect(payUrl).toMatch(/\/pay\/cs_/)
    expect(await attemptsOf(order)).toMatchObject([{ state: 'sent' }])
  })

  test('before it was made: unknown until a look-up a minute later says the provider never had it', async () => {
    breakCalls(({ method }) => (method === 'post' ? 'before' : null))
    const buyer = await makeBuyer()
    // The customer is known from an earlier visit, so that only the session is lost.
    breakCalls(null)
    const earlier = await placeOrder({ actor: buyer.actor, input: orderInput(world.run), now: NOW })
    expect(earlier.ok).toBe(true)
    breakCalls(({ method }) => (method === 'post' ? 'before' : null))
    const answer = await placeOrder({ actor: buyer.actor, input: orderInput(world.run), now: NOW })
    expect(answer).toMatchObject({ value: { state: 'awaiting_deposit', payUrl: null } })
    const orderId = answer.ok ? answer.value.order : ''
    const attempt = (await PaymentAttempt.findOne({ where: { orderId } }))!
    expect(attempt.state).toBe('unknown')
    breakCalls(null)
    await settleAttempt({ attemptId: attempt.id, now: minutesLater(NOW, 0.5) })
    expect((await attempt.reload()).state).toBe('unknown')
    await settleAttempt({ attemptId: attempt.id, now: minutesLater(NOW, 1.1) })
    expect((await attempt.reload()).state).toBe('abandoned')
    const link = await payOrder({ actor: buyer.actor, orderId, now: minutesLater(NOW, 2) })
    expect(link.ok).toBe(true)
    const attempts = await PaymentAttempt.findAll({ where: { orderId }, order: [['sequence', 'ASC']] })
    expect(attempts.map(({ sequence, state }) => `${sequence} ${state}`)).toEqual(['1 abandoned', '2 sent'])
  })
})
