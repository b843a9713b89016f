import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import type { LockInput } from '@/lib/contracts/runs'
import { payments } from '@/lib/gateways/payments'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { lockRun } from '@/lib/services/runs/lock-run'
import { BulkJob, Decision, DueItem, Invitation, MailOutbox, Order, Waiver } from '@/models'
import { runJobs } from '@/tests/support/run-jobs'
import { NOW } from '@/tests/support/worlds/base'
import { FEES_WAIVED, makeReady } from '@/tests/support/worlds/decision'
import { attemptsOf, moneyWorld, pay, placed, reserved, settleAll } from '@/tests/support/worlds/money'
import { makeOrder } from '@/tests/support/worlds/order'
import { actorOf, makeUser } from '@/tests/support/worlds/person'
import { makeSignUp } from '@/tests/support/worlds/sign-up'

let world: Awaited<ReturnType<typeof moneyWorld>>
beforeEach(async () => {
  world = await moneyWorld({ minimum: 2 })
  await makeReady(world)
})
afterAll(closeSandboxPool)

const lock = async (input: LockInput & { typed?: string } = { waivers: FEES_WAIVED }, over: object = {}) =>
  lockRun({
    actor: await actorOf(world.owner),
    workshopId: world.workshop.id,
    runId: world.run.id,
    input,
    now: NOW,
    ...over,
  })
const stateOf = async () => (await world.run.reload()).state

describe('a run that is locked', () => {
  test('freezes the figures it was decided on, and tells everyone under deposit', async () => {
    const orders = [await reserved(world.run), await reserved(world.run)]
    const locked = await lock()
    if (!locked.ok) throw new Error(JSON.stringify(locked))
    expect(await world.run.reload()).toMatchObject({ state: 'locked', lockedAt: NOW, lockReason: null })
    const decision = await Decision.findOne({ where: { runId: world.run.id }, rejectOnEmpty: true })
    expect(decision).toMatchObject({ kind: 'lock', coreVersion: '2', byPersonId: world.owner.id })
    // By hand: two kits at 95.00, 5.00 of packaging and 0.02 of resistors each, 300.00 once: from 4 kits on no loss.
    expect(decision.figures).toMatchObject({ deposited: 2, held: 0, breakEven: 4, starts: 0 })
    expect(decision.figures['readiness']).toHaveLength(9)
    expect(decision.inputs).toHaveProperty('facts.run.minimum', 2)
    await runJobs()
    const told = await MailOutbox.findAll({ where: { kind: 'run_locked' } })
    expect(told.map(({ subjectId }) => subjectId).sort()).toEqual(orders.map(({ order }) => order.id).sort())
    expect(told[0]?.props).toMatchObject({ deposited: 2, minimum: 2, belowMinimum: null })
    expect(await BulkJob.findByPk(locked.value.bulk)).toMatchObject({ kind: 'tell_locked' })
  })

  test('below its minimum with a written reason, which buyers read', async () => {
    const { order } = await reserved(world.run)
    const reason = 'A friend takes the rest of the boards.'
    expect(await lock({ reason, waivers: FEES_WAIVED })).toMatchObject({ ok: true })
    expect(await world.run.reload()).toMatchObject({ state: 'locked', lockReason: reason })
    await runJobs()
    const told = await MailOutbox.findOne({ where: { kind: 'run_locked', subjectId: order.id } })
    expect(told?.props).toMatchObject({ deposited: 1, minimum: 2, belowMinimum: reason })
  })

  test('ends open card pages at the provider first, and gives their places back', async () => {
    await reserved(world.run)
    await reserved(world.run)
    const { order, payUrl } = await placed(world.run)
    expect(await lock()).toMatchObject({ ok: true })
    expect(await order.reload()).toMatchObject({ state: 'expired' })
    const [attempt] = await attemptsOf(order)
    expect(attempt?.state).toBe('abandoned')
    const session = await payments().getCheckout({
      account: world.account,
      sessionId: attempt?.providerSessionId ?? '',
    })
    expect(session).toMatchObject({ ok: true, value: { state: 'expired' } })
    expect((await world.run.reload()).committedUnits).toBe(2)
    await expect(pay(payUrl)).resolves.toMatchObject({ outcome: 'failed' })
    await settleAll()
    expect(await order.reload()).toMatchObject({ state: 'expired' })
  })

  test('counts whoever had paid by then, though the event was still on its way', async () => {
    await reserved(world.run)
    await reserved(world.run)
    const { order, payUrl } = await placed(world.run)
    await pay(payUrl)
    expect(await lock()).toMatchObject({ ok: true })
    expect(await order.reload()).toMatchObject({ state: 'reserved' })
    const decision = await Decision.findOne({ where: { runId: world.run.id } })
    expect(decision?.figures).toMatchObject({ deposited: 3 })
  })

  test('keeps the place of somebody who waited and was offered one', async () => {
    await reserved(world.run)
    await reserved(world.run)
    const { order } = await placed(world.run)
    const holdUntil = new Date(NOW.getTime() + 47 * 3_600_000)
    await order.update({ placeOfferedAt: NOW, holdUntil })
    expect(await lock()).toMatchObject({ ok: true })
    expect(await order.reload()).toMatchObject({ state: 'awaiting_deposit', holdUntil })
  })

  test('announces balances at once where they fall due at the lock', async () => {
    await world.run.update({ balanceWhen: 'at_lock' })
    const { order } = await reserved(world.run)
    await reserved(world.run)
    expect(await lock()).toMatchObject({ ok: true })
    expect((await world.run.reload()).balancesAskedAt).toEqual(NOW)
    await runJobs()
    expect((await order.reload()).state).toBe('balance_due')
    expect(await MailOutbox.count({ where: { kind: 'balance_coming', subjectId: order.id } })).toBe(1)
  })

  test('ends invitations nobody answered, and is no longer called off by the clock', async () => {
    await reserved(world.run)
    await reserved(world.run)
    const { signup, person } = await makeSignUp(world.offers.kit)
    const invitation = await Invitation.create({
      workshopId: world.workshop.id,
      runId: world.run.id,
      signupId: signup.id,
      personId: person.id,
      sentAt: NOW,
      answeredAt: null,
    })
    await lock()
    expect((await invitation.reload()).state).toBe('expired')
    const due = await DueItem.findAll({ where: { subjectId: world.run.id, doneAt: null } })
    expect(due.map(({ kind }) => kind)).not.toContain('decide_by_passed')
  })
})

