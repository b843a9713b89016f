import 'server-only'
import type { Transaction } from 'sequelize'
import { ok, type Result } from '@/lib/core/result'
import { next, REFUND_MOVES, type RefundEvent } from '@/lib/core/states/refund'
import { recordMove } from '@/lib/services/_steps/record-move'
import type { Refund } from '@/models'

type RefundColumns = Partial<
  Pick<Refund, 'providerId' | 'shortByMinor' | 'failureCode' | 'sentAt' | 'succeededAt' | 'failedAt'>
>

/**
 * Moves a refund the caller has locked, by the table of its states.
 * Refuses: not_allowed. Writes: the row and its audit entry. Repeat: refused, the state has changed.
 */
export async function moveRefund(
  tx: Transaction,
  refund: Refund,
  event: RefundEvent,
  now: Date,
  change: RefundColumns = {},
): Promise<Result<Refund, 'not_allowed'>> {
  const from = refund.state
  const to = next(REFUND_MOVES, from, event)
  if (!to.ok) return to
  await refund.update({ ...change, state: to.value }, { transaction: tx })
  await recordMove(tx, {
    workshopId: refund.workshopId,
    subjectType: 'refund',
    subjectId: refund.id,
    from,
    event,
    to: to.value,
    byPersonId: null,
    at: now,
  })
  return ok(refund)
}
