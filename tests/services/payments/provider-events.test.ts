import Stripe from 'stripe'
import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import { minor } from '@/lib/core/brand'
import { breakCalls } from '@/lib/gateways/payments/fake/break-calls'
import { deliverDueEvents } from '@/lib/gateways/payments/fake/deliver'
import { payments } from '@/lib/gateways/payments'
import { CheckoutParams } from '@/lib/services/_steps/attempt-params'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { applyProviderEvent } from '@/lib/services/payments/apply-provider-event'
import { settleAttempt } from '@/lib/services/payments/settle-attempt'
import { LedgerTransfer, MailOutbox, PaymentAttempt, ProviderEffect, ProviderEvent, Refund } from '@/models'
import { runJobs } from '@/tests/support/run-jobs'
import { NOW } from '@/tests/support/worlds/base'
import {
  attemptsOf,
  booksOf,
  moneyWorld,
  pay,
  placed,
  reserved,
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

/** The events of the provider as they would arrive, kept back. */
async function eventsOf(run: () => Promise<unknown>): Promise<string[]> {
  await run()
  const kept: string[] = []
  await deliverDueEvents({ isHurried: true, deliver: async (body) => (kept.push(body), 200) })
  return kept
}

const signed = (body: string, secret = 'whsec_of_the_tests') =>
  toOurDoor(body, Stripe.webhooks.generateTestHeaderString({ payload: body, secret }))

/** What follows from a deposit, counted: each must be there once. */
async function effectsOf(orderId: string) {
  return {
    transfers: await LedgerTransfer.count({ where: { orderId, kind: 'deposit_paid' } }),
    fees: await LedgerTransfer.count({ where: { orderId, kind: 'fee_charged' } }),
    mails: await MailOutbox.count({ where: { subjectId: orderId, kind: 'deposit_received' } }),
    refunds: await Refund.count({ where: { orderId } }),
  }
}
const ONCE = { transfers: 1, fees: 1, mails: 1, refunds: 0 }

describe('events of a deposit', () => {
  test('in order, backwards, and each twice have their effect once', async () => {
    for (const arrange of [
      (all: string[]) => all,
      (all: string[]) => [...all].reverse(),
      (all: string[]) => [...all, ...all, ...all],
    ]) {
      const { order, payUrl } = await placed(world.run)
      const events = arrange(await eventsOf(() => pay(payUrl)))
      expect(events.length).toBeGreaterThanOrEqual(2)
      for (const body of events) {
        expect(await signed(body)).toBe(200)
        await runJobs()
      }
      expect((await order.reload()).state).toBe('reserved')
      expect(await effectsOf(order.id)).toEqual(ONCE)
      await order.update({ state: 'cancelled', cancelledAt: NOW, cancelCause: 'owner' })
    }
  })

  test('all at once, each on its own connection, have their effect once', async () => {
    const { order, payUrl } = await placed(world.run)
    const events = await eventsOf(() => pay(payUrl))
    for (const body of events) await signed(body)
    const rows = await ProviderEvent.findAll({ where: { appliedAt: null } })
    const twice = [...rows, ...rows]
    const applied = await Promise.all(twice.map(({ id }) => applyProviderEvent({ eventId: id, now: NOW })))
    expect(applied.every(({ ok }) => ok)).toBe(true)
    expect((await order.reload()).state).toBe('reserved')
    expect(await effectsOf(order.id)).toEqual(ONCE)
    expect(await ProviderEffect.count({ where: { transition: 'captured', account: world.account } })).toBe(1)
  })

  test('all of them lost, the look-up finds out', async () => {
    const { order, payUrl } = await placed(world.run)
    await eventsOf(() => pay(payUrl))
    const [attempt] = await attemptsOf(order)
    expect(await settleAttempt({ attemptId: attempt!.id, now: NOW })).toMatchObject({
      value: { state: 'captured' },
    })
    expect(await effectsOf(order.id)).toEqual(ONCE)
  })

  test('wait while the provider cannot be asked', async () => {
    const { order, payUrl } = await placed(world.run)
    const [body] = await eventsOf(() => pay(payUrl))
    await signed(body!)
    const [row] = await ProviderEvent.findAll({ where: { appliedAt: null } })
    breakCalls(() => 'before')
    expect(await applyProviderEvent({ eventId: row!.id, now: NOW })).toMatchObject({
      reason: 'provider_unreachable',
    })
    expect((await order.reload()).state).toBe('awaiting_deposit')
    breakCalls(null)
    await applyProviderEvent({ eventId: row!.id, now: NOW })
    expect((await order.reload()).state).toBe('reserved')
  })
})

describe('a webhook that is not the provider’s', () => {
  test('tampered with, wrongly signed, unsigned or no event at all is answered 400 and stored by nobody', async () => {
    const { order, payUrl } = await placed(world.run)
    const [body] = await eventsOf(() => pay(payUrl))
    const good = Stripe.webhooks.generateTestHeaderString({ payload: body!, secret: 'whsec_of_the_tests' })
    const before = await ProviderEvent.count()
    expect(await toOurDoor(body!.replace('2500', '2501'), good)).toBe(400)
    expect(await signed(body!, 'whsec_of_somebody_else')).toBe(400)
    expect(await toOurDoor(body!, '')).toBe(400)
    expect(await signed('{"hello":1}')).toBe(400)
    expect(await signed('not json')).toBe(400)
    expect(await ProviderEvent.count()).toBe(before)
    await runJobs()
    expect((await order.reload()).state).toBe('awaiting_deposit')
  })

  test('an event about a payment of another account or of nobody changes nothing', async () => {
    const { order, payUrl } = await placed(world.run)
    const [body] = await eventsOf(() => pay(payUrl))
    const foreign = JSON.stringify({ ...JSON.parse(body!), id: 'evt_foreign', account: 'acct_of_another' })
    expect(await signed(foreign)).toBe(200)
    await runJobs()
    const row = await ProviderEvent.findOne({ where: { eventId: 'evt_foreign' } })
    expect(row).toMatchObject({ outcome: 'not_ours', appliedAt: expect.any(Date) })
    expect((await order.reload()).state).toBe('awaiting_deposit')
  })
})

describe('money that is not what was asked for', () => {
  test('another sum goes back whole, and the order keeps waiting', async () => {
    const { order, payUrl } = await placed(world.run)
    const [attempt] = await attemptsOf(order)
    await attempt!.update({ amountMinor: minor(2_600) })
    await pay(payUrl)
    await settleAll()
    expect((await order.reload()).state).toBe('awaiting_deposit')
    expect(await attempt!.reload()).toMatchObject({
      state: 'captured',
      amountMinor: 2_500,
      surplusAt: expect.any(Date),
    })
    expect(await Refund.findAll({ where: { orderId: order.id } })).toMatchObject([
      { cause: 'surplus', amountMinor: 2_500, state: 'succeeded' },
    ])
    expect(await booksOf(world.workshop.id)).toEqual({ provider_balance: -63, fees_lost_on_refunds: 63 })
  })

  test('another currency goes back whole, and the order keeps waiting', async () => {
    const { order, payUrl } = await placed(world.run)
    const [attempt] = await attemptsOf(order)
    await attempt!.update({ currency: 'USD' })
    await pay(payUrl)
    await settleAll()
    expect((await order.reload()).state).toBe('awaiting_deposit')
    expect(await attempt!.reload()).toMatchObject({
      state: 'captured',
      currency: 'EUR',
      surplusAt: expect.any(Date),
    })
    expect(await Refund.findAll({ where: { orderId: order.id } })).toMatchObject([
      { cause: 'surplus', amountMinor: 2_500, currency: 'EUR', state: 'succeeded' },
    ])
  })

  test('a second deposit for an order that has one goes back', async () => {
    const { order } = await reserved(world.run)
    const [first] = await attemptsOf(order)
    const second = await PaymentAttempt.create({
      ...first!.get(),
      id: undefined,
      sequence: 2,
      idempotencyKey: `deposit:${order.id}:2`,
      state: 'sent',
      endedAt: null,
      providerId: null,
      providerSessionId: null,
      chargeId: null,
      feeMinor: null,
    } as never)
    const { amount, ...params } = CheckoutParams.parse(first!.params)
    const session = await payments().createCheckout({
      ...params,
      attemptId: second.id,
      amount: minor(amount),
      key: second.idempotencyKey,
      expiresAt: new Date(params.expiresAt),
    })
    if (!session.ok) throw new Error(session.reason)
    await pay(session.value.url)
    await settleAll()
    expect(await second.reload()).toMatchObject({ state: 'captured', surplusAt: expect.any(Date) })
    expect(await Refund.findAll({ where: { orderId: order.id } })).toMatchObject([
      { attemptId: second.id, cause: 'surplus', amountMinor: 2_500 },
    ])
    expect((await order.reload()).state).toBe('reserved')
  })
})
