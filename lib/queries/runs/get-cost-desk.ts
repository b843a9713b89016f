import 'server-only'
import { Op } from 'sequelize'
import type { CostDesk } from '@/lib/contracts/cost-desk'
import { formOfPlan } from '@/lib/contracts/form-of-plan'
import { formValues } from '@/lib/contracts/form-values'
import type { CostPlan } from '@/lib/core/costs/plan'
import { can, type Actor } from '@/lib/core/policy/can'
import { firstPlan, workOf } from '@/lib/queries/modules-admin/first-plan'
import { Plan, Run, RunOffer } from '@/models'
import { countChangedParts } from './count-changed-parts'
import { costFiguresOf } from './cost-figures-of'
import { getRunFacts } from './get-run-facts'

/**
 * A run's costs with the plan they rest on; null when the actor may not see them, or there is no such run. A fixed number
 * of statements, whatever the parts list holds.
 */
export async function getCostDesk(cmd: {
  actor: Actor
  workshopId: string
  runId: string
  units?: number | undefined
  now: Date
}): Promise<CostDesk | null> {
  const { actor, workshopId, runId, now } = cmd
  if (!can(actor, 'cost:read', { workshopId })) return null
  const run = await Run.findOne({
    where: { id: runId, workshopId },
    include: ['module', 'workshop', 'revision'],
  })
  const facts = run && (await getRunFacts({ workshopId, runId, now }))
  if (!run?.module || !run.workshop || !run.revision || !facts) return null
  const plans = await Plan.findAll({
    where: { moduleId: run.moduleId, isBase: true, runId: { [Op.or]: [run.id, null] } },
  })
  const own = plans.find((plan) => plan.runId === run.id)
  const shown = own ?? plans[0]
  const offers = await RunOffer.findAll({ where: { runId }, order: [['priceMinor', 'ASC']] })
  const kinds = offers.map(({ kind }) => kind)
  const body = shown
    ? formOfPlan(shown.plan as unknown as CostPlan, shown.steps)
    : await firstPlan(run.workshop, now)
  const values = formValues({ ...body, offers: kinds.map((kind) => workOf(body.offers, kind)) }, run.currency)
  return {
    run: {
      id: run.id,
      number: run.number,
      state: run.state,
      revision: run.revision.letter,
      currency: run.currency,
    },
    module: { slug: run.module.slug, name: run.module.name },
    offers: kinds,
    values,
    planOf: own ? 'run' : shown ? 'module' : 'none',
    changedParts: own
      ? await countChangedParts(run.revisionId, own.plan as unknown as CostPlan, facts.lines)
      : 0,
    figures: costFiguresOf(facts, { units: cmd.units, locale: run.workshop.locale }),
  }
}
