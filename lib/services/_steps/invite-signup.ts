import 'server-only'
import type { Transaction } from 'sequelize'
import { env } from '@/lib/config/env'
import { paths } from '@/lib/paths'
import { Invitation, Module, RunOffer, Workshop, type Run, type SignUp } from '@/models'
import { queueMail } from './queue-mail'
import { recordMove } from './record-move'
import { takeBackToken } from './take-back-token'

/**
 * Invites one confirmed sign-up to order in a run that takes deposits: the invitation and its mail. True when it is new.
 * Locks: nothing. Writes: invitation, audit, mail. Repeat: safe; there is one invitation per run and sign-up.
 */
export async function inviteSignUp(
  tx: Transaction,
  { run, signUp, now }: { run: Run; signUp: SignUp; now: Date },
): Promise<boolean> {
  const [invitation, isNew] = await Invitation.findOrCreate({
    where: { runId: run.id, signupId: signUp.id },
    defaults: {
      workshopId: run.workshopId,
      runId: run.id,
      signupId: signUp.id,
      personId: signUp.personId,
      sentAt: now,
      answeredAt: null,
    },
    transaction: tx,
  })
  if (!isNew) return false
  await recordMove(tx, {
    workshopId: run.workshopId,
    subjectType: 'invitation',
    subjectId: invitation.id,
    from: null,
    event: 'send',
    to: 'sent',
    byPersonId: null,
    at: now,
  })
  const workshop = await Workshop.findByPk(run.workshopId, { transaction: tx, rejectOnEmpty: true })
  const module = await Module.findByPk(run.moduleId, { transaction: tx, rejectOnEmpty: true })
  const offers = await RunOffer.findAll({
    where: { runId: run.id },
    order: [['priceMinor', 'ASC']],
    transaction: tx,
  })
  const base = env().BASE_URL
  await queueMail(tx, {
    kind: 'deposits_open',
    workshopId: run.workshopId,
    personId: signUp.personId,
    subjectId: invitation.id,
    props: {
      currency: run.currency,
      module: module.name,
      moduleUrl: `${base}${paths.module(workshop.slug, module.slug)}`,
      offers: offers.map((offer) => ({
        offer: offer.kind,
        priceMinor: offer.priceMinor,
        depositMinor: offer.depositMinor,
        postedBy: offer.postedByOn,
      })),
      pricesIncludeTax: workshop.pricesIncludeTax,
      minimum: run.minimum,
      maximum: run.maximum,
      decideBy: run.decideByOn,
      opensToAllAt: run.opensToAllAt && run.opensToAllAt > now ? run.opensToAllAt.toISOString() : null,
      takeBackUrl: `${base}${paths.takeBack(takeBackToken(signUp.id))}`,
    },
    now,
  })
  return true
}
