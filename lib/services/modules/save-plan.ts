import 'server-only'
import type { PlanInput } from '@/lib/contracts/plan-forms'
import { planOfForm } from '@/lib/contracts/plan-of-form'
import { refuseFields } from '@/lib/contracts/problem'
import { costRun } from '@/lib/core/costs/run-cost'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { moduleMistakes } from '@/lib/messages/module-mistakes'
import { Offer, Plan, Workshop } from '@/models'
import { lockModule } from '../_steps/find-module'
import { planChoices } from '../_steps/plan-choices'
import { planParts } from '../_steps/plan-parts'
import { newestRevision } from '../_steps/refresh-plan-parts'

/**
 * Saves a module's base plan and schedule: what a run costs and how long it takes, before there is one. Prices come from
 * the offers and parts from the newest revision's list; a run takes its own copy when it is made.
 * Refuses: not_found · forbidden · offers_first · invalid (amounts in another currency). Locks: the module. Writes: the
 * plan. Repeat: safe.
 */
export function savePlan(cmd: {
  actor: Actor
  workshopId: string
  module: string
  input: PlanInput
  now: Date
}) {
  const { actor, workshopId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'plan:write', { workshopId })) return refuse('forbidden')
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx })
    const module = await lockModule(tx, workshopId, cmd.module)
    if (!workshop || !module) return refuse('not_found')
    if (input.currency !== workshop.currency) return refuseFields({ currency: moduleMistakes.otherCurrency })
    const offers = await Offer.findAll({
      where: { moduleId: module.id, withdrawnAt: null },
      order: [['position', 'ASC']],
      transaction: tx,
    })
    if (offers.length === 0) return refuse('offers_first')
    const newest = await newestRevision(tx, module.id)
    const plan = planOfForm(input, {
      ...workshop.facts(),
      payoutDelayDays: workshop.payoutDelayDays,
      offers: offers.map((offer) => offer.facts()),
      parts: newest ? await planParts(tx, newest.id) : [],
      choices: await planChoices(tx, module.id),
    })
    // Once through the core, so that a plan it could not compute with is never stored.
    costRun(plan, Object.fromEntries(offers.map(({ kind }) => [kind, 1])))

    const by = { changedAt: now, changedByPersonId: actor.personId }
    const written = { plan: plan as unknown as Record<string, unknown>, steps: input.steps }
    const before = await Plan.findOne({
      where: { moduleId: module.id, runId: null, isBase: true },
      transaction: tx,
    })
    if (before) await before.update({ ...written, ...by }, { transaction: tx })
    else
      await Plan.create(
        { workshopId, moduleId: module.id, runId: null, ...written, createdAt: now, ...by },
        { transaction: tx },
      )
    return ok({ module: module.slug })
  })
}
