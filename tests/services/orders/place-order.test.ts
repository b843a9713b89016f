import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { placeOrder } from '@/lib/services/orders/place-order'
import {
  AuditEntry,
  DueItem,
  Invitation,
  MailOutbox,
  Order,
  OrderLine,
  ProviderCustomer,
  Run,
} from '@/models'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import {
  attemptsOf,
  booksOf,
  makeBuyer,
  moneyWorld,
  orderInput,
  pay,
  placed,
  reserved,
  settleAll,
} from '@/tests/support/worlds/money'
import { makeSignUp } from '@/tests/support/worlds/sign-up'

type World = Awaited<ReturnType<typeof moneyWorld>>
let world: World
beforeEach(async () => {
  world = await moneyWorld()
})
afterAll(closeSandboxPool)

const reasonOf = async (input: ReturnType<typeof orderInput>, now = NOW) => {
  const { actor } = await makeBuyer()
  const answer = await placeOrder({ actor, input, now })
  if (answer.ok) throw new Error('was not refused')
  return 'errors' in answer ? answer.errors : answer.reason
}

describe('an order that is placed', () => {
  test('fixes every sum, holds a place for 31 minutes and opens a card page for the deposit', async () => {
    const { run, terms, runOffers } = world
    const { order, payUrl, position, state } = await placed(run, {
      lines: [
        { offer: 'kit', quantity: 2 },
        { offer: 'boards', quantity: 1 },
      ],
    })
    // By hand: 2 × 95.00 + 45.00 + postage 4.90 (990 g is under a kilogram) = 239.90; deposits 2 × 25.00 + 10.00.
    expect({ state, position }).toEqual({ state: 'awaiting_deposit', position: null })
    expect(payUrl).toMatch(/^http:\/\/127\.0\.0\.1:3999\/pay\/cs_/)
    expect(order).toMatchObject({
      number: 1,
      unitCount: 3,
      termsVersionId: terms.id,
      goodsMinor: 23_500,
      postageMinor: 490,
      totalMinor: 23_990,
      depositMinor: 6_000,
      balanceMinor: 17_990,
      // 19 % in 190.00, 45.00 and 4.90, each rounded by itself: 30.34 + 7.18 + 0.78.
      taxMinor: 3_830,
      holdUntil: new Date(NOW.getTime() + 31 * 60_000),
      placedAt: NOW,
    })
    expect(order.postageQuote).toMatchObject({ serviceName: 'Parcel', grams: 990, priceMinor: 490 })
    const lines = await OrderLine.findAll({ where: { orderId: order.id }, order: [['position', 'ASC']] })
    expect(lines.map(({ postedByOn }) => postedByOn)).toEqual(['2027-08-31', '2027-08-31'])
    expect((await run.reload()).committedUnits).toBe(3)
    expect((await runOffers.kit.reload()).committedUnits).toBe(2)
    const [attempt] = await attemptsOf(order)
    expect(attempt).toMatchObject({
      state: 'sent',
      sequence: 1,
      amountMinor: 6_000,
      idempotencyKey: `deposit:${order.id}:1`,
      payUrl,
    })
    expect(attempt!.paramsHash).toMatch(/^[0-9a-f]{64}$/)
    const dues = await DueItem.findAll({ where: { subjectId: [order.id, attempt!.id] } })
    expect(dues.map(({ kind }) => kind).sort()).toEqual(['attempt_look_up', 'hold_ended'])
  })

  test('once paid is reserved, with books, saved card and one mail that is the contract', async () => {
    const { run, workshop } = world
    const { order, person } = await reserved(run)
    expect(order).toMatchObject({ state: 'reserved', holdUntil: null })
    expect((await attemptsOf(order))[0]).toMatchObject({ state: 'captured', feeMinor: 63 })
    // 1.5 % of 25.00 and 0.25, as the fake's README says: 0.63.
    expect(await booksOf(workshop.id)).toEqual({
      provider_balance: 2_437,
      customer_deposits: -2_500,
      processing_fees: 63,
    })
    expect(await ProviderCustomer.findOne({ where: { personId: person.id } })).toMatchObject({
      methodLast4: '4242',
      methodBrand: 'visa',
    })
    const mails = await MailOutbox.findAll({ where: { kind: 'deposit_received', subjectId: order.id } })
    expect(mails).toHaveLength(1)
    expect(mails[0]!.props).toMatchObject({
      depositMinor: 2_500,
      balanceMinor: 7_490,
      withdrawal: 'by_law',
      decideBy: '2027-04-01',
      terms: { version: '1' },
    })
    const moves = await AuditEntry.findAll({
      where: { subjectType: 'order', subjectId: order.id },
      order: [['id', 'ASC']],
    })
    expect(moves.map(({ event }) => event).sort()).toEqual(['deposit_captured', 'place'])
    expect(await DueItem.count({ where: { kind: 'hold_ended', subjectId: order.id } })).toBe(0)
  })

  test('ends the invitation of its person', async () => {
    const { run, offers } = world
    const { person, actor } = await makeBuyer()
    const { signup } = await makeSignUp(offers.kit, { person })
    const invitation = await Invitation.create({
      workshopId: run.workshopId,
      runId: run.id,
      signupId: signup.id,
      personId: person.id,
      sentAt: NOW,
    })
    await run.update({ opensToAllAt: hoursAfter(NOW, 10) })
    const answer = await placeOrder({ actor, input: orderInput(run), now: NOW })
    expect(answer.ok).toBe(true)
    expect((await invitation.reload()).state).toBe('ordered')
    expect(await reasonOf(orderInput(run))).toBe('not_open_to_all_yet')
  })

  test('waits in order of arrival once the run is full, without a card page', async () => {
    const { run } = world
    await placed(run, { lines: [{ offer: 'kit', quantity: 4 }] })
    const first = await placed(run, { lines: [{ offer: 'kit', quantity: 2 }] })
    const second = await placed(run, { lines: [{ offer: 'kit', quantity: 1 }] })
    // One place is free, but someone waits already: nobody overtakes.
    expect([first, second].map(({ state, position, payUrl }) => ({ state, position, payUrl }))).toEqual([
      { state: 'waiting', position: 1, payUrl: null },
      { state: 'waiting', position: 2, payUrl: null },
    ])
    expect((await run.reload()).committedUnits).toBe(4)
    expect(await attemptsOf(first.order)).toEqual([])
  })
})

