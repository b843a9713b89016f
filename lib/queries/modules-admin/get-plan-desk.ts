import 'server-only'
import { Op } from 'sequelize'
import { formOfPlan } from '@/lib/contracts/form-of-plan'
import { formValues } from '@/lib/contracts/form-values'
import type { PlanDesk } from '@/lib/contracts/module-desk'
import type { CostPlan } from '@/lib/core/costs/plan'
import { costRun } from '@/lib/core/costs/run-cost'
import { taxRateFor } from '@/lib/core/orders/tax-rate'
import { writeShare } from '@/lib/core/plain/share'
import { can, type Actor } from '@/lib/core/policy/can'
import { dayIn } from '@/lib/core/time/zone'
import { Module, Offer, Plan, TaxRate, Workshop } from '@/models'

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
  const body = plan ? formOfPlan(plan, row.steps) : await beginning(workshop, cmd.now)
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

function workOf(works: readonly { offer: string }[], offer: string) {
  const isAssembled = offer === 'built'
  const fresh = {
    offer,
    isAssembled,
    minutesPerUnit: 10,
    minutesPerStart: isAssembled ? 30 : 0,
    packaging: '0',
  }
  return works.find((work) => work.offer === offer) ?? fresh
}

function tried(plan: CostPlan, units: number): PlanDesk['trial'][number] {
  const { cost, unpriced } = costRun(plan, Object.fromEntries(plan.offers.map(({ offer }) => [offer, units])))
  return { units, costMinor: cost, unpriced: [...new Set(unpriced.map(({ name }) => name))] }
}

/** What a first plan starts from: common practice, no source; every figure is there to be changed. */
async function beginning(workshop: Workshop, now: Date) {
  const rates = await TaxRate.findAll({
    where: { country: workshop.country, workshopId: { [Op.or]: [null, workshop.id] } },
  })
  const rate = taxRateFor({
    mode: workshop.taxMode,
    home: workshop.country,
    destination: workshop.country,
    taxClass: 'standard',
    on: dayIn(now, workshop.timeZone),
    rates: rates.map((each) => each.facts()),
  })
  const step = (name: string, days: [number, number, number], after: string) => {
    const [optimistic, likely, pessimistic] = days
    return { name, optimistic, likely, pessimistic, after }
  }
  return {
    currency: workshop.currency,
    offers: [] as { offer: string }[],
    onceMinutes: 120,
    yieldPercent: '95',
    confidencePercent: '95',
    unitsPerOrder: '1',
    taxes: rate > 0 ? [{ rate: writeShare(rate), weight: 1 }] : [],
    steps: [
      step('Boards and front panels made', [10, 14, 25], ''),
      step('Parts bought', [5, 10, 20], ''),
      step('Building and testing', [5, 10, 20], '1, 2'),
      step('Packing and posting', [3, 5, 10], '3'),
    ],
  }
}
