import 'server-only'
import { hashToken } from '@/lib/config/secrets'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { Membership, StaffInvitation, Workshop } from '@/models'
import { isLastOwner } from '../_steps/is-last-owner'
import { recordMove } from '../_steps/record-move'

/**
 * Accepts an invitation to work for a workshop by its link, signed in with the address it was sent to. Who works there
 * already changes role, and who had left comes back.
 * Refuses: forbidden · token_unknown (none, or withdrawn) · token_used · token_expired · other_address · last_owner (the
 * only owner would stop being one). Locks: the workshop, the invitation. Writes: membership, invitation, audit.
 * Repeat: refused as token_used, but for the same person, who is let in again.
 */
export function acceptMembership(cmd: { actor: Actor; token: string; now: Date }) {
  const { actor, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'membership:accept')) return refuse('forbidden')
    const tokenHash = hashToken(cmd.token)
    const found = await StaffInvitation.findOne({ where: { tokenHash }, transaction: tx })
    if (!found || found.withdrawnAt !== null) return refuse('token_unknown')
    const workshop = await Workshop.findByPk(found.workshopId, {
      transaction: tx,
      lock: tx.LOCK.UPDATE,
      rejectOnEmpty: true,
    })
    const invitation = await found.reload({ transaction: tx, lock: tx.LOCK.UPDATE })
    const answer = ok({ workshop: workshop.slug, role: invitation.role })
    if (invitation.acceptedByPersonId === actor.personId) return answer
    if (invitation.acceptedAt !== null) return refuse('token_used')
    if (invitation.withdrawnAt !== null) return refuse('token_unknown')
    if (invitation.expiresAt <= now) return refuse('token_expired')
    if (invitation.emailNormal !== actor.email) return refuse('other_address')

    const { workshopId, role, createdByPersonId } = invitation
    const member = await Membership.findOne({
      where: { workshopId, personId: actor.personId },
      transaction: tx,
    })
    if (member && (await isLastOwner(tx, member))) return refuse('last_owner')
    const row =
      (await member?.update({ role, endedAt: null }, { transaction: tx })) ??
      (await Membership.create(
        { workshopId, personId: actor.personId, role, createdAt: now, createdByPersonId, endedAt: null },
        { transaction: tx },
      ))
    await invitation.update({ acceptedAt: now, acceptedByPersonId: actor.personId }, { transaction: tx })
    await recordMove(tx, {
      workshopId,
      subjectType: 'membership',
      subjectId: row.id,
      from: null,
      event: 'accept',
      to: role,
      byPersonId: actor.personId,
      at: now,
    })
    return answer
  })
}
