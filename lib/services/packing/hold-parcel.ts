import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { lockParcel } from '@/lib/services/_steps/lock-parcel'
import { recordMove } from '@/lib/services/_steps/record-move'

type Command = { actor: Actor; workshopId: string; parcelId: string; reason: string | null; now: Date }

/**
 * Puts a parcel that has not left on hold, with the reason for whoever packs next, or lets it go on (reason null). On hold
 * it is neither packed nor handed over, and it leaves its batch.
 * Refuses: forbidden · not_found · already_handed_over · parcel_discarded. Locks: run, order, parcel. Writes: parcel,
 * audit. Repeat: safe; the later reason stands.
 */
export function holdParcel({ actor, workshopId, parcelId, reason, now }: Command) {
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'parcel:hold', { workshopId })) return refuse('forbidden')
    const locked = await lockParcel(tx, { workshopId, parcelId })
    if (!locked) return refuse('not_found')
    const { parcel } = locked
    if (parcel.handedOverAt !== null) return refuse('already_handed_over')
    if (parcel.state === 'discarded') return refuse('parcel_discarded')
    const leaves = reason !== null && parcel.state === 'open'
    await parcel.update({ onHoldReason: reason, ...(leaves && { batchId: null }) }, { transaction: tx })
    await recordMove(tx, {
      workshopId,
      subjectType: 'parcel',
      subjectId: parcel.id,
      from: parcel.state,
      event: reason === null ? 'let_go' : 'put_on_hold',
      to: parcel.state,
      byPersonId: actor.personId,
      at: now,
    })
    return ok({ parcel: parcel.id, onHold: reason !== null })
  })
}
