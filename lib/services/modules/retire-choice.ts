import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { Choice, Offer } from '@/models'
import { lockModule } from '../_steps/find-module'
import { modulePageChanged } from '../_steps/module-page-changed'
import { refreshPlanParts } from '../_steps/refresh-plan-parts'

/**
 * Asks a question no longer. What was answered stays with the orders; parts that were for one of its answers are needed for
 * nobody any more.
 * Refuses: forbidden · not_found (not of this module, or retired already). Locks: the module. Writes: the choice, the base
 * plan; the public page is made anew. Repeat: not_found.
 */
export function retireChoice(cmd: {
  actor: Actor
  workshopId: string
  module: string
  choice: string
  now: Date
}) {
  const { actor, workshopId, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'choice:write', { workshopId })) return refuse('forbidden')
    const module = await lockModule(tx, workshopId, cmd.module)
    const choice =
      module &&
      (await Choice.findOne({
        where: { id: cmd.choice, workshopId, retiredAt: null },
        include: [{ model: Offer, as: 'offer', required: true, where: { moduleId: module.id } }],
        transaction: tx,
      }))
    if (!module || !choice) return refuse('not_found')
    await choice.update({ retiredAt: now }, { transaction: tx })
    await refreshPlanParts(tx, { moduleId: module.id, byPersonId: actor.personId, now })
    await modulePageChanged(tx, module.id)
    return ok({ choice: choice.id, offer: choice.offer!.kind })
  })
}
