import 'server-only'
import type { Transaction } from 'sequelize'
import type { CostPlan } from '@/lib/core/costs/plan'
import { Plan, RunOffer, type Run } from '@/models'
import { planParts } from './plan-parts'

/**
 * Gives a new run its own copy of the module's base plan: the run's offers at the run's prices, the parts list of the
 * run's revision as it stands. The run's offers must have been written before. False, and nothing written, when the
 * module has no plan or the plan lacks one of the offers: figures of half a plan would be wrong ones.
 * Locks: nothing. Writes: one plan. Repeat: false, a run has one base plan.
 */
export async function copyBasePlan(
  tx: Transaction,
  given: { run: Run; byPersonId: string; now: Date },
): Promise<boolean> {
  const { run, byPersonId, now } = given
  const base = await Plan.findOne({
    where: { moduleId: run.moduleId, runId: null, isBase: true },
    transaction: tx,
  })
  if (!base || (await Plan.count({ where: { runId: run.id, isBase: true }, transaction: tx })) > 0)
    return false
  const offers = await RunOffer.findAll({ where: { runId: run.id }, transaction: tx })
  const copied = forRun(base.plan as unknown as CostPlan, offers)
  if (copied === null) return false
  const plan: CostPlan = { ...copied, parts: await planParts(tx, run.revisionId) }
  await Plan.create(
    {
      workshopId: run.workshopId,
      moduleId: run.moduleId,
      runId: run.id,
      plan: plan as unknown as Record<string, unknown>,
      steps: base.steps,
      createdAt: now,
      changedAt: now,
      changedByPersonId: byPersonId,
    },
    { transaction: tx },
  )
  return true
}

/** The plan cut to a run's offers, at their prices; null when it knows one of them not at all. */
function forRun(plan: CostPlan, runOffers: readonly RunOffer[]): CostPlan | null {
  const priceOf = new Map(runOffers.map((each) => [each.kind as string, each]))
  const offers = plan.offers.flatMap((offer) => {
    const sold = priceOf.get(offer.offer)
    return sold ? [{ ...offer, price: sold.priceMinor, deposit: sold.depositMinor }] : []
  })
  if (offers.length < runOffers.length) return null
  return {
    ...plan,
    offers,
    choices: plan.choices.filter(({ offer }) => priceOf.has(offer)),
    perUnit: plan.perUnit.filter(({ offer }) => priceOf.has(offer)),
  }
}
