import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import type { CrashPoint } from '@/lib/db/crash-points'
import { breakCalls } from '@/lib/gateways/payments/fake/break-calls'
import { addFunds, disputePayment, setBankDebits } from '@/lib/gateways/payments/fake/controls'
import { payments } from '@/lib/gateways/payments'
import { deliverDueEvents } from '@/lib/gateways/payments/fake/deliver'
import { runJobs } from '@/tests/support/run-jobs'
import { passTime } from '@/lib/gateways/payments/fake/pass-time'
import { closeSandboxPool, sandboxPool } from '@/lib/gateways/payments/fake/pool'
import { cancelOrder } from '@/lib/services/orders/cancel-order'
import { lookUpRefund } from '@/lib/services/refunds/look-up-refund'
import { sendRefund } from '@/lib/services/refunds/send-refund'
import { DueItem, Dispute, LedgerTransfer, MailOutbox, Refund } from '@/models'
import { minutesLater, setBusinessTime } from '@/tests/support/business-time'
import { crashAt } from '@/tests/support/crash-at'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import {
  attemptsOf,
  booksOf,
  CARD,
  moneyWorld,
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

/** A cancelled order whose refund has been asked for and not sent. */
async function owed(card: string = CARD.pays) {
  const made = await reserved(world.run, {}, card)
  await cancelOrder({ actor: made.actor, orderId: made.order.id, now: NOW })
  const refund = await Refund.findOne({ where: { orderId: made.order.id }, rejectOnEmpty: true })
  return { ...made, refund }
}

async function refundsAtProvider(): Promise<number> {
  const { rows } = await (
    await sandboxPool()
  ).query(`select count(*)::int as count from sandbox.objects where kind = 'refund' and account = $1`, [
    world.account,
  ])
  return rows[0].count
}

const send = (refund: Refund, isRepeat = false, now = NOW) =>
  sendRefund({ refundId: refund.id, isRepeat, now })

async function expectPaidBackOnce(refund: Refund) {
  expect((await refund.reload()).state).toBe('succeeded')
  expect(await refundsAtProvider()).toBe(1)
  expect(await LedgerTransfer.count({ where: { source: 'refund', sourceId: refund.id } })).toBe(1)
  expect(await MailOutbox.count({ where: { kind: 'refund_sent', subjectId: refund.id } })).toBe(1)
}

describe('a refund', () => {
  test('sent twice, by two workers at once, and told by events too, goes out once', async () => {
    const { refund } = await owed()
    await Promise.all([send(refund), send(refund)])
    await send(refund, true)
    await settleAll()
    await expectPaidBackOnce(refund)
  })

  test.each<CrashPoint>([
    'refund_requested',
    'refund_provider_answered',
    'refund_before_commit',
    'refund_sent',
  ])('of a process killed at %s goes out once', async (point) => {
    const { refund } = await owed()
    await crashAt(point, () => send(refund))
    await send(refund, true)
    await settleAll()
    await expectPaidBackOnce(refund)
  })

  test('whose answer is lost is found', async () => {
    const { refund } = await owed()
    breakCalls(({ method, path }) => (method === 'post' && path.endsWith('/refunds') ? 'error_500' : null))
    await send(refund)
    breakCalls(null)
    await settleAll()
    await expectPaidBackOnce(refund)
  })

  test('that never arrived is unknown, then failed, and another takes its place', async () => {
    const { refund } = await owed()
    breakCalls(({ path }) => (path.includes('/refunds') ? 'before' : null))
    expect(await send(refund)).toEqual({ ok: true, value: { state: 'unknown' } })
    expect(await DueItem.findOne({ where: { kind: 'refund_look_up', subjectId: refund.id } })).toMatchObject({
      dueAt: minutesLater(NOW, 1),
    })
    breakCalls(null)
    await send(refund, true, minutesLater(NOW, 2))
    expect(await refund.reload()).toMatchObject({ state: 'failed', failureCode: 'never_arrived' })
    await settleAll()
    const again = await Refund.findOne({ where: { retryOfId: refund.id }, rejectOnEmpty: true })
    expect(again).toMatchObject({ state: 'succeeded', sequence: 2, amountMinor: 2_500 })
    expect(await refundsAtProvider()).toBe(1)
  })

  test('on its way is told when it arrives, also when the event is lost', async () => {
    const { refund } = await owed(CARD.refundLater)
    expect(await send(refund)).toEqual({ ok: true, value: { state: 'pending' } })
    expect(await MailOutbox.count({ where: { kind: 'refund_sent', subjectId: refund.id } })).toBe(0)
    const tomorrow = hoursAfter(NOW, 25)
    await setBusinessTime(tomorrow)
    await passTime()
    await lookUpRefund({ refundId: refund.id, now: tomorrow })
    await expectPaidBackOnce(refund)
  })

  test('that fails after it succeeded stays visible, and the books take it back', async () => {
    const { refund } = await owed(CARD.refundFails)
    await send(refund)
    await settleAll()
    expect((await refund.reload()).state).toBe('succeeded')
    await setBusinessTime(hoursAfter(NOW, 25))
    await passTime()
    await settleAll()
    expect(await refund.reload()).toMatchObject({ state: 'failed', succeededAt: expect.any(Date) })
    expect(await booksOf(world.workshop.id)).toEqual({
      provider_balance: 2_437,
      customer_deposits: -2_500,
      processing_fees: 63,
    })
  })

  test('the balance does not cover waits, names the shortfall, and resumes', async () => {
    const { refund } = await owed()
    await setBankDebits(world.account, false)
    expect(await send(refund)).toEqual({ ok: true, value: { state: 'pending' } })
    // 25.00 are owed and 24.37 lie there: the fee of 0.63 is gone.
    expect(await refund.reload()).toMatchObject({ shortByMinor: 63 })
    await addFunds(world.account, 63, 'EUR')
    await setBusinessTime(minutesLater(NOW, 2))
    await passTime()
    await settleAll()
    expect(await refund.reload()).toMatchObject({ state: 'succeeded', shortByMinor: null })
  })
})

describe('a disputed payment', () => {
  test('stops the refund while it is open; once it is won, the refund goes out', async () => {
    const { order, refund } = await owed()
    const [attempt] = await attemptsOf(order)
    const dispute = await disputePayment(attempt!.providerId!)
    await deliverDueEvents({ deliver: toOurDoor, isHurried: true })
    await runJobs(['apply_provider_event'])
    expect((await order.reload()).disputedAt).not.toBeNull()
    expect(await send(refund)).toEqual({ ok: true, value: { state: 'requested' } })
    expect(await refundsAtProvider()).toBe(0)
    const { account } = world
    const evidence = { notes: 'winning_evidence' }
    const key = `evidence-${dispute}`
    expect((await payments().sendEvidence({ account, key, dispute, evidence, submit: true })).ok).toBe(true)
    await settleAll()
    expect((await order.reload()).disputedAt).toBeNull()
    expect(await Dispute.findOne({ where: { orderId: order.id } })).toMatchObject({ state: 'won' })
    await expectPaidBackOnce(refund)
    expect(await booksOf(world.workshop.id)).toEqual({
      provider_balance: -63 - 2_000,
      fees_lost_on_refunds: 63,
      dispute_fees: 2_000,
    })
  })

  test('that was not cancelled cannot be packed or lapse, and keeps its place', async () => {
    const { order } = await reserved(world.run)
    const [attempt] = await attemptsOf(order)
    await disputePayment(attempt!.providerId!)
    await settleAll()
    expect(await order.reload()).toMatchObject({ state: 'reserved', disputedAt: expect.any(Date) })
    // 25.00 withheld and 20.00 of a fee, as the fake's README says.
    expect(await booksOf(world.workshop.id)).toEqual({
      provider_balance: 2_500 - 63 - 2_500 - 2_000,
      customer_deposits: -2_500,
      processing_fees: 63,
      disputed_funds: 2_500,
      dispute_fees: 2_000,
    })
    await setBusinessTime(hoursAfter(NOW, 11 * 24))
    await passTime()
    await settleAll()
    expect(await Dispute.findOne({ where: { orderId: order.id } })).toMatchObject({ state: 'lost' })
    expect(await booksOf(world.workshop.id)).toEqual({
      provider_balance: -2_063,
      processing_fees: 63,
      dispute_fees: 2_000,
    })
    expect((await order.reload()).disputedAt).not.toBeNull()
  })
})
