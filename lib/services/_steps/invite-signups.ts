import 'server-only'
import type { Transaction } from 'sequelize'
import { Invitation, Run, SignUp } from '@/models'
import { inviteSignUp } from './invite-signup'
import { recordMove } from './record-move'

/**
 * The confirmed sign-ups of a run's module that have no invitation to it yet, first come first: the subjects of the bulk
 * job that invites. Locks: nothing. Writes: nothing.
 */
export async function signUpsToInvite(tx: Transaction, run: Run): Promise<string[]> {
  const confirmed = await SignUp.findAll({
    where: { moduleId: run.moduleId, state: 'confirmed' },
    attributes: ['id'],
    include: [
      {
        model: Invitation,
        as: 'invitations',
        attributes: ['id'],
        required: false,
        where: { runId: run.id },
      },
    ],
    order: [
      ['confirmedAt', 'ASC'],
      ['id', 'ASC'],
    ],
    transaction: tx,
  })
  return confirmed.filter(({ invitations }) => !invitations?.length).map(({ id }) => id)
}

/**
 * Invites these sign-ups to a run, each once; those taken back or replaced meanwhile are left out, as is everybody once the
 * run takes no more deposits. Gives back how many are new.
 * Locks: the sign-ups. Writes: invitations, audit, mails. Repeat: safe; there is one invitation per run and sign-up.
 */
export async function inviteSignUps(
  tx: Transaction,
  { runId, signUpIds, now }: { runId: string; signUpIds: readonly string[]; now: Date },
): Promise<number> {
  const run = await Run.findByPk(runId, { transaction: tx, rejectOnEmpty: true })
  if (run.state !== 'taking_deposits') return 0
  const signUps = await SignUp.findAll({
    where: { id: [...signUpIds], moduleId: run.moduleId, state: 'confirmed' },
    transaction: tx,
    lock: tx.LOCK.UPDATE,
  })
  let invited = 0
  for (const signUp of signUps) if (await inviteSignUp(tx, { run, signUp, now })) invited += 1
  return invited
}

/**
 * Ends the invitations of a run that nobody answered: it takes no more deposits.
 * Locks: the invitations. Writes: their state, audit. Repeat: safe; what was answered stays.
 */
export async function endInvitations(
  tx: Transaction,
  { runId, now }: { runId: string; now: Date },
): Promise<number> {
  const open = await Invitation.findAll({
    where: { runId, state: 'sent' },
    transaction: tx,
    lock: tx.LOCK.UPDATE,
  })
  for (const invitation of open) {
    await invitation.update({ state: 'expired', answeredAt: now }, { transaction: tx })
    await recordMove(tx, {
      workshopId: invitation.workshopId,
      subjectType: 'invitation',
      subjectId: invitation.id,
      from: 'sent',
      event: 'end',
      to: 'expired',
      byPersonId: null,
      at: now,
    })
  }
  return open.length
}
