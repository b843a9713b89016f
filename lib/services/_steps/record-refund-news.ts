import 'server-only'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import type { RefundFacts } from '@/lib/gateways/payments/types'
import { recordRefund } from '@/lib/services/_steps/record-refund'
import { PaymentAttempt, Refund } from '@/models'

/**
 * Writes down what an event says of a refund; 'not_ours' when we did not ask for it (the daily comparison names those).
 * Locks: the refund. Writes: as `recordRefund`. Repeat: safe.
 */
export async function recordRefundNews(account: string, facts: RefundFacts, now: Date): Promise<string> {
  const seen = await Refund.findOne({
    where: facts.refundId === null ? { providerId: facts.id } : { id: facts.refundId },
    attributes: ['id'],
    include: [
      { model: PaymentAttempt, as: 'attempt', required: true, where: { providerAccountId: account } },
    ],
  })
  if (!seen) return 'not_ours'
  const done = await inTransaction(async (tx) => {
    const refund = await Refund.findByPk(seen.id, {
      transaction: tx,
      lock: tx.LOCK.UPDATE,
      rejectOnEmpty: true,
    })
    await recordRefund(tx, refund, facts, now)
    return ok({ state: refund.state })
  })
  return done.value.state
}
