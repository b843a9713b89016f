import 'server-only'
import type { Transaction } from 'sequelize'
import { ok, type Result } from '@/lib/core/result'
import type { OrderState } from '@/lib/core/states/order'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { lockedProps } from '@/lib/services/_steps/run-mail-props'
import { Order, Run } from '@/models'

const IN_THE_RUN: readonly OrderState[] = ['reserved', 'balance_due', 'paid']

/**
 * Tells one order's buyer that the run goes ahead. Somebody who has left since is not written to.
 * Locks: nothing. Writes: one mail. Repeat: safe.
 */
export async function tellLocked(
  tx: Transaction,
  given: { orderId: string; deposited: number; now: Date },
): Promise<Result<true, 'not_found'>> {
  const order = await Order.findByPk(given.orderId, { transaction: tx })
  if (!order || !IN_THE_RUN.includes(order.state)) return ok(true)
  const run = await Run.findByPk(order.runId, { transaction: tx, rejectOnEmpty: true })
  await queueMail(tx, {
    kind: 'run_locked',
    workshopId: order.workshopId,
    personId: order.personId,
    subjectId: order.id,
    props: await lockedProps(tx, order, { deposited: given.deposited, lockReason: run.lockReason }),
    now: given.now,
  })
  return ok(true)
}
