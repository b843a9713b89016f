import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import { breakCalls } from '@/lib/gateways/payments/fake/break-calls'
import { disputePayment } from '@/lib/gateways/payments/fake/controls'
import { passTime } from '@/lib/gateways/payments/fake/pass-time'
import { plantChange, plantLoss, plantTwin } from '@/lib/gateways/payments/fake/plant'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { getMoneyDesk } from '@/lib/queries/money/get-money-desk'
import { listLedgerMonth } from '@/lib/queries/money/list-ledger-month'
import { getStatement } from '@/lib/queries/money/get-statement'
import { cancelOrder } from '@/lib/services/orders/cancel-order'
import { compareBooks } from '@/lib/services/money/compare-books'
import { resolveStuck } from '@/lib/services/money/resolve-stuck'
import { Dispute, DueItem, ProviderEvent, Reconciliation, Refund } from '@/models'
import { minutesLater, setBusinessTime } from '@/tests/support/business-time'
import { runJobs } from '@/tests/support/run-jobs'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { attemptsOf, CARD, makeBuyer, moneyWorld, reserved, settleAll } from '@/tests/support/worlds/money'
import { actorOf } from '@/tests/support/worlds/person'

let world: Awaited<ReturnType<typeof moneyWorld>>
beforeEach(async () => {
  breakCalls(null)
  world = await moneyWorld({ maximum: 20 })
})
afterAll(closeSandboxPool)

/** Two hours on, so that nothing counts as still under way. */
const LATER = hoursAfter(NOW, 2)
const compare = async (now = LATER) => {
  await setBusinessTime(now)
  const done = await compareBooks({ workshopId: world.workshop.id, now })
  if (!done.ok) throw new Error(done.reason)
  return done.value
}
const desk = async (now = LATER) =>
  getMoneyDesk({ actor: await actorOf(world.owner), workshopId: world.workshop.id, now })

describe('books that agree', () => {
  test('after payments, a change of mind and a dispute show zero, kept for the day, and come again tomorrow', async () => {
    const one = await reserved(world.run)
    const two = await reserved(world.run)
    await cancelOrder({ actor: one.actor, orderId: one.order.id, now: NOW })
    await settleAll()
    const [paid] = await attemptsOf(two.order)
    await disputePayment(paid!.providerId!)
    await settleAll()
    const { items, differences } = await compare()
    expect(differences).toEqual([])
    // Two charges, one refund, the fees of each payment (the dispute stands with the second's).
    expect(items).toBe(5)
    expect(await Reconciliation.count({ where: { workshopId: world.workshop.id, day: '2027-03-01' } })).toBe(
      1,
    )
    const due = await DueItem.findOne({ where: { kind: 'compare_books' }, rejectOnEmpty: true })
    expect(due.dueAt).toEqual(hoursAfter(LATER, 24))
    expect((await desk())?.compared?.differences).toEqual([])
  })

  test('what happened in the last hour may still be on its way and is no difference', async () => {
    const { order } = await reserved(world.run)
    const [paid] = await attemptsOf(order)
    await plantTwin(paid!.chargeId!, 'charge', 1)
    expect(
      (await compare(minutesLater(NOW, 30))).differences.filter(({ kind }) => kind === 'missing_here'),
    ).toEqual([])
  })
})

describe('planted differences are found, each named with its order', () => {
  test('another amount', async () => {
    const { order } = await reserved(world.run)
    const [paid] = await attemptsOf(order)
    await plantChange(paid!.chargeId!, { amount: 2400, amount_captured: 2400 })
    expect((await compare()).differences).toEqual([
      {
        kind: 'amount',
        isFee: false,
        id: paid!.providerId,
        ours: { amount: 2500, currency: 'EUR' },
        theirs: { amount: 2400, currency: 'EUR' },
      },
    ])
    expect((await desk())?.compared?.differences).toMatchObject([{ orderNumber: order.number }])
  })

  test('a charge the provider does not list', async () => {
    const { order } = await reserved(world.run)
    const [paid] = await attemptsOf(order)
    await plantLoss(paid!.chargeId!)
    expect((await compare()).differences).toEqual([
      // The fee of a charge that is not listed belongs to nothing any more.
      {
        kind: 'missing_there',
        isFee: false,
        id: paid!.providerId,
        ours: { amount: 2500, currency: 'EUR' },
        theirs: null,
      },
      {
        kind: 'missing_there',
        isFee: true,
        id: paid!.providerId,
        ours: { amount: -63, currency: 'EUR' },
        theirs: null,
      },
      {
        kind: 'missing_here',
        isFee: true,
        id: 'the account',
        ours: null,
        theirs: { amount: -63, currency: 'EUR' },
      },
    ])
  })

  test('a charge our books do not have', async () => {
    const { order } = await reserved(world.run)
    const [paid] = await attemptsOf(order)
    const twin = await plantTwin(paid!.chargeId!, 'charge', 7)
    await plantChange(twin, { payment_intent: 'pi_nobody' })
    expect((await compare()).differences).toEqual([
      {
        kind: 'missing_here',
        isFee: false,
        id: 'pi_nobody',
        ours: null,
        theirs: { amount: 2500, currency: 'EUR' },
      },
    ])
  })

  test('another currency', async () => {
    const { order } = await reserved(world.run)
    const [paid] = await attemptsOf(order)
    await plantChange(paid!.chargeId!, { currency: 'usd' })
    expect((await compare()).differences).toMatchObject([
      { kind: 'currency', ours: { currency: 'EUR' }, theirs: { currency: 'USD' } },
    ])
  })
})

