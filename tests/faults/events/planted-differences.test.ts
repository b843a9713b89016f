import { afterAll, beforeAll, expect, test } from 'vitest'
import { type Difference, type Movement, reconcile } from '@/lib/core/ledger/reconcile'
import { payments } from '@/lib/gateways/payments'
import { plantChange, plantLoss, plantTwin } from '@/lib/gateways/payments/fake/plant'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { cancelOrder } from '@/lib/services/orders/cancel-order'
import { PaymentAttempt, Refund } from '@/models'
import { businessTime } from '@/tests/support/business-time'
import { NOW } from '@/tests/support/worlds/base'
import { moneyWorld, pay, placed, settleAll } from '@/tests/support/worlds/money'

// Fifty differences of all four kinds are planted in the provider's books: each is found, none is invented.
const CHARGES = 40
const REFUNDS = 10
/** How many of each kind; a charge is in at most one of them. */
const PLANTED = { missing_there: 12, missing_here: 13, amount: 13, currency: 12 }

let world: Awaited<ReturnType<typeof moneyWorld>>
beforeAll(async () => {
  world = await moneyWorld({ maximum: 200 })
  for (let nth = 0; nth < CHARGES; nth += 1) {
    const { order, actor, payUrl } = await placed(world.run, {}, await businessTime())
    await pay(payUrl)
    if (nth % (CHARGES / REFUNDS) !== 0) continue
    await settleAll()
    await cancelOrder({ actor, orderId: order.id, now: await businessTime() })
  }
  await settleAll()
}, 300_000)
afterAll(closeSandboxPool)

async function ours(): Promise<Movement[]> {
  const where = { workshopId: world.workshop.id }
  const captured = await PaymentAttempt.findAll({ where: { ...where, state: 'captured' } })
  const back = await Refund.findAll({ where: { ...where, state: 'succeeded' } })
  const movement = (kind: 'charge' | 'refund', id: string | null, amount: number, currency: string) => ({
    ...{ kind, id: id ?? '', amount, currency },
  })
  return [
    ...captured.map((each) => movement('charge', each.chargeId, each.amountMinor, each.currency)),
    ...back.map((each) => movement('refund', each.providerId, each.amountMinor, each.currency)),
  ]
}

async function theirs(): Promise<Movement[]> {
  const window = {
    account: world.account,
    from: NOW,
    to: new Date((await businessTime()).getTime() + 60_000),
  }
  const [charges, refunds] = await Promise.all([
    payments().listCharges(window),
    payments().listRefunds(window),
  ])
  if (!charges.ok || !refunds.ok) throw new Error('the lists cannot be read')
  return [...charges.value, ...refunds.value]
}

const key = ({ kind, id }: Pick<Difference, 'kind' | 'id'>) => `${kind} ${id}`

test('fifty planted differences: all found, none invented', async () => {
  const mine = await ours()
  expect(mine).toHaveLength(CHARGES + REFUNDS)
  expect(reconcile(mine, await theirs())).toEqual([])

  const untouched = [...mine]
  const expected: string[] = []
  const take = () => untouched.shift()!
  for (let nth = 0; nth < PLANTED.missing_there; nth += 1) {
    const { id } = take()
    await plantLoss(id)
    expected.push(key({ kind: 'missing_there', id }))
  }
  for (let nth = 0; nth < PLANTED.amount; nth += 1) {
    const { id, kind, amount } = take()
    const fields = kind === 'charge' ? { amount_captured: amount + nth + 1 } : { amount: amount + nth + 1 }
    await plantChange(id, fields)
    expected.push(key({ kind: 'amount', id }))
  }
  for (let nth = 0; nth < PLANTED.currency; nth += 1) {
    const { id } = take()
    await plantChange(id, { currency: 'usd' })
    expected.push(key({ kind: 'currency', id }))
  }
  for (let nth = 0; nth < PLANTED.missing_here; nth += 1) {
    const { id, kind } = untouched[nth % untouched.length]!
    const twin = await plantTwin(id, kind === 'charge' ? 'charge' : 'refund', nth)
    expected.push(key({ kind: 'missing_here', id: twin }))
  }
  expect(expected).toHaveLength(50)
  expect(
    reconcile(mine, await theirs())
      .map(key)
      .sort(),
  ).toEqual(expected.sort())
})
