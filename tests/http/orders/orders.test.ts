import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { GET as ownOrders } from '@/app/api/account/orders/route'
import { POST as cancelOrder } from '@/app/api/orders/[order]/cancel/route'
import { POST as payOrder } from '@/app/api/orders/[order]/pay/route'
import { PUT as setAddress } from '@/app/api/orders/[order]/address/route'
import { POST as draftOrder } from '@/app/api/orders/draft/route'
import { POST as placeOrder } from '@/app/api/orders/route'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { FormDraft, Order, type Person, Run } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { makeBuyer, moneyWorld, orderInput, pay, settleAll } from '@/tests/support/worlds/money'
import { makeRun } from '@/tests/support/worlds/run'
import { call, cookieFor } from './support'

let world: Awaited<ReturnType<typeof moneyWorld>>
let cookie: string
let person: Person
beforeAll(async () => {
  world = await moneyWorld({ maximum: 60 })
  person = (await makeBuyer()).person
  cookie = await cookieFor(person)
})
afterAll(closeSandboxPool)

const place = (json: unknown, headers = {}) => call(placeOrder, '/api/orders', { cookie, json, headers })
const errorsOf = async (answer: Response) => {
  expect(answer.status).toBe(422)
  expect(answer.headers.get('content-type')).toBe('application/problem+json')
  return ((await answer.json()) as { errors: Record<string, string> }).errors
}

/** Somebody new each time: the limit per person is not what is tried. */
async function newBuyer() {
  const buyer = await makeBuyer()
  return { ...buyer, cookie: await cookieFor(buyer.person) }
}

describe('POST /api/orders', () => {
  test('answers 201 with the card page, and the same again for the same key', async () => {
    const buyer = await newBuyer()
    const json = orderInput(world.run)
    const headers = { 'idempotency-key': 'once' }
    const first = await call(placeOrder, '/api/orders', { cookie: buyer.cookie, json, headers })
    expect(first.status).toBe(201)
    const body = (await first.json()) as Record<string, unknown>
    expect(body).toEqual({
      order: expect.any(String),
      state: 'awaiting_deposit',
      payUrl: expect.stringMatching(/\/pay\/cs_/),
      position: null,
    })
    const again = await call(placeOrder, '/api/orders', { cookie: buyer.cookie, json, headers })
    expect([again.status, await again.json()]).toEqual([201, body])
    const other = await call(placeOrder, '/api/orders', {
      cookie: buyer.cookie,
      json: orderInput(world.run),
      headers,
    })
    expect(other.status).toBe(422)
    expect(await Order.count({ where: { personId: buyer.person.id } })).toBe(1)
  })

  test.each([[0], [11], [1.5], ['1e3'], ['-1'], [null], ['']])(
    'refuses a quantity of %j at its field',
    async (quantity) => {
      const json = { ...orderInput(world.run), lines: [{ offer: 'kit', quantity }] }
      expect(await errorsOf(await place(json))).toHaveProperty(['lines.0.quantity'])
    },
  )

  test('refuses an unknown offer, an unknown country and an address without its parts, each at its field', async () => {
    const input = orderInput(world.run)
    expect(
      await errorsOf(await place({ ...input, lines: [{ offer: 'plush', quantity: 1 }] })),
    ).toHaveProperty(['lines.0.offer'])
    expect(await errorsOf(await place({ ...input, lines: [] }))).toHaveProperty(['lines'])
    expect(
      await errorsOf(await place({ ...input, address: { ...input.address, country: 'ZZ' } })),
    ).toHaveProperty(['address.country'])
    expect(
      await errorsOf(await place({ ...input, address: { ...input.address, name: 'A\nB: c', lines: [] } })),
    ).toMatchObject({ 'address.name': expect.any(String), 'address.lines.0': expect.any(String) })
  })

  test('an offer the run does not sell', async () => {
    const { run, runOffers } = await makeRun(world)
    await runOffers.built.destroy()
    const input = { ...orderInput(run), lines: [{ offer: 'built', quantity: 1 }] }
    expect(await errorsOf(await place(input))).toHaveProperty(['lines.0.offer'])
  })

  test('a closed run is a conflict, a run nobody may see does not exist', async () => {
    const { run } = await makeRun(world)
    await Run.update({ state: 'locked', lockedAt: NOW }, { where: { id: run.id } })
    const closed = await place(orderInput(run))
    expect([closed.status, ((await closed.json()) as { reason: string }).reason]).toEqual([
      409,
      'run_not_open',
    ])
    await Run.update({ state: 'draft' }, { where: { id: run.id } })
    expect((await place(orderInput(run))).status).toBe(404)
    expect((await place({ ...orderInput(run), run: 'not-an-id' })).status).toBe(422)
  })

  test('nothing without a session, from elsewhere, too large, or of another type', async () => {
    const json = orderInput(world.run)
    expect((await call(placeOrder, '/api/orders', { json })).status).toBe(401)
    expect((await place(json, { origin: 'https://elsewhere.example' })).status).toBe(403)
    expect((await place({ ...json, junk: 'x'.repeat(10_000_000) })).status).toBe(413)
    expect((await place(json, { 'content-type': 'text/xml' })).status).toBe(415)
    expect(await Order.count({ where: { personId: person.id } })).toBe(0)
  })
})

