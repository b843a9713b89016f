import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { enqueue } from '@/lib/jobs/enqueue'
import { breakCalls } from '@/lib/gateways/payments/fake/break-calls'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { expireHold } from '@/lib/services/orders/expire-hold'
import { payOrder } from '@/lib/services/payments/pay-order'
import { MailOutbox } from '@/models'
import { minutesLater, setBusinessTime } from '@/tests/support/business-time'
import { runJobs } from '@/tests/support/run-jobs'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { attemptsOf, moneyWorld, pay, placed, settleAll } from '@/tests/support/worlds/money'

let world: Awaited<ReturnType<typeof moneyWorld>>
beforeEach(async () => {
  breakCalls(null)
  world = await moneyWorld()
})
afterAll(closeSandboxPool)

const LATER = minutesLater(NOW, 32)

describe('a hold that ends', () => {
  test('unpaid, gives the place back once the session is known to be over, and says so', async () => {
    const { order } = await placed(world.run)
    await setBusinessTime(LATER)
    expect(await expireHold({ orderId: order.id, now: LATER })).toEqual({
      ok: true,
      value: { state: 'expired' },
    })
    expect((await attemptsOf(order))[0]!.state).toBe('abandoned')
    expect((await world.run.reload()).committedUnits).toBe(0)
    const mails = await MailOutbox.findAll({ where: { subjectId: order.id, kind: 'place_released' } })
    expect(mails.map(({ props }) => props)).toMatchObject([{ canOrderAgain: true }])
    expect(await expireHold({ orderId: order.id, now: LATER })).toEqual({
      ok: true,
      value: { state: 'expired' },
    })
    await settleAll()
    expect((await world.run.reload()).committedUnits).toBe(0)
  })

  test('before its time nothing happens', async () => {
    const { order } = await placed(world.run)
    await expireHold({ orderId: order.id, now: minutesLater(NOW, 30) })
    expect((await order.reload()).state).toBe('awaiting_deposit')
  })

  test('keeps the place of a buyer who paid at the last moment, though the event was lost', async () => {
    const { order, payUrl } = await placed(world.run)
    await pay(payUrl)
    expect(await expireHold({ orderId: order.id, now: LATER })).toMatchObject({
      value: { state: 'reserved' },
    })
    await settleAll()
    expect((await world.run.reload()).committedUnits).toBe(1)
  })

  test('keeps the place while the provider does not answer', async () => {
    const { order } = await placed(world.run)
    breakCalls(() => 'before')
    expect(await expireHold({ orderId: order.id, now: LATER })).toMatchObject({ reason: 'payment_in_flight' })
    expect((await order.reload()).state).toBe('awaiting_deposit')
    expect((await world.run.reload()).committedUnits).toBe(1)
  })

  test('by its due row, as time passes', async () => {
    const { order } = await placed(world.run)
    await setBusinessTime(LATER)
    await inTransaction(async (tx) => {
      await enqueue(tx, 'due', {})
      return ok({})
    })
    await runJobs()
    expect((await order.reload()).state).toBe('expired')
  })
})

test('a freed place is offered to the next in line for 48 hours, who pays or loses it to the one behind', async () => {
  const { run } = world
  await run.update({ maximum: 1, minimum: 1 })
  const { order } = await placed(run)
  const second = await placed(run)
  const third = await placed(run)
  await setBusinessTime(LATER)
  await expireHold({ orderId: order.id, now: LATER })
  await runJobs()
  const offered = await second.order.reload()
  expect(offered.state).toBe('awaiting_deposit')
  // The job takes its time from the clock, which has gone on a little.
  expect(Math.abs(offered.holdUntil!.getTime() - hoursAfter(LATER, 48).getTime())).toBeLessThan(30_000)
  expect((await third.order.reload()).state).toBe('waiting')
  const mails = await MailOutbox.findAll({ where: { kind: 'place_free' } })
  expect(mails.filter(({ subjectId }) => subjectId === second.order.id)).toHaveLength(1)

  const nearlyOver = hoursAfter(LATER, 47.9)
  await setBusinessTime(nearlyOver)
  const link = await payOrder({ actor: second.actor, orderId: second.order.id, now: nearlyOver })
  expect(link.ok).toBe(true)
  // The card session lasts longer than the offer: the hold lasts as long as the session.
  const afterOffer = hoursAfter(LATER, 48.2)
  await expireHold({ orderId: second.order.id, now: afterOffer })
  expect((await second.order.reload()).state).toBe('awaiting_deposit')

  const over = hoursAfter(LATER, 49)
  await setBusinessTime(over)
  await expireHold({ orderId: second.order.id, now: over })
  await runJobs()
  expect((await second.order.reload()).state).toBe('expired')
  expect((await third.order.reload()).state).toBe('awaiting_deposit')
  expect((await run.reload()).committedUnits).toBe(1)
})
