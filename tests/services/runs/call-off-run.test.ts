import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { callOffRun } from '@/lib/services/runs/call-off-run'
import { openRun } from '@/lib/services/runs/open-run'
import { due } from '@/lib/tasks/due'
import { BulkItem, MailOutbox, Order, Parcel, Refund } from '@/models'
import { setBusinessTime } from '@/tests/support/business-time'
import { runJobs } from '@/tests/support/run-jobs'
import { NOW } from '@/tests/support/worlds/base'
import {
  attemptsOf,
  booksOf,
  moneyWorld,
  pay,
  placed,
  reserved,
  settleAll,
} from '@/tests/support/worlds/money'
import { makeOrder } from '@/tests/support/worlds/order'
import { makeParcel } from '@/tests/support/worlds/parcel'
import { actorOf, makeUser } from '@/tests/support/worlds/person'

let world: Awaited<ReturnType<typeof moneyWorld>>
beforeEach(async () => {
  world = await moneyWorld()
})
afterAll(closeSandboxPool)

const REASON = 'The power stage is not stable enough.'
const callOff = async (over: Partial<Parameters<typeof callOffRun>[0]> = {}) =>
  callOffRun({
    actor: await actorOf(world.owner),
    workshopId: world.workshop.id,
    runId: world.run.id,
    reason: REASON,
    now: NOW,
    ...over,
  })

describe('a run that is called off', () => {
  test('ends every order, pays everything back and writes to everyone', async () => {
    const paid = [await reserved(world.run), await reserved(world.run)]
    const paying = await placed(world.run)
    const waiting = await placed(world.run, { lines: [{ offer: 'kit', quantity: 3 }] })
    expect(waiting.state).toBe('waiting')
    const answer = await callOff()
    if (!answer.ok) throw new Error(JSON.stringify(answer))
    expect(await world.run.reload()).toMatchObject({
      state: 'called_off',
      callOffReason: REASON,
      callOffCause: 'owner',
    })
    await settleAll()
    const orders = await Order.findAll({ where: { runId: world.run.id } })
    expect(new Set(orders.map(({ state, cancelCause }) => `${state} ${cancelCause}`))).toEqual(
      new Set(['cancelled run_called_off']),
    )
    expect((await world.run.reload()).committedUnits).toBe(0)
    const refunds = await Refund.findAll({ where: { orderId: paid.map(({ order }) => order.id) } })
    expect(refunds.map(({ amountMinor, state, cause }) => [amountMinor, state, cause])).toEqual([
      [2500, 'succeeded', 'run_called_off'],
      [2500, 'succeeded', 'run_called_off'],
    ])
    const [session] = await attemptsOf(paying.order)
    expect(session?.state).toBe('abandoned')
    // Deposits came in and went back; what is left of it all is the provider's fees.
    const books = await booksOf(world.workshop.id)
    expect(books['customer_deposits']).toBeUndefined()
    expect(books['provider_balance']).toBe(-(books['fees_lost_on_refunds'] ?? 0))

    const subjectId = orders.map(({ id }) => id)
    const mails = await MailOutbox.findAll({ where: { kind: 'run_called_off', subjectId } })
    const told = new Map(mails.map(({ subjectId, props }) => [subjectId, props]))
    expect(told.size).toBe(4)
    expect(told.get(paid[0]!.order.id)).toMatchObject({ cause: 'owner', reason: REASON, refundMinor: 2500 })
    expect(told.get(waiting.order.id)).toMatchObject({ refundMinor: 0 })
    const items = await BulkItem.findAll({ where: { bulkJobId: answer.value.bulk } })
    expect(items.map(({ state }) => state)).toEqual(['done', 'done', 'done', 'done'])
  })

  test('pays back whoever paid while it was being called off', async () => {
    const { order, payUrl } = await placed(world.run)
    await pay(payUrl)
    await callOff()
    await settleAll()
    expect(await order.reload()).toMatchObject({ state: 'cancelled' })
    const refunds = await Refund.findAll({ where: { orderId: order.id } })
    expect(refunds.map(({ amountMinor, state }) => [amountMinor, state])).toEqual([[2500, 'succeeded']])
  })

  test('takes parcels apart that have not left, and leaves what was paid outside to its owner', async () => {
    const made = await makeOrder(
      { run: world.run, lines: [{ offer: world.runOffers.kit, quantity: 1 }] },
      { kind: 'manual', state: 'paid', manualReason: 'A tester', enteredByPersonId: world.owner.id },
    )
    const { parcel } = await makeParcel(made.order, made.lines)
    await callOff()
    await runJobs()
    expect((await made.order.reload()).state).toBe('cancelled')
    expect((await Parcel.findByPk(parcel.id))?.state).toBe('discarded')
    const where = { kind: 'run_called_off', subjectId: made.order.id }
    expect(await MailOutbox.count({ where })).toBe(0)
  })

  test('as a draft simply ends', async () => {
    await world.run.update({ state: 'draft', openedAt: null, opensToAllAt: null, termsVersionId: null })
    expect(await callOff()).toMatchObject({ ok: true })
    expect((await world.run.reload()).state).toBe('called_off')
  })
})

