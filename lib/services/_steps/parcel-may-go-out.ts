import 'server-only'
import type { Transaction } from 'sequelize'
import type { Result } from '@/lib/core/result'
import { mayGoOut, type ParcelStop } from '@/lib/core/states/parcel-guards'
import type { LockedParcel } from '@/lib/services/_steps/lock-parcel'
import { Destination, PackBatch } from '@/models'

/**
 * Whether a locked parcel may be packed or handed over, from what its order, its destination and the workshop say.
 * Refuses: as `mayGoOut`. Locks: nothing. Writes: nothing.
 */
export async function parcelMayGoOut(
  tx: Transaction,
  { order, parcel, lines }: LockedParcel,
  packerId: string,
): Promise<Result<true, ParcelStop>> {
  const offerIds = lines.map((line) => line.orderLine!.runOffer!.offerId)
  const paused = await Destination.count({
    where: { offerId: offerIds, country: order.country, state: 'paused' },
    transaction: tx,
  })
  const batch =
    parcel.batchId === null
      ? null
      : await PackBatch.findOne({ where: { id: parcel.batchId, closedAt: null }, transaction: tx })
  return mayGoOut({
    order: order.state,
    disputed: order.disputedAt !== null,
    destinationPaused: paused > 0,
    onHold: parcel.onHoldReason !== null,
    labelVoid: parcel.labelVoidAt !== null,
    inOtherBatch: batch !== null && batch.packerPersonId !== packerId,
    isReplacement: parcel.problemId !== null,
  })
}
