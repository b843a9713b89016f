import 'server-only'
import type { PlanInput } from '@/lib/contracts/plan-forms'
import { planOfForm } from '@/lib/contracts/plan-of-form'
import { refuseFields } from '@/lib/contracts/problem'
import { costRun } from '@/lib/core/costs/run-cost'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { moduleMistakes } from '@/lib/messages/module-mistakes'
import { Plan, Run, RunOffer, Workshop } from '@/models'
import { planChoices } from '../_steps/plan-choices'
import { planParts } from '../_steps/plan-parts'

/**
 * Saves the plan a run's figures are computed from: the run's own offers at its prices, and the parts list of its revision
 * as it stands now. What was frozen with a decision stays as it was.
 * Refuses: forbidden · not_found · run_ended · invalid (amounts in another currency). Locks: the run. Writes: the plan.
 * Repeat: safe.
 */
export function saveRunPlan(cmd: {
  actor: Actor
  workshopId: string
  runId: string
  input: PlanInput
  now: Date
}) {
  const { actor, workshopId, runId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'cost:write', { workshopId })) return refuse('forbidden')
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx })
    const run = await Run.findOne({
      where: { id: runId, workshopId },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    if (!workshop || !run) return refuse('not_found')
    if (run.state === 'closed' || run.state === 'called_off') return refuse('run_ended')
    if (input.currency !== run.currency) return refuseFields({ currency: moduleMistakes.otherCurrency })
    const offers = await RunOffer.findAll({ where: { runId }, order: [['kind', 'ASC']], transaction: tx })
    const plan = planOfForm(input, {
      ...workshop.facts(),
      payoutDelayDays: workshop.payoutDelayDays,
      offers,
      parts: await planParts(tx, run.revisionId),
      choices: await planChoices(tx, run.moduleId),
    })
    // Once through the core, so that a plan it could not compute with is never stored.
    costRun(plan, Object.fromEntries(offers.map(({ kind }) => [kind, 1])))

    const by = { changedAt: now, changedByPersonId: actor.personId }
    const written = { plan: plan as unknown as Record<string, unknown>, steps: input.steps }
    const before = await Plan.findOne({ where: { runId, isBase: true }, transaction: tx })
    if (before) await before.update({ ...written, ...by }, { transaction: tx })
    else
      await Plan.create(
        { workshopId, moduleId: run.moduleId, runId, ...written, createdAt: now, ...by },
        { transaction: tx },
      )
    return ok({ run: run.id })
  })
}
