import 'server-only'
import type { AlternateInput } from '@/lib/contracts/part-forms'
import { refuseFields } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { moduleMistakes } from '@/lib/messages/module-mistakes'
import { Part, PartAlternate } from '@/models'

/**
 * Says that one part may stand in for another. It is not the same the other way round: a better part may replace a worse.
 * Refuses: forbidden · not_found · invalid (no part of this code, or the part itself). Locks: the part. Writes: the
 * alternate. Repeat: safe, the note is taken over.
 */
export function addAlternate(cmd: { actor: Actor; workshopId: string; input: AlternateInput }) {
  const { actor, workshopId, input } = cmd
  return inTransaction(async (tx) => {
    if (!can(actor, 'part:write', { workshopId })) return refuse('forbidden')
    const part = await Part.findOne({
      where: { workshopId, id: input.part },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    if (!part) return refuse('not_found')
    const other = await Part.findOne({ where: { workshopId, code: input.code }, transaction: tx })
    if (!other) return refuseFields({ code: moduleMistakes.partUnknown })
    if (other.id === part.id) return refuseFields({ code: moduleMistakes.partItself })
    const pair = { partId: part.id, alternateId: other.id }
    const [row] = await PartAlternate.findOrCreate({
      where: pair,
      defaults: { workshopId, ...pair },
      transaction: tx,
    })
    await row.update({ note: input.note ?? '' }, { transaction: tx })
    return ok({ part: part.id })
  })
}
