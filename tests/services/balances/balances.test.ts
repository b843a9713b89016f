import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { startBalanceCharges } from '@/lib/services/balances/start-balance-charges'
import { askBalances } from '@/lib/services/runs/ask-balances'
import { payOrder } from '@/lib/services/payments/pay-order'
import { due } from '@/lib/tasks/due'
import {
  BulkItem,
  BulkJob,
  DueItem,
  MailOutbox,
  type Order,
  Parcel,
  PaymentAttempt,
  Refund,
  TermsVersion,
} from '@/models'
import { setBusinessTime } from '@/tests/support/business-time'
import { runJobs } from '@/tests/support/run-jobs'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { booksOf, CARD, moneyWorld, orderInput, pay, reserved, settleAll } from '@/tests/support/worlds/money'
import { makeOrder } from '@/tests/support/worlds/order'
import { actorOf, makeUser } from '@/tests/support/worlds/person'

let world: Awaited<ReturnType<typeof moneyWorld>>
beforeEach(async () => {
  world = await moneyWorld()
})
afterAll(closeSandboxPool)

/** By hand: one kit at 95.00 and 4.90 of postage, less 25.00 of deposit. */
const BALANCE = 7490

const ask = async (over: Partial<Parameters<typeof askBalances>[0]> = {}) =>
  askBalances({
    actor: await actorOf(world.owner),
    workshopId: world.workshop.id,
    runId: world.run.id,
    now: NOW,
    ...over,
  })

const lockIt = () => world.run.update({ state: 'locked', lockedAt: NOW })

/** What falls due by then is done, as by the worker. */
async function passDays(days: number) {
  const now = hoursAfter(NOW, 24 * days)
  await setBusinessTime(hoursAfter(now, 0.05))
  await due({}, { jobId: '1', attempt: 1, maxAttempts: 1 })
  await settleAll()
}

const mailsOf = async (order: Order, kind: string) =>
  (await MailOutbox.findAll({ where: { kind, subjectId: order.id }, order: [['version', 'ASC']] })).map(
    ({ props }) => props as Record<string, unknown>,
  )

describe('balances that are announced', () => {
  test('tell each buyer sum, day and card a week before, once', async () => {
    const { order } = await reserved(world.run)
    await lockIt()
    const asked = await ask()
    if (!asked.ok) throw new Error(JSON.stringify(asked))
    await runJobs()
    await order.reload()
    expect(order).toMatchObject({ state: 'balance_due', balanceMinor: BALANCE })
    const gap = (order.balanceChargeAt?.getTime() ?? 0) - (order.balanceAskedAt?.getTime() ?? 0)
    expect(gap).toBe(7 * 86_400_000)
    const [mail] = await mailsOf(order, 'balance_coming')
    expect(mail).toMatchObject({ amountMinor: BALANCE, chargeOn: '2027-03-08', cardEnding: '4242' })
    expect(
      await DueItem.count({ where: { subjectId: order.id, kind: 'balance_charge', doneAt: null } }),
    ).toBe(1)
    expect(await ask()).toEqual({ ok: false, reason: 'nothing_to_ask' })
    expect(await mailsOf(order, 'balance_coming')).toHaveLength(1)
  })

  test('with nothing left to pay make the order paid, ready to be packed', async () => {
    const made = await makeOrder({ run: world.run, lines: [{ offer: world.runOffers.kit, quantity: 1 }] })
    await made.order.update({ depositMinor: made.order.totalMinor, balanceMinor: 0 } as never)
    await lockIt()
    await ask()
    await runJobs()
    expect((await made.order.reload()).state).toBe('paid')
    expect(await Parcel.count({ where: { personId: made.person.id, state: 'open' } })).toBe(1)
  })

  test('pass over a disputed order, and say so', async () => {
    const { order } = await reserved(world.run)
    await order.update({ disputedAt: NOW })
    await lockIt()
    const asked = await ask()
    if (!asked.ok) throw new Error(JSON.stringify(asked))
    await runJobs()
    expect((await order.reload()).state).toBe('reserved')
    const items = await BulkItem.findAll({ where: { bulkJobId: asked.value.bulk } })
    expect(items.map(({ state, reason }) => [state, reason])).toEqual([['failed', 'disputed']])
  })

  test('are refused before the lock, with other words typed, and to anyone but the owner', async () => {
    await reserved(world.run)
    expect(await ask()).toEqual({ ok: false, reason: 'run_not_locked' })
    await lockIt()
    expect(await ask({ typed: 'charge' })).toMatchObject({ ok: false, reason: 'invalid' })
    const { person } = await makeUser({ workshopId: world.workshop.id, role: 'packer' })
    expect(await ask({ actor: await actorOf(person) })).toEqual({ ok: false, reason: 'forbidden' })
    expect(await ask({ typed: `charge ${world.module.slug}` })).toMatchObject({ ok: true })
  })
})

