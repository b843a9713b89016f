import 'server-only'
import type { Transaction } from 'sequelize'
import { minor } from '@/lib/core/brand'
import { repaidOf } from '@/lib/services/_steps/refund-order'
import { requestRefund } from '@/lib/services/_steps/request-refund'
import { type Order, PaymentAttempt } from '@/models'
import type { RefundCause } from '@/models/words'

/**
 * Requests back part of what was captured for an order, from its latest payments first. What is left of them bounds it.
 * Locks: the order's captured attempts; the caller has locked the order and seen that it is not disputed. Writes: refunds,
 * audit entries, jobs. Repeat: not safe; it requests another part.
 */
export async function refundPart(
  tx: Transaction,
  given: {
    order: Order
    amountMinor: number
    why: RefundCause
    now: Date
    reason?: string | null
    byPersonId?: string | null
  },
): Promise<number> {
  const attempts = await PaymentAttempt.findAll({
    where: { orderId: given.order.id, state: 'captured', surplusAt: null },
    order: [
      ['endedAt', 'DESC'],
      ['id', 'DESC'],
    ],
    transaction: tx,
    lock: tx.LOCK.UPDATE,
  })
  let wanted = given.amountMinor
  for (const attempt of attempts) {
    const amount = Math.min(wanted, attempt.amountMinor - (await repaidOf(tx, attempt)))
    if (amount <= 0) continue
    await requestRefund(tx, { ...given, attempt, amountMinor: minor(amount) })
    wanted -= amount
  }
  return given.amountMinor - wanted
}
