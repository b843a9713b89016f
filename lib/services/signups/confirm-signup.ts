import 'server-only'
import { Op, type Transaction } from 'sequelize'
import { hashToken } from '@/lib/config/secrets'
import { env } from '@/lib/config/env'
import { ok, refuse } from '@/lib/core/result'
import { next, SIGNUP_MOVES } from '@/lib/core/states/signup'
import { inTransaction } from '@/lib/db/in-transaction'
import { dropDue } from '@/lib/jobs/set-due'
import { paths } from '@/lib/paths'
import { Module, Offer, Person, Run, SignUp, Workshop } from '@/models'
import { inviteSignUp } from '../_steps/invite-signup'
import { modulePageChanged } from '../_steps/module-page-changed'
import { queueMail } from '../_steps/queue-mail'
import { recordMove } from '../_steps/record-move'
import { takeBackToken } from '../_steps/take-back-token'

/**
 * Confirms a sign-up by the link of its mail; an earlier confirmed one of the same person and module gives way to it.
 * While the module's run takes deposits the invitation follows at once.
 * Refuses: token_unknown · token_expired · token_used (taken back or replaced since). Locks: the person, the sign-up.
 * Writes: states, audit, mails; the module's page is made anew. Repeat: safe; a link used twice stays confirmed.
 */
export function confirmSignUp(cmd: { token: string; now: Date }) {
  const { now } = cmd
  return inTransaction(async (tx) => {
    const confirmTokenHash = hashToken(cmd.token)
    const found = await SignUp.findOne({ where: { confirmTokenHash }, transaction: tx })
    if (!found) return refuse('token_unknown')
    // Two links of one person at once: the one confirmed last counts, so they take turns.
    await Person.findByPk(found.personId, { transaction: tx, lock: tx.LOCK.UPDATE })
    const signUp = await SignUp.findByPk(found.id, { transaction: tx, lock: tx.LOCK.UPDATE })
    if (!signUp) return refuse('token_unknown')
    if (signUp.state === 'confirmed') return ok({ state: 'confirmed' as const })
    if (!next(SIGNUP_MOVES, signUp.state, 'confirm').ok) return refuse('token_used')
    if (signUp.confirmExpiresAt <= now) return refuse('token_expired')

    await supersedeEarlier(signUp, now, tx)
    const takeBack = takeBackToken(signUp.id)
    await signUp.update(
      { state: 'confirmed', confirmedAt: now, takeBackTokenHash: hashToken(takeBack) },
      { transaction: tx },
    )
    await recordMove(tx, {
      workshopId: signUp.workshopId,
      subjectType: 'signup',
      subjectId: signUp.id,
      from: 'unconfirmed',
      event: 'confirm',
      to: 'confirmed',
      byPersonId: signUp.personId,
      at: now,
    })
    await dropDue(tx, 'signup_unconfirmed', signUp.id)
    await tell(signUp, takeBack, now, tx)
    return ok({ state: 'confirmed' as const })
  })
}

async function supersedeEarlier(signUp: SignUp, now: Date, tx: Transaction): Promise<void> {
  const { moduleId, personId, id } = signUp
  const earlier = await SignUp.findOne({
    where: { moduleId, personId, state: 'confirmed', id: { [Op.ne]: id } },
    transaction: tx,
    lock: tx.LOCK.UPDATE,
  })
  if (!earlier) return
  await earlier.update({ state: 'superseded', supersededAt: now }, { transaction: tx })
  await recordMove(tx, {
    workshopId: earlier.workshopId,
    subjectType: 'signup',
    subjectId: earlier.id,
    from: 'confirmed',
    event: 'supersede',
    to: 'superseded',
    byPersonId: personId,
    at: now,
  })
}

async function tell(signUp: SignUp, takeBack: string, now: Date, tx: Transaction): Promise<void> {
  const found = { transaction: tx, rejectOnEmpty: true } as const
  const workshop = await Workshop.findByPk(signUp.workshopId, found)
  const module = await Module.findByPk(signUp.moduleId, found)
  const offer = await Offer.findByPk(signUp.offerId, found)
  const run = await Run.findOne({
    where: { moduleId: signUp.moduleId, state: 'taking_deposits', decideByAt: { [Op.gt]: now } },
    order: [['number', 'DESC']],
    transaction: tx,
  })
  const modulePath = paths.module(workshop.slug, module.slug)
  await queueMail(tx, {
    kind: 'signup_confirmed',
    workshopId: workshop.id,
    personId: signUp.personId,
    subjectId: signUp.id,
    props: {
      module: module.name,
      moduleUrl: `${env().BASE_URL}${modulePath}`,
      offer: offer.kind,
      quantity: signUp.quantity,
      updates: signUp.wantsUpdates,
      takeBackUrl: `${env().BASE_URL}${paths.takeBack(takeBack)}`,
    },
    now,
  })
  if (run) await inviteSignUp(tx, { run, signUp, now })
  await modulePageChanged(tx, module.id)
}
