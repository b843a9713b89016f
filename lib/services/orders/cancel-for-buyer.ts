import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { cancelWithRight } from '@/lib/services/_steps/cancel-with-right'
import { endOpenPayments } from '@/lib/services/_steps/end-open-payments'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { Order } from '@/models'

/**
 * The owner cancels one order that has not gone to the post, with a reason the buyer reads: everything paid goes back.
 * Refuses: not_found · payment_in_flight · disputed · not_allowed. Locks: run, order, parcels, attempts. Writes: order,
 * parcels, counts, refunds, mail, due rows, audit. Repeat: refused as not_allowed.
 */
export async function cancelForBuyer(cmd: {
  actor: Actor
  workshopId: string
  orderId: string
  reason: string
  now: Date
}) {
  const { actor, workshopId, orderId, reason, now } = cmd
  if (actor.kind !== 'person' || !can(actor, 'order:cancel_for_buyer', { workshopId }))
    return refuse('not_found')
  const seen = await Order.findOne({ where: { id: orderId, workshopId }, attributes: ['id'] })
  if (!seen) return refuse('not_found')
  const ended = await endOpenPayments(orderId, now)
  if (!ended.ok) return ended
  return inTransaction(async (tx) => {
    const locked = await lockOrder(tx, orderId)
    if (!locked) return refuse('not_found')
    const { order } = locked
    if (order.disputedAt !== null) return refuse('disputed')
    const given = { order, cause: 'owner', why: 'owner', reason, byPersonId: actor.personId, now } as const
    const done = await cancelWithRight(tx, given)
    if (!done.ok) return done
    const { ofOrder } = await orderMailFacts(tx, order)
    const { refundMinor } = done.value
    if (order.kind === 'paid')
      await queueMail(tx, {
        kind: 'order_cancelled',
        workshopId,
        personId: order.personId,
        subjectId: order.id,
        props: { ...ofOrder, currency: order.currency, cause: 'owner', reason, refundMinor },
        now,
      })
    return ok({ state: order.state, refundMinor })
  })
}
