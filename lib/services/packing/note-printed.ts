import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse, type Result } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { Parcel } from '@/models'

/**
 * Notes that the papers of parcels were made with the addresses they have now: a label that had become wrong is right
 * again.
 * Refuses: forbidden. Locks: nothing. Writes: parcels still open, others are left alone. Repeat: safe; the later time stands.
 */
export function notePrinted(cmd: {
  actor: Actor
  workshopId: string
  parcelIds: readonly string[]
  now: Date
}): Promise<Result<{ printed: number }, 'forbidden'>> {
  const { actor, workshopId, parcelIds, now } = cmd
  return inTransaction(async (tx) => {
    if (!can(actor, 'paper:print', { workshopId })) return refuse('forbidden')
    const [printed] = await Parcel.update(
      { printedAt: now, labelVoidAt: null },
      { where: { workshopId, id: [...parcelIds], state: 'open' }, transaction: tx },
    )
    return ok({ printed })
  })
}
