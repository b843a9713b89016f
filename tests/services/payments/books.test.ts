import { afterAll, expect, test } from 'vitest'
import { type Movement, reconcile } from '@/lib/core/ledger/entries'
import type { Result } from '@/lib/core/result'
import { payments } from '@/lib/gateways/payments'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { cancelOrder } from '@/lib/services/orders/cancel-order'
import { chargeBalance } from '@/lib/services/payments/charge-balance'
import { LedgerTransfer, PaymentAttempt, Refund, Run } from '@/models'
import { minutesLater } from '@/tests/support/business-time'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { booksOf, CARD, moneyWorld, pay, placed, reserved, settleAll } from '@/tests/support/worlds/money'

afterAll(closeSandboxPool)

function valueOf<T>(result: Result<T, string>): T {
  if (!result.ok) throw new Error(result.reason)
  return result.value
}

test('after a run of everything the books equal the provider’s own lists, to the cent', async () => {
  const world = await moneyWorld({ maximum: 20 })
  const { account, run, workshop } = world
  const kept = [await reserved(run), await reserved(run, { lines: [{ offer: 'built', quantity: 2 }] })]
  const gone = await reserved(run)
  await cancelOrder({ actor: gone.actor, orderId: gone.order.id, now: NOW })
  const racing = await placed(run)
  await pay(racing.payUrl)
  await cancelOrder({ actor: racing.actor, orderId: racing.order.id, now: NOW })
  const unpaid = await placed(run)
  await pay(unpaid.payUrl, CARD.refused)
  await settleAll()
  await Run.update({ state: 'locked', lockedAt: NOW }, { where: { id: run.id } })
  for (const { order } of kept) {
    await order.update({ state: 'balance_due', balanceAskedAt: NOW, balanceChargeAt: NOW })
    await chargeBalance({ orderId: order.id, now: NOW })
  }
  await settleAll()

  const window = { account, from: hoursAfter(NOW, -1), to: minutesLater(NOW, 30) }
  const charges = valueOf(await payments().listCharges(window))
  const refunds = valueOf(await payments().listRefunds(window))
  const fees = valueOf(await payments().listFees(window))
  const where = { workshopId: workshop.id }
  const captured = await PaymentAttempt.findAll({ where: { ...where, state: 'captured' } })
  const sent = await Refund.findAll({ where: { ...where, state: ['pending', 'succeeded'] } })
  const ours: Movement[] = [
    ...captured.map(({ chargeId, amountMinor, currency }) => ({
      id: chargeId ?? '',
      kind: 'charge' as const,
      amount: amountMinor,
      currency,
    })),
    ...sent.map(({ providerId, amountMinor, currency }) => ({
      id: providerId ?? '',
      kind: 'refund' as const,
      amount: amountMinor,
      currency,
    })),
  ]
  expect([charges.length, refunds.length]).toEqual([6, 2])
  expect(reconcile(ours, [...charges, ...refunds])).toEqual([])

  const balance = valueOf(await payments().balance({ account }))
  const there = [...balance.available, ...balance.pending].reduce((sum, { amount }) => sum + amount, 0)
  const books = await booksOf(workshop.id)
  expect(books.provider_balance).toBe(there)
  expect((books.processing_fees ?? 0) + (books.fees_lost_on_refunds ?? 0)).toBe(
    fees.reduce((sum, { amount }) => sum + amount, 0),
  )
  expect(Object.values(books).reduce((sum, amount) => sum + amount, 0)).toBe(0)
  expect(await LedgerTransfer.count({ where })).toBe(6 + 6 + 2)
})
