import 'server-only'
import type { Transaction } from 'sequelize'
import { ok, refuse } from '@/lib/core/result'
import { dayIn } from '@/lib/core/time/zone'
import { crashPoint } from '@/lib/db/crash-point'
import { inTransaction } from '@/lib/db/in-transaction'
import { dropDue } from '@/lib/jobs/set-due'
import { endOpenPayments } from '@/lib/services/_steps/end-open-payments'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { LIVE } from '@/lib/services/_steps/move-attempt'
import { orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { releasePlace } from '@/lib/services/_steps/release-place'
import { Order, PaymentAttempt } from '@/models'

/**
 * Ends the hold of an unpaid place when its time is over: the card session is expired at the provider first, and the
 * place is released only when the session is known to be over. A buyer who paid at the last moment keeps it.
 * Refuses: not_found · payment_in_flight (the provider has not said; try again). Locks: run, order. Writes: order, counts,
 * mail, jobs. Repeat: safe.
 */
export async function expireHold(cmd: { orderId: string; now: Date }) {
  const { orderId, now } = cmd
  const seen = await Order.findByPk(orderId)
  if (!seen) return refuse('not_found')
  if (!isOver(seen, now)) return ok({ state: seen.state })
  const ended = await endOpenPayments(orderId, now)
  if (!ended.ok) return ended
  crashPoint('hold_session_ended')
  return inTransaction(async (tx) => {
    const locked = await lockOrder(tx, orderId)
    if (!locked) return refuse('not_found')
    const { order } = locked
    if (!isOver(order, now)) return ok({ state: order.state })
    // Someone may have begun to pay again since the sessions were ended.
    const live = await PaymentAttempt.count({ where: { orderId, state: [...LIVE] }, transaction: tx })
    if (live > 0) return refuse('payment_in_flight')
    const moved = await moveOrder(tx, order, 'hold_ended', { now })
    if (!moved.ok) return moved
    await releasePlace(tx, order)
    await dropDue(tx, 'hold_ended', orderId)
    await mailPlaceReleased(tx, order, now)
    return ok({ state: order.state })
  })
}

const isOver = (order: Order, now: Date) =>
  order.state === 'awaiting_deposit' && order.holdUntil !== null && order.holdUntil <= now

async function mailPlaceReleased(tx: Transaction, order: Order, now: Date): Promise<void> {
  const { run, workshop, moduleUrl, ofOrder } = await orderMailFacts(tx, order)
  const isBeforeEnd = dayIn(now, workshop.timeZone) <= run.decideByOn
  await queueMail(tx, {
    kind: 'place_released',
    workshopId: order.workshopId,
    personId: order.personId,
    subjectId: order.id,
    props: {
      orderNumber: ofOrder.orderNumber,
      module: ofOrder.module,
      moduleUrl,
      canOrderAgain: run.state === 'taking_deposits' && isBeforeEnd,
    },
    now,
  })
}
