import 'server-only'
import type { Transaction } from 'sequelize'
import { ok, refuse, type Result } from '@/lib/core/result'
import type { OrderState } from '@/lib/core/states/order'
import { dropDue } from '@/lib/jobs/set-due'
import { dropBalanceDues } from '@/lib/services/_steps/balance-dues'
import { discardParcels } from '@/lib/services/_steps/discard-parcels'
import { leftOf } from '@/lib/services/_steps/left-of'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { LIVE } from '@/lib/services/_steps/move-attempt'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { refundOrder } from '@/lib/services/_steps/refund-order'
import { releasePlace } from '@/lib/services/_steps/release-place'
import { calledOffProps } from '@/lib/services/_steps/run-mail-props'
import { type Order, PaymentAttempt } from '@/models'
import type { CallOffCause } from '@/models/words'

/** States in which an order of a run that is called off is still to be ended. */
export const CALLED_OFF_FROM: readonly OrderState[] = [
  'waiting',
  'awaiting_deposit',
  'reserved',
  'balance_due',
  'paid',
  'packed',
]

type Given = { orderId: string; cause: CallOffCause; reason: string; now: Date }

/**
 * Ends one order of a run that is called off: cancelled, everything captured on its way back, the buyer told. Open
 * payments must have been ended at the provider first.
 * Refuses: not_found · payment_in_flight (a payment could still be captured: come again). Locks: run, order, attempts.
 * Writes: order, parcels, counts, refunds, due rows, mail. Repeat: safe; an order that has ended is left alone.
 */
export async function callOffOrder(
  tx: Transaction,
  given: Given,
): Promise<Result<true, 'not_found' | 'payment_in_flight' | 'not_allowed'>> {
  const { cause, reason, now } = given
  const locked = await lockOrder(tx, given.orderId)
  if (!locked) return refuse('not_found')
  const { order } = locked
  if (!CALLED_OFF_FROM.includes(order.state)) return ok(true)
  const live = await PaymentAttempt.count({
    where: { orderId: order.id, state: [...LIVE] },
    transaction: tx,
  })
  if (live > 0) return refuse('payment_in_flight')

  const hadPlace = order.state !== 'waiting'
  const change = { cancelCause: 'run_called_off' as const, cancelReason: reason }
  const moved = await moveOrder(tx, order, 'run_called_off', { now, change })
  if (!moved.ok) return moved
  await discardParcels(tx, order, now)
  if (hadPlace) await releasePlace(tx, order)
  await dropDue(tx, 'hold_ended', order.id)
  await dropBalanceDues(tx, order.id)
  const owedMinor = await leftOf(tx, order)
  await refundOrder(tx, { order, why: 'run_called_off', now, reason: cause === 'owner' ? reason : null })
  await tell(tx, order, given, owedMinor)
  return ok(true)
}

async function tell(tx: Transaction, order: Order, given: Given, refundMinor: number): Promise<void> {
  // What was paid outside is settled outside.
  if (order.kind === 'manual') return
  await queueMail(tx, {
    kind: 'run_called_off',
    workshopId: order.workshopId,
    personId: order.personId,
    subjectId: order.id,
    props: await calledOffProps(tx, order, { ...given, refundMinor }),
    now: given.now,
  })
}
