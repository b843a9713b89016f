import 'server-only'
import type { Transaction } from 'sequelize'
import { INVITATION_MOVES, next } from '@/lib/core/states/invitation'
import { AuditEntry, Invitation, type Run } from '@/models'

/**
 * Ends the invitations of a run that nobody has answered: it takes no more deposits.
 * Locks: the invitations. Writes: their state, one audit entry each. Repeat: safe.
 */
export async function endInvitations(tx: Transaction, run: Run, now: Date): Promise<void> {
  const to = next(INVITATION_MOVES, 'sent', 'end')
  if (!to.ok) throw new Error('an open invitation must be able to end')
  const [, ended] = await Invitation.update(
    { state: to.value, answeredAt: now },
    { where: { runId: run.id, state: 'sent' }, returning: true, transaction: tx },
  )
  await AuditEntry.bulkCreate(
    ended.map(({ id }) => ({
      workshopId: run.workshopId,
      subjectType: 'invitation',
      subjectId: id,
      fromState: 'sent',
      event: 'end',
      toState: to.value,
      byPersonId: null,
      at: now,
      note: null,
    })),
    { transaction: tx },
  )
}
