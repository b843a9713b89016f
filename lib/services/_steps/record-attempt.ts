import 'server-only'
import type { Transaction } from 'sequelize'
import { crashPoint } from '@/lib/db/crash-point'
import { dropDue, setDue } from '@/lib/jobs/set-due'
import { applyCapture } from '@/lib/services/_steps/apply-capture'
import { applyFee } from '@/lib/services/_steps/apply-fee'
import { holdUntil } from '@/lib/services/_steps/hold-until'
import type { LockedPayment } from '@/lib/services/_steps/locked-payment'
import type { Truth } from '@/lib/services/_steps/look-up-attempt'
import { LIVE, moveAttempt } from '@/lib/services/_steps/move-attempt'
import { nextLookUp } from '@/lib/services/_steps/next-look-up'
import { noteBalanceFailed } from '@/lib/services/_steps/note-balance-failed'
import type { PaymentAttempt } from '@/models'

/** A look-up that finds nothing is final only when the request can no longer be under way. */
const FINAL_AFTER_MS = 60_000
/** How long a fee the provider has not named is asked for. */
const FEE_ASKED_FOR_MS = 7 * 86_400_000

/**
 * Act 3 of a payment: writes down how it stands at the provider, from whatever state it had here, with everything that
 * follows for the order. What comes twice, late or out of order changes nothing, since it is the provider's present word
 * and not an event's that is written down. Run, order and attempt are locked by the caller, in this order.
 * Locks: nothing more. Writes: attempt, order, ledger, refunds, mails, due rows. Repeat: safe.
 */
export async function recordAttempt(
  tx: Transaction,
  locked: LockedPayment,
  truth: Truth,
  by: { now: Date; eventId?: string | null },
): Promise<void> {
  const { attempt } = locked
  const { now } = by
  switch (truth.state) {
    case 'open':
      await recordOpen(tx, locked, truth, now)
      break
    case 'captured':
      if (attempt.state !== 'captured') await applyCapture(tx, locked, truth, by)
      else await applyFee(tx, locked, truth.payment, now)
      break
    case 'needs_customer':
    case 'failed':
      await recordRefused(tx, locked, truth, now)
      break
    case 'in_flight':
      await moveAttempt(tx, attempt, 'send', now, {
        providerId: truth.payment?.payment ?? attempt.providerId,
        providerSessionId: truth.sessionId ?? attempt.providerSessionId,
      })
      break
    case 'ended':
      await moveAttempt(tx, attempt, 'abandon', now, {
        providerSessionId: truth.sessionId ?? attempt.providerSessionId,
      })
      break
    case 'never_had_it':
      if (isStillUnheard(attempt) && now.getTime() - attempt.requestedAt.getTime() >= FINAL_AFTER_MS)
        await moveAttempt(tx, attempt, 'abandon', now)
      break
    case 'unavailable':
      break
  }
  await planLookUp(tx, attempt, now)
  crashPoint('event_before_commit')
}

/** Between the look-up and this transaction the answer may have come after all. */
const isStillUnheard = (attempt: PaymentAttempt) =>
  attempt.providerId === null && attempt.providerSessionId === null

async function recordOpen(
  tx: Transaction,
  { attempt, order }: LockedPayment,
  truth: Extract<Truth, { state: 'open' }>,
  now: Date,
): Promise<void> {
  const answer = {
    providerSessionId: truth.sessionId,
    payUrl: truth.url ?? attempt.payUrl,
    sessionExpiresAt: truth.expiresAt,
  }
  if (attempt.state === 'requested') await moveAttempt(tx, attempt, 'send', now, answer)
  else if (LIVE.includes(attempt.state)) await attempt.update(answer, { transaction: tx })
  if (attempt.purpose === 'deposit' && order.state === 'awaiting_deposit')
    await holdUntil(tx, order, truth.expiresAt)
}

/** A saved card said no, or its bank wants the buyer. On the card page the buyer tries again: nothing is recorded there. */
async function recordRefused(
  tx: Transaction,
  { attempt, order, run }: LockedPayment,
  truth: Extract<Truth, { state: 'needs_customer' | 'failed' }>,
  now: Date,
): Promise<void> {
  if (attempt.method !== 'saved_card') return
  const providerId = truth.payment.payment
  const failure = truth.state === 'failed' ? truth.failure : null
  const moved =
    truth.state === 'failed'
      ? await moveAttempt(tx, attempt, 'fail', now, { providerId, failureCode: failure?.code ?? 'declined' })
      : await moveAttempt(tx, attempt, 'needs_customer', now, { providerId })
  if (!moved.ok) return
  const why =
    truth.state === 'needs_customer' ? 'bank_asks' : failure?.code === 'expired_card' ? 'expired' : 'declined'
  await noteBalanceFailed(tx, { order, run, subjectId: attempt.id, why, now })
}

async function planLookUp(tx: Transaction, attempt: PaymentAttempt, now: Date): Promise<void> {
  const { id: subjectId, workshopId } = attempt
  const asksForFee =
    attempt.state === 'captured' &&
    attempt.feeMinor === null &&
    now.getTime() - attempt.requestedAt.getTime() < FEE_ASKED_FOR_MS
  if (LIVE.includes(attempt.state) || asksForFee)
    await setDue(tx, { kind: 'attempt_look_up', subjectId, workshopId, at: nextLookUp(attempt, now) })
  else await dropDue(tx, 'attempt_look_up', subjectId)
}
