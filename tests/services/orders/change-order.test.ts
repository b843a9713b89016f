import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { cancelOrder } from '@/lib/services/orders/cancel-order'
import { changeOrder } from '@/lib/services/orders/change-order'
import { payOrder } from '@/lib/services/payments/pay-order'
import { MailOutbox, type Order, OrderChange, OrderLine, Refund } from '@/models'
import type { Actor } from '@/lib/core/policy/can'
import { NOW } from '@/tests/support/worlds/base'
import { compareBooks } from '@/tests/support/books'
import {
  attemptsOf,
  makeBuyer,
  moneyWorld,
  orderInput,
  pay,
  placed,
  reserved,
  settleAll,
} from '@/tests/support/worlds/money'
import { placeOrder } from '@/lib/services/orders/place-order'

// By hand: a kit costs 95.00 with 25.00 of deposit, a built one 165.00 with 40.00; postage is 4.90 up to a kilogram.
let world: Awaited<ReturnType<typeof moneyWorld>>
beforeEach(async () => {
  world = await moneyWorld({ maximum: 5 })
})
afterAll(closeSandboxPool)

type Mine = { actor: Actor; order: Order }
const change = ({ actor, order }: Mine, lines: { offer: 'kit' | 'built' | 'boards'; quantity: number }[]) =>
  changeOrder({ actor, orderId: order.id, input: { lines }, now: NOW })

async function payDifference({ actor, order }: Mine) {
  const link = await payOrder({ actor, orderId: order.id, now: NOW })
  if (!link.ok) throw new Error(link.reason)
  await pay(link.value.payUrl)
  await settleAll()
  await order.reload()
}

const linesOf = async (order: Order) =>
  (await OrderLine.findAll({ where: { orderId: order.id } })).map(({ offerKind, quantity }) => [
    offerKind,
    quantity,
  ])

describe('a change that costs more', () => {
  test('holds when its difference is paid, under a purpose of its own', async () => {
    const mine = await reserved(world.run)
    expect(await change(mine, [{ offer: 'built', quantity: 1 }])).toMatchObject({
      ok: true,
      value: { toPayMinor: 1500 },
    })
    expect(await linesOf(mine.order)).toEqual([['kit', 1]])
    await payDifference(mine)
    expect(await linesOf(mine.order)).toEqual([['built', 1]])
    expect(mine.order).toMatchObject({
      state: 'reserved',
      depositMinor: 4000,
      totalMinor: 16990,
      balanceMinor: 12990,
    })
    expect(
      (await attemptsOf(mine.order)).map(({ purpose, amountMinor, state }) => [purpose, amountMinor, state]),
    ).toEqual([
      ['deposit', 2500, 'captured'],
      ['change-1', 1500, 'captured'],
    ])
    expect(await MailOutbox.count({ where: { kind: 'deposit_received', subjectId: mine.order.id } })).toBe(2)
    expect((await compareBooks()).wrong).toEqual([])
  })

  test('a second change of the same order is change-2, and cancelling pays all three back', async () => {
    const mine = await reserved(world.run)
    await change(mine, [{ offer: 'built', quantity: 1 }])
    await payDifference(mine)
    await change(mine, [{ offer: 'built', quantity: 2 }])
    await payDifference(mine)
    expect((await world.run.reload()).committedUnits).toBe(2)
    expect(await cancelOrder({ actor: mine.actor, orderId: mine.order.id, now: NOW })).toMatchObject({
      value: { refundMinor: 8000 },
    })
    await settleAll()
    expect((await world.run.reload()).committedUnits).toBe(0)
    expect(await Refund.sum('amountMinor', { where: { orderId: mine.order.id, state: 'succeeded' } })).toBe(
      8000,
    )
    expect((await compareBooks()).wrong).toEqual([])
  })

  test('is replaced by the next one while unpaid; nobody pays the first', async () => {
    const mine = await reserved(world.run)
    await change(mine, [{ offer: 'built', quantity: 2 }])
    const first = await payOrder({ actor: mine.actor, orderId: mine.order.id, now: NOW })
    if (!first.ok) throw new Error(first.reason)
    await change(mine, [{ offer: 'built', quantity: 1 }])
    await expect(pay(first.value.payUrl)).resolves.not.toMatchObject({ outcome: 'captured' })
    await payDifference(mine)
    expect(await linesOf(mine.order)).toEqual([['built', 1]])
    const changes = await OrderChange.findAll({
      where: { orderId: mine.order.id },
      order: [['number', 'ASC']],
    })
    expect(changes.map(({ appliedAt, droppedAt }) => [appliedAt !== null, droppedAt !== null])).toEqual([
      [false, true],
      [true, false],
    ])
  })

  test('whose place has gone meanwhile is paid back at once, and the order stays', async () => {
    const mine = await reserved(world.run)
    await change(mine, [{ offer: 'kit', quantity: 2 }])
    await reserved(world.run, { lines: [{ offer: 'kit', quantity: 2 }] })
    await reserved(world.run, { lines: [{ offer: 'kit', quantity: 2 }] })
    await payDifference(mine)
    expect(await linesOf(mine.order)).toEqual([['kit', 1]])
    expect((await world.run.reload()).committedUnits).toBe(5)
    const refunds = await Refund.findAll({ where: { orderId: mine.order.id } })
    expect(refunds.map(({ amountMinor, cause, state }) => [amountMinor, cause, state])).toEqual([
      [2500, 'order_change', 'succeeded'],
    ])
    expect((await compareBooks()).wrong).toEqual([])
  })

  test('paid after the run was locked goes back', async () => {
    const mine = await reserved(world.run)
    await change(mine, [{ offer: 'built', quantity: 1 }])
    const link = await payOrder({ actor: mine.actor, orderId: mine.order.id, now: NOW })
    if (!link.ok) throw new Error(link.reason)
    await world.run.update({ state: 'locked', lockedAt: NOW })
    await pay(link.value.payUrl)
    await settleAll()
    expect(await linesOf(mine.order)).toEqual([['kit', 1]])
    expect(await Refund.sum('amountMinor', { where: { orderId: mine.order.id } })).toBe(1500)
  })
})

