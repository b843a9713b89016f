import 'server-only'
import type { Transaction } from 'sequelize'
import { modulePageChanged } from '@/lib/services/_steps/module-page-changed'
import { OrderLine, type Order, Run, RunOffer } from '@/models'

/**
 * Counts an order's units into its run and offers. The caller has locked the run and seen that they fit; the database
 * refuses more than the maximum in any case.
 * Locks: the run, then its offers. Writes: the counts. Repeat: not safe; the order's state says whether it has a place.
 */
export async function takePlace(tx: Transaction, order: Order): Promise<void> {
  await countPlace(tx, order, 1)
}

/** The shared half of taking and releasing a place; answers the run, locked. */
export async function countPlace(tx: Transaction, order: Order, sign: 1 | -1): Promise<Run> {
  const run = await Run.findByPk(order.runId, {
    transaction: tx,
    lock: tx.LOCK.UPDATE,
    rejectOnEmpty: true,
  })
  await run.update({ committedUnits: run.committedUnits + sign * order.unitCount }, { transaction: tx })
  const lines = await OrderLine.findAll({
    where: { orderId: order.id },
    attributes: ['runOfferId', 'quantity'],
    order: [['runOfferId', 'ASC']],
    transaction: tx,
  })
  for (const { runOfferId, quantity } of lines)
    await RunOffer.increment(
      { committedUnits: sign * quantity },
      { where: { id: runOfferId }, transaction: tx },
    )
  await modulePageChanged(tx, run.moduleId)
  return run
}
