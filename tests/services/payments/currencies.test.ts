import { afterAll, describe, expect, test } from 'vitest'
import { closeSandboxPool, sandboxPool } from '@/lib/gateways/payments/fake/pool'
import { compareBooks } from '@/lib/services/money/compare-books'
import { createRun } from '@/lib/services/runs/create-run'
import { askBalances } from '@/lib/services/runs/ask-balances'
import { chargeBalance } from '@/lib/services/payments/charge-balance'
import { withdrawOrder } from '@/lib/services/orders/withdraw-order'
import { receiveReturn } from '@/lib/services/returns/receive-return'
import { Refund } from '@/models'
import { setBusinessTime } from '@/tests/support/business-time'
import { runJobs } from '@/tests/support/run-jobs'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { attemptsOf, moneyWorld, reserved, settleAll } from '@/tests/support/worlds/money'
import { actorOf } from '@/tests/support/worlds/person'
import { handOver, pack } from '@/tests/support/worlds/post-order'

afterAll(closeSandboxPool)

/** What the provider itself holds, in its own units. Source: its published rules, from memory: yen without decimals, dinars in fils by tens. */
async function atProvider(id: string): Promise<{ amount: number; currency: string }> {
  const { rows } = await (await sandboxPool()).query('select body from sandbox.objects where id = $1', [id])
  const { amount, currency } = rows[0].body as { amount: number; currency: string }
  return { amount, currency }
}

describe.each([
  { currency: 'JPY', words: 'a kit at ¥9,500, a deposit of ¥2,500' },
  { currency: 'KWD', words: 'a kit at 9.500 KWD, a deposit of 2.500 KWD' },
])('a workshop in $currency ($words)', ({ currency }) => {
  test('goes the whole way: deposit, balance, posting, withdrawal and money back, with equal books', async () => {
    const world = await moneyWorld({ maximum: 10 }, { currency })
    await world.workshop.update({ depositsTaxed: true })
    const owner = await actorOf(world.owner)
    const workshopId = world.workshop.id
    const mine = await reserved(world.run)
    expect(mine.order).toMatchObject({ state: 'reserved', currency, depositMinor: 2500, totalMinor: 9990 })
    const [deposit] = await attemptsOf(mine.order)
    expect(await atProvider(deposit!.providerId!)).toEqual({ amount: 2500, currency: currency.toLowerCase() })

    await world.run.update({ state: 'locked', lockedAt: NOW })
    await askBalances({ actor: owner, workshopId, runId: world.run.id, now: NOW })
    await runJobs()
    expect(await chargeBalance({ orderId: mine.order.id, now: NOW })).toEqual({
      ok: true,
      value: { outcome: 'captured' },
    })
    await settleAll()
    await mine.order.reload()
    await pack(world, mine.order)
    await handOver(world, mine.order)
    await withdrawOrder({ actor: mine.actor, orderId: mine.order.id, now: NOW })
    await receiveReturn({ actor: owner, workshopId, orderId: mine.order.id, now: NOW })
    await settleAll()
    expect(await Refund.sum('amountMinor', { where: { orderId: mine.order.id, state: 'succeeded' } })).toBe(
      9990,
    )
    await setBusinessTime(hoursAfter(NOW, 2))
    expect(await compareBooks({ workshopId, now: hoursAfter(NOW, 2) })).toMatchObject({
      ok: true,
      value: { differences: [] },
    })
  })
})

test('a sum the provider cannot take in dinars is refused when the price is set, with a sentence at its field', async () => {
  const world = await moneyWorld({}, { currency: 'KWD' })
  const made = await createRun({
    actor: await actorOf(world.owner),
    workshopId: world.workshop.id,
    input: {
      module: world.module.slug,
      revision: 'A',
      minimum: 3,
      maximum: 5,
      decideBy: '2027-04-01',
      balanceWhen: 'at_lock',
      // Not a multiple of ten fils.
      offers: [{ offer: 'kit', priceMinor: 9505, depositMinor: 2500, postedBy: '2027-08-31' }],
    },
    now: NOW,
  })
  expect(made).toMatchObject({ ok: false, errors: { 'offers.0.priceMinor': expect.any(String) } })
})
