import 'server-only'
import type { Transaction } from 'sequelize'
import { can, type Actor } from '@/lib/core/policy/can'
import { refundDue } from '@/lib/core/promises/delay'
import { formatAddress } from '@/lib/core/post/address'
import { ok, refuse } from '@/lib/core/result'
import { mayWithdraw } from '@/lib/core/states/withdrawal-guards'
import { addDays } from '@/lib/core/time/day'
import { dayIn } from '@/lib/core/time/zone'
import { inTransaction } from '@/lib/db/in-transaction'
import { withdrawalOf } from '@/lib/queries/orders/withdrawal-of'
import { cancelWithRight } from '@/lib/services/_steps/cancel-with-right'
import { endOpenPayments } from '@/lib/services/_steps/end-open-payments'
import { leftOf } from '@/lib/services/_steps/left-of'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { Order, Parcel, ParcelLine, OrderLine, type Run, type Workshop } from '@/models'

/** Days a buyer has to send goods back. Source: Directive 2011/83/EU Art. 14(1); own rule elsewhere. */
const SEND_BACK_DAYS = 14

/**
 * The buyer withdraws after the lock: by right where the law gives one, until 14 days after the last piece arrived;
 * elsewhere, as the terms say, until packing. What was not posted is cancelled and paid back at once, standard postage
 * included; what was posted is paid back when it has come back. The mail acknowledges day and time.
 * Refuses: not_found · payment_in_flight · run_not_locked (cancelling is simpler) · packed_already (no right by law) ·
 * withdrawal_over · not_allowed. Locks: run, order, parcels, attempts. Writes: order, parcels, counts, refunds, mail, due
 * rows, audit. Repeat: an order withdrawn from answers the same.
 */
export async function withdrawOrder(cmd: { actor: Actor; orderId: string; now: Date }) {
  const { actor, orderId, now } = cmd
  const seen = await Order.findByPk(orderId, { attributes: ['personId'] })
  if (!seen || actor.kind !== 'person' || !can(actor, 'order:withdraw', seen)) return refuse('not_found')
  const ended = await endOpenPayments(orderId, now)
  if (!ended.ok) return ended
  return inTransaction(async (tx) => {
    const locked = await lockOrder(tx, orderId)
    return locked ? withdraw(tx, locked, { byPersonId: actor.personId, now }) : refuse('not_found')
  })
}

async function withdraw(
  tx: Transaction,
  { run, order }: { run: Run; order: Order },
  by: { byPersonId: string; now: Date },
) {
  const { now } = by
  const isDone = order.state === 'withdrawn' || order.cancelCause === 'withdrawal'
  if (isDone) return ok({ state: order.state, refundMinor: await leftOf(tx, order) })
  const { workshop, ofOrder } = await orderMailFacts(tx, order)
  const today = dayIn(now, workshop.timeZone)
  const may = mayWithdraw({ run: run.state, state: order.state, today, ...withdrawalOf(order, workshop) })
  if (!may.ok) return may
  const refundMinor = await leftOf(tx, order)
  const isPosted = may.value === 'return'
  const done = isPosted
    ? await moveOrder(tx, order, 'withdraw', by)
    : await cancelWithRight(tx, { order, cause: 'withdrawal', why: 'withdrawn', ...by })
  if (!done.ok) return done
  const hasGone = isPosted || (await isPartPosted(tx, order))
  await queueMail(tx, {
    kind: 'withdrawal_acknowledged',
    workshopId: order.workshopId,
    personId: order.personId,
    subjectId: order.id,
    props: {
      ...ofOrder,
      currency: order.currency,
      receivedAt: now.toISOString(),
      refundMinor,
      refundBy: refundDue(order.country, today, []),
      returnTo: hasGone ? addressOf(workshop) : null,
      returnBy: hasGone ? addDays(today, SEND_BACK_DAYS) : null,
    },
    now,
  })
  return ok({ state: order.state, refundMinor })
}

async function isPartPosted(tx: Transaction, order: Order): Promise<boolean> {
  const gone = await ParcelLine.count({
    include: [
      { model: OrderLine, as: 'orderLine', required: true, where: { orderId: order.id } },
      { model: Parcel, as: 'parcel', required: true, where: { state: ['handed_over', 'delivered'] } },
    ],
    transaction: tx,
  })
  return gone > 0
}

const addressOf = ({ name, postalAddress }: Workshop): string[] =>
  postalAddress ? formatAddress(postalAddress, { script: 'latin', from: '' }).slice(0, 12) : [name]
