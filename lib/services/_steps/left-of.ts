import 'server-only'
import type { Transaction } from 'sequelize'
import { minor, type Minor } from '@/lib/core/brand'
import { repaidOf } from '@/lib/services/_steps/refund-order'
import { type Order, PaymentAttempt } from '@/models'

/** What was taken for an order and is not on its way back, in minor units. Locks, writes: nothing. */
export async function leftOf(tx: Transaction, order: Order): Promise<Minor> {
  const captured = await PaymentAttempt.findAll({
    where: { orderId: order.id, state: 'captured' },
    transaction: tx,
  })
  let left = 0
  for (const attempt of captured) left += attempt.amountMinor - (await repaidOf(tx, attempt))
  return minor(left)
}