describe('a run is not called off', () => {
  test('without a reason, with other words typed, twice, or by anyone but its owner', async () => {
    expect(await callOff({ reason: '  ' })).toEqual({ ok: false, reason: 'reason_missing' })
    expect(await callOff({ typed: 'call it off' })).toMatchObject({ ok: false, reason: 'invalid' })
    const { person } = await makeUser({ workshopId: world.workshop.id, role: 'packer' })
    expect(await callOff({ actor: await actorOf(person) })).toEqual({ ok: false, reason: 'forbidden' })
    const other = await moneyWorld()
    expect(await callOff({ runId: other.run.id })).toEqual({ ok: false, reason: 'not_found' })
    expect((await world.run.reload()).state).toBe('taking_deposits')
    expect(await callOff({ typed: `call off ${world.module.slug}` })).toMatchObject({ ok: true })
    expect(await callOff()).toEqual({ ok: false, reason: 'not_allowed' })
  })

  test('once something of it is in the post', async () => {
    const made = await makeOrder(
      { run: world.run, lines: [{ offer: world.runOffers.kit, quantity: 1 }] },
      { state: 'posted' },
    )
    await makeParcel(made.order, made.lines, {
      state: 'handed_over',
      packedAt: NOW,
      packedByPersonId: world.owner.id,
      grams: 420,
      handedOverAt: NOW,
      handedOverByPersonId: world.owner.id,
      serviceName: 'Parcel',
    })
    expect(await callOff()).toEqual({ ok: false, reason: 'already_handed_over' })
  })
})

describe('a run nobody decides about', () => {
  const draft = { state: 'draft' as const, openedAt: null, opensToAllAt: null, termsVersionId: null }
  /** Everything due by an instant, as the worker would do it. */
  const advanceTo = async (at: string) => {
    await setBusinessTime(new Date(at))
    await due({}, { jobId: '1', attempt: 1, maxAttempts: 1 })
    await settleAll()
  }

  test('calls itself off on the seventh day after decide-by, not before', async () => {
    world = await moneyWorld(draft)
    const opened = await openRun({
      actor: await actorOf(world.owner),
      workshopId: world.workshop.id,
      runId: world.run.id,
      now: NOW,
    })
    expect(opened.ok).toBe(true)
    await world.run.update({ opensToAllAt: NOW })
    const { order } = await reserved(world.run)
    await advanceTo('2027-04-07T21:59:00Z')
    expect((await world.run.reload()).state).toBe('taking_deposits')
    await advanceTo('2027-04-07T22:00:01Z')
    expect(await world.run.reload()).toMatchObject({ state: 'called_off', callOffCause: 'clock' })
    expect((await order.reload()).state).toBe('cancelled')
    expect(await Refund.findAll({ where: { orderId: order.id, state: 'succeeded' } })).toHaveLength(1)
    const mail = await MailOutbox.findOne({ where: { kind: 'run_called_off', subjectId: order.id } })
    expect(mail?.props).toMatchObject({ cause: 'clock', reason: null, refundMinor: 2500 })
  })
})
