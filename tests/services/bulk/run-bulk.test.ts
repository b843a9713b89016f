import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { inTransaction } from '@/lib/db/in-transaction'
import { ok } from '@/lib/core/result'
import { callOffRun } from '@/lib/services/runs/call-off-run'
import { startBulk } from '@/lib/services/_steps/start-bulk'
import { startBalanceCharges } from '@/lib/services/balances/start-balance-charges'
import { workBulkItem } from '@/lib/services/bulk/work-bulk-item'
import { runBulk } from '@/lib/tasks/run-bulk'
import { BulkItem, BulkJob, Invitation, MailOutbox, PaymentAttempt, Refund } from '@/models'
import { setBusinessTime } from '@/tests/support/business-time'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { booksOf, CARD, moneyWorld, placed, reserved, settleAll } from '@/tests/support/worlds/money'
import { actorOf } from '@/tests/support/worlds/person'
import { makeSignUp } from '@/tests/support/worlds/sign-up'

let world: Awaited<ReturnType<typeof moneyWorld>>
beforeEach(async () => {
  world = await moneyWorld()
})
afterAll(closeSandboxPool)

const context = { jobId: '1', attempt: 1, maxAttempts: 25 }

async function begin(kind: 'invite' | 'ask_balances', subjectIds: string[]) {
  const { run } = world
  const started = await inTransaction(async (tx) =>
    ok(await startBulk(tx, { kind, run, subjectIds, byPersonId: null, now: NOW })),
  )
  return started.value
}

/** In a process that kills itself once a row is ticked off. */
async function workAndDie(bulk: BulkJob) {
  const child = spawn(
    process.execPath,
    ['--import', 'tsx', 'tests/services/bulk/fixtures/work-bulk.ts', bulk.id],
    {
      env: { ...process.env, CRASH_AT: 'bulk_item_done', TSX_TSCONFIG_PATH: 'tsconfig.scripts.json' },
      stdio: ['ignore', 'ignore', 'inherit'],
    },
  )
  const [, signal] = await once(child, 'exit')
  expect(signal).toBe('SIGKILL')
}

const statesOf = async (bulk: BulkJob) =>
  (await BulkItem.findAll({ where: { bulkJobId: bulk.id }, order: [['position', 'ASC']] })).map(
    ({ state }) => state,
  )

describe('a bulk job', () => {
  test('killed after each row goes on where it was and does nothing twice', async () => {
    const ids: string[] = []
    for (let i = 0; i < 3; i += 1) ids.push((await makeSignUp(world.offers.kit)).signup.id)
    const bulk = await begin('invite', ids)
    await workAndDie(bulk)
    expect(await statesOf(bulk)).toEqual(['done', 'waiting', 'waiting'])
    await workAndDie(bulk)
    expect(await statesOf(bulk)).toEqual(['done', 'done', 'waiting'])
    await runBulk({ bulkId: bulk.id }, context)
    expect(await statesOf(bulk)).toEqual(['done', 'done', 'done'])
    expect((await bulk.reload()).doneAt).not.toBeNull()
    const invited = await Invitation.findAll({ where: { runId: world.run.id } })
    expect(invited).toHaveLength(3)
    const subjectId = invited.map(({ id }) => id)
    expect(await MailOutbox.count({ where: { kind: 'deposits_open', subjectId } })).toBe(3)
  })

  test('worked by two at once does each row once', async () => {
    const ids: string[] = []
    for (let i = 0; i < 6; i += 1) ids.push((await makeSignUp(world.offers.kit)).signup.id)
    const bulk = await begin('invite', ids)
    await Promise.all([runBulk({ bulkId: bulk.id }, context), runBulk({ bulkId: bulk.id }, context)])
    expect(await statesOf(bulk)).toEqual(Array(6).fill('done'))
    expect(await Invitation.count({ where: { runId: world.run.id } })).toBe(6)
  })

  test('takes the same row in once, and a row ticked off is left alone', async () => {
    const { signup } = await makeSignUp(world.offers.kit)
    const bulk = await begin('invite', [signup.id, signup.id])
    const items = await BulkItem.findAll({ where: { bulkJobId: bulk.id } })
    expect(items).toHaveLength(1)
    await runBulk({ bulkId: bulk.id }, context)
    const doneAt = (await items[0]!.reload()).doneAt
    expect(await workBulkItem({ itemId: items[0]!.id, now: hoursAfter(NOW, 1) })).toEqual({
      ok: true,
      value: true,
    })
    expect((await items[0]!.reload()).doneAt).toEqual(doneAt)
  })

  test('passes over who has gone in the meantime', async () => {
    const { signup } = await makeSignUp(world.offers.kit)
    const bulk = await begin('invite', [signup.id])
    await signup.update({ state: 'taken_back', takenBackAt: NOW })
    await runBulk({ bulkId: bulk.id }, context)
    expect(await statesOf(bulk)).toEqual(['done'])
    expect(await Invitation.count({ where: { runId: world.run.id } })).toBe(0)
  })

  test('that cannot end a payment now leaves its row waiting and says that it comes again', async () => {
    const { order } = await placed(world.run)
    const called = await callOffRun({
      actor: await actorOf(world.owner),
      workshopId: world.workshop.id,
      runId: world.run.id,
      reason: 'No jacks.',
      now: NOW,
    })
    if (!called.ok) throw new Error('refused')
    const bulkId = String(called.value.bulk)
    // An answer that was lost: the provider has never heard of it, and less than a minute has passed.
    await PaymentAttempt.update(
      {
        state: 'unknown',
        providerId: null,
        providerSessionId: null,
        payUrl: null,
        requestedAt: hoursAfter(NOW, 1),
      },
      { where: { orderId: order.id } },
    )
    await PaymentAttempt.update({ params: { customer: 'cus_nobody' } }, { where: { orderId: order.id } })
    await expect(runBulk({ bulkId }, context)).rejects.toThrow('1 rows')
    expect((await order.reload()).state).toBe('awaiting_deposit')
    await PaymentAttempt.update({ requestedAt: NOW }, { where: { orderId: order.id } })
    await setBusinessTime(hoursAfter(NOW, 0.5))
    await runBulk({ bulkId }, context)
    expect((await order.reload()).state).toBe('cancelled')
  })
})

