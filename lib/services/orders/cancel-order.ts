import 'server-only'
import type { Transaction } from 'sequelize'
import type { CancelAnswer } from '@/lib/contracts/orders'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse, type Result } from '@/lib/core/result'
import { mayCancelFreely } from '@/lib/core/states/order-guards'
import { inTransaction } from '@/lib/db/in-transaction'
import { dropDue } from '@/lib/jobs/set-due'
import { endOpenPayments } from '@/lib/services/_steps/end-open-payments'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { refundOrder } from '@/lib/services/_steps/refund-order'
import { releasePlace } from '@/lib/services/_steps/release-place'
import { Order, Refund, type Run } from '@/models'

type Cmd = { actor: Actor; orderId: string; now: Date }

/**
 * The buyer cancels before the lock: everything paid goes back, the place is offered to whoever waits. An open card
 * session is expired at the provider first; a deposit that was faster is paid back like any other. A person who waits
 * leaves the list.
 * Refuses: not_found · payment_in_flight (the provider has not said what became of a payment) · run_locked ·
 * disputed (the bank decides first) · not_allowed (nothing to cancel). Locks: run, order, attempts. Writes: order, counts,
 * refunds, mail, jobs. Repeat: safe; a cancelled order answers the same and pays nothing back twice.
 */
export async function cancelOrder(cmd: Cmd) {
  const { actor, orderId, now } = cmd
  const seen = await Order.findByPk(orderId)
  if (!seen || actor.kind !== 'person' || !can(actor, 'order:cancel', { personId: seen.personId }))
    return refuse('not_found')
  if (seen.state === 'awaiting_deposit' || seen.state === 'reserved') {
    const ended = await endOpenPayments(orderId, now)
    if (!ended.ok) return ended
  }
  return inTransaction(async (tx) => {
    const locked = await lockOrder(tx, orderId)
    if (!locked) return refuse('not_found')
    return cancel(tx, locked, { byPersonId: actor.personId, now })
  })
}

async function cancel(
  tx: Transaction,
  { run, order }: { run: Run; order: Order },
  by: { byPersonId: string; now: Date },
): Promise<Result<CancelAnswer, string>> {
  const from = order.state
  if (from === 'cancelled') return ok({ state: 'cancelled', refundMinor: await requestedBack(tx, order) })
  if (from === 'waiting') {
    const left = await moveOrder(tx, order, 'leave', { ...by, change: { cancelCause: 'left_queue' } })
    if (!left.ok) return left
    await mail(tx, order, { cause: 'left_queue', refundMinor: 0, now: by.now })
    return ok({ state: order.state, refundMinor: 0 })
  }
  const isPaid = from !== 'awaiting_deposit'
  const free = mayCancelFreely(run.state)
  if (isPaid && from !== 'expired' && from !== 'lapsed' && !free.ok) return free
  if (order.disputedAt !== null) return refuse('disputed')
  const moved = await moveOrder(tx, order, 'cancel', { ...by, change: { cancelCause: 'customer' } })
  if (!moved.ok) return moved
  await dropDue(tx, 'hold_ended', order.id)
  await releasePlace(tx, order)
  const { refundMinor } = await refundOrder(tx, { order, why: 'cancelled', ...by })
  await mail(tx, order, { cause: 'customer', refundMinor, now: by.now })
  return ok({ state: order.state, refundMinor })
}

async function requestedBack(tx: Transaction, order: Order): Promise<number> {
  const refunds = await Refund.findAll({
    where: { orderId: order.id },
    attributes: ['amountMinor', 'state'],
    transaction: tx,
  })
  return refunds
    .filter(({ state }) => state !== 'failed')
    .reduce((sum, { amountMinor }) => sum + amountMinor, 0)
}

async function mail(
  tx: Transaction,
  order: Order,
  given: { cause: 'customer' | 'left_queue'; refundMinor: number; now: Date },
): Promise<void> {
  const { ofOrder } = await orderMailFacts(tx, order)
  const { cause, refundMinor, now } = given
  await queueMail(tx, {
    kind: 'order_cancelled',
    workshopId: order.workshopId,
    personId: order.personId,
    subjectId: order.id,
    props: { ...ofOrder, currency: order.currency, cause, reason: null, refundMinor },
    now,
  })
}
