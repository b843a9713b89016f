import 'server-only'
import type { Transaction } from 'sequelize'
import { dropDue } from '@/lib/jobs/set-due'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { releasePlace } from '@/lib/services/_steps/release-place'
import { Order, type Run } from '@/models'

/**
 * Gives back the places held for people who had not paid when a run is locked. Whoever waited and was offered a place
 * keeps it for the time promised: they may still pay. No payment of theirs can be captured any more.
 * The run is locked by the caller. Locks: the orders. Writes: orders, counts, due rows, mails. Repeat: safe.
 */
export async function endHolds(tx: Transaction, run: Run, now: Date): Promise<void> {
  const held = await Order.findAll({
    where: { runId: run.id, state: 'awaiting_deposit' },
    order: [['id', 'ASC']],
    transaction: tx,
    lock: tx.LOCK.UPDATE,
  })
  for (const order of held) {
    const wasOffered = order.placeOfferedAt !== null && order.holdUntil !== null && order.holdUntil > now
    if (!wasOffered) await endHold(tx, order, now)
  }
  await run.reload({ transaction: tx })
}

async function endHold(tx: Transaction, order: Order, now: Date): Promise<void> {
  const moved = await moveOrder(tx, order, 'hold_ended', { now, note: 'run_locked' })
  if (!moved.ok) throw new Error(`order ${order.id} is held but its hold cannot end`)
  await releasePlace(tx, order)
  await dropDue(tx, 'hold_ended', order.id)
  const { ofOrder, moduleUrl } = await orderMailFacts(tx, order)
  await queueMail(tx, {
    kind: 'place_released',
    workshopId: order.workshopId,
    personId: order.personId,
    subjectId: order.id,
    props: {
      orderNumber: ofOrder.orderNumber,
      module: ofOrder.module,
      moduleUrl,
      canOrderAgain: false,
    },
    now,
  })
}
