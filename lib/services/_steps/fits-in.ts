import 'server-only'
import type { Transaction } from 'sequelize'
import { freeUnits } from '@/lib/core/orders/free'
import { type Order, OrderLine, Run, RunOffer } from '@/models'

/**
 * Whether an order without a place fits into its run as it is now. The caller has locked the run.
 * Locks: nothing. Writes: nothing.
 */
export async function fitsIn(tx: Transaction, order: Order): Promise<boolean> {
  const run = await Run.findByPk(order.runId, { transaction: tx, rejectOnEmpty: true })
  const offers = await RunOffer.findAll({ where: { runId: order.runId }, transaction: tx })
  const lines = await OrderLine.findAll({ where: { orderId: order.id }, transaction: tx })
  return order.unitCount <= freeUnits(run, offers, lines)
}
