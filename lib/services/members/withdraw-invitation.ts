import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { StaffInvitation } from '@/models'

/**
 * Takes back an invitation to work for the workshop that nobody has accepted.
 * Refuses: not_found · forbidden · token_used (accepted already). Locks: the invitation. Writes: when it was withdrawn.
 * Repeat: safe.
 */
export function withdrawInvitation(cmd: { actor: Actor; workshopId: string; invitation: string; now: Date }) {
  const { actor, workshopId, now } = cmd
  return inTransaction(async (tx) => {
    if (!can(actor, 'member:invite', { workshopId })) return refuse('forbidden')
    const row = await StaffInvitation.findOne({
      where: { workshopId, id: cmd.invitation },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    if (!row) return refuse('not_found')
    if (row.acceptedAt !== null) return refuse('token_used')
    await row.update({ withdrawnAt: row.withdrawnAt ?? now }, { transaction: tx })
    return ok({ invitation: row.id })
  })
}
