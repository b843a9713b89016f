import { Client } from 'pg'
import { afterAll, beforeEach, expect, test } from 'vitest'
import { sequelize } from '@/lib/db/sequelize'
import { inTransaction } from '@/lib/db/in-transaction'
import { ok } from '@/lib/core/result'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { placeOrder } from '@/lib/services/orders/place-order'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { releasePlace } from '@/lib/services/_steps/release-place'
import { Order, Refund } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { makeRun } from '@/tests/support/worlds/run'
import {
  attemptsOf,
  booksOf,
  makeBuyer,
  moneyWorld,
  orderInput,
  pay,
  placed,
  settleAll,
} from '@/tests/support/worlds/money'

const STARTER = 4711
const TRIES = 20

let world: Awaited<ReturnType<typeof moneyWorld>>
beforeEach(async () => {
  world = await moneyWorld()
})
afterAll(closeSandboxPool)

/** Both wait for one advisory lock and go on at the same instant. */
async function released<T>(runs: (() => Promise<T>)[]): Promise<T[]> {
  const starter = new Client({ connectionString: process.env.DATABASE_URL })
  await starter.connect()
  await starter.query('select pg_advisory_lock($1)', [STARTER])
  const waiting = runs.map((run) =>
    sequelize
      .transaction(async (transaction) => {
        await sequelize.query('select pg_advisory_xact_lock_shared(:key)', {
          replacements: { key: STARTER },
          transaction,
        })
      })
      .then(run),
  )
  await expect
    .poll(async () => {
      const { rows } = await starter.query<{ count: number }>(
        `select count(*)::int as count from pg_locks where locktype = 'advisory' and objid = $1 and not granted`,
        [STARTER],
      )
      return rows[0]?.count
    })
    .toBe(runs.length)
  await starter.query('select pg_advisory_unlock($1)', [STARTER])
  const done = await Promise.all(waiting)
  await starter.end()
  return done
}

test('of two who want the last place exactly one gets it, every time; the other is never charged', async () => {
  for (let round = 0; round < TRIES; round += 1) {
    const { run } = await makeRun(world)
    await run.update({ maximum: 3, minimum: 1, committedUnits: 2 })
    const buyers = [await makeBuyer(), await makeBuyer()]
    const answers = await released(
      buyers.map((buyer) => () => placeOrder({ actor: buyer.actor, input: orderInput(run), now: NOW })),
    )
    const states = answers.map((answer) => (answer.ok ? answer.value.state : answer.reason)).sort()
    expect(states).toEqual(['awaiting_deposit', 'waiting'])
    expect((await run.reload()).committedUnits).toBe(3)
    const orders = await Order.findAll({ where: { runId: run.id } })
    const loser = orders.find(({ state }) => state === 'waiting')!
    expect(await attemptsOf(loser)).toEqual([])
  }
})

test('the database itself refuses one unit too many', async () => {
  const { run } = world
  await expect(run.update({ committedUnits: run.maximum + 1 })).rejects.toMatchObject({
    parent: { constraint: 'runs_committed_within_maximum_check' },
  })
})

async function endHold(orderId: string) {
  await inTransaction(async (tx) => {
    const { order } = (await lockOrder(tx, orderId))!
    const moved = await moveOrder(tx, order, 'hold_ended', { now: NOW })
    if (!moved.ok) return moved
    await releasePlace(tx, order)
    return ok({})
  })
}

test('money for a place that was given away meanwhile goes back at once', async () => {
  const { run, workshop } = world
  await run.update({ maximum: 1, minimum: 1 })
  const late = await placed(run)
  await pay(late.payUrl)
  // The money is with the provider, its event on the way, when the hold ends and somebody else takes the place.
  await endHold(late.order.id)
  const { order: winner, payUrl } = await placed(run)
  await pay(payUrl)
  await settleAll()
  expect((await winner.reload()).state).toBe('reserved')
  expect((await late.order.reload()).state).toBe('expired')
  const refunds = await Refund.findAll({ where: { orderId: late.order.id } })
  expect(refunds).toMatchObject([{ cause: 'late_capture', amountMinor: 2_500, state: 'succeeded' }])
  expect((await attemptsOf(late.order))[0]).toMatchObject({ state: 'captured', surplusAt: expect.any(Date) })
  // Both paid 25.00, one had it back; two fees of 0.63, of which one is lost on the refund.
  expect(await booksOf(workshop.id)).toEqual({
    provider_balance: 2_500 - 126,
    customer_deposits: -2_500,
    processing_fees: 63,
    fees_lost_on_refunds: 63,
  })
})

test('money that comes late takes the place again while it is free', async () => {
  const { run } = world
  const late = await placed(run)
  await pay(late.payUrl)
  await endHold(late.order.id)
  expect((await run.reload()).committedUnits).toBe(0)
  await settleAll()
  expect((await late.order.reload()).state).toBe('reserved')
  expect((await run.reload()).committedUnits).toBe(1)
})