describe('seven days later', () => {
  test('every card of the run is charged by one bulk job, each once', async () => {
    const orders = [await reserved(world.run), await reserved(world.run), await reserved(world.run)]
    await lockIt()
    await ask()
    await runJobs()
    await passDays(6.9)
    expect((await orders[0]!.order.reload()).state).toBe('balance_due')
    await passDays(7)
    for (const { order } of orders) {
      expect((await order.reload()).state).toBe('paid')
      const taken = await PaymentAttempt.findAll({ where: { orderId: order.id, purpose: 'balance' } })
      expect(taken.map(({ state, amountMinor }) => [state, amountMinor])).toEqual([['captured', BALANCE]])
    }
    const jobs = await BulkJob.findAll({ where: { runId: world.run.id, kind: 'charge_balances' } })
    expect(jobs).toHaveLength(1)
    const items = await BulkItem.findAll({ where: { bulkJobId: jobs[0]?.id ?? '' } })
    expect(items.map(({ state }) => state)).toEqual(['done', 'done', 'done'])
    expect((await booksOf(world.workshop.id))['customer_deposits']).toBe(-3 * (2500 + BALANCE))
    // The day does not come twice.
    for (const { order } of orders)
      expect(await startBalanceCharges({ orderId: order.id, now: hoursAfter(NOW, 200) })).toEqual({
        ok: true,
        value: { orders: 0 },
      })
  })

  test('a disputed order waits, day by day, and is charged when the bank has decided', async () => {
    const { order } = await reserved(world.run)
    await lockIt()
    await ask()
    await runJobs()
    await order.reload()
    await order.update({ disputedAt: NOW })
    await passDays(7)
    expect((await order.reload()).state).toBe('balance_due')
    await order.update({ disputedAt: null })
    await passDays(8.1)
    expect((await order.reload()).state).toBe('paid')
  })
})

describe('a balance whose card was refused', () => {
  const failedOrder = async () => {
    const { order, person } = await reserved(world.run, {}, CARD.refusedLater)
    await lockIt()
    await ask()
    await runJobs()
    await passDays(7)
    await order.reload()
    expect(order.state).toBe('balance_due')
    expect(order.balanceFailedAt).not.toBeNull()
    return { order, person }
  }

  test('is reminded of on days 3, 7 and 12, and lapses on day 14: the place goes on, the deposit goes back', async () => {
    const { order } = await failedOrder()
    const nths = async () => (await mailsOf(order, 'balance_reminder')).map(({ nth }) => nth)
    await passDays(7 + 2.9)
    expect(await nths()).toEqual([])
    await passDays(7 + 3.05)
    expect(await nths()).toEqual([1])
    await passDays(7 + 7.05)
    await passDays(7 + 12.05)
    expect(await nths()).toEqual([1, 2, 3])
    // The charge failed on 8 March; fourteen days later is 22 March.
    expect((await mailsOf(order, 'balance_reminder')).map(({ lapseOn }) => lapseOn)).toEqual(
      Array(3).fill('2027-03-22'),
    )
    await passDays(7 + 13.9)
    expect((await order.reload()).state).toBe('balance_due')
    await passDays(7 + 14.05)
    expect((await order.reload()).state).toBe('lapsed')
    expect((await world.run.reload()).committedUnits).toBe(0)
    const refunds = await Refund.findAll({ where: { orderId: order.id } })
    expect(refunds.map(({ cause, amountMinor, state }) => [cause, amountMinor, state])).toEqual([
      ['lapsed', 2500, 'succeeded'],
    ])
    expect(await mailsOf(order, 'order_lapsed')).toMatchObject([
      { depositThen: 'returned', depositMinor: 2500 },
    ])
    expect(await DueItem.count({ where: { subjectId: order.id, doneAt: null } })).toBe(0)
  })

  test('never lapses while its mails bounce; it is looked at again each day', async () => {
    const { order, person } = await failedOrder()
    await person.update({ mailBouncedAt: NOW })
    await passDays(7 + 14.05)
    await passDays(7 + 16.05)
    expect((await order.reload()).state).toBe('balance_due')
    await person.update({ mailBouncedAt: null })
    await passDays(7 + 17.1)
    expect((await order.reload()).state).toBe('lapsed')
  })

  test('paid by the buyer meanwhile, it neither reminds nor lapses', async () => {
    const { order, person } = await failedOrder()
    const link = await payOrder({
      actor: await actorOf(person),
      orderId: order.id,
      now: hoursAfter(NOW, 24 * 7 + 1),
    })
    if (!link.ok) throw new Error(link.reason)
    await pay(link.value.payUrl)
    await settleAll()
    expect((await order.reload()).state).toBe('paid')
    await passDays(7 + 14.05)
    expect((await order.reload()).state).toBe('paid')
    expect(await mailsOf(order, 'balance_reminder')).toEqual([])
  })
})

describe('a deposit kept by the terms', () => {
  const lapsedOf = async (country: string) => {
    await TermsVersion.create({
      workshopId: world.workshop.id,
      number: 7,
      body: 'A lapsed deposit is kept where the law allows it.',
      lapseKeepsDeposit: true,
      publishedAt: NOW,
      publishedByPersonId: world.owner.id,
    }).then(({ id }) => world.run.update({ termsVersionId: id }))
    const address = {
      US: {
        country: 'US',
        name: 'R. Vane',
        lines: ['12 Mill Road'],
        city: 'Albany',
        region: 'NY',
        postcode: '12203',
      },
      DE: orderInput(world.run).address,
    }[country]
    const { order } = await reserved(world.run, { address: address as never }, CARD.refusedLater)
    await lockIt()
    await ask()
    await runJobs()
    await passDays(7)
    await passDays(7 + 14.05)
    return order.reload()
  }

  test('is booked as kept where no right to withdraw gives it back', async () => {
    const order = await lapsedOf('US')
    expect(order.state).toBe('lapsed')
    expect(await Refund.count({ where: { orderId: order.id } })).toBe(0)
    const books = await booksOf(world.workshop.id)
    expect(books).toMatchObject({ kept_deposits: -2500 })
    expect(books['customer_deposits']).toBeUndefined()
    expect(await mailsOf(order, 'order_lapsed')).toMatchObject([{ depositThen: 'kept' }])
  })

  test('goes back all the same where the law says so', async () => {
    const order = await lapsedOf('DE')
    expect(await Refund.count({ where: { orderId: order.id, cause: 'lapsed' } })).toBe(1)
  })
})
