import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { lockParcel } from '@/lib/services/_steps/lock-parcel'
import { unpackParcel } from '@/lib/services/_steps/unpack-parcel'

/**
 * Undoes packing until the hand-over: the parcel is open again, its units are free, a packed order is paid. An order that
 * stopped meanwhile may be unpacked as well.
 * Refuses: not_found · forbidden · not_packed · already_handed_over · parcel_discarded. Locks: run, order, parcel. Writes:
 * parcel, lines, units, order, audit. Repeat: refused as not_packed.
 */
export function reopenParcel(cmd: { actor: Actor; workshopId: string; parcelId: string; now: Date }) {
  const { actor, workshopId, parcelId, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'parcel:reopen', { workshopId })) return refuse('forbidden')
    const locked = await lockParcel(tx, { workshopId, parcelId })
    if (!locked) return refuse('not_found')
    const { parcel, order } = locked
    if (parcel.handedOverAt !== null) return refuse('already_handed_over')
    if (parcel.state !== 'packed') return refuse(parcel.state === 'open' ? 'not_packed' : 'parcel_discarded')
    const open = await unpackParcel(tx, locked, { now, byPersonId: actor.personId })
    if (!open.ok) return open
    return ok({ parcel: parcel.id, state: open.value.state, order: order.state })
  })
}