describe('a run is not locked', () => {
  const refused = async (answer: Awaited<ReturnType<typeof lock>>, reason: string) => {
    expect(answer).toMatchObject({ ok: false, reason })
    expect(await stateOf()).toBe('taking_deposits')
    expect(await Waiver.count({ where: { runId: world.run.id } })).toBe(0)
    expect(await Decision.count({ where: { runId: world.run.id } })).toBe(0)
  }

  test('below its minimum without a reason; held places and orders entered by hand do not count', async () => {
    await reserved(world.run)
    await placed(world.run)
    await makeOrder(
      { run: world.run, lines: [{ offer: world.runOffers.kit, quantity: 1 }] },
      { kind: 'manual', state: 'paid', manualReason: 'A tester', enteredByPersonId: world.owner.id },
    )
    await refused(await lock(), 'below_minimum')
    // Nobody's card page was closed for a lock that could not be.
    expect(await Order.count({ where: { runId: world.run.id, state: 'awaiting_deposit' } })).toBe(1)
  })

  describe('while a line of the readiness list is not ready', () => {
    beforeEach(async () => {
      await reserved(world.run)
      await reserved(world.run)
    })
    test('since the provider has kept its fees of the deposits', async () =>
      refused(await lock({}), 'not_ready'))
    test('a reason for another line does not help', async () => {
      await world.revision.update({ firstGoodAt: null, firstGoodByPersonId: null, firstGoodHow: null })
      await refused(await lock(), 'not_ready')
    })
    test('a line without data is not ready either, until it is let pass', async () => {
      await world.revision.update({ firstGoodAt: null, firstGoodByPersonId: null, firstGoodHow: null })
      const waivers = [...FEES_WAIVED, { key: 'first_good_unit' as const, reason: 'Seen at the fair.' }]
      expect(await lock({ waivers })).toMatchObject({ ok: true })
      const kept = await Waiver.findAll({ where: { runId: world.run.id }, order: [['key', 'ASC']] })
      expect(kept.map(({ key, reason, byPersonId }) => [key, reason, byPersonId])).toEqual([
        ['first_good_unit', 'Seen at the fair.', world.owner.id],
        ['repay', FEES_WAIVED[0]?.reason, world.owner.id],
      ])
    })
    test('with other words typed than those asked for', async () => {
      await refused(await lock({ waivers: FEES_WAIVED, typed: 'lock it' }), 'invalid')
      const typed = ` LOCK ${world.module.slug}`
      expect(await lock({ waivers: FEES_WAIVED, typed })).toMatchObject({ ok: true })
    })
    test('twice', async () => {
      expect(await lock()).toMatchObject({ ok: true })
      expect(await lock()).toEqual({ ok: false, reason: 'not_allowed' })
    })
    test('by two hands at once: one wins', async () => {
      const both = await Promise.all([lock(), lock()])
      expect(both.filter(({ ok }) => ok)).toHaveLength(1)
      expect(await Decision.count({ where: { runId: world.run.id } })).toBe(1)
    })
    test('by anyone but its owner', async () => {
      const { person } = await makeUser({ workshopId: world.workshop.id, role: 'bench' })
      await refused(await lock({}, { actor: await actorOf(person) }), 'forbidden')
      const other = await moneyWorld()
      await refused(await lock({}, { runId: other.run.id }), 'not_found')
    })
  })
})
