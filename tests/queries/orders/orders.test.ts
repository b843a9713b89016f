import { beforeAll, describe, expect, test } from 'vitest'
import { sequelize } from '@/lib/db/sequelize'
import { getOrder } from '@/lib/queries/orders/get-order'
import { getOrderForm } from '@/lib/queries/orders/get-order-form'
import { listOwnOrders } from '@/lib/queries/orders/list-own-orders'
import { Run } from '@/models'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { makeAddress, makeOrder } from '@/tests/support/worlds/order'
import { makeAttempt, makeRefund } from '@/tests/support/worlds/payment'
import { actorOf, makeUser } from '@/tests/support/worlds/person'
import { pier } from '@/tests/support/worlds/pier'
import { makeRun } from '@/tests/support/worlds/run'

type Actor = Awaited<ReturnType<typeof buyerWith>>
let world: Awaited<ReturnType<typeof pier>>
let many: Actor
beforeAll(async () => {
  world = await pier()
  many = await buyerWith(53)
})

async function statements(read: () => Promise<unknown>): Promise<number> {
  let count = 0
  const options = (sequelize as unknown as { options: { logging: unknown } }).options
  options.logging = () => (count += 1)
  try {
    await read()
  } finally {
    options.logging = false
  }
  return count
}

async function buyerWith(orders: number) {
  const { run, runOffers } = await makeRun(world, { maximum: 500 })
  const { person } = await makeUser()
  for (let n = 0; n < orders; n += 1) {
    const address = await makeAddress(world.workshop.id, person, { lines: [`Haus ${n}`] })
    const { order } = await makeOrder(
      { run, person, address, lines: [{ offer: runOffers.kit, quantity: 1 }] },
      { placedAt: hoursAfter(NOW, n) },
    )
    await makeRefund(await makeAttempt(order), { state: 'succeeded', succeededAt: NOW })
  }
  return actorOf(person)
}

describe('the list of own orders', () => {
  test('takes as many statements for fifty orders as for five', async () => {
    const five = await buyerWith(5)
    const few = await statements(() => listOwnOrders({ actor: five, now: NOW }))
    const lots = await statements(() => listOwnOrders({ actor: many, now: NOW }))
    expect(lots).toBe(few)
    expect(lots).toBeLessThanOrEqual(10)
  })

  test('goes on a page at a time, newest first, without a gap', async () => {
    const first = await listOwnOrders({ actor: many, now: NOW })
    expect(first.items).toHaveLength(50)
    const second = await listOwnOrders({ actor: many, after: first.next!, now: NOW })
    expect(second.items).toHaveLength(3)
    expect(second.next).toBeNull()
    const ids = [...first.items, ...second.items].map(({ id }) => id)
    expect(new Set(ids).size).toBe(53)
    expect((await listOwnOrders({ actor: many, after: 'no mark at all', now: NOW })).items).toHaveLength(50)
  })

  test('is empty for a visitor', async () => {
    expect(await listOwnOrders({ actor: { kind: 'visitor' }, now: NOW })).toEqual({ items: [], next: null })
  })
})

describe('an order’s page', () => {
  test('is its person’s with deeds, the owner’s without, and nobody else’s', async () => {
    const { order, ines, owner, hana, fenLamp, packer } = world
    const own = await getOrder({ actor: await actorOf(ines), orderId: order.id, now: NOW })
    expect(own).toMatchObject({
      state: 'reserved',
      paidMinor: 2_500,
      can: ['cancel', 'change', 'address'],
      timeZone: 'Europe/Berlin',
    })
    expect(await getOrder({ actor: await actorOf(owner), orderId: order.id, now: NOW })).toMatchObject({
      can: [],
    })
    for (const person of [hana, fenLamp.owner, packer])
      expect(await getOrder({ actor: await actorOf(person), orderId: order.id, now: NOW })).toBeNull()
  })
})

describe('the order form', () => {
  const ask = async (now = NOW) =>
    getOrderForm({ actor: await actorOf(world.hana), workshop: 'hollow-pier', module: 'rowlock', now })

  test('shows the newest run that takes deposits, its offers and where they go', async () => {
    const form = await ask()
    expect(form).toMatchObject({ closedBecause: null, limitPerPerson: 4, decideBy: '2027-04-01' })
    expect(form!.countries).toEqual(['AT', 'DE', 'GB', 'JP', 'US'])
    expect(form!.offers.map(({ offer, priceMinor }) => [offer, priceMinor])).toEqual([
      ['boards', 4_500],
      ['kit', 9_500],
      ['built', 16_500],
    ])
  })

  test('says why nobody, or this person, may order', async () => {
    expect(await ask(new Date('2027-04-02T08:00:00Z'))).toMatchObject({ closedBecause: 'decide_by_past' })
    const form = await ask()
    await Run.update({ opensToAllAt: hoursAfter(NOW, 5) }, { where: { id: form!.run } })
    expect(await ask()).toMatchObject({ closedBecause: 'not_open_to_all_yet' })
    await Run.update({ state: 'locked', lockedAt: NOW }, { where: { id: form!.run } })
    expect(await ask()).toMatchObject({ closedBecause: 'run_not_open' })
  })

  test('does not exist for a module without a run', async () => {
    const form = await getOrderForm({
      actor: await actorOf(world.hana),
      workshop: 'hollow-pier',
      module: 'nothing',
      now: NOW,
    })
    expect(form).toBeNull()
  })
})