test('a dispute whose events were all lost is written down by the comparison', async () => {
  const { order } = await reserved(world.run)
  const [paid] = await attemptsOf(order)
  await disputePayment(paid!.providerId!)
  expect(await Dispute.count({ where: { orderId: order.id } })).toBe(0)
  expect((await compare()).differences).toEqual([])
  expect(await Dispute.count({ where: { orderId: order.id, state: 'open' } })).toBe(1)
  expect((await order.reload()).disputedAt).not.toBeNull()
})

test('the text of an event is cut after 90 days, not before, and never while it waits', async () => {
  await reserved(world.run)
  await compare(hoursAfter(NOW, 24 * 89))
  expect(await ProviderEvent.count({ where: { account: world.account, payload: null } })).toBe(0)
  const [first] = await ProviderEvent.findAll({ where: { account: world.account }, limit: 1 })
  await first!.update({ appliedAt: null })
  await compare(hoursAfter(NOW, 24 * 91))
  const kept = (await ProviderEvent.findAll({ where: { account: world.account } })).filter(
    ({ payload }) => payload !== null,
  )
  expect(kept.map(({ id }) => id)).toEqual([first!.id])
})

describe('what is stuck', () => {
  test('a refund that failed is shown, asked for anew once, and gone when it went through', async () => {
    const mine = await reserved(world.run, {}, CARD.refundFails)
    await cancelOrder({ actor: mine.actor, orderId: mine.order.id, now: NOW })
    await settleAll()
    await setBusinessTime(hoursAfter(NOW, 25))
    await passTime()
    await settleAll()
    const failed = await Refund.findOne({ where: { orderId: mine.order.id, state: 'failed' } })
    if (!failed) throw new Error('the refund did not fail')
    expect((await desk())?.stuck).toMatchObject([{ kind: 'refund', id: failed.id, state: 'failed' }])
    const cmd = {
      workshopId: world.workshop.id,
      input: { kind: 'refund' as const, id: failed.id },
      now: LATER,
    }
    expect(await resolveStuck({ ...cmd, actor: mine.actor })).toMatchObject({ reason: 'not_found' })
    expect(await resolveStuck({ ...cmd, actor: await actorOf(world.owner) })).toMatchObject({ ok: true })
    expect(await resolveStuck({ ...cmd, actor: await actorOf(world.owner) })).toMatchObject({
      reason: 'not_allowed',
    })
    expect(await Refund.count({ where: { orderId: mine.order.id } })).toBe(2)
  })

  test('an event that was not applied is applied again', async () => {
    await reserved(world.run)
    const event = await ProviderEvent.findOne({
      where: { account: world.account, type: 'payment_intent.succeeded' },
      rejectOnEmpty: true,
    })
    await event.update({ appliedAt: null })
    expect((await desk())?.stuck).toMatchObject([{ kind: 'event', id: event.id }])
    await resolveStuck({
      actor: await actorOf(world.owner),
      workshopId: world.workshop.id,
      input: { kind: 'event', id: event.id },
      now: LATER,
    })
    await runJobs()
    expect((await desk())?.stuck).toEqual([])
  })

  test('nobody but the owner sees it, and a stranger’s row is not found', async () => {
    const { actor } = await makeBuyer()
    expect(await getMoneyDesk({ actor, workshopId: world.workshop.id, now: LATER })).toBeNull()
    const other = await moneyWorld()
    const { order } = await reserved(other.run)
    const [attempt] = await attemptsOf(order)
    const input = { kind: 'attempt' as const, id: attempt!.id }
    expect(
      await resolveStuck({
        actor: await actorOf(world.owner),
        workshopId: world.workshop.id,
        input,
        now: LATER,
      }),
    ).toMatchObject({ reason: 'not_found' })
  })
})

test('the statement of an order and the month’s export add up to nothing, line by line', async () => {
  const { order } = await reserved(world.run)
  await reserved(world.run)
  const actor = await actorOf(world.owner)
  const workshopId = world.workshop.id
  const statement = await getStatement({ actor, workshopId, orderId: order.id })
  expect(statement?.lines.map(({ kind }) => kind)).toContain('deposit_paid')
  expect(statement?.lines.every(({ orderNumber }) => orderNumber === order.number)).toBe(true)
  for (const { entries } of statement?.lines ?? [])
    expect(entries.reduce((sum, { amountMinor }) => sum + amountMinor, 0)).toBe(0)
  const lines = await listLedgerMonth({ actor, workshopId, month: '2027-03' })
  expect(lines?.reduce((sum, { amountMinor }) => sum + amountMinor, 0)).toBe(0)
  // Each deposit: two entries; each fee: two.
  expect(lines).toHaveLength(8)
  expect(await listLedgerMonth({ actor, workshopId, month: '2027-02' })).toEqual([])
})
