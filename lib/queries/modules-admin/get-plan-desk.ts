import 'server-only'
import { formOfPlan } from '@/lib/contracts/form-of-plan'
import { formValues } from '@/lib/contracts/form-values'
import type { PlanDesk } from '@/lib/contracts/module-desk'
import type { CostPlan } from '@/lib/core/costs/plan'
import { costRun } from '@/lib/core/costs/run-cost'
import { can, type Actor } from '@/lib/core/policy/can'
import { Module, Offer, Plan, Workshop } from '@/models'
import { firstPlan, workOf } from './first-plan'

/** Units of each offer the plan is tried with, so that an owner sees at once whether it is plausible. */
const TRIAL_UNITS = [20, 60, 150]

/** A module's base plan as its short form; null when there is nothing to see. Five queries. */
export async function getPlanDesk(cmd: {
  actor: Actor
  workshopId: string
  module: string
  now: Date
}): Promise<PlanDesk | null> {
  const { actor, workshopId } = cmd
  if (!can(actor, 'plan:read', { workshopId })) return null
  const workshop = await Workshop.findByPk(workshopId)
  const module = await Module.findOne({ where: { workshopId, slug: cmd.module }, attributes: ['id'] })
  if (!workshop || !module) return null
  const offers = await Offer.findAll({
    where: { moduleId: module.id, withdrawnAt: null },
    order: [['position', 'ASC']],
  })
  const kinds = offers.map(({ kind }) => kind)
  const row = await Plan.findOne({ where: { moduleId: module.id, runId: null, isBase: true } })
  const plan = row && (row.plan as unknown as CostPlan)
  const known = plan?.offers.map(({ offer }) => offer) ?? []
  const body = plan ? formOfPlan(plan, row.steps) : await firstPlan(workshop, cmd.now)
  const shown = { ...body, offers: kinds.map((offer) => workOf(body.offers, offer)) }
  return {
    currency: workshop.currency,
    offers: kinds,
    values: formValues(shown, workshop.currency),
    isSaved: plan !== null,
    missing: plan ? kinds.filter((kind) => !known.includes(kind)) : [],
    parts: plan?.parts.length ?? 0,
    trial: plan ? TRIAL_UNITS.map((units) => tried(plan, units)) : [],
  }
}

function tried(plan: CostPlan, units: number): PlanDesk['trial'][number] {
  const { cost, unpriced } = costRun(plan, Object.fromEntries(plan.offers.map(({ offer }) => [offer, units])))
  return { units, costMinor: cost, unpriced: [...new Set(unpriced.map(({ name }) => name))] }
}