describe('money in bulk', () => {
  test('killed while paying everyone back, everyone is paid back once', async () => {
    const orders = [await reserved(world.run), await reserved(world.run), await reserved(world.run)]
    const called = await callOffRun({
      actor: await actorOf(world.owner),
      workshopId: world.workshop.id,
      runId: world.run.id,
      reason: 'No jacks.',
      now: NOW,
    })
    if (!called.ok) throw new Error('refused')
    const bulk = await BulkJob.findByPk(String(called.value.bulk), { rejectOnEmpty: true })
    await workAndDie(bulk)
    await workAndDie(bulk)
    await settleAll()
    expect(await statesOf(bulk)).toEqual(['done', 'done', 'done'])
    const refunds = await Refund.findAll({ where: { orderId: orders.map(({ order }) => order.id) } })
    expect(refunds.map(({ state, amountMinor }) => [state, amountMinor])).toEqual(
      Array(3).fill(['succeeded', 2500]),
    )
    expect((await booksOf(world.workshop.id))['customer_deposits']).toBeUndefined()
  })

  test('killed while charging, every card is charged once; a refused one is told apart', async () => {
    const orders = [
      await reserved(world.run),
      await reserved(world.run, {}, CARD.refusedLater),
      await reserved(world.run),
    ]
    await world.run.update({ state: 'locked', lockedAt: NOW })
    const asked = await begin(
      'ask_balances',
      orders.map(({ order }) => order.id),
    )
    await runBulk({ bulkId: asked.id }, context)
    const due = hoursAfter(NOW, 7 * 24 + 1)
    await setBusinessTime(due)
    await startBalanceCharges({ orderId: orders[0]!.order.id, now: due })
    const bulk = await BulkJob.findOne({
      where: { runId: world.run.id, kind: 'charge_balances' },
      rejectOnEmpty: true,
    })
    await workAndDie(bulk)
    expect(await statesOf(bulk)).toEqual(['done', 'waiting', 'waiting'])
    await runBulk({ bulkId: bulk.id }, context)
    await settleAll()
    expect(await statesOf(bulk)).toEqual(['done', 'failed', 'done'])
    const captured = await PaymentAttempt.findAll({
      where: { orderId: orders.map(({ order }) => order.id), purpose: 'balance' },
    })
    expect(captured.map(({ state }) => state).sort()).toEqual(['captured', 'captured', 'failed'])
    const failed = await BulkItem.findOne({ where: { bulkJobId: bulk.id, state: 'failed' } })
    expect(failed?.reason).toBe('failed')
  })
})
