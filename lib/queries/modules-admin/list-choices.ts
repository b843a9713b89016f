import 'server-only'
import type { ChoiceDesk } from '@/lib/contracts/choice-forms'
import { can, type Actor } from '@/lib/core/policy/can'
import { Choice, ChoiceAnswer, Module, Offer } from '@/models'

/** The questions a module's offers ask today, in their order; empty for who may not see them. Three queries. */
export async function listChoices(cmd: {
  actor: Actor
  workshopId: string
  module: string
}): Promise<ChoiceDesk[]> {
  if (!can(cmd.actor, 'offer:read', { workshopId: cmd.workshopId })) return []
  const module = await Module.findOne({
    where: { workshopId: cmd.workshopId, slug: cmd.module },
    attributes: ['id'],
  })
  if (!module) return []
  const choices = await Choice.findAll({
    where: { retiredAt: null },
    include: [
      { model: Offer, as: 'offer', required: true, where: { moduleId: module.id }, attributes: ['kind'] },
      { model: ChoiceAnswer, as: 'answers', separate: true, order: [['position', 'ASC']] },
    ],
    order: [['position', 'ASC']],
  })
  return choices.map((choice) => ({
    id: choice.id,
    offer: choice.offer!.kind,
    question: choice.question,
    askedAfterLock: choice.askedAfterLock,
    answerWithinDays: choice.answerWithinDays,
    answers: (choice.answers ?? []).map(({ id, label, surchargeMinor, isDefault }) => ({
      ...{ id, label, surchargeMinor, isDefault },
    })),
  }))
}
