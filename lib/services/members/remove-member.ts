import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { Membership, Workshop } from '@/models'
import { isLastOwner } from '../_steps/is-last-owner'
import { recordMove } from '../_steps/record-move'

/**
 * Ends somebody's work for the workshop; what they did stays under their name.
 * Refuses: not_found · forbidden · last_owner. Locks: the workshop. Writes: membership, audit. Repeat: safe.
 */
export function removeMember(cmd: { actor: Actor; workshopId: string; membership: string; now: Date }) {
  const { actor, workshopId, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'member:remove', { workshopId })) return refuse('forbidden')
    // Two owners who remove each other at the same instant take turns here.
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx, lock: tx.LOCK.UPDATE })
    const member = await Membership.findOne({ where: { workshopId, id: cmd.membership }, transaction: tx })
    if (!workshop || !member) return refuse('not_found')
    if (member.endedAt !== null) return ok({ membership: member.id })
    if (await isLastOwner(tx, member)) return refuse('last_owner')
    await member.update({ endedAt: now }, { transaction: tx })
    await recordMove(tx, {
      workshopId,
      subjectType: 'membership',
      subjectId: member.id,
      from: member.role,
      event: 'remove',
      to: 'ended',
      byPersonId: actor.personId,
      at: now,
    })
    return ok({ membership: member.id })
  })
}
