import 'server-only'
import type { Transaction } from 'sequelize'
import { ok, type Result } from '@/lib/core/result'
import { next, ORDER_MOVES, type OrderEvent, type OrderState } from '@/lib/core/states/order'
import { recordMove } from '@/lib/services/_steps/record-move'
import type { Order } from '@/models'

type OrderColumns = Partial<
  Pick<
    Order,
    | 'holdUntil'
    | 'holdAttempts'
    | 'placeOfferedAt'
    | 'cancelCause'
    | 'cancelReason'
    | 'balanceAskedAt'
    | 'balanceChargeAt'
    | 'balanceFailedAt'
  >
>

/**
 * Moves an order the caller has locked, by the table of its states, with the moments that belong to the new state.
 * Places are counted apart (take-place, release-place). `change.holdUntil` is needed on the way to awaiting_deposit,
 * `change.cancelCause` on the way to cancelled.
 * Refuses: not_allowed. Writes: the order and its audit entry. Repeat: refused, the state has changed.
 */
export async function moveOrder(
  tx: Transaction,
  order: Order,
  event: OrderEvent,
  by: { now: Date; byPersonId?: string | null; note?: string; change?: OrderColumns },
): Promise<Result<Order, 'not_allowed'>> {
  const from = order.state
  const to = next(ORDER_MOVES, from, event)
  if (!to.ok) return to
  await order.update(
    { holdUntil: null, ...momentsOf(order, to.value, by.now), ...by.change, state: to.value },
    { transaction: tx },
  )
  await recordMove(tx, {
    workshopId: order.workshopId,
    subjectType: 'order',
    subjectId: order.id,
    from,
    event,
    to: to.value,
    byPersonId: by.byPersonId ?? null,
    at: by.now,
    ...(by.note === undefined ? {} : { note: by.note }),
  })
  return ok(order)
}

function momentsOf(order: Order, to: OrderState, now: Date): Partial<Order> {
  return {
    expiredAt: to === 'expired' ? now : null,
    cancelledAt: to === 'cancelled' ? now : null,
    lapsedAt: to === 'lapsed' ? now : null,
    ...(to === 'paid' ? { paidAt: order.paidAt ?? now, packedAt: null } : {}),
    ...(to === 'packed' ? { packedAt: now } : {}),
    ...(to === 'posted' ? { postedAt: now } : {}),
    ...(to === 'withdrawn' ? { withdrawnAt: now } : {}),
    ...(to === 'returned' ? { returnedAt: now } : {}),
  }
}
