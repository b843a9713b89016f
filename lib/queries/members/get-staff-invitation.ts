import 'server-only'
import type { MemberView } from '@/lib/contracts/settings'
import { StaffInvitation, Workshop } from '@/models'

/** What an invitation's link is for; null when it does not work any more. `tokenHash` is what the database keeps of it. */
export async function getStaffInvitation(cmd: {
  tokenHash: string
  now: Date
}): Promise<{ workshop: string; slug: string; role: MemberView['role']; email: string } | null> {
  const row = await StaffInvitation.findOne({ where: { tokenHash: cmd.tokenHash } })
  if (!row || row.acceptedAt !== null || row.withdrawnAt !== null || row.expiresAt <= cmd.now) return null
  const workshop = await Workshop.findByPk(row.workshopId, { rejectOnEmpty: true })
  return { workshop: workshop.name, slug: workshop.slug, role: row.role, email: row.emailNormal }
}
