import { afterAll, beforeEach, expect, test } from 'vitest'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { enterOrder } from '@/lib/services/orders/enter-order'
import { Order, Parcel } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { booksOf, makeBuyer, moneyWorld } from '@/tests/support/worlds/money'
import { actorOf } from '@/tests/support/worlds/person'
import { handOver, pack } from '@/tests/support/worlds/post-order'

let world: Awaited<ReturnType<typeof moneyWorld>>
beforeEach(async () => {
  world = await moneyWorld({ maximum: 3 })
})
afterAll(closeSandboxPool)

const input = (priceMinor: number, quantity = 1) => ({
  email: 'dealer@example.org',
  lines: [{ offer: 'kit' as const, quantity, priceMinor }],
  address: { country: 'DE', name: 'A Dealer', lines: ['Markt 2'], postcode: '89073', city: 'Ulm' },
  reason: 'Pays by invoice.',
})
const enter = async (over: Partial<Parameters<typeof enterOrder>[0]> = {}) =>
  enterOrder({
    actor: await actorOf(world.owner),
    workshopId: world.workshop.id,
    runId: world.run.id,
    input: input(8000),
    now: NOW,
    ...over,
  })

test('an order paid elsewhere takes places, is paid, and its money stands outside the provider until it is posted', async () => {
  await world.run.update({ state: 'locked', lockedAt: NOW })
  const made = await enter()
  if (!made.ok) throw new Error(JSON.stringify(made))
  const order = await Order.findByPk(made.value.order, { rejectOnEmpty: true })
  expect(order).toMatchObject({ kind: 'manual', state: 'paid', totalMinor: 8000, balanceMinor: 0 })
  expect((await world.run.reload()).committedUnits).toBe(1)
  expect(await booksOf(world.workshop.id)).toEqual({ outside_receipts: 8000, customer_deposits: -8000 })
  await pack(world, order)
  await handOver(world, order)
  // 80.00 holds 12.77 of tax at 19 %: 8000 · 19 / 119 = 1277.3.
  expect(await booksOf(world.workshop.id)).toEqual({
    outside_receipts: 8000,
    sales: -6723,
    tax_payable: -1277,
  })
})

test('a free one books nothing and waits for the lock before it is packed', async () => {
  const made = await enter({ input: input(0) })
  expect(made).toMatchObject({ ok: true })
  expect(await booksOf(world.workshop.id)).toEqual({})
  expect(await Parcel.count({ where: { workshopId: world.workshop.id } })).toBe(0)
})

test('it is refused beyond the maximum, in a draft, with an address that lacks something, and to buyers', async () => {
  expect(await enter({ input: input(0, 4) })).toMatchObject({ reason: 'no_place' })
  const lame = { ...input(0), address: { ...input(0).address, postcode: undefined } }
  expect(await enter({ input: lame })).toMatchObject({
    reason: 'invalid',
    errors: { 'address.postcode': expect.any(String) },
  })
  expect(await enter({ actor: (await makeBuyer()).actor })).toMatchObject({ reason: 'not_found' })
  await world.run.update({ state: 'closed', lockedAt: NOW, closedAt: NOW })
  expect(await enter()).toMatchObject({ reason: 'run_not_open' })
})
