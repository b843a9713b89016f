import 'server-only'
import { minor } from '@/lib/core/brand'
import { ok, refuse, type Result } from '@/lib/core/result'
import { crashPoint } from '@/lib/db/crash-point'
import { inTransaction } from '@/lib/db/in-transaction'
import { payments } from '@/lib/gateways/payments'
import { CheckoutParams } from '@/lib/services/_steps/attempt-params'
import { lookUpAttempt, type Truth } from '@/lib/services/_steps/look-up-attempt'
import { moveAttempt } from '@/lib/services/_steps/move-attempt'
import { recordTruth } from '@/lib/services/_steps/settle-attempt'
import { PaymentAttempt } from '@/models'

/**
 * Acts 2 and 3 of a payment on the card page: opens the session under the attempt's stored key, with its stored
 * parameters, and writes down what came of it. An answer that was lost is looked up at once; when that finds nothing
 * either, the attempt stays unknown until a webhook or a later look-up ends it, and `payUrl` is null.
 * Refuses: provider_refused (the provider certainly has no session; the attempt failed). Locks: run, order, attempt, in a
 * transaction of its own. Writes: attempt, hold. Repeat: safe; the same key opens the same session.
 */
export async function openCardSession(
  attemptId: string,
  now: Date,
): Promise<Result<{ payUrl: string | null }, 'provider_refused'>> {
  const attempt = await PaymentAttempt.findByPk(attemptId, { rejectOnEmpty: true })
  const { amount, expiresAt, ...params } = CheckoutParams.parse(attempt.params)
  crashPoint('attempt_requested')
  const made = await payments().createCheckout({
    ...params,
    key: attempt.idempotencyKey,
    amount: minor(amount),
    expiresAt: new Date(expiresAt),
  })
  crashPoint('provider_answered')
  const refusal = made.ok ? null : made.reason
  if (refusal !== null && refusal !== 'unknown_outcome' && refusal !== 'rate_limited') {
    await endUnopened(attemptId, refusal, now)
    return refuse('provider_refused')
  }
  const truth: Truth = made.ok ? { state: 'open', ...made.value } : await lookUpAttempt(attempt)
  const isLost = truth.state === 'never_had_it' || truth.state === 'unavailable'
  // Certainly not done when we were asked to slow down: the same key may be sent again.
  if (isLost && refusal !== 'rate_limited') await loseAnswer(attemptId, now)
  else if (!isLost) await recordTruth(attemptId, truth, { now })
  crashPoint('attempt_sent')
  return ok({ payUrl: truth.state === 'open' ? truth.url : null })
}

async function loseAnswer(attemptId: string, now: Date): Promise<void> {
  await inTransaction(async (tx) => {
    await moveAttempt(tx, await locked(attemptId, tx), 'lose_answer', now)
    return ok({})
  })
}

async function endUnopened(attemptId: string, code: string, now: Date): Promise<void> {
  await inTransaction(async (tx) => {
    await moveAttempt(tx, await locked(attemptId, tx), 'fail', now, { failureCode: code })
    return ok({})
  })
}

function locked(attemptId: string, tx: Parameters<Parameters<typeof inTransaction>[0]>[0]) {
  return PaymentAttempt.findByPk(attemptId, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true })
}
