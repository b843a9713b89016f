import 'server-only'
import { refuseFields } from '@/lib/contracts/problem'
import type { WhatIfInput } from '@/lib/contracts/what-ifs'
import type { CostPlan } from '@/lib/core/costs/plan'
import { costRun } from '@/lib/core/costs/run-cost'
import { applyWhatIf, type WhatIf } from '@/lib/core/costs/what-if'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { moduleMistakes } from '@/lib/messages/module-mistakes'
import { MOST_SIDE_BY_SIDE } from '@/lib/queries/runs/get-what-ifs'
import { Plan, Run, RunOffer } from '@/models'

/**
 * Keeps the run's plan once more under a name of its own, with some things different. The run and its plan are not touched.
 * Refuses: forbidden · not_found · no_plan · too_many_what_ifs · invalid (name taken, other currency, unknown supplier).
 * Locks: the run. Writes: a plan that is none of those decided on. Repeat: refused, the name is taken.
 */
export function addWhatIf(cmd: {
  actor: Actor
  workshopId: string
  runId: string
  input: WhatIfInput
  now: Date
}) {
  const { actor, workshopId, runId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'cost:write', { workshopId })) return refuse('forbidden')
    const run = await Run.findOne({
      where: { id: runId, workshopId },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    if (!run) return refuse('not_found')
    if (input.currency !== run.currency) return refuseFields({ currency: moduleMistakes.otherCurrency })
    const plans = await Plan.findAll({ where: { runId }, transaction: tx })
    const base = plans.find(({ isBase }) => isBase)
    if (!base) return refuse('no_plan')
    if (plans.length >= MOST_SIDE_BY_SIDE) return refuse('too_many_what_ifs')
    if (plans.some(({ name }) => name === input.name))
      return refuseFields({ name: moduleMistakes.whatIfNameTaken })
    const sold = await RunOffer.findAll({ where: { runId }, transaction: tx })
    const own = Object.fromEntries(sold.map(({ kind, priceMinor }) => [kind, priceMinor]))
    const { prices, ...change } = changeOf(input)
    const plan = applyWhatIf(base.plan as unknown as CostPlan, { ...change, prices: { ...own, ...prices } })
    // Once through the core, so that a plan it could not compute with is never stored.
    costRun(plan, Object.fromEntries(plan.offers.map(({ offer }) => [offer, 1])))
    const row = await Plan.create(
      {
        ...{ workshopId, moduleId: run.moduleId, runId, name: input.name, isBase: false },
        plan: plan as unknown as Record<string, unknown>,
        steps: base.steps,
        units: input.units ?? null,
        ...{ createdAt: now, changedAt: now, changedByPersonId: actor.personId },
      },
      { transaction: tx },
    )
    return ok({ plan: row.id })
  })
}

function changeOf({ prices, yieldPercent, supplier, supplierDoes, supplierPercent }: WhatIfInput): WhatIf {
  const set = prices.flatMap(({ offer, priceMinor }) =>
    priceMinor === undefined ? [] : [[offer, priceMinor] as const],
  )
  return {
    prices: Object.fromEntries(set),
    ...(yieldPercent !== undefined && { yieldBasisPoints: yieldPercent }),
    ...(supplier !== undefined && {
      supplier: {
        name: supplier,
        hundredths: supplierDoes === 'left_out' ? null : 100 + (supplierPercent ?? 0),
      },
    }),
  }
}
