import 'server-only'
import type { CostFigures, CostTrial } from '@/lib/contracts/cost-desk'
import { planOfForm } from '@/lib/contracts/plan-of-form'
import { can, type Actor } from '@/lib/core/policy/can'
import { Workshop } from '@/models'
import { costFiguresOf } from './cost-figures-of'
import { getRunFacts } from './get-run-facts'

/**
 * A run's figures as they would be with the plan as it is typed; nothing is saved. The parts are those of the plan the run
 * has. Null when the actor may not see them, or there is no such run. As many statements as the run's facts.
 */
export async function tryCosts(cmd: {
  actor: Actor
  workshopId: string
  runId: string
  input: CostTrial
  now: Date
}): Promise<CostFigures | null> {
  const { actor, workshopId, runId, input, now } = cmd
  if (!can(actor, 'cost:read', { workshopId })) return null
  const facts = await getRunFacts({ workshopId, runId, now })
  const workshop = await Workshop.findByPk(workshopId)
  if (!facts || !workshop) return null
  const costs = planOfForm(input, {
    ...workshop.facts(),
    payoutDelayDays: workshop.payoutDelayDays,
    offers: facts.offers,
    parts: facts.plan?.costs.parts ?? [],
    choices: facts.plan?.costs.choices ?? [],
  })
  const tried = { ...facts, plan: { costs, steps: input.steps, names: {} } }
  return costFiguresOf(tried, { units: input.units, locale: workshop.locale })
}
