import 'server-only'
import { col, fn, type Transaction } from 'sequelize'
import type { CostPlan } from '@/lib/core/costs/plan'
import { Plan, Revision } from '@/models'
import { planChoices } from './plan-choices'
import { planParts } from './plan-parts'

/**
 * Brings the parts list of a module's newest revision and the questions of its offers into its base plan, which costs are computed from. Nothing to do
 * while there is no plan. Plans of runs keep the list they were made with.
 * Locks: nothing; the caller holds the module. Writes: the plan. Repeat: safe.
 */
export async function refreshPlanParts(
  tx: Transaction,
  { moduleId, byPersonId, now }: { moduleId: string; byPersonId: string; now: Date },
): Promise<void> {
  const plan = await Plan.findOne({ where: { moduleId, runId: null, isBase: true }, transaction: tx })
  if (!plan) return
  const newest = await newestRevision(tx, moduleId)
  const parts = newest ? await planParts(tx, newest.id) : []
  const offers = (plan.plan as unknown as CostPlan).offers.map(({ offer }) => offer)
  const choices = (await planChoices(tx, moduleId)).filter(({ offer }) => offers.includes(offer))
  await plan.update(
    { plan: { ...plan.plan, parts, choices }, changedAt: now, changedByPersonId: byPersonId },
    { transaction: tx },
  )
}

/** The revision whose letter comes last (A … Z, AA …); null while there is none. */
export function newestRevision(tx: Transaction, moduleId: string): Promise<Revision | null> {
  return Revision.findOne({
    where: { moduleId },
    order: [
      [fn('length', col('letter')), 'DESC'],
      ['letter', 'DESC'],
    ],
    transaction: tx,
  })
}
