import 'server-only'
import type { Transaction } from 'sequelize'
import { minor, type Minor } from '@/lib/core/brand'
import { mayRefund } from '@/lib/core/states/order-guards'
import { requestRefund } from '@/lib/services/_steps/request-refund'
import { type Order, PaymentAttempt, Refund } from '@/models'
import type { RefundCause } from '@/models/words'

/**
 * Requests back everything captured for an order and not paid back yet: one refund per payment, each sent by a job.
 * Of a disputed order nothing is requested (the buyer's bank may pay it back, and twice is too much): the answer is 0,
 * and what is left is requested when the dispute is won.
 * Locks: the order's captured attempts; the caller has locked the order. Writes: refunds, audit entries, jobs.
 * Repeat: safe; what was requested before is not requested again, and the answer counts what is new.
 */
export async function refundOrder(
  tx: Transaction,
  given: { order: Order; why: RefundCause; now: Date; reason?: string | null; byPersonId?: string | null },
): Promise<{ refundMinor: Minor }> {
  const { order } = given
  const attempts = await PaymentAttempt.findAll({
    where: { orderId: order.id, state: 'captured' },
    order: [['id', 'ASC']],
    transaction: tx,
    lock: tx.LOCK.UPDATE,
  })
  let refundMinor = 0
  for (const attempt of attempts) {
    const refundedMinor = await repaidOf(tx, attempt)
    const amountMinor = minor(attempt.amountMinor - refundedMinor)
    if (amountMinor <= 0) continue
    const asked = { capturedMinor: attempt.amountMinor, refundedMinor, amountMinor }
    if (!mayRefund({ ...asked, disputed: order.disputedAt !== null }).ok) continue
    await requestRefund(tx, { ...given, attempt, amountMinor })
    refundMinor += amountMinor
  }
  return { refundMinor: minor(refundMinor) }
}

/** What of a payment went back or is on its way back; failed refunds do not count. */
export async function repaidOf(tx: Transaction, attempt: PaymentAttempt): Promise<number> {
  const refunds = await Refund.findAll({
    where: { attemptId: attempt.id },
    attributes: ['amountMinor', 'state'],
    transaction: tx,
  })
  return refunds
    .filter(({ state }) => state !== 'failed')
    .reduce((sum, { amountMinor }) => sum + amountMinor, 0)
}
