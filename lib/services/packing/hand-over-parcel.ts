import 'server-only'
import { UniqueConstraintError } from 'sequelize'
import type { HandOverInput } from '@/lib/contracts/packing'
import type { Actor } from '@/lib/core/policy/can'
import { inTransaction } from '@/lib/db/in-transaction'
import { handOver } from '@/lib/services/_steps/hand-over'

type Command = {
  actor: Actor
  workshopId: string
  parcelId: string
  input: HandOverInput
  now: Date
}

/**
 * Hands a packed parcel to the post: the buyer's mail goes out, and with the order's last parcel the order is posted and
 * its money becomes sales.
 * Refuses: not_found · forbidden · not_packed · already_handed_over · parcel_discarded · order_cancelled · order_not_paid ·
 * order_disputed · destination_paused · on_hold · label_void · in_other_batch · invalid, at `service` (it takes no such parcel, or does not go there)
 * or `tracking` (mistyped, or on another parcel).
 * Locks: run, order, parcel. Writes: parcel, units, order, ledger, mail, audit; the module's page is made anew. Repeat:
 * refused as already_handed_over.
 */
export async function handOverParcel(cmd: Command) {
  try {
    return await inTransaction((tx) => handOver(tx, cmd))
  } catch (error) {
    // Two parcels got the same number at the same moment; the second is told once the first stands.
    const isTaken = error instanceof UniqueConstraintError && 'tracking' in error.fields
    if (isTaken) return inTransaction((tx) => handOver(tx, cmd))
    throw error
  }
}
