import 'server-only'
import type { Transaction } from 'sequelize'
import { applyChange, placesFor } from '@/lib/services/_steps/apply-change'
import type { LockedPayment } from '@/lib/services/_steps/locked-payment'
import { mailContract } from '@/lib/services/_steps/mail-contract'
import { issuePrepayment } from '@/lib/services/_steps/prepayment-invoice'
import { type Order, OrderChange, type PaymentAttempt, type Run } from '@/models'

/** The change a payment is for, if it still waits for it. Locks: the change. Writes: nothing. */
export function changeOf(tx: Transaction, { orderId, purpose }: PaymentAttempt): Promise<OrderChange | null> {
  return OrderChange.findOne({
    where: { orderId, number: Number(purpose.replace('change-', '')), appliedAt: null, droppedAt: null },
    transaction: tx,
    lock: tx.LOCK.UPDATE,
  })
}

/** Whether a change that is paid may still take effect: before the lock, and while its places are free. Locks: nothing. */
export async function changeFits(
  tx: Transaction,
  { order, run, change }: { order: Order; run: Run; change: OrderChange },
): Promise<boolean> {
  if (order.state !== 'reserved' || run.state !== 'taking_deposits') return false
  const { free, extra } = await placesFor(tx, { order, run, lines: change.after.lines })
  return free >= extra
}

/**
 * The difference of a change has arrived: the order is changed, and the buyer gets the contract as it is now.
 * Run, order and attempt are locked by the caller, who has seen that it fits. Writes: order, lines, counts, change, invoice,
 * audit, mail. Repeat: not safe; called once per capture.
 */
export async function acceptChange(
  tx: Transaction,
  { order, attempt }: LockedPayment,
  now: Date,
): Promise<void> {
  const change = await changeOf(tx, attempt)
  if (!change) throw new Error(`order ${order.id} has no open change for ${attempt.purpose}`)
  await applyChange(tx, { order, change, now })
  await issuePrepayment(tx, { order, attempt, now })
  await mailContract(tx, order, { version: change.number + 1, now })
}
