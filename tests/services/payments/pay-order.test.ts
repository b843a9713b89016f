import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { breakCalls } from '@/lib/gateways/payments/fake/break-calls'
import { chargeBalance } from '@/lib/services/payments/charge-balance'
import { payOrder } from '@/lib/services/payments/pay-order'
import { DueItem, MailOutbox, type Order, Parcel, ParcelLine, ProviderCustomer, Run } from '@/models'
import { NOW, hoursAfter } from '@/tests/support/worlds/base'
import {
  attemptsOf,
  booksOf,
  CARD,
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
  await settleAll()
})
afterAll(closeSandboxPool)

/** The balance is asked for, as the run's own deed does it. */
async function asked(order: Order) {
  await Run.update({ state: 'locked', lockedAt: NOW }, { where: { id: order.runId } })
  await order.update({ state: 'balance_due', balanceAskedAt: NOW, balanceChargeAt: hoursAfter(NOW, 168) })
}
const charge = async (order: Order) => {
  const done = await chargeBalance({ orderId: order.id, now: NOW })
  return done.ok ? done.value.outcome : done.reason
}

async function expectPaid(order: Order) {
  expect((await order.reload()).state).toBe('paid')
  const parcels = await Parcel.findAll({
    where: { personId: order.personId },
    include: [{ model: ParcelLine, as: 'lines' }],
  })
  expect(parcels).toMatchObject([{ state: 'open' }])
  expect(await MailOutbox.count({ where: { kind: 'balance_paid', personId: order.personId } })).toBe(1)
  const dues = await DueItem.findAll({ where: { subjectId: order.id, doneAt: null } })
  expect(dues.filter(({ kind }) => kind !== 'attempt_look_up')).toEqual([])
}

