import 'server-only'
import type { Transaction } from 'sequelize'
import { ok, type Result } from '@/lib/core/result'
import type { OrderState } from '@/lib/core/states/order'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { changedProps, type RunChange } from '@/lib/services/_steps/run-mail-props'
import { startBulk } from '@/lib/services/_steps/start-bulk'
import { Decision, Order, type Run } from '@/models'

/** Whoever has ordered in a run that takes deposits counts on what it says. */
export const TOLD_OF_CHANGE: readonly OrderState[] = ['waiting', 'awaiting_deposit', 'reserved']

/**
 * Promises that everyone who has ordered is told what has changed about the run. The decision must be recorded before: the
 * mails of each are counted by it.
 * Locks: nothing. Writes: the bulk job. Repeat: makes another.
 */
export async function tellEveryone(
  tx: Transaction,
  given: { run: Run; change: RunChange; byPersonId: string; now: Date },
) {
  const { run, change, byPersonId, now } = given
  const orders = await Order.findAll({
    where: { runId: run.id, kind: 'paid', state: [...TOLD_OF_CHANGE] },
    attributes: ['id'],
    order: [['number', 'ASC']],
    transaction: tx,
  })
  const version = await Decision.count({
    where: { runId: run.id, kind: ['lower_minimum', 'move_decide_by'] },
    transaction: tx,
  })
  return startBulk(tx, {
    kind: 'tell_changed',
    run,
    subjectIds: orders.map(({ id }) => id),
    params: { change, version },
    byPersonId,
    now,
  })
}

/**
 * Tells one order's buyer what has changed about the run. Somebody who has left since is not written to.
 * Locks: nothing. Writes: one mail. Repeat: safe; there is one mail per order and change.
 */
export async function tellChanged(
  tx: Transaction,
  given: { orderId: string; change: RunChange; version: number; now: Date },
): Promise<Result<true, never>> {
  const order = await Order.findByPk(given.orderId, { transaction: tx })
  if (!order || !TOLD_OF_CHANGE.includes(order.state)) return ok(true)
  await queueMail(tx, {
    kind: 'run_changed',
    workshopId: order.workshopId,
    personId: order.personId,
    subjectId: order.id,
    version: given.version,
    props: await changedProps(tx, order, given.change),
    now: given.now,
  })
  return ok(true)
}
