import 'server-only'
import type { Transaction } from 'sequelize'
import { PackBatch, Parcel } from '@/models'

/**
 * Closes a batch once nothing in it waits to be packed or handed over.
 * Locks: the batch. Writes: the batch. Repeat: safe; a closed one stays closed.
 */
export async function closeBatchIfDone(tx: Transaction, batchId: string | null, now: Date): Promise<void> {
  if (batchId === null) return
  const batch = await PackBatch.findByPk(batchId, { transaction: tx, lock: tx.LOCK.UPDATE })
  if (!batch || batch.closedAt !== null) return
  const left = await Parcel.count({ where: { batchId, state: ['open', 'packed'] }, transaction: tx })
  if (left === 0) await batch.update({ closedAt: now }, { transaction: tx })
}