describe('the balance on the saved card', () => {
  test('is charged once, with books, parcel and mail', async () => {
    const { order } = await reserved(world.run)
    await asked(order)
    expect(await charge(order)).toBe('captured')
    expect(await charge(order)).toBe('not_due')
    await settleAll()
    await expectPaid(order)
    // 74.90 at 1.5 % is 1.12 (rounded half-up), and 0.25: 1.37 beside the deposit's 0.63.
    expect(await booksOf(world.workshop.id)).toEqual({
      provider_balance: 9_990 - 63 - 137,
      customer_deposits: -9_990,
      processing_fees: 200,
    })
    expect(await attemptsOf(order)).toMatchObject([
      { purpose: 'deposit', state: 'captured' },
      { purpose: 'balance', state: 'captured', method: 'saved_card', amountMinor: 7_490 },
    ])
  })

  test('two workers at once charge once', async () => {
    const { order } = await reserved(world.run)
    await asked(order)
    await Promise.all([charge(order), charge(order)])
    await settleAll()
    await expectPaid(order)
    expect((await attemptsOf(order)).filter(({ purpose }) => purpose === 'balance')).toHaveLength(1)
  })

  test('an answer that is lost after the charge is found, not charged again', async () => {
    const { order } = await reserved(world.run)
    await asked(order)
    breakCalls(({ method, path }) =>
      method === 'post' && path.endsWith('/payment_intents') ? 'error_500' : null,
    )
    expect(await charge(order)).toBe('captured')
    breakCalls(null)
    await settleAll()
    await expectPaid(order)
  })

  test('a card that fails is told once, with reminder and lapse, and the balance is paid by link', async () => {
    const { order, actor } = await reserved(world.run, {}, CARD.refusedLater)
    await asked(order)
    expect(await charge(order)).toBe('failed')
    await settleAll()
    expect(await order.reload()).toMatchObject({ state: 'balance_due', balanceFailedAt: NOW })
    const mails = await MailOutbox.findAll({ where: { kind: 'card_needs_you', personId: order.personId } })
    // 14 days after 1 March.
    expect(mails.map(({ props }) => props)).toMatchObject([
      { why: 'declined', lapseOn: '2027-03-15', amountMinor: 7_490 },
    ])
    const dues = await DueItem.findAll({ where: { subjectId: order.id }, order: [['kind', 'ASC']] })
    expect(dues.map(({ kind, dueAt }) => [kind, dueAt])).toEqual([
      ['balance_reminder', hoursAfter(NOW, 72)],
      ['order_lapse', hoursAfter(NOW, 14 * 24)],
    ])
    const link = await payOrder({ actor, orderId: order.id, now: NOW })
    if (!link.ok) throw new Error(link.reason)
    await pay(link.value.payUrl)
    await settleAll()
    await expectPaid(order)
  })

  test('a bank that wants the buyer: the same payment is finished on its page', async () => {
    const { order, actor } = await reserved(world.run, {}, CARD.asksAlways)
    await asked(order)
    expect(await charge(order)).toBe('needs_customer')
    expect(await charge(order)).toBe('needs_customer')
    const link = await payOrder({ actor, orderId: order.id, now: NOW })
    if (!link.ok) throw new Error(link.reason)
    expect(link.value.payUrl).toMatch(/\/authenticate\//)
    await pay(link.value.payUrl)
    await settleAll()
    await expectPaid(order)
    expect((await attemptsOf(order)).map(({ sequence, purpose }) => `${purpose} ${sequence}`)).toEqual([
      'deposit 1',
      'balance 1',
    ])
  })

  test('a bank that wants the buyer: another card instead, and the first payment can never be captured', async () => {
    const { order, actor } = await reserved(world.run, {}, CARD.asksAlways)
    await asked(order)
    await charge(order)
    const bank = await payOrder({ actor, orderId: order.id, now: NOW })
    const other = await payOrder({ actor, orderId: order.id, otherCard: true, now: NOW })
    if (!bank.ok || !other.ok) throw new Error('refused')
    expect(other.value.payUrl).toMatch(/\/pay\//)
    expect(await pay(bank.value.payUrl)).toMatchObject({ outcome: 'failed' })
    await pay(other.value.payUrl)
    await settleAll()
    await expectPaid(order)
  })

  test('without a saved card the buyer is asked', async () => {
    const { order } = await reserved(world.run)
    await asked(order)
    await ProviderCustomer.update({ methodId: null }, { where: { personId: order.personId } })
    expect(await charge(order)).toBe('no_card')
    expect(await charge(order)).toBe('no_card')
    const mails = await MailOutbox.findAll({ where: { kind: 'card_needs_you', subjectId: order.id } })
    expect(mails.map(({ props }) => props)).toMatchObject([{ why: 'no_card' }])
  })

  test('not while disputed, suspended, or not due', async () => {
    const { order } = await reserved(world.run)
    expect(await charge(order)).toBe('not_due')
    await asked(order)
    await order.update({ disputedAt: NOW })
    expect(await charge(order)).toBe('disputed')
    await order.update({ disputedAt: null })
    await world.workshop.update({ state: 'suspended', suspendedAt: NOW })
    expect(await charge(order)).toBe('workshop_suspended')
    expect(await attemptsOf(order)).toHaveLength(1)
  })
})

describe('the link to pay', () => {
  test('is the same open session while it lasts, also for two presses at once', async () => {
    const { order, actor, payUrl } = await placed(world.run)
    const links = await Promise.all([1, 2].map(() => payOrder({ actor, orderId: order.id, now: NOW })))
    expect(links).toEqual([
      { ok: true, value: { payUrl } },
      { ok: true, value: { payUrl } },
    ])
    expect(await attemptsOf(order)).toHaveLength(1)
  })

  test('leads nowhere once it is paid, even before the event came', async () => {
    const { order, actor, payUrl } = await placed(world.run)
    await pay(payUrl)
    expect(await payOrder({ actor, orderId: order.id, now: NOW })).toMatchObject({ reason: 'nothing_to_pay' })
    expect((await order.reload()).state).toBe('reserved')
  })

  test('is nobody else’s', async () => {
    const { order } = await placed(world.run)
    const { actor } = await makeBuyer()
    expect(await payOrder({ actor, orderId: order.id, now: NOW })).toMatchObject({ reason: 'not_found' })
  })
})
