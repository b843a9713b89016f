import 'server-only'
import type { ReportInput } from '@/lib/contracts/tracking'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { lockParcel } from '@/lib/services/_steps/lock-parcel'
import { reportParcelState } from '@/lib/services/_steps/report-parcel'

/**
 * Notes by hand that a parcel arrived, is lost, came back, or turned up again.
 * Refuses: forbidden · not_found · not_handed_over · not_allowed (it arrived already, say). Locks: run, order, parcel.
 * Writes: parcel, order, units, audit. Repeat: refused as not_allowed.
 */
export function reportParcel(cmd: {
  actor: Actor
  workshopId: string
  parcelId: string
  input: ReportInput
  now: Date
}) {
  const { actor, workshopId, parcelId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'parcel:report', { workshopId })) return refuse('forbidden')
    const locked = await lockParcel(tx, { workshopId, parcelId })
    if (!locked) return refuse('not_found')
    if (locked.parcel.handedOverAt === null) return refuse('not_handed_over')
    const moved = await reportParcelState(tx, locked, input.state, { now, byPersonId: actor.personId })
    if (!moved.ok) return moved
    return ok({ parcel: parcelId, state: moved.value.state })
  })
}
