import 'server-only'
import { Op } from 'sequelize'
import type { MemberView, StaffInvitationView } from '@/lib/contracts/settings'
import { can, type Actor } from '@/lib/core/policy/can'
import { Membership, Person, StaffInvitation } from '@/models'

/** Who works for a workshop and who is asked to; null when the actor may not know. Two queries. */
export async function listMembers(cmd: {
  actor: Actor
  workshopId: string
  now: Date
}): Promise<{ members: MemberView[]; invitations: StaffInvitationView[] } | null> {
  const { actor, workshopId, now } = cmd
  if (!can(actor, 'member:list', { workshopId })) return null
  const members = await Membership.findAll({
    where: { workshopId, endedAt: null },
    include: [{ model: Person, as: 'person', required: true }],
    order: [['createdAt', 'ASC']],
  })
  const invitations = await StaffInvitation.findAll({
    where: { workshopId, acceptedAt: null, withdrawnAt: null, expiresAt: { [Op.gt]: now } },
    order: [['createdAt', 'ASC']],
  })
  return {
    members: members.map(({ id, personId, role, createdAt, person }) => ({
      id,
      personId,
      role,
      email: person?.emailShown ?? '',
      name: person?.name ?? null,
      since: createdAt.toISOString(),
    })),
    invitations: invitations.map(({ id, emailNormal, role, expiresAt }) => ({
      id,
      role,
      email: emailNormal,
      validUntil: expiresAt.toISOString(),
    })),
  }
}
