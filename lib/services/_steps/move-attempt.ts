import 'server-only'
import type { Transaction } from 'sequelize'
import { ok, type Result } from '@/lib/core/result'
import { ATTEMPT_MOVES, next, type AttemptEvent, type AttemptState } from '@/lib/core/states/attempt'
import { recordMove } from '@/lib/services/_steps/record-move'
import type { PaymentAttempt } from '@/models'

type AttemptColumns = Partial<
  Pick<
    PaymentAttempt,
    | 'providerId'
    | 'providerSessionId'
    | 'chargeId'
    | 'payUrl'
    | 'sessionExpiresAt'
    | 'failureCode'
    | 'feeMinor'
    | 'surplusAt'
    | 'amountMinor'
    | 'currency'
  >
>

/** States in which the provider may still take the money. */
export const LIVE: readonly AttemptState[] = ['requested', 'sent', 'unknown', 'needs_customer']
const ENDED: readonly AttemptState[] = ['captured', 'failed', 'abandoned']

/**
 * Moves an attempt the caller has locked, by the table of its states.
 * Refuses: not_allowed. Writes: the row and its audit entry. Repeat: refused, the state has changed.
 */
export async function moveAttempt(
  tx: Transaction,
  attempt: PaymentAttempt,
  event: AttemptEvent,
  now: Date,
  change: AttemptColumns = {},
): Promise<Result<PaymentAttempt, 'not_allowed'>> {
  const from = attempt.state
  const to = next(ATTEMPT_MOVES, from, event)
  if (!to.ok) return to
  const isAnswered = event !== 'lose_answer' && attempt.sentAt === null
  await attempt.update(
    {
      ...change,
      state: to.value,
      endedAt: ENDED.includes(to.value) ? now : null,
      ...(isAnswered ? { sentAt: now } : {}),
    },
    { transaction: tx },
  )
  await recordMove(tx, {
    workshopId: attempt.workshopId,
    subjectType: 'attempt',
    subjectId: attempt.id,
    from,
    event,
    to: to.value,
    byPersonId: null,
    at: now,
  })
  return ok(attempt)
}
