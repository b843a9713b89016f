import 'server-only'
import type { Transaction } from 'sequelize'
import { startBulk } from '@/lib/services/_steps/start-bulk'
import { type BulkJob, Order, type Run } from '@/models'

/**
 * Begins to announce the balances of a locked run: a bulk job over every order still under deposit alone.
 * The run is locked by the caller. Writes: the run, a bulk job. Repeat: an order announced before is passed over.
 */
export async function startAsking(
  tx: Transaction,
  run: Run,
  by: { byPersonId: string | null; now: Date },
): Promise<{ bulk: BulkJob; orders: number }> {
  const orders = await Order.findAll({
    where: { runId: run.id, state: 'reserved' },
    attributes: ['id'],
    order: [['number', 'ASC']],
    transaction: tx,
  })
  const subjectIds = orders.map(({ id }) => id)
  const bulk = await startBulk(tx, { kind: 'ask_balances', run, subjectIds, ...by })
  if (run.balancesAskedAt === null) await run.update({ balancesAskedAt: by.now }, { transaction: tx })
  return { bulk, orders: orders.length }
}
