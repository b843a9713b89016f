import 'server-only'
import { ok, refuse, type Result } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { lookUpAttempt, type Truth } from '@/lib/services/_steps/look-up-attempt'
import { recordAttempt } from '@/lib/services/_steps/record-attempt'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { PaymentAttempt } from '@/models'

/**
 * Writes down how a payment stands, in a transaction of its own with the locks in their order.
 * Refuses: not_found. Locks: run, order, attempt. Writes: what `recordAttempt` writes. Repeat: safe.
 */
export async function recordTruth(
  attemptId: string,
  truth: Truth,
  by: { now: Date; eventId?: string | null },
): Promise<Result<PaymentAttempt, 'not_found'>> {
  return inTransaction(async (tx) => {
    const seen = await PaymentAttempt.findByPk(attemptId, { attributes: ['orderId'], transaction: tx })
    const locked = seen && (await lockOrder(tx, seen.orderId))
    if (!locked) return refuse('not_found')
    const attempt = await PaymentAttempt.findByPk(attemptId, {
      transaction: tx,
      lock: tx.LOCK.UPDATE,
      rejectOnEmpty: true,
    })
    await recordAttempt(tx, { ...locked, attempt }, truth, by)
    return ok(attempt)
  })
}

/**
 * Asks the provider how a payment stands and writes it down.
 * Refuses: not_found · provider_unreachable (nothing is known; ask again). Locks, writes: as `recordTruth`. Repeat: safe.
 */
export async function settle(
  attemptId: string,
  by: { now: Date; eventId?: string | null },
): Promise<Result<{ attempt: PaymentAttempt; truth: Truth }, 'not_found' | 'provider_unreachable'>> {
  const seen = await PaymentAttempt.findByPk(attemptId)
  if (!seen) return refuse('not_found')
  const truth = await lookUpAttempt(seen)
  if (truth.state === 'unavailable') return refuse('provider_unreachable')
  const attempt = await recordTruth(attemptId, truth, by)
  return attempt.ok ? ok({ attempt: attempt.value, truth }) : attempt
}
