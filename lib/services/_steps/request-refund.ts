import 'server-only'
import type { Transaction } from 'sequelize'
import type { Minor } from '@/lib/core/brand'
import { enqueue } from '@/lib/jobs/enqueue'
import { recordMove } from '@/lib/services/_steps/record-move'
import { type PaymentAttempt, Refund } from '@/models'
import type { RefundCause } from '@/models/words'

type Wanted = {
  attempt: PaymentAttempt
  amountMinor: Minor
  why: RefundCause
  now: Date
  /** The owner's words, told to the buyer. */
  reason?: string | null
  byPersonId?: string | null
  /** The failed refund this one repeats. */
  retryOfId?: string | null
  /** By how much the balance was short when it last failed; a refund that waits for money names it. */
  shortByMinor?: Minor | null
  /** False: it waits for its due row instead of a job. */
  isSentNow?: boolean
}

/**
 * Writes down that part of a captured payment goes back, under a key of its own, and promises the job that sends it.
 * The caller has locked the attempt and seen that so much is left of it; the database checks it once more at commit.
 * Locks: nothing more. Writes: one refund, one audit entry, one job. Repeat: makes another refund.
 */
export async function requestRefund(tx: Transaction, wanted: Wanted): Promise<Refund> {
  const { attempt, now } = wanted
  const last = await Refund.max<number | null, Refund>('sequence', {
    where: { attemptId: attempt.id },
    transaction: tx,
  })
  const sequence = (last ?? 0) + 1
  const refund = await Refund.create(
    {
      workshopId: attempt.workshopId,
      attemptId: attempt.id,
      orderId: attempt.orderId,
      sequence,
      amountMinor: wanted.amountMinor,
      currency: attempt.currency,
      cause: wanted.why,
      reason: wanted.reason ?? null,
      idempotencyKey: `refund:${attempt.id}:${sequence}`,
      shortByMinor: wanted.shortByMinor ?? null,
      retryOfId: wanted.retryOfId ?? null,
      requestedByPersonId: wanted.byPersonId ?? null,
      requestedAt: now,
    },
    { transaction: tx },
  )
  await recordMove(tx, {
    workshopId: refund.workshopId,
    subjectType: 'refund',
    subjectId: refund.id,
    from: null,
    event: 'request',
    to: 'requested',
    byPersonId: wanted.byPersonId ?? null,
    at: now,
  })
  if (wanted.isSentNow ?? true) await enqueue(tx, 'send_refund', { refundId: refund.id })
  return refund
}
