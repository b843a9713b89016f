import 'server-only'
import type { Transaction } from 'sequelize'
import { Order, Run } from '@/models'

/**
 * Locks an order with its run, always the run first: everything that counts places or moves money takes the locks in the
 * order run, order, attempt, refund, so that no two wait for each other. Null when there is no such order.
 * Locks: the run, the order. Writes: nothing.
 */
export async function lockOrder(
  tx: Transaction,
  orderId: string,
): Promise<{ run: Run; order: Order } | null> {
  const seen = await Order.findByPk(orderId, { attributes: ['runId'], transaction: tx })
  if (!seen) return null
  const run = await Run.findByPk(seen.runId, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true })
  const order = await Order.findByPk(orderId, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true })
  return { run, order }
}
