import 'server-only'
import { randomUUID } from 'node:crypto'
import { ok, refuse, type Result } from '@/lib/core/result'
import { payments } from '@/lib/gateways/payments'
import {
  lookUpAttempt,
  truthOfCheckout,
  truthOfPayment,
  type Truth,
} from '@/lib/services/_steps/look-up-attempt'
import { LIVE } from '@/lib/services/_steps/move-attempt'
import { recordTruth } from '@/lib/services/_steps/settle-attempt'
import { PaymentAttempt } from '@/models'

/**
 * Makes sure that no payment of an order can still be captured, at the provider first: open card sessions are expired,
 * payments that wait for the buyer are cancelled. A buyer who was faster has paid, and that is written down: look at the
 * order's state afterwards. For tasks and services, outside any transaction.
 * Refuses: payment_in_flight (the provider did not answer, or money is on its way: try again later).
 * Locks: run, order, attempt, per payment, in transactions of their own. Writes: as `recordTruth`. Repeat: safe.
 */
export async function endOpenPayments(
  orderId: string,
  now: Date,
): Promise<Result<{ ended: number }, 'payment_in_flight'>> {
  const live = await PaymentAttempt.findAll({ where: { orderId, state: [...LIVE] } })
  for (const attempt of live) {
    const truth = await endOne(attempt)
    if (truth.state === 'unavailable') return refuse('payment_in_flight')
    const recorded = await recordTruth(attempt.id, truth, { now })
    if (!recorded.ok || LIVE.includes(recorded.value.state)) return refuse('payment_in_flight')
  }
  return ok({ ended: live.length })
}

async function endOne(attempt: PaymentAttempt): Promise<Truth> {
  const account = attempt.providerAccountId
  const found = await lookUpAttempt(attempt)
  // Ending twice is ending once, so each call has a key of its own.
  const key = `end:${attempt.id}:${randomUUID()}`
  if (found.state === 'open') {
    const ended = await payments().expireCheckout({ account, key, sessionId: found.sessionId })
    return ended.ok ? truthOfCheckout(ended.value) : { state: 'unavailable' }
  }
  if (found.state === 'needs_customer') {
    const ended = await payments().cancelPayment({ account, key, payment: found.payment.payment })
    return ended.ok ? truthOfPayment(ended.value) : { state: 'unavailable' }
  }
  return found
}
