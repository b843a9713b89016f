import { afterAll, beforeEach, expect, test } from 'vitest'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { reinstateOrder } from '@/lib/services/balances/reinstate-order'
import { withdrawOrder } from '@/lib/services/orders/withdraw-order'
import { payOrder } from '@/lib/services/payments/pay-order'
import { askBalances } from '@/lib/services/runs/ask-balances'
import { placeOrder } from '@/lib/services/orders/place-order'
import { due } from '@/lib/tasks/due'
import { DueItem, MailOutbox, Order, TermsVersion } from '@/models'
import { setBusinessTime } from '@/tests/support/business-time'
import { runJobs } from '@/tests/support/run-jobs'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import {
  booksOf,
  CARD,
  makeBuyer,
  moneyWorld,
  orderInput,
  pay,
  reserved,
  settleAll,
} from '@/tests/support/worlds/money'
import { actorOf } from '@/tests/support/worlds/person'

let world: Awaited<ReturnType<typeof moneyWorld>>
beforeEach(async () => {
  world = await moneyWorld({ maximum: 3 })
})
afterAll(closeSandboxPool)

async function lockAndAsk() {
  await world.run.update({ state: 'locked', lockedAt: NOW })
  await askBalances({
    actor: await actorOf(world.owner),
    workshopId: world.workshop.id,
    runId: world.run.id,
    now: NOW,
  })
  await runJobs()
}

test('whoever gets a freed place after balances were asked for is asked too, a week ahead', async () => {
  const first = await reserved(world.run)
  await reserved(world.run, { lines: [{ offer: 'kit', quantity: 2 }] })
  const late = await makeBuyer()
  const queued = await placeOrder({ actor: late.actor, input: orderInput(world.run), now: NOW })
  if (!queued.ok) throw new Error(queued.reason)
  expect(queued.value.state).toBe('waiting')
  await lockAndAsk()
  expect(await withdrawOrder({ actor: first.actor, orderId: first.order.id, now: NOW })).toMatchObject({
    ok: true,
  })
  await settleAll()
  const order = await Order.findByPk(queued.value.order, { rejectOnEmpty: true })
  expect(order.state).toBe('awaiting_deposit')
  const link = await payOrder({ actor: late.actor, orderId: order.id, now: NOW })
  if (!link.ok) throw new Error(link.reason)
  await pay(link.value.payUrl)
  await settleAll()
  await order.reload()
  expect(order).toMatchObject({ state: 'balance_due', depositMinor: 2500 })
  expect((order.balanceChargeAt?.getTime() ?? 0) - (order.balanceAskedAt?.getTime() ?? 0)).toBe(
    7 * 86_400_000,
  )
  expect(await DueItem.count({ where: { kind: 'balance_charge', subjectId: order.id, doneAt: null } })).toBe(
    1,
  )
})

/** An order in the United States, where terms may keep the deposit, lapsed over a card that fails. */
async function lapsedWithKeptDeposit() {
  const { id } = await TermsVersion.create({
    workshopId: world.workshop.id,
    number: 7,
    body: 'A lapsed deposit is kept where the law allows it.',
    lapseKeepsDeposit: true,
    publishedAt: NOW,
    publishedByPersonId: world.owner.id,
  })
  await world.run.update({ termsVersionId: id })
  const address = {
    country: 'US',
    name: 'Sam Hale',
    lines: ['12 Mill Rd'],
    city: 'Salem',
    region: 'OR',
    postcode: '97301',
  }
  const mine = await reserved(world.run, { address }, CARD.refusedLater)
  await lockAndAsk()
  for (const day of [7, 21.05]) {
    await setBusinessTime(hoursAfter(NOW, 24 * day + 1))
    await due({}, { jobId: '1', attempt: 1, maxAttempts: 1 })
    await settleAll()
  }
  await mine.order.reload()
  return mine
}

test('a lapsed order whose deposit was kept is taken up again: the deposit counts, the balance is announced anew', async () => {
  const { order } = await lapsedWithKeptDeposit()
  expect(order.state).toBe('lapsed')
  expect(await booksOf(world.workshop.id)).toMatchObject({ kept_deposits: -2500 })
  const later = hoursAfter(NOW, 24 * 23)
  const cmd = {
    actor: await actorOf(world.owner),
    workshopId: world.workshop.id,
    orderId: order.id,
    now: later,
  }
  expect(await reinstateOrder(cmd)).toEqual({ ok: true, value: { state: 'balance_due' } })
  const books = await booksOf(world.workshop.id)
  expect(books.kept_deposits).toBeUndefined()
  expect(books.customer_deposits).toBe(-2500)
  expect((await world.run.reload()).committedUnits).toBe(1)
  expect(await MailOutbox.count({ where: { kind: 'balance_coming', subjectId: order.id } })).toBe(2)
  expect(await reinstateOrder(cmd)).toMatchObject({ reason: 'not_allowed' })
})

test('it is not taken up again by its buyer, nor once its place has gone', async () => {
  const { order, actor } = await lapsedWithKeptDeposit()
  const cmd = { workshopId: world.workshop.id, orderId: order.id, now: hoursAfter(NOW, 24 * 23) }
  expect(await reinstateOrder({ ...cmd, actor })).toMatchObject({ reason: 'not_found' })
  await world.run.update({ committedUnits: 3 })
  expect(await reinstateOrder({ ...cmd, actor: await actorOf(world.owner) })).toMatchObject({
    reason: 'no_place',
  })
})