describe('the form, without script', () => {
  const fields = (over: Record<string, string> = {}) => ({
    run: world.run.id,
    workshop: world.workshop.slug,
    module: world.module.slug,
    'lines.0.offer': 'boards',
    'lines.0.quantity': '0',
    'lines.1.offer': 'kit',
    'lines.1.quantity': '1',
    'lines.2.offer': 'built',
    'lines.2.quantity': '',
    'address.country': 'DE',
    'address.name': 'A. Berg',
    'address.lines.0': `Weg ${Math.random()}`,
    'address.lines.1': '',
    'address.postcode': '89073',
    'address.city': 'Ulm',
    'address.latin.name': '',
    ...over,
  })

  test('is priced, kept and shown once more; then the button orders and leads to the card page', async () => {
    const buyer = await newBuyer()
    const form = fields()
    const kept = await call(draftOrder, '/api/orders/draft', { cookie: buyer.cookie, form })
    expect(kept.status).toBe(303)
    const next = new URL(kept.headers.get('location')!, 'http://localhost:3000')
    expect(next.pathname).toBe(`/account/order/${world.workshop.slug}/${world.module.slug}/check`)
    const draft = await FormDraft.findByPk(next.searchParams.get('draft')!, { rejectOnEmpty: true })
    // Nothing typed is lost on the way, the postcode least of all.
    expect(draft.values).toEqual(form)
    expect(await Order.count({ where: { personId: buyer.person.id } })).toBe(0)

    const button = { ...draft.values, idempotencyKey: draft.id }
    const placed = await call(placeOrder, '/api/orders', { cookie: buyer.cookie, form: button })
    expect([placed.status, placed.headers.get('location')]).toEqual([
      303,
      expect.stringMatching(/\/pay\/cs_/),
    ])
    const twice = await call(placeOrder, '/api/orders', { cookie: buyer.cookie, form: button })
    expect(twice.headers.get('location')).toBe(placed.headers.get('location'))
    expect(await Order.count({ where: { personId: buyer.person.id } })).toBe(1)
  })

  test('comes back with its mistakes and everything typed', async () => {
    const form = fields({ 'lines.1.quantity': '11', 'address.postcode': '' })
    const answer = await call(draftOrder, '/api/orders/draft', { cookie, form })
    expect(answer.status).toBe(303)
    const back = new URL(answer.headers.get('location')!, 'http://localhost:3000')
    expect(back.pathname).toBe(`/account/order/${world.workshop.slug}/${world.module.slug}`)
    const draft = await FormDraft.findByPk(back.searchParams.get('draft')!, { rejectOnEmpty: true })
    expect(draft.values).toEqual(form)
    expect(draft.errors).toEqual({ 'lines.0.quantity': 'Enter a whole number from 1 to 10.' })
  })
})

describe('an order that is somebody’s', () => {
  test('is paid, listed, moved and cancelled by its person, and does not exist for others', async () => {
    const buyer = await newBuyer()
    const placed = await call(placeOrder, '/api/orders', {
      cookie: buyer.cookie,
      json: orderInput(world.run),
    })
    const { order, payUrl } = (await placed.json()) as { order: string; payUrl: string }
    const params = { order }
    const link = await call(payOrder, `/api/orders/${order}/pay`, { cookie: buyer.cookie, json: {}, params })
    expect([link.status, await link.json()]).toEqual([200, { payUrl }])
    await pay(payUrl)
    await settleAll()

    const list = await call(ownOrders, '/api/account/orders', { cookie: buyer.cookie, method: 'GET' })
    const { items, next } = (await list.json()) as { items: Record<string, unknown>[]; next: null }
    expect(next).toBeNull()
    expect(items).toMatchObject([
      {
        id: order,
        state: 'reserved',
        depositMinor: 2_500,
        balanceMinor: 7_490,
        paidMinor: 2_500,
        refundedMinor: 0,
        currency: 'EUR',
        can: ['cancel', 'change', 'address'],
        lines: [{ offer: 'kit', quantity: 1, priceMinor: 9_500, postedBy: '2027-08-31' }],
      },
    ])
    expect((items[0]!.history as { event: string }[]).map(({ event }) => event)).toEqual([
      'place',
      'deposit_captured',
    ])

    const address = { country: 'DE', name: 'B. Berg', lines: ['Tor 2'], postcode: '20457', city: 'Hamburg' }
    const moved = await call(setAddress, `/api/orders/${order}/address`, {
      method: 'PUT',
      cookie: buyer.cookie,
      json: address,
      params,
    })
    expect([moved.status, await moved.json()]).toEqual([200, expect.objectContaining({ id: order })])
    const wrong = await call(setAddress, `/api/orders/${order}/address`, {
      method: 'PUT',
      cookie: buyer.cookie,
      json: { ...address, city: '' },
      params,
    })
    expect(await errorsOf(wrong)).toEqual({ city: 'Enter the town or city.' })

    for (const [handler, path, json] of [
      [payOrder, 'pay', {}],
      [cancelOrder, 'cancel', {}],
    ] as const) {
      const theirs = await call(handler, `/api/orders/${order}/${path}`, { cookie, json, params })
      expect(theirs.status).toBe(404)
    }
    const theirs = await call(setAddress, `/api/orders/${order}/address`, {
      method: 'PUT',
      cookie,
      json: address,
      params,
    })
    expect(theirs.status).toBe(404)

    const cancelled = await call(cancelOrder, `/api/orders/${order}/cancel`, {
      cookie: buyer.cookie,
      json: {},
      params,
    })
    expect([cancelled.status, await cancelled.json()]).toEqual([
      200,
      { state: 'cancelled', refundMinor: 2_500 },
    ])
    const late = await call(payOrder, `/api/orders/${order}/pay`, { cookie: buyer.cookie, json: {}, params })
    expect(late.status).toBe(409)
  })
})
