import 'server-only'
import type { ChoiceInput } from '@/lib/contracts/choice-forms'
import { refuseFields } from '@/lib/contracts/problem'
import { minor } from '@/lib/core/brand'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { moduleMistakes } from '@/lib/messages/module-mistakes'
import { Choice, ChoiceAnswer, Offer, Workshop } from '@/models'
import { lockModule } from '../_steps/find-module'
import { modulePageChanged } from '../_steps/module-page-changed'
import { refreshPlanParts } from '../_steps/refresh-plan-parts'

/**
 * Asks one more question with an offer. Orders placed before owe what they owed: they hold their own copy.
 * Refuses: forbidden · not_found · offers_first (the offer is not there) · invalid (amounts in another currency). Locks: the
 * module. Writes: the choice and its answers, the base plan; the public page is made anew. Repeat: asks it twice.
 */
export function addChoice(cmd: {
  actor: Actor
  workshopId: string
  module: string
  input: ChoiceInput
  now: Date
}) {
  const { actor, workshopId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'choice:write', { workshopId })) return refuse('forbidden')
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx })
    const module = await lockModule(tx, workshopId, cmd.module)
    if (!workshop || !module) return refuse('not_found')
    if (input.currency !== workshop.currency) return refuseFields({ answers: moduleMistakes.otherCurrency })
    const offer = await Offer.findOne({
      where: { moduleId: module.id, kind: input.offer },
      transaction: tx,
    })
    if (!offer) return refuse('offers_first')
    const { question, askedAfterLock, answerWithinDays } = input
    const position = await Choice.count({ where: { offerId: offer.id }, transaction: tx })
    const choice = await Choice.create(
      {
        ...{ workshopId, offerId: offer.id, question, position, askedAfterLock, answerWithinDays },
        retiredAt: null,
      },
      { transaction: tx },
    )
    await ChoiceAnswer.bulkCreate(
      input.answers.map(({ label, surchargeMinor, isDefault }, i) => ({
        ...{ workshopId, choiceId: choice.id, label, isDefault, position: i + 1 },
        surchargeMinor: minor(surchargeMinor),
      })),
      { transaction: tx },
    )
    await refreshPlanParts(tx, { moduleId: module.id, byPersonId: actor.personId, now })
    await modulePageChanged(tx, module.id)
    return ok({ choice: choice.id, offer: offer.kind })
  })
}
