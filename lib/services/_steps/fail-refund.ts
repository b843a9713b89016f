import 'server-only'
import type { Transaction } from 'sequelize'
import type { Minor } from '@/lib/core/brand'
import { setDue } from '@/lib/jobs/set-due'
import { moveRefund } from '@/lib/services/_steps/move-refund'
import { requestRefund } from '@/lib/services/_steps/request-refund'
import { PaymentAttempt, type Refund } from '@/models'

/** How long a refund waits for money before it is tried again. Own rule. */
const RETRY_AFTER_MS = 6 * 3_600_000

/**
 * Writes down that the provider certainly has not carried a refund out. Where trying again can help (the balance was
 * too small, the request never arrived) a new refund under a new key takes its place: the old key would only bring the
 * old answer. It waits for its due row, naming the shortfall.
 * Locks: the attempt; the caller has locked the refund. Writes: the refund, perhaps its successor, audit, a due row.
 * Repeat: refused by the state, nothing happens.
 */
export async function failRefund(
  tx: Transaction,
  refund: Refund,
  given: { code: string; now: Date; shortByMinor?: Minor | null; isTriedAgain: boolean },
): Promise<void> {
  const { code, now, shortByMinor = null } = given
  const moved = await moveRefund(tx, refund, 'fail', now, { failureCode: code, failedAt: now, shortByMinor })
  if (!moved.ok || !given.isTriedAgain) return
  const attempt = await PaymentAttempt.findByPk(refund.attemptId, {
    transaction: tx,
    lock: tx.LOCK.UPDATE,
    rejectOnEmpty: true,
  })
  const again = await requestRefund(tx, {
    attempt,
    amountMinor: refund.amountMinor,
    why: refund.cause,
    reason: refund.reason,
    byPersonId: refund.requestedByPersonId,
    retryOfId: refund.id,
    shortByMinor,
    isSentNow: shortByMinor === null,
    now,
  })
  if (shortByMinor === null) return
  const at = new Date(now.getTime() + RETRY_AFTER_MS)
  await setDue(tx, { kind: 'refund_retry', subjectId: again.id, workshopId: again.workshopId, at })
}