describe('is refused', () => {
  test('with a sentence at the field, and nothing is written', async () => {
    const { run } = world
    const address = orderInput(run).address
    expect(await reasonOf(orderInput(run, { address: { ...address, country: 'XX' } }))).toHaveProperty([
      'address.country',
    ])
    expect(await reasonOf(orderInput(run, { address: { ...address, country: 'FR' } }))).toHaveProperty([
      'address.country',
    ])
    expect(await reasonOf(orderInput(run, { address: { ...address, postcode: undefined } }))).toHaveProperty([
      'address.postcode',
    ])
    expect(
      await reasonOf(orderInput(run, { lines: [{ offer: 'kit', quantity: 1, choices: { odd: 'answer' } }] })),
    ).toHaveProperty(['lines.0.choices.odd'])
    expect(
      await reasonOf(
        orderInput(run, {
          lines: [
            { offer: 'kit', quantity: 1 },
            { offer: 'kit', quantity: 1 },
          ],
        }),
      ),
    ).toHaveProperty(['lines.1.offer'])
    expect(await Order.count({ where: { runId: run.id } })).toBe(0)
    expect((await run.reload()).committedUnits).toBe(0)
  })

  test('after decide-by, above the limit, in another state of the run or the workshop', async () => {
    const { run, workshop } = world
    expect(await reasonOf(orderInput(run), new Date('2027-04-02T08:00:00Z'))).toBe('decide_by_past')
    expect(await reasonOf(orderInput(run, { lines: [{ offer: 'kit', quantity: 5 }] }))).toBe('limit_reached')
    expect(await reasonOf({ ...orderInput(run), run: '00000000-0000-4000-8000-000000000000' })).toBe(
      'not_found',
    )
    await Run.update({ state: 'draft' }, { where: { id: run.id } })
    expect(await reasonOf(orderInput(run))).toBe('not_found')
    await Run.update({ state: 'locked', lockedAt: NOW }, { where: { id: run.id } })
    expect(await reasonOf(orderInput(run))).toBe('run_not_open')
    await Run.update({ state: 'taking_deposits' }, { where: { id: run.id } })
    await workshop.update({ state: 'suspended', suspendedAt: NOW })
    expect(await reasonOf(orderInput(run))).toBe('workshop_suspended')
  })

  test('a second live order of the same person to the same place, however it is written', async () => {
    const { run } = world
    const { actor } = await makeBuyer()
    const input = orderInput(run)
    expect((await placeOrder({ actor, input, now: NOW })).ok).toBe(true)
    const again = {
      ...input,
      address: { ...input.address, lines: [`  ${input.address.lines[0]!.toUpperCase()} `] },
    }
    expect(await placeOrder({ actor, input: again, now: NOW })).toMatchObject({ reason: 'already_ordered' })
    const elsewhere = await placeOrder({ actor, input: orderInput(run), now: NOW })
    expect(elsewhere.ok).toBe(true)
    expect(await Order.count({ where: { runId: run.id } })).toBe(2)
  })

  test('a visitor places nothing', async () => {
    const answer = await placeOrder({ actor: { kind: 'visitor' }, input: orderInput(world.run), now: NOW })
    expect(answer).toMatchObject({ reason: 'forbidden' })
  })
})

test('a refused card leaves the page open, and another card pays', async () => {
  const { order, payUrl } = await placed(world.run)
  expect(await pay(payUrl, '4000 0000 0000 0002')).toMatchObject({ outcome: 'failed' })
  await settleAll()
  expect((await order.reload()).state).toBe('awaiting_deposit')
  expect((await attemptsOf(order))[0]!.state).toBe('sent')
  await pay(payUrl)
  await settleAll()
  expect((await order.reload()).state).toBe('reserved')
})
