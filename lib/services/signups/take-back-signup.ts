import 'server-only'
import { Op } from 'sequelize'
import { hashToken } from '@/lib/config/secrets'
import { ok, refuse } from '@/lib/core/result'
import { next, SIGNUP_MOVES } from '@/lib/core/states/signup'
import { inTransaction } from '@/lib/db/in-transaction'
import { Invitation, SignUp } from '@/models'
import { modulePageChanged } from '../_steps/module-page-changed'
import { recordMove } from '../_steps/record-move'

/**
 * Takes a confirmed sign-up back by the link of its mails; open invitations to it count as declined.
 * Refuses: token_unknown · token_used (replaced by a later sign-up). Locks: the sign-up. Writes: states, audit; the
 * module's page is made anew. Repeat: safe; taken back stays taken back.
 */
export function takeBackSignUp(cmd: { token: string; now: Date }) {
  const { now } = cmd
  return inTransaction(async (tx) => {
    const signUp = await SignUp.findOne({
      where: { takeBackTokenHash: hashToken(cmd.token) },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    if (!signUp) return refuse('token_unknown')
    if (signUp.state === 'taken_back') return ok({ state: 'taken_back' as const })
    if (!next(SIGNUP_MOVES, signUp.state, 'take_back').ok) return refuse('token_used')
    await signUp.update({ state: 'taken_back', takenBackAt: now }, { transaction: tx })
    await recordMove(tx, {
      workshopId: signUp.workshopId,
      subjectType: 'signup',
      subjectId: signUp.id,
      from: 'confirmed',
      event: 'take_back',
      to: 'taken_back',
      byPersonId: signUp.personId,
      at: now,
    })
    const open = await Invitation.findAll({
      where: { signupId: signUp.id, state: 'sent', answeredAt: { [Op.is]: null } },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    for (const invitation of open) {
      await invitation.update({ state: 'declined', answeredAt: now }, { transaction: tx })
      await recordMove(tx, {
        workshopId: invitation.workshopId,
        subjectType: 'invitation',
        subjectId: invitation.id,
        from: 'sent',
        event: 'decline',
        to: 'declined',
        byPersonId: signUp.personId,
        at: now,
      })
    }
    await modulePageChanged(tx, signUp.moduleId)
    return ok({ state: 'taken_back' as const })
  })
}