describe('a change that costs less', () => {
  test('holds at once, frees its places and pays the difference back', async () => {
    const mine = await reserved(world.run, { lines: [{ offer: 'kit', quantity: 2 }] })
    expect(await change(mine, [{ offer: 'kit', quantity: 1 }])).toMatchObject({
      ok: true,
      value: { refundMinor: 2500 },
    })
    await settleAll()
    await mine.order.reload()
    expect(mine.order).toMatchObject({ depositMinor: 2500, totalMinor: 9990, unitCount: 1 })
    expect((await world.run.reload()).committedUnits).toBe(1)
    expect(await Refund.sum('amountMinor', { where: { orderId: mine.order.id, state: 'succeeded' } })).toBe(
      2500,
    )
    expect((await compareBooks()).wrong).toEqual([])
  })
})

describe('a change is refused', () => {
  test('when nothing would be different, above the limit, without a place, after the lock, and to strangers', async () => {
    const mine = await reserved(world.run)
    expect(await change(mine, [{ offer: 'kit', quantity: 1 }])).toMatchObject({ reason: 'nothing_changed' })
    expect(await change(mine, [{ offer: 'kit', quantity: world.run.limitPerPerson + 1 }])).toMatchObject({
      reason: 'limit_reached',
    })
    const stranger = await makeBuyer()
    expect(await change({ ...stranger, order: mine.order }, [{ offer: 'built', quantity: 1 }])).toMatchObject(
      { reason: 'not_found' },
    )
    await world.run.update({ maximum: 1, minimum: 1 })
    expect(await change(mine, [{ offer: 'kit', quantity: 2 }])).toMatchObject({ reason: 'no_place' })
    await world.run.update({ state: 'locked', lockedAt: NOW })
    expect(await change(mine, [{ offer: 'built', quantity: 1 }])).toMatchObject({ reason: 'run_locked' })
  })

  test('when somebody waits for the place it would take', async () => {
    const mine = await reserved(world.run)
    await reserved(world.run, { lines: [{ offer: 'kit', quantity: 2 }] })
    const last = await makeBuyer()
    const input = orderInput(world.run, { lines: [{ offer: 'kit', quantity: 2 }] })
    await placed(world.run, { lines: [{ offer: 'kit', quantity: 1 }] })
    expect(await placeOrder({ actor: last.actor, input, now: NOW })).toMatchObject({
      value: { state: 'waiting' },
    })
    expect(await change(mine, [{ offer: 'kit', quantity: 2 }])).toMatchObject({ reason: 'no_place' })
  })
})
