import 'server-only'
import { ok } from '@/lib/core/result'
import { crashPoint } from '@/lib/db/crash-point'
import { inTransaction } from '@/lib/db/in-transaction'
import { PUT_OFF, putOffCharge } from '@/lib/services/_steps/put-off-charge'
import { BulkItem, Order } from '@/models'

/**
 * Ticks off a charge of a bulk job, which was done in transactions of its own; `reason` says why it did not succeed. One
 * that was not even tried falls due again.
 * Locks: the item, the order put off. Writes: the item, a due row. Repeat: safe; what is ticked off stays as it is.
 */
export async function settleBulkItem(cmd: { itemId: string; reason: string | null; now: Date }) {
  const { itemId, reason, now } = cmd
  const settled = await inTransaction(async (tx) => {
    const how = { transaction: tx, lock: tx.LOCK.UPDATE } as const
    const item = await BulkItem.findByPk(itemId, how)
    if (item?.state !== 'waiting') return ok(true)
    const state = reason === null ? 'done' : 'failed'
    await item.update({ state, reason, doneAt: now }, { transaction: tx })
    const order = reason !== null && PUT_OFF.includes(reason) && (await Order.findByPk(item.subjectId, how))
    if (order && order.state === 'balance_due') await putOffCharge(tx, order, now)
    return ok(true)
  })
  crashPoint('bulk_item_done')
  return settled
}
