import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { PackBatch, Parcel } from '@/models'

/**
 * Gives what is not packed yet of a batch back to the queue; what is packed may be handed over by anybody afterwards.
 * Refuses: forbidden · not_found · batch_done. Locks: the batch. Writes: batch, parcels. Repeat: refused as batch_done.
 */
export function returnBatch(cmd: { actor: Actor; workshopId: string; batchId: string; now: Date }) {
  const { actor, workshopId, batchId, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'batch:take', { workshopId })) return refuse('forbidden')
    const batch = await PackBatch.findOne({
      where: { id: batchId, workshopId },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    if (!batch) return refuse('not_found')
    if (batch.closedAt !== null) return refuse('batch_done')
    const [returned] = await Parcel.update(
      { batchId: null },
      { where: { workshopId, batchId, state: 'open' }, transaction: tx },
    )
    await batch.update({ closedAt: now }, { transaction: tx })
    return ok({ returned })
  })
}
