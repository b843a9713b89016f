import 'server-only'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { BulkItem, BulkJob } from '@/models'

/**
 * Writes down that no row of a bulk job waits any more.
 * Locks: the job. Writes: the job. Repeat: safe.
 */
export function finishBulk(cmd: { bulkId: string; now: Date }) {
  return inTransaction(async (tx) => {
    const job = await BulkJob.findByPk(cmd.bulkId, { transaction: tx, lock: tx.LOCK.UPDATE })
    const where = { bulkJobId: cmd.bulkId, state: 'waiting' as const }
    const isDone = (await BulkItem.count({ where, transaction: tx })) === 0
    if (job && job.doneAt === null && isDone) await job.update({ doneAt: cmd.now }, { transaction: tx })
    return ok({ isDone })
  })
}
