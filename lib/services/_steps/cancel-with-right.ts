import 'server-only'
import type { Transaction } from 'sequelize'
import type { Result } from '@/lib/core/result'
import { ok, refuse } from '@/lib/core/result'
import { dropBalanceDues } from '@/lib/services/_steps/balance-dues'
import { discardParcels } from '@/lib/services/_steps/discard-parcels'
import { LIVE } from '@/lib/services/_steps/move-attempt'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { refundOrder } from '@/lib/services/_steps/refund-order'
import { releasePlace } from '@/lib/services/_steps/release-place'
import { type Order, OrderChange, PaymentAttempt } from '@/models'
import type { CancelCause, RefundCause } from '@/models/words'

/**
 * Ends an order of a locked run that has not gone to the post: its parcels are taken apart, its place is free, everything
 * paid goes back. Open payments must have been ended at the provider first. Of a disputed order the money goes back once
 * the bank has decided.
 * Refuses: payment_in_flight · not_allowed. The caller has locked run and order. Writes: order, parcels, counts, changes,
 * refunds, due rows, audit. Repeat: refused, the state has changed.
 */
export async function cancelWithRight(
  tx: Transaction,
  given: {
    order: Order
    cause: CancelCause
    why: RefundCause
    reason?: string | null
    byPersonId: string | null
    now: Date
  },
): Promise<Result<{ refundMinor: number }, 'payment_in_flight' | 'not_allowed'>> {
  const { order, cause, why, now, byPersonId, reason = null } = given
  const live = { orderId: order.id, state: [...LIVE] }
  if ((await PaymentAttempt.count({ where: live, transaction: tx })) > 0) return refuse('payment_in_flight')
  await discardParcels(tx, order, now)
  const change = { cancelCause: cause, cancelReason: reason }
  const moved = await moveOrder(tx, order, 'cancel_with_right', { now, byPersonId, change })
  if (!moved.ok) return moved
  await releasePlace(tx, order)
  await dropBalanceDues(tx, order.id)
  const open = { orderId: order.id, appliedAt: null, droppedAt: null }
  await OrderChange.update({ droppedAt: now }, { where: open, transaction: tx })
  const { refundMinor } = await refundOrder(tx, { order, why, now, reason, byPersonId })
  return ok({ refundMinor })
}
