import 'server-only'
import type { SampleInput } from '@/lib/contracts/module-forms'
import { refuseFields } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { dayIn } from '@/lib/core/time/zone'
import { inTransaction } from '@/lib/db/in-transaction'
import { moduleMistakes } from '@/lib/messages/module-mistakes'
import { Part, Workshop } from '@/models'

/**
 * Records that a sample of a part was looked at and whether it fits; the last word counts.
 * Refuses: not_found · forbidden · invalid (a day to come). Locks: the part. Writes: the part. Repeat: safe.
 */
export function recordSampleCheck(cmd: { actor: Actor; workshopId: string; input: SampleInput; now: Date }) {
  const { actor, workshopId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'part:check_sample', { workshopId }))
      return refuse('forbidden')
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx })
    const part = await Part.findOne({
      where: { workshopId, id: input.part },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    if (!workshop || !part) return refuse('not_found')
    if (input.on > dayIn(now, workshop.timeZone)) return refuseFields({ on: moduleMistakes.notYet })
    await part.update(
      {
        sampleCheckedOn: input.on,
        sampleFits: input.fits === 'yes',
        sampleNote: input.note ?? null,
        sampleByPersonId: actor.personId,
      },
      { transaction: tx },
    )
    return ok({ part: part.code })
  })
}
