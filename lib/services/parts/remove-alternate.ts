import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { PartAlternate } from '@/models'

/**
 * Takes back that one part may stand in for another.
 * Refuses: forbidden · not_found. Locks: nothing. Writes: the alternate goes. Repeat: not_found.
 */
export function removeAlternate(cmd: {
  actor: Actor
  workshopId: string
  input: { part: string; alternate: string }
}) {
  const { actor, workshopId, input } = cmd
  return inTransaction(async (tx) => {
    if (!can(actor, 'part:write', { workshopId })) return refuse('forbidden')
    const gone = await PartAlternate.destroy({
      where: { workshopId, partId: input.part, alternateId: input.alternate },
      transaction: tx,
    })
    return gone > 0 ? ok({ part: input.part }) : refuse('not_found')
  })
}
