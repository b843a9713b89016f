import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { Plan } from '@/models'

/**
 * Throws a what-if away; the plan a run is decided on never goes this way.
 * Refuses: forbidden · not_found. Locks: nothing. Writes: the plan goes. Repeat: not_found.
 */
export function removeWhatIf(cmd: { actor: Actor; workshopId: string; runId: string; planId: string }) {
  const { actor, workshopId, runId, planId } = cmd
  return inTransaction(async (tx) => {
    if (!can(actor, 'cost:write', { workshopId })) return refuse('forbidden')
    const gone = await Plan.destroy({
      where: { id: planId, workshopId, runId, isBase: false },
      transaction: tx,
    })
    return gone > 0 ? ok({ plan: planId }) : refuse('not_found')
  })
}
